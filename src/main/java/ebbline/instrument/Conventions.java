package ebbline.instrument;

import ebbline.time.BusinessCalendar;
import ebbline.time.DayCount;
import ebbline.time.Roll;
import ebbline.time.ScheduleTerms.AccrualDates;
import java.util.Objects;

/**
 * How coupons accrue and on which days they are paid.
 *
 * @param dayCount how interest accrues on dates
 * @param calendar days on which payments are made
 * @param roll where a payment goes that falls on another day
 * @param endOfMonth whether dates stick to the last day of the month
 * @param accrual whether interest is counted to the date in the terms or to the day of payment
 */
public record Conventions(
    DayCount dayCount,
    BusinessCalendar calendar,
    Roll roll,
    boolean endOfMonth,
    AccrualDates accrual) {

  /** Weekends only, nothing rolled. */
  public static Conventions of(DayCount dayCount) {
    return new Conventions(
        dayCount, BusinessCalendar.WEEKENDS, Roll.NONE, false, AccrualDates.UNADJUSTED);
  }

  public Conventions {
    Objects.requireNonNull(dayCount, "dayCount");
    Objects.requireNonNull(calendar, "calendar");
    Objects.requireNonNull(roll, "roll");
    Objects.requireNonNull(accrual, "accrual");
  }
}
