package ebbline.data;

import ebbline.instrument.BondTerms;
import ebbline.instrument.Conventions;
import ebbline.instrument.OddPeriods;
import ebbline.time.BusinessCalendar;
import ebbline.time.DayCount;
import ebbline.time.ExDividend;
import ebbline.time.Moment;
import ebbline.time.Roll;
import ebbline.time.ScheduleTerms.AccrualDates;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/** The columns that every kind with coupons or a redemption shares. */
final class TermsCells {
  /** Columns of the schedule. */
  static final Set<String> SCHEDULE =
      Set.of(
          "issue",
          "maturity",
          "frequency",
          "day_count",
          "calendar",
          "roll",
          "eom",
          "first_coupon",
          "last_coupon");

  /** Columns of settlement and redemption. */
  static final Set<String> SETTLING = Set.of("redemption", "settle_days", "ex_days");

  /** Columns of a quote. */
  static final Set<String> QUOTE =
      Set.of("price", "yield", "yield_kind", "last_period", "rounding");

  private TermsCells() {}

  /**
   * The terms; empty where a cell is missing or wrong.
   *
   * @param dayCount where the row does not say
   * @param start column of the first period's start, {@code issue} or {@code start}
   */
  static Optional<BondTerms> read(
      RowCells cells, int frequency, DayCount dayCount, AccrualDates accrual, String start) {
    Optional<Moment> maturity = cells.requiredMoment("maturity");
    int coupons = cells.frequency(frequency);
    Conventions conventions = conventions(cells, dayCount, accrual);
    BusinessCalendar calendar = conventions.calendar();
    OddPeriods ends =
        new OddPeriods(
            cells.moment(start), cells.moment("first_coupon"), cells.moment("last_coupon"));
    double redemption = cells.redemption();
    int settleDays = cells.settleDays();
    ExDividend ex =
        cells.value("ex_days", text -> exDays(text, calendar)).orElse(ExDividend.never());
    return cells.build(
        maturity.isPresent(),
        () ->
            new BondTerms(maturity.get(), coupons, redemption, conventions, ends, settleDays, ex));
  }

  /**
   * Day count, calendar and roll.
   *
   * @param dayCount where the row does not say
   */
  static Conventions conventions(RowCells cells, DayCount dayCount, AccrualDates accrual) {
    return new Conventions(
        cells.dayCount(dayCount),
        cells.calendar(),
        cells.value("roll", Roll::of).orElse(Roll.NONE),
        cells.value("eom", TermsCells::yesOrNo).orElse(false),
        accrual);
  }

  private static boolean yesOrNo(String text) {
    String lower = text.toLowerCase(Locale.ROOT);
    if (lower.equals("yes") || lower.equals("no")) {
      return lower.equals("yes");
    }
    throw new IllegalArgumentException("expected yes or no");
  }

  /** Business days of the row's calendar, or calendar days where a D follows. */
  private static ExDividend exDays(String text, BusinessCalendar calendar) {
    if (text.matches("\\d{1,2}")) {
      return ExDividend.businessDays(Integer.parseInt(text), calendar);
    } else if (text.matches("\\d{1,2}[dD]")) {
      return ExDividend.calendarDays(Integer.parseInt(text.substring(0, text.length() - 1)));
    }
    throw new IllegalArgumentException("expected business days such as 7, or calendar days, 7D");
  }
}
