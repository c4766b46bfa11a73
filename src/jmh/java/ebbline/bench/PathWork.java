package ebbline.bench;

import ebbline.curve.FlatCurve;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import ebbline.pricing.simulation.Sampling;
import ebbline.pricing.simulation.Sampling.Points;
import ebbline.pricing.simulation.StatePaths;

/**
 * Exact joint paths of the state and its integral, 120 monthly steps under a = 0.05 and σ = 1.2 %:
 * the mean of e^(−∫x) over ten years, which is 1.
 */
final class PathWork {
  static final int STEPS = 120;

  /** 32 batches of 4,096. */
  static final int PATHS = 1 << 17;

  private final StatePaths paths;

  PathWork() {
    GaussianRates rates =
        new HullWhite(0.05, VolatilitySteps.constant(0.012)).on(FlatCurve.of(0.03));
    double[] times = new double[STEPS];
    for (int k = 0; k < STEPS; k++) {
      times[k] = (k + 1) / 12.0;
    }
    paths = StatePaths.of(rates, times);
  }

  double plain(int threads) {
    return mean(Points.PSEUDO_RANDOM, threads);
  }

  double mirrored() {
    return mean(Points.ANTITHETIC, 1);
  }

  double sobol() {
    return mean(Points.SOBOL, 1);
  }

  private double mean(Points points, int threads) {
    double[][] batches =
        paths.sums(new Sampling(points, PATHS, 42, threads), 1, () -> PathWork::add);
    double sum = 0;
    for (double[] batch : batches) {
      sum += batch[0];
    }
    return sum / PATHS;
  }

  private static void add(double[][] x, double[][] integral, int count, double[] sums) {
    double[] last = integral[STEPS - 1];
    for (int i = 0; i < count; i++) {
      sums[0] += Math.exp(-last[i]);
    }
  }
}
