package ebbline.fitting.history;

/**
 * How the Vasicek model is estimated from a history; the label is what the user types and reads.
 */
public enum HistoryMethod {
  /** Regression of each rate on the one before; residual variance over n − 2. */
  OLS("ols"),
  /** Maximum likelihood given the first rate; the regression with residual variance over n. */
  EXACT("exact"),
  /** Maximum likelihood with the first rate drawn from the stationary law. */
  STATIONARY("stationary"),
  /** Sample mean and autocovariances; evenly spaced histories only. */
  YULE_WALKER("yule-walker");

  private final String label;

  HistoryMethod(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }
}
