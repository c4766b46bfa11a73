package ebbline.time;

import java.time.LocalDate;
import java.util.BitSet;
import java.util.Locale;
import java.util.Set;

/**
 * The days on which money moves: neither Saturday nor Sunday nor a holiday.
 *
 * <p>A calendar states the years it knows; a date outside them is refused, never guessed.
 * Immutable.
 */
public final class BusinessCalendar {
  private static final int EARLIEST = 1;
  private static final int LATEST = 9999;

  /** Saturdays and Sundays only; every year from 1 to 9999. */
  public static final BusinessCalendar WEEKENDS = of("weekends", Set.of(), EARLIEST, LATEST);

  private final String name;
  private final int firstYear;
  private final int lastYear;

  /** The first day known; bit k of {@link #holidays} is the day k days later. */
  private final long origin;

  private final long end;
  private final BitSet holidays;

  private BusinessCalendar(String name, int firstYear, int lastYear, BitSet holidays) {
    this.name = name;
    this.firstYear = firstYear;
    this.lastYear = lastYear;
    this.origin = LocalDate.of(firstYear, 1, 1).toEpochDay();
    this.end = LocalDate.of(lastYear, 12, 31).toEpochDay();
    this.holidays = holidays;
  }

  /**
   * A calendar of the holidays given; those on a Saturday or Sunday close no other day.
   *
   * @param name how the user calls it; letters, digits and hyphens
   * @param firstYear first year known, 1 January of it included
   * @param lastYear last year known, 31 December of it included
   * @throws IllegalArgumentException if a holiday lies outside the years, the years are not in
   *     order within 1 to 9999, or the name is of another form
   */
  public static BusinessCalendar of(
      String name, Set<LocalDate> holidays, int firstYear, int lastYear) {
    String own = name.strip().toLowerCase(Locale.ROOT);
    if (!own.matches("[a-z0-9][a-z0-9-]*")) {
      throw new IllegalArgumentException(
          "a calendar's name must be letters, digits and hyphens, found '" + name + "'");
    }
    if (!(EARLIEST <= firstYear && firstYear <= lastYear && lastYear <= LATEST)) {
      throw new IllegalArgumentException(
          "a calendar's years must run upwards within 1 to 9999, found "
              + firstYear
              + " to "
              + lastYear);
    }
    BitSet days = new BitSet();
    long origin = LocalDate.of(firstYear, 1, 1).toEpochDay();
    for (LocalDate day : holidays) {
      if (day.getYear() < firstYear || day.getYear() > lastYear) {
        throw new IllegalArgumentException(
            "a holiday must lie in the calendar's years "
                + firstYear
                + " to "
                + lastYear
                + ", found "
                + day);
      }
      days.set((int) (day.toEpochDay() - origin));
    }
    return new BusinessCalendar(own, firstYear, lastYear, days);
  }

  /** The calendar's name; of joined calendars the names with {@code +} between them. */
  public String name() {
    return name;
  }

  public int firstYear() {
    return firstYear;
  }

  public int lastYear() {
    return lastYear;
  }

  /**
   * A calendar that is closed whenever this or the other is, for the years that both know.
   *
   * @throws IllegalArgumentException if they know no year in common
   */
  public BusinessCalendar join(BusinessCalendar other) {
    int first = Math.max(firstYear, other.firstYear);
    int last = Math.min(lastYear, other.lastYear);
    if (first > last) {
      throw new IllegalArgumentException(
          "calendars must know a year in common, found " + years() + " and " + other.years());
    }
    long start = LocalDate.of(first, 1, 1).toEpochDay();
    int length = (int) (LocalDate.of(last, 12, 31).toEpochDay() - start) + 1;
    BitSet days = holidaysFrom(start, length);
    days.or(other.holidaysFrom(start, length));
    return new BusinessCalendar(name + "+" + other.name, first, last, days);
  }

  private BitSet holidaysFrom(long start, int length) {
    int offset = (int) (start - origin);
    return holidays.get(offset, offset + length);
  }

  private String years() {
    return "'" + name + "' of " + firstYear + " to " + lastYear;
  }

  /**
   * @throws IllegalArgumentException if the date lies outside the years known
   */
  public boolean isBusinessDay(LocalDate date) {
    long day = date.toEpochDay();
    if (day < origin || day > end) {
      throw new IllegalArgumentException(
          "the calendar '"
              + name
              + "' knows the years "
              + firstYear
              + " to "
              + lastYear
              + ", found "
              + date);
    }
    return date.getDayOfWeek().getValue() <= 5 && !holidays.get((int) (day - origin));
  }

  /**
   * The {@code count}-th business day after a date, or before it where {@code count} is negative;
   * the date itself, business day or not, where it is 0. Settlement and ex-dividend days count so.
   *
   * @throws IllegalArgumentException if the count leads outside the years known
   */
  public LocalDate plusBusinessDays(LocalDate date, int count) {
    int step = Integer.signum(count);
    LocalDate day = date;
    for (long left = Math.abs((long) count); left > 0; ) {
      day = day.plusDays(step);
      if (isBusinessDay(day)) {
        left--;
      }
    }
    return day;
  }

  /**
   * Business days from a date, itself included, to another, that excluded; negative if they are in
   * the other order.
   *
   * @throws IllegalArgumentException if a day counted lies outside the years known
   */
  public int businessDays(LocalDate from, LocalDate to) {
    if (to.isBefore(from)) {
      return -businessDays(to, from);
    }
    if (from.equals(to)) {
      return 0;
    }
    isBusinessDay(from); // both ends lie in the years known, so every day between does
    isBusinessDay(to.minusDays(1));
    long first = from.toEpochDay();
    long last = to.toEpochDay();
    long count = weekdaysBefore(last) - weekdaysBefore(first);
    int beyond = (int) (last - origin);
    for (int day = holidays.nextSetBit((int) (first - origin));
        day >= 0 && day < beyond;
        day = holidays.nextSetBit(day + 1)) {
      count -= isWeekday(origin + day) ? 1 : 0;
    }
    return (int) count;
  }

  /** Weekdays from Thursday 1 January 1970 to a day, that excluded; negative before. */
  private static long weekdaysBefore(long day) {
    // Counted from the Monday of that week, which lies three days before it.
    long fromMonday = day + 3;
    return 5 * Math.floorDiv(fromMonday, 7L) + Math.min(5, Math.floorMod(fromMonday, 7L));
  }

  private static boolean isWeekday(long day) {
    return Math.floorMod(day + 3, 7L) < 5;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof BusinessCalendar that
        && name.equals(that.name)
        && firstYear == that.firstYear
        && lastYear == that.lastYear
        && holidays.equals(that.holidays);
  }

  @Override
  public int hashCode() {
    return 31 * name.hashCode() + holidays.hashCode();
  }

  @Override
  public String toString() {
    return name;
  }
}
