package ebbline.time;

import java.time.LocalDate;
import java.util.HashSet;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.IntFunction;

/**
 * Holiday calendars by name: {@code weekends}, {@code target}, {@code federal-reserve}, {@code
 * england-wales}, and those that a user adds. Immutable.
 *
 * <p>Rules are carried forward as they stand today to 2199; a holiday that is still to be
 * proclaimed cannot be known.
 */
public final class CalendarRegistry {
  static final int LAST_YEAR = 2199;

  /**
   * TARGET, from 2002 [ECB press release of 14 December 2000, long-term calendar for TARGET closing
   * days].
   */
  private static final BusinessCalendar TARGET = byRule("target", 2002, HolidayRules::target);

  /**
   * The Federal Reserve Banks, from 1986 [5 U.S.C. 6103 as the Reserve Banks observe it; a Saturday
   * holiday leaves the Friday before open].
   */
  private static final BusinessCalendar FEDERAL_RESERVE =
      byRule("federal-reserve", 1986, HolidayRules::federalReserve);

  /**
   * England and Wales, from 1978 [Banking and Financial Dealings Act 1971 and the list on gov.uk;
   * one-off days before 2020 from memory].
   */
  private static final BusinessCalendar ENGLAND_WALES =
      byRule("england-wales", 1978, HolidayRules::englandWales);

  private static final CalendarRegistry STANDARD =
      new CalendarRegistry(
          new TreeMap<>(
              Map.of(
                  BusinessCalendar.WEEKENDS.name(), BusinessCalendar.WEEKENDS,
                  TARGET.name(), TARGET,
                  FEDERAL_RESERVE.name(), FEDERAL_RESERVE,
                  ENGLAND_WALES.name(), ENGLAND_WALES)));

  private final SortedMap<String, BusinessCalendar> calendars;

  private CalendarRegistry(SortedMap<String, BusinessCalendar> calendars) {
    this.calendars = calendars;
  }

  private static BusinessCalendar byRule(
      String name, int firstYear, IntFunction<Set<LocalDate>> rule) {
    Set<LocalDate> days = new HashSet<>();
    for (int year = firstYear; year <= LAST_YEAR; year++) {
      days.addAll(rule.apply(year));
    }
    return BusinessCalendar.of(name, days, firstYear, LAST_YEAR);
  }

  /** The calendars that the program knows by itself. */
  public static CalendarRegistry standard() {
    return STANDARD;
  }

  /**
   * A copy that knows one calendar more.
   *
   * @throws IllegalArgumentException if the name is taken
   */
  public CalendarRegistry with(BusinessCalendar calendar) {
    if (calendars.containsKey(calendar.name())) {
      throw new IllegalArgumentException(
          "a calendar's name must be new, found '" + calendar.name() + "'");
    }
    SortedMap<String, BusinessCalendar> more = new TreeMap<>(calendars);
    more.put(calendar.name(), calendar);
    return new CalendarRegistry(more);
  }

  /**
   * The calendar of a name in either case, or of several joined with {@code +}.
   *
   * @throws IllegalArgumentException for an unknown name, with those that are known, or if the
   *     calendars joined know no year in common
   */
  public BusinessCalendar find(String text) {
    BusinessCalendar joined = null;
    for (String part : text.split("\\+", -1)) {
      BusinessCalendar found = calendars.get(part.strip().toLowerCase(Locale.ROOT));
      if (found == null) {
        throw new IllegalArgumentException(
            "expected calendars joined with +, each one of "
                + String.join(", ", calendars.keySet()));
      }
      joined = joined == null ? found : joined.join(found);
    }
    return joined;
  }
}
