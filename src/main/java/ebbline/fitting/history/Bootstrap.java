package ebbline.fitting.history;

import ebbline.fitting.history.HistoryEstimate.Reverting;
import java.util.Arrays;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Parametric bootstrap of an estimate: histories drawn from the estimated law at the same times,
 * each estimated by the same method. The same seed gives the same figures.
 */
public final class Bootstrap {
  private final Reverting estimate;
  private final double[] meanReversion;
  private final double[] longRunMean;
  private final double[] volatility;
  private final int withoutReversion;
  private final double meanOfReversion;

  private Bootstrap(
      Reverting estimate,
      double[] meanReversion,
      double[] longRunMean,
      double[] volatility,
      int withoutReversion) {
    double sum = 0;
    for (double kappa : meanReversion) {
      sum += kappa;
    }
    this.meanOfReversion = sum / meanReversion.length;
    Arrays.sort(meanReversion);
    Arrays.sort(longRunMean);
    Arrays.sort(volatility);
    this.estimate = estimate;
    this.meanReversion = meanReversion;
    this.longRunMean = longRunMean;
    this.volatility = volatility;
    this.withoutReversion = withoutReversion;
  }

  /** Draws and estimates; the first rate of each drawn history comes from the stationary law. */
  public static Bootstrap of(RateHistory history, Reverting estimate, Resampling resampling) {
    UniformRandomProvider random = RandomSource.XO_SHI_RO_256_PP.create(resampling.seed());
    ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
    Draw draw = new Draw(history, estimate.law());
    int count = resampling.replications();
    double[] kappa = new double[count];
    double[] theta = new double[count];
    double[] sigma = new double[count];
    int without = 0;
    int done = 0;
    for (int k = 0; k < count; k++) {
      RateHistory drawn = history.withRates(draw.next(normal));
      double[] found = PlainEstimate.of(drawn, estimate.method());
      if (found.length == 0) {
        continue;
      }
      if (!(found[0] > 0)) {
        without++;
      }
      kappa[done] = found[0];
      theta[done] = found[1];
      sigma[done++] = found[2];
    }
    return new Bootstrap(
        estimate,
        Arrays.copyOf(kappa, done),
        Arrays.copyOf(theta, done),
        Arrays.copyOf(sigma, done),
        without);
  }

  /** Exact draws at the times of a history. */
  private static final class Draw {
    private final double[] moved;
    private final double[] sd;
    private final RateLaw law;
    private final boolean regular;
    private final int size;

    Draw(RateHistory history, RateLaw law) {
      this.law = law;
      this.size = history.size();
      this.regular = history.isRegular();
      int laws = regular ? 1 : size - 1;
      this.moved = new double[laws];
      this.sd = new double[laws];
      for (int i = 0; i < laws; i++) {
        double step = regular ? history.step() : history.time(i + 1) - history.time(i);
        moved[i] = -Math.expm1(-law.meanReversion() * step);
        sd[i] = law.conditional(0, step).standardDeviation();
      }
    }

    double[] next(ZigguratSampler.NormalizedGaussian normal) {
      double[] rates = new double[size];
      double off = law.stationary().standardDeviation() * normal.sample();
      rates[0] = law.longRunMean() + off;
      for (int i = 1; i < size; i++) {
        int j = regular ? 0 : i - 1;
        off += sd[j] * normal.sample() - moved[j] * off;
        rates[i] = law.longRunMean() + off;
      }
      return rates;
    }
  }

  /** Draws that could be estimated. */
  public int replications() {
    return meanReversion.length;
  }

  /** Draws whose estimate showed no mean reversion, although their law has one. */
  public int withoutReversion() {
    return withoutReversion;
  }

  /** Mean estimate of κ over the draws, less the κ they were drawn with. */
  public double meanReversionBias() {
    return meanOfReversion - estimate.law().meanReversion();
  }

  /** From quantile to quantile of the draws; not centred on the estimate, which is biased. */
  public Interval meanReversionPercentiles(double confidence) {
    return percentiles(meanReversion, confidence);
  }

  /** From quantile to quantile of the draws. */
  public Interval longRunMeanPercentiles(double confidence) {
    return percentiles(longRunMean, confidence);
  }

  /** From quantile to quantile of the draws. */
  public Interval volatilityPercentiles(double confidence) {
    return percentiles(volatility, confidence);
  }

  private static Interval percentiles(double[] sorted, double confidence) {
    Interval.requireConfidence(confidence);
    double tail = 0.5 * (1 - confidence);
    return Interval.of(
        ReversionLaw.quantile(sorted, tail), ReversionLaw.quantile(sorted, 1 - tail), confidence);
  }

  /** The estimate divided by its relative error, quantile by quantile: free of its bias. */
  Interval volatilityByRatio(double confidence) {
    Interval draws = percentiles(volatility, confidence);
    double square = estimate.law().volatility() * estimate.law().volatility();
    return Interval.of(
        square / draws.high().orElseThrow(), square / draws.low().orElseThrow(), confidence);
  }
}
