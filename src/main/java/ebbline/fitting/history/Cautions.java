package ebbline.fitting.history;

import ebbline.fitting.history.HistoryEstimate.Regression;
import ebbline.fitting.history.HistoryEstimate.Sample;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** What must be said beside an estimate before anyone uses it. */
final class Cautions {
  /** Large-sample 5 % point of the Dickey-Fuller law with a constant [MacKinnon 2010]. */
  private static final double NOT_FROM_ONE = -2.86154;

  private Cautions() {}

  static List<String> of(
      RateHistory history, Sample sample, RateLaw law, Precision precision, Regression line) {
    List<String> cautions = new ArrayList<>();
    double t = (line.slope() - 1) / line.slopeError();
    if (!(t < NOT_FROM_ONE)) {
      cautions.add(
          String.format(
              Locale.ROOT,
              "the slope %.6f is not told apart from 1 (t = %.2f, needs %.2f): mean reversion may"
                  + " be none, and the half-life of %.1f years has no upper bound",
              line.slope(),
              t,
              NOT_FROM_ONE,
              law.halfLife()));
    }
    double range = sample.highest() - sample.lowest();
    double theta = law.longRunMean();
    boolean outside = theta < sample.lowest() - range || theta > sample.highest() + range;
    if (outside || precision.longRunMeanError() > range) {
      cautions.add(
          String.format(
              Locale.ROOT,
              "the long-run mean is not identified: %s with a standard error of %s, while the"
                  + " rates lie between %s and %s; their own mean is %s",
              Refusals.percent(theta),
              Refusals.percent(precision.longRunMeanError()),
              Refusals.percent(sample.lowest()),
              Refusals.percent(sample.highest()),
              Refusals.percent(sample.mean())));
    }
    addOneMove(cautions, history);
    return cautions;
  }

  private static void addOneMove(List<String> cautions, RateHistory history) {
    double largest = 0;
    double all = 0;
    for (int i = 1; i < history.size(); i++) {
      double change = history.rate(i) - history.rate(i - 1);
      all += change * change;
      largest = Math.max(largest, change * change);
    }
    if (largest > 0.5 * all) {
      cautions.add(
          String.format(
              Locale.ROOT,
              "one move makes up %.0f %% of all squared moves: the estimate rests on it",
              100 * largest / all));
    }
  }
}
