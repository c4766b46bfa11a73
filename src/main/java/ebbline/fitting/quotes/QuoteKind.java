package ebbline.fitting.quotes;

import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/** What the market quotes to build a curve from. */
public enum QuoteKind {
  DEPOSIT("deposit"),
  BILL("bill"),
  /** Forward-rate agreement. */
  FRA("fra"),
  FUTURE("future"),
  /** Overnight-index swap. */
  OIS("ois"),
  /** Fixed against floating on one curve. */
  SWAP("swap"),
  BOND("bond"),
  /** Zero rate. */
  ZERO("zero");

  private final String label;

  QuoteKind(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  /** All labels, for a message. */
  public static String known() {
    return Arrays.stream(values()).map(QuoteKind::label).collect(Collectors.joining(", "));
  }

  /**
   * The kind of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static QuoteKind of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (QuoteKind kind : values()) {
      if (kind.label.equals(wanted)) {
        return kind;
      }
    }
    throw new IllegalArgumentException("expected an instrument, one of " + known());
  }
}
