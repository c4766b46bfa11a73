package ebbline.time;

import java.util.Objects;

/**
 * One thing wrong with what the user gave: where it stands, what was found, what was expected.
 *
 * <p>Readers collect all problems of an input and report them together, in the order of the file.
 *
 * @param source file path as the user gave it, or the name of an option
 * @param line line of the file, counted from 1; 0 where lines mean nothing
 * @param column column name (CSV), or the number of a character in its line (JSON); empty where
 *     unknown
 * @param value the offending text; empty where nothing was found
 * @param expected what is wrong and how to mend it, one sentence without the place
 */
public record InputProblem(String source, int line, String column, String value, String expected) {
  private static final int MOST_SHOWN = 60;

  public InputProblem {
    Objects.requireNonNull(source, "source");
    Objects.requireNonNull(column, "column");
    Objects.requireNonNull(value, "value");
    Objects.requireNonNull(expected, "expected");
  }

  /**
   * The problem as one line, {@code file:line: column 'x': found 'y': expected …} or, where the
   * column is a number, {@code file:line:column: found 'y': expected …}.
   */
  public String message() {
    StringBuilder text = new StringBuilder(source);
    boolean numbered = !column.isEmpty() && column.chars().allMatch(Character::isDigit);
    if (line > 0) {
      text.append(':').append(line);
      if (numbered) {
        text.append(':').append(column);
      }
    }
    text.append(": ");
    if (!column.isEmpty() && !numbered) {
      text.append("column '").append(start(column)).append("': ");
    }
    if (!value.isEmpty()) {
      text.append("found '").append(start(value)).append("': ");
    }
    return onOneLine(text.append(expected).toString());
  }

  /** As much of a text as a message can carry. */
  private static String start(String text) {
    return text.codePointCount(0, text.length()) <= MOST_SHOWN
        ? text
        : text.substring(0, text.offsetByCodePoints(0, MOST_SHOWN)) + "…";
  }

  /** Characters of the user's text that break lines or steer a terminal are shown as a dot. */
  private static String onOneLine(String text) {
    StringBuilder shown = new StringBuilder(text.length());
    text.codePoints()
        .forEach(
            c ->
                shown.appendCodePoint(
                    switch (Character.getType(c)) {
                      case Character.CONTROL,
                          Character.FORMAT,
                          Character.LINE_SEPARATOR,
                          Character.PARAGRAPH_SEPARATOR,
                          Character.SURROGATE ->
                          '·';
                      default -> c;
                    }));
    return shown.toString();
  }
}
