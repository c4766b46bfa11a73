package ebbline.bond;

/** How a yield discounts over the fraction of a period to the next flow. */
public enum FirstFraction {
  /** Compound, but simple where the next flow is the last [street convention]. */
  STREET,
  /** Compound always [UK Debt Management Office, Australian Office of Financial Management]. */
  COMPOUND,
  /** Simple always [31 CFR 356, Appendix B]. */
  SIMPLE;

  boolean isSimple(int flows) {
    return this == SIMPLE || (this == STREET && flows == 1);
  }
}
