package ebbline.fitting.history;

import java.util.Arrays;
import java.util.Map;
import java.util.TreeMap;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * The sampling laws of two statistics of the regression, simulated at a given reversion: the t
 * ratio of the slope, and the likelihood ratio of the mean. Both are free of θ and σ.
 *
 * <p>Every reversion is simulated with the same normal draws, so quantiles move smoothly with it.
 */
final class ReversionLaw {
  /*
   * The laws depend on reversion × span, and beyond a thousand steps hardly on the number of steps
   * (differences are of order 1/n, below the noise of the quantiles); longer histories are
   * simulated with MOST steps over the same span.
   */
  private static final int MOST = 1000;

  private final int steps;
  private final Resampling resampling;
  private final Map<Double, Draws> known = new TreeMap<>();

  ReversionLaw(int transitions, Resampling resampling) {
    this.steps = Math.min(transitions, MOST);
    this.resampling = resampling;
  }

  /** Sorted draws. */
  static final class Draws {
    private final double[] ratio;
    private final double[] likelihood;

    private Draws(double[] ratio, double[] likelihood) {
      Arrays.sort(ratio);
      Arrays.sort(likelihood);
      this.ratio = ratio;
      this.likelihood = likelihood;
    }

    /** Of (slope − true slope)/standard error. */
    double ratioQuantile(double p) {
      return quantile(ratio, p);
    }

    /** Of n ln(SSR with the true mean / SSR). */
    double likelihoodQuantile(double p) {
      return quantile(likelihood, p);
    }

    /** Share of ratios at or below {@code t}, counting the observed one too. */
    double shareBelow(double t) {
      int count = 0;
      while (count < ratio.length && ratio[count] <= t) {
        count++;
      }
      return (count + 1.0) / (ratio.length + 1.0);
    }
  }

  /** The p-quantile of sorted values, linear between them with ends at 0 and n + 1. */
  static double quantile(double[] sorted, double p) {
    double place = p * (sorted.length + 1) - 1;
    int below = (int) Math.floor(place);
    if (below < 0) {
      return sorted[0];
    }
    if (below >= sorted.length - 1) {
      return sorted[sorted.length - 1];
    }
    return sorted[below] + (place - below) * (sorted[below + 1] - sorted[below]);
  }

  /**
   * Draws at a reversion.
   *
   * @param timesSpan mean reversion × span of the history, at least 0
   */
  Draws at(double timesSpan) {
    return known.computeIfAbsent(timesSpan, this::simulate);
  }

  private Draws simulate(double timesSpan) {
    UniformRandomProvider random = RandomSource.XO_SHI_RO_256_PP.create(resampling.seed());
    ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
    int count = resampling.replications();
    double[] ratio = new double[count];
    double[] likelihood = new double[count];
    double below = -Math.expm1(-timesSpan / steps);
    // Distance of the first rate from the mean, in innovations; without reversion there is no
    // mean, and the ratio does not depend on where a walk starts.
    double spread = below > 0 ? 1 / Math.sqrt(below * (2 - below)) : 0;
    for (int k = 0; k < count; k++) {
      double first = spread * normal.sample();
      // y is measured from the first rate, which keeps digits where spread is large.
      double y = 0;
      double sum = 0;
      double squares = 0;
      double changes = 0;
      for (int i = 0; i < steps; i++) {
        sum += y;
        squares += y * y;
        double change = normal.sample() - below * (y + first);
        changes += change * change;
        y += change;
      }
      double cross = 0.5 * (y * y - changes);
      double mean = sum / steps;
      double move = y / steps;
      double sxx = squares - sum * mean;
      double sxd = cross - sum * move;
      double slope = sxd / sxx;
      double residuals = changes - y * move - slope * sxd;
      ratio[k] = (slope + below) * Math.sqrt(sxx * (steps - 2) / residuals);
      // With the true mean: regression of the change on y + first, no constant.
      double sxxMean = squares + 2 * first * sum + steps * first * first;
      double sxdMean = cross + first * y;
      double known = changes - sxdMean * sxdMean / sxxMean;
      // Without reversion the mean is infinitely far away, and what is left of it is a drift.
      double restricted = below > 0 ? known : changes - y * move;
      likelihood[k] = steps * Math.log(restricted / residuals);
    }
    return new Draws(ratio, likelihood);
  }
}
