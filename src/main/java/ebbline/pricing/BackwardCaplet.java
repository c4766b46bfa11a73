package ebbline.pricing;

import ebbline.model.GaussianRates;

/**
 * Options on a rate compounded in arrears over [T₁, T₂] and paid at T₂, per unit of face. Henrard
 * 2004; Lyashenko and Mercurio 2019.
 */
public final class BackwardCaplet {
  private BackwardCaplet() {}

  /**
   * max(0, growth − (1 + δK)) paid at T₂.
   *
   * @param accrual δ, years
   * @param strike K, the simple rate as a decimal
   */
  public static double caplet(
      GaussianRates rates, double start, double end, double accrual, double strike) {
    double v = deviation(rates, start, end);
    return BlackFormula.call(
        rates.curve().discount(start), (1 + accrual * strike) * rates.curve().discount(end), v);
  }

  /** max(0, (1 + δK) − growth) paid at T₂. */
  public static double floorlet(
      GaussianRates rates, double start, double end, double accrual, double strike) {
    double v = deviation(rates, start, end);
    return BlackFormula.put(
        rates.curve().discount(start), (1 + accrual * strike) * rates.curve().discount(end), v);
  }

  /**
   * Standard deviation of the log of the growth over the period relative to the bond, seen from
   * today: what is known of it at T₁, and what the period itself adds.
   */
  static double deviation(GaussianRates rates, double start, double end) {
    if (!(start >= 0 && end > start)) {
      throw new IllegalArgumentException(
          "a rate's period starts today or later and has a length, found " + start + " to " + end);
    }
    double g = rates.g(end - start);
    return Math.sqrt(rates.variance(start) * g * g + rates.integralVariance(start, end));
  }
}
