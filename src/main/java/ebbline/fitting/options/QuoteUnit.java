package ebbline.fitting.options;

import ebbline.pricing.VolatilityLaw;
import ebbline.pricing.VolatilityTerms;

/** In what options are quoted. */
public enum QuoteUnit {
  NORMAL_VOL("normal-vol"),
  BLACK_VOL("black-vol"),
  /** Per 100 face. */
  PREMIUM("premium");

  private final String label;

  QuoteUnit(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  /**
   * @throws IllegalArgumentException for a text that is none of them
   */
  public static QuoteUnit of(String text) {
    for (QuoteUnit unit : values()) {
      if (unit.label.equalsIgnoreCase(text)) {
        return unit;
      }
    }
    throw new IllegalArgumentException("expected normal-vol, black-vol or premium");
  }

  /** The premium per 100 of a figure in this unit. */
  public double premium(VolatilityTerms terms, double figure, double shift) {
    return this == PREMIUM ? figure : terms.premium(law(), figure, shift);
  }

  /**
   * A premium per 100 in this unit.
   *
   * @throws IllegalArgumentException in words if no volatility gives the premium
   */
  public double figure(VolatilityTerms terms, double premium, double shift) {
    return this == PREMIUM ? premium : terms.implied(law(), premium, shift);
  }

  /** How a premium per 100 moves with a figure in this unit. */
  double slope(VolatilityTerms terms, double figure, double shift) {
    return this == PREMIUM ? 1 : terms.vega(law(), figure, shift);
  }

  private VolatilityLaw law() {
    return this == BLACK_VOL ? VolatilityLaw.BLACK : VolatilityLaw.NORMAL;
  }
}
