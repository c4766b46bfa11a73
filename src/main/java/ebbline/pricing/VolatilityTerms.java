package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.OptionKind;
import ebbline.instrument.Optionlet;
import ebbline.instrument.RateBasis;
import ebbline.instrument.Right;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * What turns a quoted volatility of an option into its premium and back: for each period or right a
 * factor, a forward, a strike and the years to expiry. Premiums are per 100 face. Immutable.
 *
 * <p>The forward of a swaption is the swap rate, of a caplet its rate, of an option on a bond the
 * bond's forward price with accrued interest.
 */
public final class VolatilityTerms {
  private static final int MOST_STEPS = 200;

  private record Part(
      OptionKind option, double factor, double forward, double strike, double expiry) {

    double intrinsic() {
      return factor * Math.max(0, option.sign() * (forward - strike));
    }
  }

  private final List<Part> parts;
  private final boolean onRates;
  private final double most;

  private VolatilityTerms(List<Part> parts, boolean onRates, double most) {
    this.parts = parts;
    this.onRates = onRates;
    this.most = most;
  }

  /**
   * What the option can be worth at most, whatever the model: what exercise brings, and nothing of
   * what it costs.
   */
  public double most() {
    return most;
  }

  /**
   * The volatility that a value implies: normal for an option on rates, Black's for one on a bond.
   * Empty for other claims, and where the value holds none.
   *
   * @param value per 100 face
   */
  static Optional<Double> impliedBy(Claim claim, DiscountCurve curve, double value) {
    boolean plain =
        claim.flows().isEmpty()
            && claim.rights().size() <= 1
            && claim.rights().stream().allMatch(r -> r.strike().isPresent());
    if (!plain) {
      return Optional.empty();
    }
    try {
      VolatilityTerms terms = of(claim, curve);
      VolatilityLaw law = terms.onRates ? VolatilityLaw.NORMAL : VolatilityLaw.BLACK;
      double vol = terms.lastExpiry() > 0 ? terms.implied(law, value, 0) : 0;
      return vol > 0 ? Optional.of(vol) : Optional.empty();
    } catch (IllegalArgumentException e) {
      return Optional.empty(); // at its intrinsic value or its bound no volatility shows
    }
  }

  /** Whether the forward is a rate, or a price per 100. */
  public boolean isOnRates() {
    return onRates;
  }

  /**
   * @param claim one right with a strike, or options on rates; everything fixed
   * @throws IllegalArgumentException in words for any other claim
   */
  public static VolatilityTerms of(Claim claim, DiscountCurve curve) {
    List<Part> parts = new ArrayList<>();
    for (Optionlet each : claim.optionlets()) {
      double growth =
          each.growthOver()
              * Math.exp(curve.logDiscount(each.start()) - curve.logDiscount(each.end()));
      double known = each.basis() == RateBasis.FORWARD ? each.start() : each.end();
      parts.add(
          new Part(
              each.option(),
              each.notional() * each.accrual() * curve.discount(each.end()),
              (growth - 1) / each.accrual(),
              each.strike().orElseThrow(),
              known));
    }
    for (Right right : claim.rights()) {
      parts.add(part(right, curve));
    }
    if (parts.isEmpty() || claim.rights().size() > 1 || !claim.flows().isEmpty()) {
      throw new IllegalArgumentException(
          "a volatility is quoted for an option by itself, with one strike");
    }
    boolean onRates =
        claim.rights().stream()
            .allMatch(r -> r.strike().orElseThrow().perUnit().time(0) > r.decision());
    return new VolatilityTerms(parts, onRates, most(claim, curve));
  }

  private static double most(Claim claim, DiscountCurve curve) {
    double most = 0;
    for (Right right : claim.rights()) {
      most += gained(right.received().merged(), curve);
    }
    for (Optionlet each : claim.optionlets()) {
      most += gained(each.exchanged(), curve);
    }
    return most;
  }

  private static double gained(CashFlows flows, DiscountCurve curve) {
    double gained = 0;
    for (int i = 0; i < flows.size(); i++) {
      gained += Math.max(0, flows.amount(i)) * curve.discount(flows.time(i));
    }
    return gained;
  }

  private static Part part(Right right, DiscountCurve curve) {
    if (right.strike().isEmpty()) {
      throw new IllegalArgumentException("a volatility is quoted for an option with a strike");
    }
    double strike = right.strike().get().value().orElseThrow();
    CashFlows perUnit = right.strike().get().perUnit();
    double annuity = Discounting.value(perUnit, curve).presentValue();
    double rest =
        Discounting.value(right.received().plus(perUnit.times(-strike)).merged(), curve)
            .presentValue();
    // What exercise brings is annuity (strike − forward): a put where the strike is received.
    return new Part(
        annuity < 0 ? OptionKind.CALL : OptionKind.PUT,
        Math.abs(annuity),
        -rest / annuity,
        strike,
        right.decision());
  }

