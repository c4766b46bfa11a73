package ebbline.fitting.history;

import ebbline.fitting.history.HistoryEstimate.Reverting;

/** κ, θ, σ of a simulated history and nothing else. */
final class PlainEstimate {
  private static final double[] NONE = {};

  private PlainEstimate() {}

  /**
   * κ, θ, σ; empty where there is none. On even steps a regression gives κ ≤ 0 where its slope is 1
   * or more; elsewhere a likelihood that is highest without reversion gives κ = 0.
   */
  static double[] of(RateHistory history, HistoryMethod method) {
    boolean line = method == HistoryMethod.OLS || method == HistoryMethod.EXACT;
    if (line && history.isRegular()) {
      LaggedSums sums = LaggedSums.of(history.ratesInPlace());
      double below = -sums.changeSlope();
      if (!(below < 1) || below == 0) {
        return NONE;
      }
      double divisor = method == HistoryMethod.OLS ? sums.n - 2 : sums.n;
      double kappa = -Math.log1p(-below) / history.step();
      double ratio = 2 * kappa / (below * (2 - below));
      return new double[] {
        kappa,
        sums.origin + sums.mean + sums.meanChange / below,
        Math.sqrt(sums.residuals() / divisor * ratio)
      };
    }
    HistoryEstimate estimate = HistoryEstimator.estimate(history, method);
    if (estimate instanceof Reverting found) {
      RateLaw law = found.law();
      return new double[] {law.meanReversion(), law.longRunMean(), law.volatility()};
    }
    if (estimate instanceof HistoryEstimate.Undetermined none && none.walk().isPresent()) {
      return new double[] {0, history.mean(), none.walk().get().volatility()};
    }
    return NONE;
  }
}
