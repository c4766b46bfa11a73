package ebbline.data;

import java.math.BigDecimal;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Rates as the user writes them: {@code 4.25%}, {@code 35bp} or a bare decimal fraction {@code
 * 0.0425}. The result is the double nearest to the decimal number that is written.
 */
public final class RateText {
  private static final Pattern FORM =
      Pattern.compile("([+-]?(?:\\d+(?:\\.\\d*)?|\\.\\d+)(?:[eE][+-]?\\d{1,3})?)\\s*(%|[bB][pP])?");

  /** 10,000 % a year: what is larger was not meant, and its powers overflow. */
  private static final double LARGEST = 100;

  private RateText() {}

  /** The unit in which bare numbers of a rate column stand. */
  public enum Unit {
    /** Decimal fraction, or a sign of its own. */
    WRITTEN(0),
    PER_CENT(2),
    BASIS_POINTS(4);

    private final int shift;

    Unit(int shift) {
      this.shift = shift;
    }
  }

  /**
   * Reads a rate.
   *
   * @throws IllegalArgumentException if the text is no rate, or a bare number of magnitude 1 or
   *     more; the message says what was expected and does not repeat the whole text
   */
  public static double parse(String text) {
    return parse(text, Unit.WRITTEN);
  }

  /**
   * Reads a rate from a column that may have its own unit; then a sign in the cell is refused.
   *
   * @throws IllegalArgumentException as above
   */
  public static double parse(String text, Unit unit) {
    String t = text.strip();
    double plain = plain(t, unit);
    if (Math.abs(plain) <= LARGEST) {
      return plain + 0.0; // a rate of -0 is 0
    }
    Matcher m = FORM.matcher(t);
    if (!m.matches() || t.length() > 60) {
      throw new IllegalArgumentException(
          "expected a rate, 4.25%, 35bp or 0.0425" + NumberText.hint(t));
    }
    BigDecimal number = new BigDecimal(m.group(1));
    String sign = m.group(2);
    if (unit != Unit.WRITTEN) {
      if (sign != null) {
        throw new IllegalArgumentException(
            "the column's heading gives the unit already; write the number without a sign");
      }
      return finite(number.movePointLeft(unit.shift));
    }
    if (sign != null) {
      return finite(number.movePointLeft(sign.equals("%") ? 2 : 4));
    }
    if (number.abs().compareTo(BigDecimal.ONE) >= 0) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "%s means %s %%; write %s%% or %s",
              m.group(1),
              plain(number.movePointRight(2)),
              m.group(1),
              plain(number.movePointLeft(2))));
    }
    return finite(number);
  }

  /**
   * The rate where it is a plain number, with % or without; NaN where that is to be looked into.
   */
  private static double plain(String t, Unit unit) {
    if (unit != Unit.WRITTEN) {
      return PlainDecimal.parse(t, t.length(), unit.shift);
    }
    if (t.endsWith("%")) {
      return PlainDecimal.parse(t, t.length() - 1, 2);
    }
    double bare = PlainDecimal.parse(t, t.length(), 0);
    return Math.abs(bare) < 1 ? bare : Double.NaN;
  }

  private static String plain(BigDecimal number) {
    BigDecimal short0 = number.stripTrailingZeros();
    return Math.abs(short0.scale()) > 30 ? short0.toString() : short0.toPlainString();
  }

  private static double finite(BigDecimal number) {
    double value = number.doubleValue();
    if (Math.abs(value) <= LARGEST) {
      return value;
    }
    throw new IllegalArgumentException("a rate must lie between -100 and 100 (10000 %)");
  }
}