  /** The earliest moment at which something is decided, years. */
  public double expiry() {
    return parts.stream().mapToDouble(Part::expiry).min().orElseThrow();
  }

  /** The latest moment at which something is decided, years. */
  public double lastExpiry() {
    return parts.stream().mapToDouble(Part::expiry).max().orElseThrow();
  }

  /** The forward, of the first period where there are several. */
  public double forward() {
    return parts.get(0).forward();
  }

  /** The least the option can be worth. */
  public double intrinsic() {
    return parts.stream().mapToDouble(Part::intrinsic).sum();
  }

  /**
   * The premium of a volatility.
   *
   * @param volatility per year^½, at least 0
   * @param shift of Black's forward and strike; ignored by the normal law
   */
  public double premium(VolatilityLaw law, double volatility, double shift) {
    if (!(volatility >= 0 && Double.isFinite(volatility))) {
      throw new IllegalArgumentException("volatility must be at least 0, found " + volatility);
    }
    double sum = 0;
    for (Part part : parts) {
      sum += part.factor() * price(part, law, volatility * Math.sqrt(part.expiry()), shift);
    }
    return sum;
  }

  private static double price(Part part, VolatilityLaw law, double deviation, double shift) {
    boolean call = part.option() == OptionKind.CALL;
    if (law == VolatilityLaw.NORMAL) {
      return call
          ? BachelierFormula.call(part.forward(), part.strike(), deviation)
          : BachelierFormula.put(part.forward(), part.strike(), deviation);
    }
    requireAboveShift(part, shift);
    double f = part.forward() + shift;
    double k = part.strike() + shift;
    return call ? BlackFormula.call(f, k, deviation) : BlackFormula.put(f, k, deviation);
  }

  private static void requireAboveShift(Part part, double shift) {
    if (!(part.forward() + shift > 0 && part.strike() + shift > 0)) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "Black's volatility needs forward and strike above minus the shift; found forward"
                  + " %.9g, strike %.9g, shift %.9g",
              part.forward(),
              part.strike(),
              shift));
    }
  }

  /** Derivative of {@link #premium} in the volatility. */
  public double vega(VolatilityLaw law, double volatility, double shift) {
    double sum = 0;
    for (Part part : parts) {
      double root = Math.sqrt(part.expiry());
      double deviation = volatility * root;
      if (!(root > 0)) {
        continue;
      }
      if (law == VolatilityLaw.NORMAL) {
        double d = Math.abs(part.forward() - part.strike()) / deviation;
        sum += part.factor() * root * Math.exp(-0.5 * d * d) / Math.sqrt(2 * Math.PI);
      } else {
        requireAboveShift(part, shift);
        double f = part.forward() + shift;
        double k = part.strike() + shift;
        double x = Math.abs(OutOfTheMoney.logRatio(f, k));
        sum +=
            part.factor()
                * root
                * Math.sqrt(f)
                * Math.sqrt(k)
                * Math.exp(OutOfTheMoney.logScale(x, deviation));
      }
    }
    return sum;
  }

  /**
   * The volatility of a premium.
   *
   * @throws IllegalArgumentException in words if none gives it
   */
  public double implied(VolatilityLaw law, double premium, double shift) {
    double least = intrinsic();
    if (!(premium >= least * (1 - 1e-15))) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "the premium %.9g is below the intrinsic value %.9g: no volatility gives it",
              premium,
              least));
    }
    if (parts.size() == 1) {
      Part part = parts.get(0);
      double price = premium / part.factor();
      return law == VolatilityLaw.NORMAL
          ? ImpliedVolatility.normal(
              part.option(), part.forward(), part.strike(), part.expiry(), price)
          : ImpliedVolatility.black(
              part.option(), part.forward(), part.strike(), part.expiry(), price, shift);
    }
    return search(law, premium, shift);
  }

  /** Newton on the premium, kept inside a shrinking bracket. */
  private double search(VolatilityLaw law, double premium, double shift) {
    double low = 0;
    double high = law == VolatilityLaw.NORMAL ? 1e-3 : 0.1;
    while (premium(law, high, shift) < premium) {
      low = high;
      high *= 2;
      if (!(high < 1e4)) {
        throw new IllegalArgumentException(
            String.format(
                Locale.ROOT, "no volatility gives the premium %.9g: it is too high", premium));
      }
    }
    double vol = 0.5 * (low + high);
    for (int step = 0; step < MOST_STEPS; step++) {
      double miss = premium(law, vol, shift) - premium;
      if (miss > 0) {
        high = vol;
      } else {
        low = vol;
      }
      double next = vol - miss / vega(law, vol, shift);
      if (!(next > low && next < high)) {
        next = 0.5 * (low + high);
      }
      if (Math.abs(next - vol) <= 1e-15 * vol) {
        return next;
      }
      vol = next;
    }
    return vol;
  }
}
