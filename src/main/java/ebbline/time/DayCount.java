package ebbline.time;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/**
 * How a coupon accrues over the days of its period, in years.
 *
 * <p>Four of them depend on more than two dates and ask for the {@link CouponPeriod}.
 */
public enum DayCount {
  /**
   * Days over days of the reference period times the frequency, summed over the reference periods
   * of an odd one [ICMA Rule 251].
   */
  ACT_ACT_ICMA("act/act-icma", true),
  /** Days in leap years over 366 plus other days over 365 [2006 ISDA Definitions sec. 4.16(b)]. */
  ACT_ACT_ISDA("act/act-isda", false),
  /** Days over 365 [2006 ISDA Definitions sec. 4.16(d)]. */
  ACT_365F("act/365f", false),
  /** Days over 360 [2006 ISDA Definitions sec. 4.16(e)]. */
  ACT_360("act/360", false),
  /**
   * Days over 366 or 365: for annual coupons 366 if 29 February lies in the period (its start
   * excluded, its end included), for others if the period ends in a leap year [ICMA Rule 251; from
   * memory].
   */
  ACT_365L("act/365l", true),
  /** Bond basis [2006 ISDA Definitions sec. 4.16(f)]. */
  THIRTY_360("30/360", false),
  /** As in the United States, with the February rule applied first. */
  THIRTY_U_360("30u/360", false),
  /** Eurobond basis [2006 ISDA Definitions sec. 4.16(g)]. */
  THIRTY_E_360("30e/360", false),
  /** Asks whether the end is the maturity [2006 ISDA Definitions sec. 4.16(h)]. */
  THIRTY_E_360_ISDA("30e/360-isda", true),
  /** Business days of the calendar over 252 (Brazil). */
  BUS_252("bus/252", true);

  private final String label;
  private final boolean needsPeriod;

  DayCount(String label, boolean needsPeriod) {
    this.label = label;
    this.needsPeriod = needsPeriod;
  }

  public String label() {
    return label;
  }

  /** Whether two dates are not enough, and {@link #years(LocalDate, LocalDate)} refuses. */
  public boolean needsPeriod() {
    return needsPeriod;
  }

  /**
   * The day count of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static DayCount of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (DayCount dayCount : values()) {
      if (dayCount.label.equals(wanted)) {
        return dayCount;
      }
    }
    throw new IllegalArgumentException(
        "expected a day count, one of "
            + Arrays.stream(values()).map(DayCount::label).collect(Collectors.joining(", ")));
  }

  /**
   * Years between two dates by a day count that needs nothing else.
   *
   * @throws IllegalArgumentException if it {@linkplain #needsPeriod() needs} a period, or the dates
   *     are not in order
   */
  public double years(LocalDate from, LocalDate to) {
    requireOrder(from, to);
    return switch (this) {
      case ACT_ACT_ISDA -> byCalendarYears(from, to);
      case ACT_365F -> actual(from, to) / 365.0;
      case ACT_360 -> actual(from, to) / 360.0;
      case THIRTY_360 -> ThirtyDayMonths.bondBasis(from, to) / 360.0;
      case THIRTY_U_360 -> ThirtyDayMonths.unitedStates(from, to) / 360.0;
      case THIRTY_E_360 -> ThirtyDayMonths.european(from, to) / 360.0;
      default ->
          throw new IllegalArgumentException(
              label + " must know the coupon period that the dates lie in, found none");
    };
  }

  /**
   * Years between two dates of one coupon period.
   *
   * @throws IllegalArgumentException if the dates are not in order or not within the period, or the
   *     period's calendar does not know the year
   */
  public double years(LocalDate from, LocalDate to, CouponPeriod period) {
    requireWithin(from, to, period);
    return switch (this) {
      case ACT_ACT_ICMA -> byReference(from, to, period);
      case ACT_365L -> actual(from, to) / (leaps(period) ? 366.0 : 365.0);
      case THIRTY_E_360_ISDA -> ThirtyDayMonths.europeanIsda(from, to, period.maturity()) / 360.0;
      case BUS_252 -> period.calendar().businessDays(from, to) / 252.0;
      default -> years(from, to);
    };
  }

