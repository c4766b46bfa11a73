package ebbline.bond;

/**
 * Price of a floating-rate note whose index is held at one rate: each payment is 100 × max(index +
 * spread, 0) × days/360, discounted by 1 + (index + margin) days/360 a period [31 CFR 356, Appendix
 * B, section IV].
 *
 * @param index annual rate, a decimal
 * @param spread over the index, a decimal
 */
public record DiscountMargin(double index, double spread) {
  private static final double YEAR = 360;

  public DiscountMargin {
    if (!(Double.isFinite(index) && Double.isFinite(spread))) {
      throw new IllegalArgumentException(
          "index and spread must be finite, found " + index + " and " + spread);
    }
  }

  /** Interest for a number of days, per 100; never below 0. */
  public double interest(double days) {
    return 100 * Math.max(index + spread, 0) * days / YEAR;
  }

  /**
   * Dirty price per 100.
   *
   * @param accrued interest accrued at settlement, per 100
   * @param days from settlement to the first payment, and between each payment and the next
   * @param margin over the index, a decimal
   * @throws IllegalArgumentException if a period's growth is not positive, or there is no period
   */
  public double price(double accrued, int[] days, double margin) {
    if (days.length == 0) {
      throw new IllegalArgumentException("a note must have a payment to come, found none");
    }
    double discount = 1;
    double sum = 0;
    for (int i = 0; i < days.length; i++) {
      double growth = 1 + (index + margin) * days[i] / YEAR;
      if (!(growth > 0 && Double.isFinite(growth))) {
        throw new IllegalArgumentException("growth over a period must be above 0, found " + growth);
      }
      discount /= growth;
      sum += (interest(days[i]) + (i == 0 ? accrued : 0)) * discount;
    }
    return sum + 100 * discount;
  }
}
