package ebbline.time;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.regex.Pattern;

/** The written forms of a moment. */
final class MomentText {
  static final String EXPECTED =
      "a date 2031-11-15, a tenor such as 3M, 10Y or 1Y6M, or a number of years such as 0.25";
  private static final double MOST_YEARS = 1000;
  private static final Pattern DATE = Pattern.compile("\\d{4}-\\d{2}-\\d{2}");
  private static final Pattern NUMBER =
      Pattern.compile("[+-]?(\\d+(\\.\\d*)?|\\.\\d+)([eE][+-]?\\d+)?");

  private MomentText() {}

  static Moment parse(String text) {
    String t = text.strip();
    if (DATE.matcher(t).matches()) {
      try {
        return Moment.of(LocalDate.of(digits(t, 0, 4), digits(t, 5, 7), digits(t, 8, 10)));
      } catch (DateTimeException e) {
        throw new IllegalArgumentException("no such day in the calendar", e);
      }
    }
    if (NUMBER.matcher(t).matches()) {
      double years = Double.parseDouble(t);
      if (Math.abs(years) <= MOST_YEARS) {
        return Moment.ofYears(years);
      }
      // 20311115 is a date without its hyphens, not twenty million years.
      throw new IllegalArgumentException(
          "a number of years must lie within -1000 to 1000; a date is written 2031-11-15");
    }
    if (Tenor.isTenor(t)) {
      return Moment.of(Tenor.parse(t));
    }
    throw new IllegalArgumentException("expected " + EXPECTED);
  }

  private static int digits(String text, int from, int to) {
    return Integer.parseInt(text, from, to, 10); // a general date parser takes ten times as long
  }
}
