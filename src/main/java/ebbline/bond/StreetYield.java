package ebbline.bond;

import ebbline.instrument.PeriodFlows;

/**
 * Price and yield by the street convention: P = Σ cₖ v^(w + k), v = 1/(1 + y/f), w the fraction of
 * a period to the next coupon; in the last period simple interest, P = c/(1 + w y/f). Prices are
 * dirty, per 100; yields decimals per year, compounded f times a year.
 */
public final class StreetYield {
  private final PeriodYield yields;

  public StreetYield(PeriodFlows flows) {
    this.yields = new PeriodYield(flows, FirstFraction.STREET);
  }

  /**
   * Dirty price at a yield.
   *
   * @throws IllegalArgumentException if a period's growth 1 + y/f is not positive
   */
  public double price(double yield) {
    return yields.price(yield);
  }

  /**
   * The yield of a dirty price, to 1e-14.
   *
   * @throws IllegalArgumentException if no yield gives it, or flows change sign so that there may
   *     be several
   */
  public double yieldOf(double price) {
    return yields.yieldOf(price);
  }

  /** −P′/P, years. */
  public double modifiedDuration(double yield) {
    return yields.modifiedDuration(yield);
  }

  /** Present-value weighted mean time of the flows, years. */
  public double macaulayDuration(double yield) {
    return yields.macaulayDuration(yield);
  }

  /** P″/P, years². */
  public double convexity(double yield) {
    return yields.convexity(yield);
  }

  /** Price gained when the yield falls by one basis point, two-sided, per 100. */
  public double dv01(double yield) {
    return yields.dv01(yield);
  }
}
