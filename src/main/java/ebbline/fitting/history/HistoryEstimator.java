package ebbline.fitting.history;

import ebbline.fitting.history.HistoryEstimate.Regression;
import ebbline.fitting.history.HistoryEstimate.Reverting;
import ebbline.fitting.history.HistoryEstimate.Sample;
import ebbline.fitting.history.HistoryEstimate.Undetermined;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** The Vasicek model from one rate's history; see {@link HistoryMethod} for the ways. */
public final class HistoryEstimator {
  private HistoryEstimator() {}

  /**
   * Estimates, or says in words why not.
   *
   * @throws IllegalArgumentException for {@code yule-walker} on an unevenly spaced history
   */
  public static HistoryEstimate estimate(RateHistory history, HistoryMethod method) {
    if (method == HistoryMethod.YULE_WALKER && !history.isRegular()) {
      throw new IllegalArgumentException(
          "yule-walker needs evenly spaced rates without gaps; use exact or stationary here, or"
              + " give --step if the dates only mark even steps");
    }
    if (history.size() < Refusals.FEWEST) {
      return Refusals.tooFew(history, method);
    }
    LaggedSums sums = LaggedSums.of(history.ratesInPlace());
    Extremes extremes = Extremes.of(history.ratesInPlace(), sums.squaredChanges());
    Sample sample = sample(history, sums, extremes);
    Optional<Undetermined> refusal =
        Refusals.beforeFitting(history, sample, sums, extremes, method);
    if (refusal.isPresent()) {
      return refusal.get();
    }
    HistoryEstimate estimate =
        switch (method) {
          case OLS, EXACT ->
              history.isRegular()
                  ? regression(history, sample, sums, method)
                  : likelihood(history, sample, method);
          case STATIONARY -> likelihood(history, sample, method);
          case YULE_WALKER -> autocovariances(history, sample);
        };
    return estimate instanceof Reverting found
        ? found.with(Cautions.of(found, extremes.largestMove() / sums.squaredChanges()))
        : estimate;
  }

  private static Sample sample(RateHistory history, LaggedSums sums, Extremes extremes) {
    return new Sample(
        history.size(),
        history.missing(),
        history.span(),
        history.step(),
        history.isRegular(),
        sums.meanOfAll(),
        sums.deviationOfAll(),
        extremes.lowest(),
        extremes.highest(),
        history.rate(history.size() - 1));
  }

  private static HistoryEstimate regression(
      RateHistory history, Sample sample, LaggedSums sums, HistoryMethod method) {
    double below = -sums.changeSlope();
    if (!(below > 0)) {
      return Refusals.noReversion(history, sample, method, OptionalDouble.of(1 - below));
    }
    if (!(below < 1)) {
      return Refusals.stepTooLong(sample, method, OptionalDouble.of(1 - below));
    }
    int n = sums.n;
    double divisor = method == HistoryMethod.OLS ? n - 2 : n;
    double s2 = sums.residuals() / divisor;
    double slope = 1 - below;
    double step = history.step();
    double kappa = -Math.log1p(-below) / step;
    double theta = sums.origin + sums.mean + sums.meanChange / below;
    double ratio = 2 * kappa / (below * (1 + slope));
    double sigma = Math.sqrt(s2 * ratio);
    double center = sums.origin + sums.mean;
    double slopeVariance = s2 / sums.square;
    double interceptVariance = s2 * (1.0 / n + center * center / sums.square);
    Regression line =
        new Regression(
            sums.intercept(),
            slope,
            Math.sqrt(s2),
            Math.sqrt(interceptVariance),
            Math.sqrt(slopeVariance));
    // Delta method from (mean change at the sample mean, slope, s²), which are independent.
    double byKappa = -1 / (slope * step);
    double[] ofKappa = {0, byKappa, 0};
    double[] ofTheta = {1 / below, sums.meanChange / (below * below), 0};
    double logRatio = byKappa / kappa + 2 * slope / (below * (1 + slope));
    double[] ofSigma = {0, 0.5 * sigma * logRatio, 0.5 * sigma / s2};
    double[] variances = {s2 / n, slopeVariance, 2 * s2 * s2 / divisor};
    Precision precision = Precision.of(delta(variances, ofKappa, ofTheta, ofSigma));
    double logLikelihood = -0.5 * n * (Math.log(2 * Math.PI * sums.residuals() / n) + 1);
    RateLaw law = new RateLaw(kappa, theta, sigma);
    return new Reverting(sample, method, law, line, logLikelihood, precision, List.of());
  }

