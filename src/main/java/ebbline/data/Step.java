package ebbline.data;

import ebbline.time.Moment;
import java.util.OptionalInt;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The length of time from one observation of a history to the next.
 *
 * @param years above 0; a month is 1/12, a day 1/365
 * @param months where it is a whole number of them
 */
public record Step(double years, OptionalInt months) {
  private static final Pattern FRACTION =
      Pattern.compile("(\\d{1,6}(?:\\.\\d{1,9})?)\\s*/\\s*(\\d{1,6}(?:\\.\\d{1,9})?)");
  private static final double LONGEST = 100;
  private static final String EXPECTED =
      "expected a step such as 1M, 1D, 0.25 or 1/12, above 0 and at most 100 years";

  public Step {
    if (!(years > 0 && years <= LONGEST)) {
      throw new IllegalArgumentException(EXPECTED);
    }
  }

  /**
   * Reads a tenor, a number of years or a fraction of years.
   *
   * @throws IllegalArgumentException if the text is none or not above 0; the message says what was
   *     expected and does not repeat the text
   */
  public static Step parse(String text) {
    String t = text.strip();
    Matcher fraction = FRACTION.matcher(t);
    if (fraction.matches()) {
      return of(Double.parseDouble(fraction.group(1)) / Double.parseDouble(fraction.group(2)));
    }
    Moment moment;
    try {
      moment = Moment.parse(t);
    } catch (IllegalArgumentException e) {
      throw new IllegalArgumentException(EXPECTED, e);
    }
    if (moment instanceof Moment.After after) {
      return after.tenor().days() == 0 && after.tenor().months() > 0
          ? new Step(after.tenor().years(), OptionalInt.of(after.tenor().months()))
          : of(after.tenor().years());
    } else if (moment instanceof Moment.InYears number) {
      return of(number.years());
    }
    throw new IllegalArgumentException(EXPECTED);
  }

  private static Step of(double years) {
    double months = Math.rint(12 * years);
    boolean whole = months >= 1 && months <= 12 * LONGEST && months / 12 == years;
    return new Step(years, whole ? OptionalInt.of((int) months) : OptionalInt.empty());
  }
}
