package ebbline.time;

import java.time.LocalDate;
import java.time.YearMonth;

/**
 * Dates a whole number of months from an anchor, on one day of the month where the month has it and
 * on its last day where it has not. Each is counted from the anchor, never from its neighbour, so
 * that a short month does not shorten those after it.
 *
 * @param month the anchor's month
 * @param day the day of the month, 31 for the last
 */
record MonthCycle(YearMonth month, int day) {

  /**
   * @param endOfMonth whether an anchor on the last day of its month keeps to last days
   */
  static MonthCycle of(LocalDate anchor, boolean endOfMonth) {
    int day = endOfMonth && isMonthEnd(anchor) ? 31 : anchor.getDayOfMonth();
    return new MonthCycle(YearMonth.from(anchor), day);
  }

  static boolean isMonthEnd(LocalDate date) {
    return date.getDayOfMonth() == date.lengthOfMonth();
  }

  MonthCycle onDay(int other) {
    return new MonthCycle(month, other);
  }

  LocalDate date(long months) {
    YearMonth there = month.plusMonths(months);
    return there.atDay(Math.min(day, there.lengthOfMonth()));
  }
}
