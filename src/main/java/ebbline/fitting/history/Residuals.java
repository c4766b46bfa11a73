package ebbline.fitting.history;

import ebbline.model.NormalLaw;

/** Residuals of a history under a model, each over its standard deviation. */
final class Residuals {
  private Residuals() {}

  /** Under the estimate, or under the random walk where that is what was found; else none. */
  static double[] of(RateHistory history, HistoryEstimate estimate) {
    if (estimate instanceof HistoryEstimate.Reverting found) {
      return of(history, found.law());
    }
    HistoryEstimate.RandomWalk walk = ((HistoryEstimate.Undetermined) estimate).walk().orElse(null);
    if (walk == null || !(walk.volatility() > 0)) {
      return new double[0];
    }
    double[] residuals = new double[history.size() - 1];
    for (int i = 0; i < residuals.length; i++) {
      double step = history.isRegular() ? history.step() : history.time(i + 1) - history.time(i);
      double change = history.rate(i + 1) - history.rate(i);
      residuals[i] = (change - walk.drift() * step) / (walk.volatility() * Math.sqrt(step));
    }
    return residuals;
  }

  private static double[] of(RateHistory history, RateLaw law) {
    double[] residuals = new double[history.size() - 1];
    for (int i = 0; i < residuals.length; i++) {
      double step = history.isRegular() ? history.step() : history.time(i + 1) - history.time(i);
      NormalLaw next = law.conditional(history.rate(i), step);
      residuals[i] = (history.rate(i + 1) - next.mean()) / next.standardDeviation();
    }
    return residuals;
  }
}
