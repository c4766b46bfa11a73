package ebbline.risk;

import ebbline.model.NormalLaw;
import java.util.Arrays;

/**
 * What simulated values say of a law, and how far chance may have moved it.
 *
 * @param distribution of the sample
 * @param meanError standard error of its mean
 * @param distance largest distance between the sample's distribution and the exact law
 *     (Kolmogorov); above 1.63/√n once in 100 samples
 */
public record SampleLaw(Distribution distribution, double meanError, double distance) {

  /**
   * @param values at least two; sorted on return
   * @param exact the law they were drawn from
   */
  static SampleLaw of(double[] values, NormalLaw exact) {
    int n = values.length;
    double sum = 0;
    for (double value : values) {
      sum += value - exact.mean();
    }
    double off = sum / n;
    double squares = 0;
    for (double value : values) {
      double d = value - exact.mean() - off;
      squares += d * d;
    }
    double sd = Math.sqrt(squares / (n - 1));
    Arrays.sort(values);
    double[] quantiles = new double[HorizonLaw.SHARES.length];
    for (int i = 0; i < quantiles.length; i++) {
      quantiles[i] = quantile(values, HorizonLaw.SHARES[i]);
    }
    return new SampleLaw(
        new Distribution(
            exact.mean() + off,
            sd,
            quantiles[0],
            quantiles[1],
            quantiles[2],
            quantiles[3],
            quantiles[4],
            below(values, 0) / (double) n),
        sd / Math.sqrt(n),
        exact.standardDeviation() > 0 ? distance(values, exact) : 0);
  }

  /** Linear between sorted values, with the ends at 0 and n + 1. */
  private static double quantile(double[] sorted, double share) {
    double place = Math.max(0, Math.min(sorted.length - 1, share * (sorted.length + 1) - 1));
    int left = Math.min((int) place, sorted.length - 2);
    return sorted[left] + (place - left) * (sorted[left + 1] - sorted[left]);
  }

  private static int below(double[] sorted, double bound) {
    int low = 0;
    int high = sorted.length;
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (sorted[middle] < bound) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return low;
  }

  private static double distance(double[] sorted, NormalLaw exact) {
    int n = sorted.length;
    double largest = 0;
    for (int i = 0; i < n; i++) {
      double share = exact.probabilityBelow(sorted[i]);
      largest = Math.max(largest, Math.max((i + 1.0) / n - share, share - (double) i / n));
    }
    return largest;
  }
}
