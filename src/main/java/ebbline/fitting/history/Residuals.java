package ebbline.fitting.history;

import ebbline.model.NormalLaw;

/** Residuals of a history under a law, each over its standard deviation. */
final class Residuals {
  private Residuals() {}

  static double[] of(RateHistory history, RateLaw law) {
    double[] residuals = new double[history.size() - 1];
    for (int i = 0; i < residuals.length; i++) {
      double step = history.isRegular() ? history.step() : history.time(i + 1) - history.time(i);
      NormalLaw next = law.conditional(history.rate(i), step);
      residuals[i] = (history.rate(i + 1) - next.mean()) / next.standardDeviation();
    }
    return residuals;
  }
}
