package ebbline.time;

import java.time.LocalDate;
import java.util.Objects;
import java.util.Optional;

/**
 * When a coupon goes to the seller instead of the buyer: from so many days before it.
 *
 * @param days days before the coupon date; 0 for a bond that never goes ex
 * @param calendar whose business days are counted (7 for gilts); absent to count calendar days (7
 *     for Australian Treasury bonds)
 */
public record ExDividend(int days, Optional<BusinessCalendar> calendar) {
  public ExDividend {
    Objects.requireNonNull(calendar, "calendar");
    if (!(days >= 0)) {
      throw new IllegalArgumentException("ex_days must be at least 0, found " + days);
    }
  }

  public static ExDividend never() {
    return new ExDividend(0, Optional.empty());
  }

  public static ExDividend businessDays(int days, BusinessCalendar calendar) {
    return new ExDividend(days, Optional.of(calendar));
  }

  public static ExDividend calendarDays(int days) {
    return new ExDividend(days, Optional.empty());
  }

  /** First settlement day on which the buyer does not get the coupon of this date. */
  public LocalDate dateFor(LocalDate coupon) {
    return calendar
        .map(business -> business.plusBusinessDays(coupon, -days))
        .orElseGet(() -> coupon.minusDays(days));
  }

  /** Whether a buyer who settles on a day before the coupon date does not get that coupon. */
  public boolean applies(LocalDate settlement, LocalDate coupon) {
    return settlement.isBefore(coupon) && !settlement.isBefore(dateFor(coupon));
  }
}
