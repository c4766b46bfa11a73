package ebbline.instrument;

import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/** What a quoted yield means; {@code docs/conventions.md} gives each formula with its source. */
public enum YieldKind {
  /** Compounded at the coupon frequency, the first fraction of a period too. */
  STREET("street"),
  /** As street, but simple over the first fraction of a period. */
  TREASURY("treasury"),
  /** As street, on the days on which payments are made. */
  TRUE("true"),
  /** Coupon and capital gain spread evenly over the years to maturity, over the price. */
  SIMPLE("simple"),
  /** Bank discount on the redemption. */
  DISCOUNT("discount"),
  /** Simple interest on the price to the single payment left. */
  MONEY_MARKET("money-market"),
  /** Compounded once a year. */
  ANNUAL("annual"),
  /** Compounded continuously. */
  CONTINUOUS("continuous");

  private final String label;

  YieldKind(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  /**
   * The kind of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static YieldKind of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (YieldKind kind : values()) {
      if (kind.label.equals(wanted)) {
        return kind;
      }
    }
    throw new IllegalArgumentException(
        "expected a kind of yield, one of "
            + Arrays.stream(values()).map(YieldKind::label).collect(Collectors.joining(", ")));
  }
}
