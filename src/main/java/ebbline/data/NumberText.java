package ebbline.data;

import java.util.Locale;
import java.util.regex.Pattern;

/** Plain numbers as the user writes them. */
public final class NumberText {
  private static final Pattern NUMBER =
      Pattern.compile("[+-]?(?:\\d+(?:\\.\\d*)?|\\.\\d+)(?:[eE][+-]?\\d{1,3})?");

  private NumberText() {}

  /**
   * Reads a finite number.
   *
   * @throws IllegalArgumentException if the text is none; the message says what was expected
   */
  public static double parse(String text) {
    String t = text.strip();
    double plain = PlainDecimal.parse(t, t.length(), 0);
    if (!Double.isNaN(plain)) {
      return plain;
    }
    if (NUMBER.matcher(t).matches()) {
      double value = Double.parseDouble(t);
      if (Double.isFinite(value)) {
        return value;
      }
    }
    throw new IllegalArgumentException("expected a number such as 98.5" + hint(t));
  }

  /** What is probably meant by a text that is no number; empty where nothing can be guessed. */
  static String hint(String text) {
    String t = text.toLowerCase(Locale.ROOT);
    if (t.matches("[+-]?\\d{1,3}(,\\d{3})+(\\.\\d*)?%?")) {
      return "; write it without thousands separators";
    } else if (t.matches("[+-]?\\d+,\\d+\\s*(%|bp)?")) {
      return "; the decimal separator is a point";
    } else if (t.matches("[+-]?(nan|inf|infinity)")) {
      return "; it must be a finite number";
    }
    return "";
  }
}
