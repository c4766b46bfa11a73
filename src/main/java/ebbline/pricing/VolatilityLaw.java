package ebbline.pricing;

/** In which formula a quoted volatility is put. */
public enum VolatilityLaw {
  /** Bachelier's: the forward is normal, volatility in its own unit. */
  NORMAL,
  /** Black's, of forward + shift. */
  BLACK
}