  private static double[][] delta(double[] variances, double[]... gradients) {
    double[][] result = new double[gradients.length][gradients.length];
    for (int i = 0; i < gradients.length; i++) {
      for (int j = 0; j < gradients.length; j++) {
        for (int k = 0; k < variances.length; k++) {
          result[i][j] += gradients[i][k] * gradients[j][k] * variances[k];
        }
      }
    }
    return result;
  }

  private static HistoryEstimate likelihood(
      RateHistory history, Sample sample, HistoryMethod method) {
    boolean stationary = method == HistoryMethod.STATIONARY;
    ExactLikelihood best = new ExactLikelihood(history, stationary);
    LikelihoodSearch.End end = LikelihoodSearch.maximise(best, history);
    if (end == LikelihoodSearch.End.AT_ZERO) {
      return Refusals.noReversion(history, sample, method, OptionalDouble.empty());
    }
    if (end == LikelihoodSearch.End.AT_TOP) {
      return Refusals.stepTooLong(sample, method, OptionalDouble.empty());
    }
    Precision precision = Precision.invert(best.information());
    if (precision == null) {
      return Refusals.noReversion(history, sample, method, OptionalDouble.empty());
    }
    int n = best.terms();
    double correction = method == HistoryMethod.OLS ? Math.sqrt(n / (n - 2.0)) : 1;
    precision = precision.inflated(correction);
    RateLaw law =
        new RateLaw(best.meanReversion, best.longRunMean(), Math.sqrt(best.variance) * correction);
    Regression line = overMeanStep(history, law, precision);
    return new Reverting(sample, method, law, line, best.logLikelihood, precision, List.of());
  }

  private static HistoryEstimate autocovariances(RateHistory history, Sample sample) {
    int n = history.size();
    double mean = sample.mean();
    double same = 0;
    double lagged = 0;
    for (int i = 0; i < n; i++) {
      double d = history.rate(i) - mean;
      same += d * d;
      if (i > 0) {
        lagged += d * (history.rate(i - 1) - mean);
      }
    }
    double slope = lagged / same;
    if (!(slope > 0)) {
      return Refusals.stepTooLong(sample, HistoryMethod.YULE_WALKER, OptionalDouble.of(slope));
    }
    // |slope| < 1 always: the biased autocovariances belong to a stationary process.
    double kappa = -Math.log(slope) / history.step();
    double sigma = Math.sqrt(2 * kappa * same / n);
    RateLaw law = new RateLaw(kappa, mean, sigma);
    ExactLikelihood at = new ExactLikelihood(history, true);
    double logLikelihood = at.logLikelihood(law);
    // Large-sample laws: var B = (1 − B²)/n, var of the mean = 2γ₀/(κ × span) here with its
    // discrete form γ₀(1 + B)/((1 − B)n), and innovations' variance 2s⁴/n independent of both.
    double s2 = same / n * (1 - slope * slope);
    double byKappa = -1 / (slope * history.step());
    double logRatio = byKappa / kappa + 2 * slope / (1 - slope * slope);
    double[] variances = {
      same / n * (1 + slope) / ((1 - slope) * n), (1 - slope * slope) / n, 2 * s2 * s2 / n
    };
    Precision precision =
        Precision.of(
            delta(
                variances,
                new double[] {0, byKappa, 0},
                new double[] {1, 0, 0},
                new double[] {0, 0.5 * sigma * logRatio, 0.5 * sigma / s2}));
    Regression line = overMeanStep(history, law, precision);
    return new Reverting(
        sample, HistoryMethod.YULE_WALKER, law, line, logLikelihood, precision, List.of());
  }

  /** The regression that the law implies over the mean step, errors by the delta method. */
  private static Regression overMeanStep(RateHistory history, RateLaw law, Precision precision) {
    double step = history.step();
    double below = -Math.expm1(-law.meanReversion() * step);
    double slope = Math.exp(-law.meanReversion() * step);
    double byKappa = law.longRunMean() * step * slope;
    double[][] c = precision.covariance();
    double variance =
        byKappa * byKappa * c[0][0] + 2 * byKappa * below * c[0][1] + below * below * c[1][1];
    return new Regression(
        law.longRunMean() * below,
        slope,
        law.conditional(0, step).standardDeviation(),
        Math.sqrt(Math.max(0, variance)),
        step * slope * precision.meanReversionError());
  }
}
