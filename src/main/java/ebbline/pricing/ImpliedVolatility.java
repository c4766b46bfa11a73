package ebbline.pricing;

import ebbline.instrument.OptionKind;
import java.util.Locale;

/**
 * The volatility that a price implies, normal (Bachelier) or lognormal (Black) with a displacement.
 *
 * <p>Good to 1e-12 relative wherever the price holds the volatility: for options out of the money
 * down to prices of 1e-300; in the money as far as the price less the intrinsic value is known.
 * Prices are undiscounted. Jäckel 2015 and 2017, Wilmott, treat the same problem with rational
 * guesses; here it is Newton's method in variables in which the price is nearly straight.
 */
public final class ImpliedVolatility {
  /** A premium this close to the intrinsic value, in units of the larger figure, is equal to it. */
  private static final double EQUAL = 4 * Math.ulp(1.0);

  private static final int MOST_STEPS = 100;
  private static final double ROOT_TWO_PI = 2.5066282746310002;

  private ImpliedVolatility() {}

  /**
   * The normal volatility, per year^½ in the unit of the forward.
   *
   * @param expiry years, above 0
   * @param price undiscounted
   * @return 0 where the price is the intrinsic value
   * @throws IllegalArgumentException in words if no volatility gives the price
   */
  public static double normal(
      OptionKind option, double forward, double strike, double expiry, double price) {
    requireExpiry(expiry);
    double time = timeValue(option, forward, strike, price);
    return time == 0 ? 0 : normalDeviation(Math.abs(forward - strike), time) / Math.sqrt(expiry);
  }

  /**
   * Black's volatility, per year^½, of forward + shift.
   *
   * @param shift added to forward and strike; 0 for Black's own formula
   * @return 0 where the price is the intrinsic value
   * @throws IllegalArgumentException in words if no volatility gives the price, or forward + shift
   *     or strike + shift is not above 0
   */
  public static double black(
      OptionKind option, double forward, double strike, double expiry, double price, double shift) {
    requireExpiry(expiry);
    double f = forward + shift;
    double k = strike + shift;
    if (!(f > 0 && k > 0 && Double.isFinite(f) && Double.isFinite(k))) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "Black's volatility needs forward and strike above minus the shift; found forward"
                  + " %.9g, strike %.9g, shift %.9g",
              forward,
              strike,
              shift));
    }
    double most = option == OptionKind.CALL ? f : k;
    if (!(price < most)) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "the price %.9g is not below %.9g, the most the option can be worth",
              price,
              most));
    }
    double time = timeValue(option, f, k, price);
    if (time == 0) {
      return 0;
    }
    // In the money the other side of parity is worth the time value, and its bound is the smaller.
    double room = option.sign() * (f - k) > 0 ? most - price : Math.min(f, k) - time;
    return lognormalDeviation(f, k, time, room) / Math.sqrt(expiry);
  }

  private static void requireExpiry(double expiry) {
    if (!(expiry > 0 && Double.isFinite(expiry))) {
      throw new IllegalArgumentException(
          "a volatility is implied only before expiry, found " + expiry + " years to it");
    }
  }

  private static double timeValue(OptionKind option, double forward, double strike, double price) {
    if (!(Double.isFinite(forward) && Double.isFinite(strike) && Double.isFinite(price))) {
      throw new IllegalArgumentException(
          "forward, strike and price must be finite, found "
              + forward
              + ", "
              + strike
              + " and "
              + price);
    }
    double intrinsic = Math.max(0, option.sign() * (forward - strike));
    double time = price - intrinsic;
    if (Math.abs(time) <= EQUAL * intrinsic) {
      return 0;
    }
    if (time >= 0) {
      return time;
    }
    throw new IllegalArgumentException(
        String.format(
            Locale.ROOT,
            "the price %.9g is below the intrinsic value %.9g: no volatility gives it",
            price,
            intrinsic));
  }

  /** s with E[max(0, sz − m)] = price. */
  static double normalDeviation(double m, double price) {
    if (m == 0) {
      return price * ROOT_TWO_PI;
    }
    double target = Math.log(price) - Math.log(m);
    double guess =
        target < -2 ? Math.sqrt(-2 * target) : 1 / (ROOT_TWO_PI * (Math.exp(target) + 0.5));
    // ln of the price is concave and falling in w = ln d: Newton comes in from the right.
    double w = Math.log(guess);
    for (int step = 0; step < MOST_STEPS; step++) {
      double d = Math.exp(w);
      double move = (OutOfTheMoney.logNormal(d) - target) * OutOfTheMoney.fall(d);
      w += Math.max(-2, Math.min(2, move));
      if (Math.abs(move) <= 1e-15 * (1 + Math.abs(w))) {
        break;
      }
    }
    return m / Math.exp(w);
  }

  /**
   * v of the option out of the money.
   *
   * @param time its price
   * @param room the smaller of forward and strike less the price
   */
  static double lognormalDeviation(double forward, double strike, double time, double room) {
    double x = Math.abs(OutOfTheMoney.logRatio(forward, strike));
    double logMean = 0.5 * (Math.log(forward) + Math.log(strike));
    return room < time
        ? fromRoom(x, Math.log(room) - logMean)
        : fromPrice(x, Math.log(time) - logMean);
  }

  /** ln of the price is concave and rising in ln v: Newton comes in from the left. */
  private static double fromPrice(double x, double target) {
    double far = x / Math.sqrt(Math.max(1e-300, -2 * (target + 0.5 * x)));
    double near = Math.exp(Math.min(0, target)) * ROOT_TWO_PI;
    double u = Math.log(Math.max(Math.max(far, near), 1e-300));
    if (!(target + 0.5 * x < -0.5)) {
      u = Math.log(Math.max(near, Math.sqrt(2 * x)));
    }
    double low = Double.NEGATIVE_INFINITY;
    double high = Double.POSITIVE_INFINITY;
    for (int step = 0; step < MOST_STEPS; step++) {
      double v = Math.exp(u);
      double price = OutOfTheMoney.logPrice(x, v);
      double miss = price - target;
      if (miss > 0) {
        high = u;
      } else {
        low = u;
      }
      double move = -miss * Math.exp(price - OutOfTheMoney.logScale(x, v)) / v;
      double next = u + Math.max(-3, Math.min(3, move));
      if (!(next > low && next < high)) {
        next = Double.isFinite(low) && Double.isFinite(high) ? 0.5 * (low + high) : next;
      }
      if (Math.abs(next - u) <= 1e-15 * (1 + Math.abs(u))) {
        return Math.exp(next);
      }
      u = next;
    }
    return Math.exp(u);
  }

  /** ln of the room is concave and falling in v. */
  private static double fromRoom(double x, double target) {
    double v = Math.max(Math.sqrt(2 * x), Math.sqrt(Math.max(0, -8 * target)));
    v = Math.max(v, 0.5);
    for (int step = 0; step < MOST_STEPS; step++) {
      double room = OutOfTheMoney.logRoom(x, v);
      double move = (room - target) * Math.exp(room - OutOfTheMoney.logScale(x, v));
      double next = Math.max(0.25 * v, Math.min(4 * v, v + move));
      if (Math.abs(next - v) <= 1e-15 * v) {
        return next;
      }
      v = next;
    }
    return v;
  }
}
