package ebbline.instrument;

import java.util.Locale;

/** Rounding that is part of a standard; only on request. */
public enum PriceRounding {
  NONE("none"),
  /** Factors and prices per 100 as the United States Treasury rounds them [31 CFR 356, App. B]. */
  TREASURY("treasury");

  private final String label;

  PriceRounding(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  /**
   * The rounding of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static PriceRounding of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (PriceRounding rounding : values()) {
      if (rounding.label.equals(wanted)) {
        return rounding;
      }
    }
    throw new IllegalArgumentException("expected none or treasury");
  }
}
