package ebbline.time;

import java.time.LocalDate;
import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/** Where a date goes that is no business day [2006 ISDA Definitions sec. 4.12]. */
public enum Roll {
  /** It stays. */
  NONE("none"),
  /** To the next business day. */
  FOLLOWING("following"),
  /** To the next business day, unless that lies in the next month: then to the one before. */
  MODIFIED_FOLLOWING("modified-following"),
  /** To the business day before. */
  PRECEDING("preceding"),
  /** To the business day before, unless that lies in the month before: then to the next. */
  MODIFIED_PRECEDING("modified-preceding");

  private final String label;

  Roll(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  /**
   * The roll of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static Roll of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (Roll roll : values()) {
      if (roll.label.equals(wanted)) {
        return roll;
      }
    }
    throw new IllegalArgumentException(
        "expected a roll, one of "
            + Arrays.stream(values()).map(Roll::label).collect(Collectors.joining(", ")));
  }

  /**
   * @throws IllegalArgumentException if the calendar does not know a year that the search meets
   */
  public LocalDate apply(LocalDate date, BusinessCalendar calendar) {
    return switch (this) {
      case NONE -> date;
      case FOLLOWING -> seek(date, 1, calendar);
      case PRECEDING -> seek(date, -1, calendar);
      case MODIFIED_FOLLOWING -> within(date, 1, calendar);
      case MODIFIED_PRECEDING -> within(date, -1, calendar);
    };
  }

  private static LocalDate within(LocalDate date, int step, BusinessCalendar calendar) {
    LocalDate found = seek(date, step, calendar);
    return found.getMonth() == date.getMonth() ? found : seek(date, -step, calendar);
  }

  private static LocalDate seek(LocalDate date, int step, BusinessCalendar calendar) {
    LocalDate day = date;
    while (!calendar.isBusinessDay(day)) {
      day = day.plusDays(step);
    }
    return day;
  }
}
