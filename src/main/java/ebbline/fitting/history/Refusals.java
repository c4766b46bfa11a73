package ebbline.fitting.history;

import ebbline.fitting.history.HistoryEstimate.RandomWalk;
import ebbline.fitting.history.HistoryEstimate.Reason;
import ebbline.fitting.history.HistoryEstimate.Sample;
import ebbline.fitting.history.HistoryEstimate.Undetermined;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/** The histories that hold no estimate of a mean reversion, and what they still hold. */
final class Refusals {
  /** Three transitions leave one to spare after slope and intercept. */
  static final int FEWEST = 4;

  private Refusals() {}

  static Undetermined tooFew(RateHistory history, HistoryMethod method) {
    int n = history.size();
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (double rate : history.ratesInPlace()) {
      low = Math.min(low, rate);
      high = Math.max(high, rate);
    }
    Sample sample =
        new Sample(
            n,
            history.missing(),
            history.span(),
            history.step(),
            history.isRegular(),
            history.mean(),
            history.deviation(),
            n == 0 ? 0 : low,
            n == 0 ? 0 : high,
            n == 0 ? 0 : history.rate(n - 1));
    return refuse(
        sample,
        method,
        Reason.TOO_FEW,
        n == 0
            ? "the history has no rate at all"
            : String.format(
                Locale.ROOT,
                "%d %s too few: slope, intercept and noise need at least %d; the mean of what is"
                    + " there is %s",
                n,
                n == 1 ? "rate is" : "rates are",
                FEWEST,
                percent(sample.mean())),
        Optional.empty());
  }

  static Optional<Undetermined> beforeFitting(
      RateHistory history,
      Sample sample,
      LaggedSums sums,
      Extremes extremes,
      HistoryMethod method) {
    int n = history.size();
    double size = Math.max(Math.abs(sample.lowest()), Math.abs(sample.highest()));
    if (!(sample.highest() - sample.lowest() > 4 * Math.ulp(size))) {
      return Optional.of(
          refuse(
              sample,
              method,
              Reason.CONSTANT,
              String.format(
                  Locale.ROOT,
                  "all %d rates are %s: volatility is 0 in this sample, and a rate that never moves"
                      + " shows no mean reversion",
                  n,
                  percent(sample.mean())),
              Optional.empty()));
    }
    double squares = sums.squaredChanges();
    // What is left besides one move is rounding of the sums, or nothing.
    if (extremes.largestMove() > squares * (1 - 1e-12)) {
      int where = extremes.after();
      return Optional.of(
          refuse(
              sample,
              method,
              Reason.SINGLE_JUMP,
              String.format(
                  Locale.ROOT,
                  "the rate moves once, from %s to %s after %d of %d steps: one jump tells neither"
                      + " a mean reversion nor a volatility; the sample holds the two levels only",
                  percent(history.rate(where - 1)),
                  percent(history.rate(where)),
                  where,
                  n - 1),
              Optional.empty()));
    }
    if (history.isRegular() && !(sums.residuals() > 1e-12 * squares)) {
      return Optional.of(
          refuse(
              sample,
              method,
              Reason.WITHOUT_NOISE,
              String.format(
                  Locale.ROOT,
                  "each rate follows from the one before without any error (slope %.10g, intercept"
                      + " %.6g): this is no random history, and its volatility is 0",
                  1 + sums.changeSlope(),
                  sums.intercept()),
              Optional.empty()));
    }
    return Optional.empty();
  }

  static Undetermined noReversion(
      RateHistory history, Sample sample, HistoryMethod method, OptionalDouble slope) {
    RandomWalk walk = walk(history);
    String found =
        slope.isPresent()
            ? String.format(
                Locale.ROOT,
                "no mean reversion in this sample: the slope of each rate on the one before is"
                    + " %.6f, not below 1",
                slope.getAsDouble())
            : "no mean reversion in this sample: the likelihood is highest without any";
    return new Undetermined(
        sample,
        method,
        Reason.NO_REVERSION,
        found
            + String.format(
                Locale.ROOT,
                "; there is no long-run mean, half-life or stationary law to report. A random walk"
                    + " fits it with volatility %s a year and drift %s a year (standard error %s)",
                percent(walk.volatility()),
                percent(walk.drift()),
                percent(walk.driftError())),
        slope,
        Optional.of(walk));
  }

  static Undetermined stepTooLong(Sample sample, HistoryMethod method, OptionalDouble slope) {
    String found =
        slope.isPresent()
            ? String.format(
                Locale.ROOT,
                "the slope of each rate on the one before is %.6f, not above 0",
                slope.getAsDouble())
            : "each rate is independent of the one before";
    return new Undetermined(
        sample,
        method,
        Reason.STEP_TOO_LONG,
        found
            + String.format(
                Locale.ROOT,
                ": a step of %.4g years is too long to see the reversion, which is over before the"
                    + " next rate. Mean %s and stationary standard deviation %s are what remains;"
                    + " use more frequent rates",
                sample.step(),
                percent(sample.mean()),
                percent(sample.deviation())),
        slope,
        Optional.empty());
  }

  static RandomWalk walk(RateHistory history) {
    int n = history.size() - 1;
    double span = history.span();
    double drift = (history.rate(n) - history.rate(0)) / span;
    double squares = 0;
    double logs = 0;
    for (int i = 1; i <= n; i++) {
      double step = history.isRegular() ? history.step() : history.time(i) - history.time(i - 1);
      double off = history.rate(i) - history.rate(i - 1) - drift * step;
      squares += off * off / step;
      logs += Math.log(step);
    }
    double volatility = Math.sqrt(squares / (n - 1));
    double logLikelihood = -0.5 * (n * (Math.log(2 * Math.PI * squares / n) + 1) + logs);
    return new RandomWalk(
        drift,
        volatility / Math.sqrt(span),
        volatility,
        volatility / Math.sqrt(2.0 * (n - 1)),
        squares > 0 ? logLikelihood : 0);
  }

  private static Undetermined refuse(
      Sample sample,
      HistoryMethod method,
      Reason reason,
      String explanation,
      Optional<RandomWalk> walk) {
    return new Undetermined(sample, method, reason, explanation, OptionalDouble.empty(), walk);
  }

  static String percent(double rate) {
    return String.format(Locale.ROOT, "%.4f %%", 100 * rate);
  }
}
