package ebbline.time;

import java.time.LocalDate;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A length of calendar time, {@code 1D 2W 6M 18M 10Y 1Y6M}: whole months and whole days.
 *
 * @param months years count as twelve; 0 to 11,999
 * @param days weeks count as seven; 0 to 99,999
 */
public record Tenor(int months, int days) {
  private static final Pattern FORM =
      Pattern.compile("(?:(\\d{1,3})Y)?(?:(\\d{1,4})M)?(?:(\\d{1,4})W)?(?:(\\d{1,5})D)?");

  private static final int MOST_MONTHS = 12 * 1000 - 1;
  private static final int MOST_DAYS = 99_999;

  public Tenor {
    if (!(months >= 0 && months <= MOST_MONTHS && days >= 0 && days <= MOST_DAYS)) {
      throw new IllegalArgumentException(
          "a tenor must be 0 to 11999 months and 0 to 99999 days, found "
              + months
              + " months and "
              + days
              + " days");
    }
  }

  static boolean isTenor(String text) {
    return !text.isEmpty() && FORM.matcher(text.toUpperCase(Locale.ROOT)).matches();
  }

  /**
   * Reads {@code 1Y6M}; either case, at least one part, parts in the order Y M W D.
   *
   * @throws IllegalArgumentException if the text is not a tenor, or one too long
   */
  public static Tenor parse(String text) {
    Matcher m = FORM.matcher(text.strip().toUpperCase(Locale.ROOT));
    if (text.isBlank() || !m.matches()) {
      throw new IllegalArgumentException("expected a tenor such as 1D, 2W, 6M, 10Y or 1Y6M");
    }
    return new Tenor(
        12 * number(m.group(1)) + number(m.group(2)), 7 * number(m.group(3)) + number(m.group(4)));
  }

  private static int number(String digits) {
    return digits == null ? 0 : Integer.parseInt(digits);
  }

  /** The date this long after {@code start}, the day of month kept where the month has it. */
  public LocalDate after(LocalDate start) {
    return start.plusMonths(months).plusDays(days);
  }

  /** Exact length in years where there is no calendar: a month is 1/12, a day 1/365. */
  public double years() {
    return months / 12.0 + days / 365.0;
  }

  @Override
  public String toString() {
    StringBuilder text = new StringBuilder();
    if (months >= 12) {
      text.append(months / 12).append('Y');
    }
    if (months % 12 != 0) {
      text.append(months % 12).append('M');
    }
    if (days != 0 || months == 0) {
      text.append(days).append('D');
    }
    return text.toString();
  }
}
