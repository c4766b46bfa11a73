package ebbline.time;

import java.time.LocalDate;
import java.util.List;
import java.util.Objects;

/**
 * One coupon's period, with what a day count may have to know of it.
 *
 * @param start first day that accrues
 * @param end first day that does not
 * @param payment day on which the coupon is paid
 * @param frequency coupons a year
 * @param reference regular dates, ascending, the first at or before the start and the last at or
 *     after the end; a regular period's are its start and end
 * @param maturity end of the bond's last period
 * @param calendar business days
 */
public record CouponPeriod(
    LocalDate start,
    LocalDate end,
    LocalDate payment,
    Frequency frequency,
    List<LocalDate> reference,
    LocalDate maturity,
    BusinessCalendar calendar) {

  public CouponPeriod {
    Objects.requireNonNull(payment, "payment");
    Objects.requireNonNull(frequency, "frequency");
    Objects.requireNonNull(maturity, "maturity");
    Objects.requireNonNull(calendar, "calendar");
    reference = List.copyOf(reference);
    if (!start.isBefore(end)) {
      throw new IllegalArgumentException(
          "a period must start before it ends, found " + start + " to " + end);
    }
    for (int i = 1; i < reference.size(); i++) {
      if (!reference.get(i - 1).isBefore(reference.get(i))) {
        throw new IllegalArgumentException("reference dates must ascend, found " + reference);
      }
    }
    if (reference.size() < 2
        || reference.get(0).isAfter(start)
        || reference.get(reference.size() - 1).isBefore(end)) {
      throw new IllegalArgumentException(
          "reference dates must cover the period " + start + " to " + end + ", found " + reference);
    }
  }

  /** A whole period of regular dates, paid at its end, with weekends alone closed. */
  public static CouponPeriod regular(
      LocalDate start, LocalDate end, Frequency frequency, LocalDate maturity) {
    return new CouponPeriod(
        start, end, end, frequency, List.of(start, end), maturity, BusinessCalendar.WEEKENDS);
  }

  /** Whether the period is a whole one of the bond's regular dates. */
  public boolean isRegular() {
    return reference.size() == 2 && reference.get(0).equals(start) && reference.get(1).equals(end);
  }
}
