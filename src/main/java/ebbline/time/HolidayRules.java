package ebbline.time;

import static java.time.DayOfWeek.MONDAY;
import static java.time.DayOfWeek.SATURDAY;
import static java.time.DayOfWeek.SUNDAY;
import static java.time.DayOfWeek.THURSDAY;

import java.time.DayOfWeek;
import java.time.LocalDate;
import java.time.temporal.TemporalAdjusters;
import java.util.HashSet;
import java.util.Set;

/** The published rules from which the calendars that the program knows are made. */
final class HolidayRules {
  /*
   * England and Wales: days moved or added by proclamation or order. From the list on gov.uk for
   * 2020 to 2023; from memory before.
   */
  private static final Set<LocalDate> ONE_OFF =
      Set.of(
          LocalDate.of(1981, 7, 29), // royal wedding
          LocalDate.of(1999, 12, 31), // end of the millennium
          LocalDate.of(2002, 6, 3), // Golden Jubilee
          LocalDate.of(2011, 4, 29), // royal wedding
          LocalDate.of(2012, 6, 5), // Diamond Jubilee
          LocalDate.of(2022, 6, 3), // Platinum Jubilee
          LocalDate.of(2022, 9, 19), // state funeral
          LocalDate.of(2023, 5, 8)); // coronation

  private HolidayRules() {}

  /** Gregorian Easter Sunday [Meeus, Astronomical Algorithms, ch. 8; from memory]. */
  static LocalDate easter(int year) {
    int a = year % 19;
    int century = year / 100;
    int rest = year % 100;
    int g = (century - (century + 8) / 25 + 1) / 3;
    int h = (19 * a + century - century / 4 - g + 15) % 30;
    int l = (32 + 2 * (century % 4) + 2 * (rest / 4) - h - rest % 4) % 7;
    int m = (a + 11 * h + 22 * l) / 451;
    int n = h + l - 7 * m + 114;
    return LocalDate.of(year, n / 31, n % 31 + 1);
  }

  /** 1 January, Good Friday, Easter Monday, 1 May, 25 and 26 December. */
  static Set<LocalDate> target(int year) {
    LocalDate easter = easter(year);
    return Set.of(
        LocalDate.of(year, 1, 1),
        easter.minusDays(2),
        easter.plusDays(1),
        LocalDate.of(year, 5, 1),
        LocalDate.of(year, 12, 25),
        LocalDate.of(year, 12, 26));
  }

  /** A holiday on a Sunday closes the Monday after; one on a Saturday closes no other day. */
  static Set<LocalDate> federalReserve(int year) {
    Set<LocalDate> days = new HashSet<>();
    days.add(sundayToMonday(LocalDate.of(year, 1, 1)));
    days.add(nth(3, MONDAY, year, 1));
    days.add(nth(3, MONDAY, year, 2));
    days.add(last(MONDAY, year, 5));
    if (year >= 2021) {
      days.add(sundayToMonday(LocalDate.of(year, 6, 19)));
    }
    days.add(sundayToMonday(LocalDate.of(year, 7, 4)));
    days.add(nth(1, MONDAY, year, 9));
    days.add(nth(2, MONDAY, year, 10));
    days.add(sundayToMonday(LocalDate.of(year, 11, 11)));
    days.add(nth(4, THURSDAY, year, 11));
    days.add(sundayToMonday(LocalDate.of(year, 12, 25)));
    return days;
  }

  /** A holiday on a Saturday or Sunday has the next free weekday as its substitute. */
  static Set<LocalDate> englandWales(int year) {
    LocalDate easter = easter(year);
    Set<LocalDate> days = new HashSet<>();
    days.add(nextWeekday(LocalDate.of(year, 1, 1)));
    days.add(easter.minusDays(2));
    days.add(easter.plusDays(1));
    // In 1995 and 2020 the May holiday stood on the anniversary of the end of the war.
    days.add(year == 1995 || year == 2020 ? LocalDate.of(year, 5, 8) : nth(1, MONDAY, year, 5));
    days.add(
        switch (year) {
          case 2002, 2012 -> LocalDate.of(year, 6, 4);
          case 2022 -> LocalDate.of(2022, 6, 2);
          default -> last(MONDAY, year, 5);
        });
    days.add(last(MONDAY, year, 8));
    LocalDate christmas = LocalDate.of(year, 12, 25);
    LocalDate boxing = christmas.plusDays(1);
    days.add(christmas);
    days.add(boxing);
    if (isWeekend(boxing)) {
      days.add(christmas.plusDays(boxing.getDayOfWeek() == SUNDAY ? 2 : 3));
    }
    if (isWeekend(christmas)) {
      days.add(christmas.plusDays(christmas.getDayOfWeek() == SUNDAY ? 2 : 3));
    }
    ONE_OFF.stream().filter(day -> day.getYear() == year).forEach(days::add);
    return days;
  }

  private static LocalDate nth(int n, DayOfWeek day, int year, int month) {
    return LocalDate.of(year, month, 1).with(TemporalAdjusters.dayOfWeekInMonth(n, day));
  }

  private static LocalDate last(DayOfWeek day, int year, int month) {
    return LocalDate.of(year, month, 1).with(TemporalAdjusters.lastInMonth(day));
  }

  private static LocalDate sundayToMonday(LocalDate date) {
    return date.getDayOfWeek() == SUNDAY ? date.plusDays(1) : date;
  }

  private static LocalDate nextWeekday(LocalDate date) {
    return isWeekend(date) ? date.with(TemporalAdjusters.next(MONDAY)) : date;
  }

  private static boolean isWeekend(LocalDate date) {
    return date.getDayOfWeek() == SATURDAY || date.getDayOfWeek() == SUNDAY;
  }
}