  /**
   * Days between two dates of one coupon period as the day count sees them: of thirty-day months,
   * business days, or actual ones. Their ratio says how far into a period a date lies.
   *
   * @throws IllegalArgumentException as {@link #years(LocalDate, LocalDate, CouponPeriod)}
   */
  public long days(LocalDate from, LocalDate to, CouponPeriod period) {
    requireWithin(from, to, period);
    return switch (this) {
      case THIRTY_360 -> ThirtyDayMonths.bondBasis(from, to);
      case THIRTY_U_360 -> ThirtyDayMonths.unitedStates(from, to);
      case THIRTY_E_360 -> ThirtyDayMonths.european(from, to);
      case THIRTY_E_360_ISDA -> ThirtyDayMonths.europeanIsda(from, to, period.maturity());
      case BUS_252 -> period.calendar().businessDays(from, to);
      default -> actual(from, to);
    };
  }

  /**
   * Days of a whole period: by the thirty-day counts 360 over the frequency where the period is
   * regular, also where it ends in February; by the others {@link #days}.
   */
  public long periodDays(CouponPeriod period) {
    return thirtyDayMonths() && period.isRegular()
        ? 360 / period.frequency().perYear()
        : days(period.start(), period.end(), period);
  }

  /** Years that a whole coupon is paid for: {@link #periodDays} on its base. */
  public double periodYears(CouponPeriod period) {
    return thirtyDayMonths()
        ? periodDays(period) / 360.0
        : years(period.start(), period.end(), period);
  }

  private boolean thirtyDayMonths() {
    return switch (this) {
      case THIRTY_360, THIRTY_U_360, THIRTY_E_360, THIRTY_E_360_ISDA -> true;
      default -> false;
    };
  }

  private static void requireWithin(LocalDate from, LocalDate to, CouponPeriod period) {
    requireOrder(from, to);
    if (from.isBefore(period.start()) || to.isAfter(period.end())) {
      throw new IllegalArgumentException(
          "dates must lie in the coupon period "
              + period.start()
              + " to "
              + period.end()
              + ", found "
              + from
              + " to "
              + to);
    }
  }

  private static void requireOrder(LocalDate from, LocalDate to) {
    if (to.isBefore(from)) {
      throw new IllegalArgumentException("dates must be in order, found " + from + " to " + to);
    }
  }

  private static double byReference(LocalDate from, LocalDate to, CouponPeriod period) {
    double periods = 0;
    for (int i = 1; i < period.reference().size(); i++) {
      LocalDate start = period.reference().get(i - 1);
      LocalDate end = period.reference().get(i);
      LocalDate left = from.isAfter(start) ? from : start;
      LocalDate right = to.isBefore(end) ? to : end;
      if (left.isBefore(right)) {
        periods += actual(left, right) / (double) actual(start, end);
      }
    }
    return periods / period.frequency().perYear();
  }

  private static double byCalendarYears(LocalDate from, LocalDate to) {
    long leap = 0;
    for (int year = from.getYear(); year <= to.getYear(); year++) {
      LocalDate start = LocalDate.of(year, 1, 1);
      if (start.isLeapYear()) {
        LocalDate left = from.isAfter(start) ? from : start;
        LocalDate next = start.plusYears(1);
        leap += actual(left, to.isBefore(next) ? to : next);
      }
    }
    return leap / 366.0 + (actual(from, to) - leap) / 365.0;
  }

  private static boolean leaps(CouponPeriod period) {
    if (period.frequency() != Frequency.ANNUAL) {
      return period.end().isLeapYear();
    }
    for (int year = period.start().getYear(); year <= period.end().getYear(); year++) {
      LocalDate march = LocalDate.of(year, 3, 1);
      if (march.isLeapYear()
          && period.start().isBefore(march.minusDays(1))
          && period.end().isAfter(march.minusDays(2))) {
        return true;
      }
    }
    return false;
  }

  private static long actual(LocalDate from, LocalDate to) {
    return ChronoUnit.DAYS.between(from, to);
  }
}
