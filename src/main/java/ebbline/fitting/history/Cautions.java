package ebbline.fitting.history;

import ebbline.fitting.history.HistoryEstimate.Regression;
import ebbline.fitting.history.HistoryEstimate.Reverting;
import ebbline.fitting.history.HistoryEstimate.Sample;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** What must be said beside an estimate before anyone uses it. */
final class Cautions {
  /** Large-sample 5 % point of the Dickey-Fuller law with a constant [MacKinnon 2010]. */
  private static final double NOT_FROM_ONE = -2.86154;

  private Cautions() {}

  /** Of an estimate whose largest move is {@code share} of all squared moves. */
  static List<String> of(Reverting estimate, double share) {
    Sample sample = estimate.sample();
    RateLaw law = estimate.law();
    Precision precision = estimate.precision();
    Regression line = estimate.regression();
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
    if (share > 0.5) {
      cautions.add(
          String.format(
              Locale.ROOT,
              "one move makes up %.0f %% of all squared moves: the estimate rests on it",
              100 * share));
    }
    return cautions;
  }
}
