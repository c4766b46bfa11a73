package ebbline.fitting;

/** A parameter that a fit may estimate or hold; the label is what the user types and reads. */
public enum Parameter {
  /** κ (or a), per year. */
  MEAN_REVERSION("mean_reversion"),
  /** θ, per year, a decimal rate. */
  LONG_RUN_MEAN("long_run_mean"),
  /** σ, per year^(3/2), a decimal. */
  VOLATILITY("volatility"),
  /** r₀, per year, a decimal rate. */
  SHORT_RATE("short_rate");

  private final String label;

  Parameter(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  /** The label as words, {@code mean reversion}. */
  String words() {
    return label.replace('_', ' ');
  }
}
