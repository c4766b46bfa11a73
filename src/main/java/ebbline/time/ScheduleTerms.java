package ebbline.time;

import java.time.LocalDate;
import java.util.Objects;
import java.util.Optional;

/**
 * What a bond's terms say about its coupon dates.
 *
 * @param maturity end of the last period
 * @param frequency coupons a year
 * @param endOfMonth whether dates stick to the last day of the month when the date they are counted
 *     from is one
 * @param issue where the first period starts; absent for a seasoned bond
 * @param firstCoupon end of an odd first period, short or long; needs an issue date
 * @param lastCoupon start of an odd last period, short or long
 * @param calendar days on which payments are made
 * @param roll where a payment goes that falls on another day
 * @param accrual whether interest is counted to the date in the terms or to the day of payment
 */
public record ScheduleTerms(
    LocalDate maturity,
    Frequency frequency,
    boolean endOfMonth,
    Optional<LocalDate> issue,
    Optional<LocalDate> firstCoupon,
    Optional<LocalDate> lastCoupon,
    BusinessCalendar calendar,
    Roll roll,
    AccrualDates accrual) {

  /** Which dates interest is counted between. */
  public enum AccrualDates {
    /** Those of the terms, business days or not. */
    UNADJUSTED,
    /** The rolled ones, so that a late payment carries more interest. */
    ADJUSTED
  }

  public ScheduleTerms {
    Objects.requireNonNull(maturity, "maturity");
    Objects.requireNonNull(frequency, "frequency");
    Objects.requireNonNull(issue, "issue");
    Objects.requireNonNull(firstCoupon, "firstCoupon");
    Objects.requireNonNull(lastCoupon, "lastCoupon");
    Objects.requireNonNull(calendar, "calendar");
    Objects.requireNonNull(roll, "roll");
    Objects.requireNonNull(accrual, "accrual");
  }

  /** Regular periods back from maturity without end, paid on the very dates. */
  public static ScheduleTerms regular(LocalDate maturity, Frequency frequency) {
    return new ScheduleTerms(
        maturity,
        frequency,
        false,
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        BusinessCalendar.WEEKENDS,
        Roll.NONE,
        AccrualDates.UNADJUSTED);
  }

  public ScheduleTerms withEndOfMonth(boolean sticky) {
    return new ScheduleTerms(
        maturity, frequency, sticky, issue, firstCoupon, lastCoupon, calendar, roll, accrual);
  }

  public ScheduleTerms withIssue(LocalDate date) {
    return new ScheduleTerms(
        maturity,
        frequency,
        endOfMonth,
        Optional.of(date),
        firstCoupon,
        lastCoupon,
        calendar,
        roll,
        accrual);
  }

  public ScheduleTerms withFirstCoupon(LocalDate date) {
    return new ScheduleTerms(
        maturity,
        frequency,
        endOfMonth,
        issue,
        Optional.of(date),
        lastCoupon,
        calendar,
        roll,
        accrual);
  }

  public ScheduleTerms withLastCoupon(LocalDate date) {
    return new ScheduleTerms(
        maturity,
        frequency,
        endOfMonth,
        issue,
        firstCoupon,
        Optional.of(date),
        calendar,
        roll,
        accrual);
  }

  public ScheduleTerms withRoll(BusinessCalendar days, Roll how, AccrualDates counted) {
    return new ScheduleTerms(
        maturity, frequency, endOfMonth, issue, firstCoupon, lastCoupon, days, how, counted);
  }
}
