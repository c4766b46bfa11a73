package ebbline.instrument;

/**
 * Interest at a rate that is not fixed yet: {@code notional × (growth over the period − 1) +
 * margin}, paid once. What the growth is, a curve says.
 *
 * @param start of the rate's period, years from today; not before today
 * @param end of the rate's period
 * @param payment when it is paid
 * @param notional per 100 face; negative where it is owed
 * @param margin what is paid besides, such as a spread, per 100 face
 * @param accruedPart which part of the coupon has accrued at settlement, 0 to 1
 */
public record FloatingCoupon(
    double start, double end, double payment, double notional, double margin, double accruedPart) {

  public FloatingCoupon {
    if (!(start >= 0 && end > start && payment >= start && Double.isFinite(payment))) {
      throw new IllegalArgumentException(
          "a floating period starts today or later and ends after that, found "
              + start
              + " to "
              + end
              + ", paid at "
              + payment);
    }
    if (!(Double.isFinite(notional) && Double.isFinite(margin))) {
      throw new IllegalArgumentException(
          "a floating coupon must be finite, found " + notional + " and " + margin);
    }
  }

  /**
   * What is paid if one unit grows to e^{@code log} over the period.
   *
   * @param log logarithm of the growth
   */
  public double amount(double log) {
    return notional * Math.expm1(log) + margin;
  }
}
