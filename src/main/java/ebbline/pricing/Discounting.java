package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;

/** Flows times discount factors. */
public final class Discounting {
  private static final double ROUNDING = Math.ulp(1.0);

  private Discounting() {}

  /**
   * The value of a claim without rights.
   *
   * @throws IllegalArgumentException if the claim has rights
   */
  public static Valuation value(Claim claim, DiscountCurve curve) {
    if (claim.isCertain()) {
      return value(claim.flows(), curve);
    }
    throw new IllegalArgumentException(
        "discounting alone prices no options, found "
            + (claim.rights().size() + claim.optionlets().size()));
  }

  /** The value of flows; those at or before today count in full at their discount factor. */
  public static Valuation value(CashFlows flows, DiscountCurve curve) {
    double sum = 0;
    double bound = 0;
    for (int i = 0; i < flows.size(); i++) {
      double log = curve.logDiscount(flows.time(i));
      double term = flows.amount(i) * curve.discount(flows.time(i));
      sum += term;
      // Two units for the log discount, one each for exponential and product, half a unit of every
      // partial sum.
      bound += (2 + 2 * Math.abs(log)) * Math.abs(term) + 0.5 * Math.abs(sum);
    }
    return new Valuation(sum, Method.DISCOUNTING, ROUNDING * bound);
  }
}
