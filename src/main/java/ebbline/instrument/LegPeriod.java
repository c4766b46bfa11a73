package ebbline.instrument;

import ebbline.time.CouponPeriod;
import ebbline.time.TimeAxis;
import java.util.Optional;

/**
 * One coupon period in years from today.
 *
 * @param start first moment that accrues; may lie before today
 * @param end where the accrual ends
 * @param payment when the coupon is paid, at or after the end where it rolls
 * @param years that the whole coupon is paid for
 * @param regular whether the period is a whole one
 * @param dated the period on dates, where the bond has them
 */
public record LegPeriod(
    double start,
    double end,
    double payment,
    double years,
    boolean regular,
    Optional<CouponPeriod> dated) {

  /**
   * Whether the period's floating rate is fixed already: it began before today, or begins today and
   * its rate is given.
   */
  boolean runsToday(boolean given) {
    return start < -TimeAxis.SAME_MOMENT || (given && start <= TimeAxis.SAME_MOMENT);
  }
}
