package ebbline.pricing;

import ebbline.model.StandardNormal;
import org.apache.commons.numbers.gamma.Erfcx;

/**
 * Options out of the money in units that leave one number beside the volatility, in logarithms: no
 * price is too small, and nothing cancels that the volatility could be read from.
 */
final class OutOfTheMoney {
  /*
   * Normal: with d = |F − K|/s the price over |F − K| is (φ(d) − dΦ(−d))/d = φ(d)(1 − dR(d))/d, R = Φ(−d)/φ(d).
   *
   * Lognormal: with x = |ln F/K|, a = x/v and t = v/2 the price over √(FK) is
   *   c (R(a − t) − R(a + t)),   c = e^(−(a² + t²)/2)/√(2π),
   * and R′(z) = zR(z) − 1, so for a short interval the difference is the integral of 1 − zR(z) over it, which is
   * positive: no digits go. 1 − zR(z) itself loses z² units in the last place, but ln of the price moves z² times as
   * fast as ln of the volatility, so the volatility does not.
   */
  private static final double ROOT_HALF = 0.7071067811865476;

  private static final double ROOT_HALF_PI = 1.2533141373155003;
  private static final double HALF_LOG_TWO_PI = 0.9189385332046728;

  /** The difference of two ratios is safe from here on; below it a rule of 16 points is exact. */
  private static final double SHORT_BELOW = 0.5;

  private static final double[] NODES = {
    0.09501250983763744, 0.2816035507792589, 0.45801677765722737, 0.6178762444026438,
    0.755404408355003, 0.8656312023878318, 0.9445750230732326, 0.9894009349916499
  };
  private static final double[] WEIGHTS = {
    0.1894506104550685, 0.18260341504492358, 0.16915651939500254, 0.14959598881657674,
    0.12462897125553388, 0.09515851168249279, 0.062253523938647894, 0.027152459411754096
  };

  private OutOfTheMoney() {}

  /** Φ(−z)/φ(z). */
  static double ratio(double z) {
    return ROOT_HALF_PI * Erfcx.value(z * ROOT_HALF);
  }

  /** 1 − zR(z), minus the slope of R; positive and falling. */
  static double fall(double z) {
    return 1 - z * ratio(z);
  }

  /** ln of the normal price over |F − K|, at d above 0. */
  static double logNormal(double d) {
    return -0.5 * d * d - HALF_LOG_TWO_PI + Math.log(fall(d) / d);
  }

  /**
   * ln of the lognormal price over √(FK).
   *
   * @param x |ln F/K|
   * @param deviation v, above 0
   */
  static double logPrice(double x, double deviation) {
    return logScale(x, deviation) + Math.log(spread(x / deviation, 0.5 * deviation));
  }

  /** ln of the most that the price can be, √(min(F,K)/max(F,K)), less the price, over √(FK). */
  static double logRoom(double x, double deviation) {
    double a = x / deviation;
    double t = 0.5 * deviation;
    return logScale(x, deviation) + Math.log(ratio(t - a) + ratio(a + t));
  }

  /** ln of the derivative of the price over √(FK) in v. */
  static double logScale(double x, double deviation) {
    double a = x / deviation;
    double t = 0.5 * deviation;
    return -0.5 * (a * a + t * t) - HALF_LOG_TWO_PI;
  }

  private static double spread(double a, double t) {
    if (t >= SHORT_BELOW) {
      return ratio(a - t) - ratio(a + t);
    }
    double sum = 0;
    for (int i = 0; i < NODES.length; i++) {
      sum += WEIGHTS[i] * (fall(a - t * NODES[i]) + fall(a + t * NODES[i]));
    }
    return t * sum;
  }

  /** ln F/K without loss where the two are close. */
  static double logRatio(double forward, double strike) {
    double ratio = forward / strike;
    return ratio > 0.5 && ratio < 2
        ? Math.log1p((forward - strike) / strike)
        : Math.log(forward) - Math.log(strike);
  }

  /** The lognormal price itself, E[max(0, ±(F e^(vz − v²/2) − K))] on the side out of the money. */
  static double lognormal(double forward, double strike, double deviation) {
    double x = Math.abs(logRatio(forward, strike));
    double a = x / deviation;
    double t = 0.5 * deviation;
    if (t < SHORT_BELOW) {
      double density = StandardNormal.density(a) * Math.exp(-0.5 * t * t);
      return Math.sqrt(forward) * Math.sqrt(strike) * (density * spread(a, t));
    }
    double more = Math.min(forward, strike) * StandardNormal.cdf(t - a);
    return Math.max(0, more - Math.max(forward, strike) * StandardNormal.cdf(-a - t));
  }

  /**
   * The normal price itself: E[max(0, sz − m)].
   *
   * @param m how far the option is out of the money, at least 0
   */
  static double normal(double m, double deviation) {
    double d = m / deviation;
    return deviation * StandardNormal.density(d) * fall(d);
  }
}
