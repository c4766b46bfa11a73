package ebbline.fitting.options;

/** In which unit the errors of a calibration are squared. */
public enum Objective {
  NORMAL(QuoteUnit.NORMAL_VOL, "normal"),
  BLACK(QuoteUnit.BLACK_VOL, "black"),
  PREMIUM(QuoteUnit.PREMIUM, "premium");

  private final QuoteUnit unit;
  private final String label;

  Objective(QuoteUnit unit, String label) {
    this.unit = unit;
    this.label = label;
  }

  QuoteUnit unit() {
    return unit;
  }

  public String label() {
    return label;
  }

  /** What is made small, in words. */
  public String words() {
    return this == PREMIUM
        ? "least squares in premiums"
        : "least squares in " + label + " volatilities";
  }

  /**
   * @throws IllegalArgumentException for another text than normal, black or premium
   */
  public static Objective of(String text) {
    for (Objective objective : values()) {
      if (objective.label.equalsIgnoreCase(text)) {
        return objective;
      }
    }
    throw new IllegalArgumentException("expected normal, black or premium");
  }
}
