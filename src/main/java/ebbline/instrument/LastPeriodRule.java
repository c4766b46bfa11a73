package ebbline.instrument;

import java.util.Locale;

/** How a yield discounts the last payment once it is the only one left. */
public enum LastPeriodRule {
  /** Simple interest on the fraction of the period (United States). */
  SIMPLE("simple"),
  /** Compound as before (United Kingdom). */
  COMPOUND("compound"),
  /** Simple interest on actual days over 365 (Australia). */
  SIMPLE_ACT_365("simple-act/365");

  private final String label;

  LastPeriodRule(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  /**
   * The rule of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static LastPeriodRule of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (LastPeriodRule rule : values()) {
      if (rule.label.equals(wanted)) {
        return rule;
      }
    }
    throw new IllegalArgumentException("expected simple, compound or simple-act/365");
  }
}
