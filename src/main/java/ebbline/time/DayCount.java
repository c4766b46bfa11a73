package ebbline.time;

import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/** How a coupon accrues over the days of its period. */
public enum DayCount {
  /** Days over days of the coupon period, times the coupon of a period [ICMA Rule 251]. */
  ACT_ACT_ICMA("act/act-icma"),
  /** Days over 365 [2006 ISDA Definitions sec. 4.16(d)]. */
  ACT_365F("act/365f");

  private final String label;

  DayCount(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  /**
   * The day count of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static DayCount of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (DayCount dayCount : values()) {
      if (dayCount.label.equals(wanted)) {
        return dayCount;
      }
    }
    throw new IllegalArgumentException(
        "expected a day count, one of "
            + Arrays.stream(values()).map(DayCount::label).collect(Collectors.joining(", ")));
  }
}
