package ebbline.time;

import java.time.LocalDate;

/** Days between dates when every month has thirty. */
final class ThirtyDayMonths {
  private ThirtyDayMonths() {}

  /** [2006 ISDA Definitions sec. 4.16(f)] */
  static long bondBasis(LocalDate from, LocalDate to) {
    int first = Math.min(from.getDayOfMonth(), 30);
    int second = first > 29 ? Math.min(to.getDayOfMonth(), 30) : to.getDayOfMonth();
    return days(from, first, to, second);
  }

  /** The February rule first, then the 31st [rule order of 30U/360 in FIX EP200, field 1950]. */
  static long unitedStates(LocalDate from, LocalDate to) {
    int first = from.getDayOfMonth();
    int second = to.getDayOfMonth();
    if (endsFebruary(from)) {
      if (endsFebruary(to)) {
        second = 30;
      }
      first = 30;
    }
    if (second == 31 && first >= 30) {
      second = 30;
    }
    return days(from, Math.min(first, 30), to, second);
  }

  /** [2006 ISDA Definitions sec. 4.16(g)] */
  static long european(LocalDate from, LocalDate to) {
    return days(from, Math.min(from.getDayOfMonth(), 30), to, Math.min(to.getDayOfMonth(), 30));
  }

  /** [2006 ISDA Definitions sec. 4.16(h)] */
  static long europeanIsda(LocalDate from, LocalDate to, LocalDate termination) {
    int first = endsFebruary(from) ? 30 : Math.min(from.getDayOfMonth(), 30);
    int second =
        endsFebruary(to) && !to.equals(termination) ? 30 : Math.min(to.getDayOfMonth(), 30);
    return days(from, first, to, second);
  }

  private static boolean endsFebruary(LocalDate date) {
    return date.getMonthValue() == 2 && date.getDayOfMonth() == date.lengthOfMonth();
  }

  private static long days(LocalDate from, int first, LocalDate to, int second) {
    return 360L * (to.getYear() - from.getYear())
        + 30L * (to.getMonthValue() - from.getMonthValue())
        + (second - first);
  }
}
