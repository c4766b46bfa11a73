package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Objects;

/**
 * Fixed coupons and repayments on a schedule: level, stepped or amortising.
 *
 * @param coupon annual rate until the first step, a decimal
 * @param steps new rates, each from a coupon date on, in their order
 * @param sinking repayments at 100 on coupon dates, per 100 of the first face; what is left is
 *     repaid at maturity
 */
public record FixedLeg(BondTerms terms, double coupon, List<Step> steps, List<Sinking> sinking) {

  /**
   * A new coupon.
   *
   * @param from coupon date from which it accrues
   * @param rate annual, a decimal
   */
  public record Step(Moment from, double rate) {
    public Step {
      Objects.requireNonNull(from, "from");
      if (!Double.isFinite(rate)) {
        throw new IllegalArgumentException("a step's rate must be finite, found " + rate);
      }
    }
  }

  /**
   * A repayment before maturity.
   *
   * @param at coupon date
   * @param amount per 100 of the first face, above 0
   */
  public record Sinking(Moment at, double amount) {
    public Sinking {
      Objects.requireNonNull(at, "at");
      if (!(amount > 0 && Double.isFinite(amount))) {
        throw new IllegalArgumentException("a repayment must be above 0, found " + amount);
      }
    }
  }

  public FixedLeg {
    Objects.requireNonNull(terms, "terms");
    if (!Double.isFinite(coupon)) {
      throw new IllegalArgumentException("coupon must be finite, found " + coupon);
    }
    steps = List.copyOf(steps);
    sinking = List.copyOf(sinking);
    double repaid = 0;
    for (Sinking each : sinking) {
      repaid += each.amount();
    }
    if (!(repaid <= 100 * (1 + 1e-12))) {
      throw new IllegalArgumentException(
          "sinking must repay the face at most, found " + repaid + " of 100");
    }
  }

  /** One coupon for the whole life, repaid at maturity. */
  public static FixedLeg of(BondTerms terms, double coupon) {
    return new FixedLeg(terms, coupon, List.of(), List.of());
  }

  /**
   * The leg in years from today.
   *
   * @throws IllegalArgumentException in words if its dates make no sense on this axis
   */
  public PlacedLeg on(TimeAxis axis) {
    return new PlacedLeg(this, axis);
  }
}
