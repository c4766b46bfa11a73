package ebbline.time;

import java.util.Arrays;
import java.util.stream.Collectors;

/** How many coupons a year pays. */
public enum Frequency {
  ANNUAL(1),
  SEMI_ANNUAL(2),
  QUARTERLY(4),
  MONTHLY(12);

  private final int perYear;

  Frequency(int perYear) {
    this.perYear = perYear;
  }

  /**
   * @throws IllegalArgumentException for anything but 1, 2, 4 or 12
   */
  public static Frequency of(int perYear) {
    for (Frequency frequency : values()) {
      if (frequency.perYear == perYear) {
        return frequency;
      }
    }
    throw new IllegalArgumentException("frequency must be " + known() + ", found " + perYear);
  }

  /**
   * Reads {@code 1}, {@code 2}, {@code 4} or {@code 12}.
   *
   * @throws IllegalArgumentException for any other text; the message does not repeat it
   */
  public static Frequency parse(String text) {
    String wanted = text.strip();
    for (Frequency frequency : values()) {
      if (Integer.toString(frequency.perYear).equals(wanted)) {
        return frequency;
      }
    }
    throw new IllegalArgumentException("expected " + known() + " payments a year");
  }

  private static String known() {
    return Arrays.stream(values())
        .map(f -> Integer.toString(f.perYear))
        .collect(Collectors.joining(", "))
        .replace(", 12", " or 12");
  }

  public int perYear() {
    return perYear;
  }

  /** Months in a period. */
  public int months() {
    return 12 / perYear;
  }
}
