package ebbline.fitting.quotes;

import java.util.Arrays;

/**
 * Tukey's biweight on residuals scaled by their median deviation: full weight at 0, none beyond
 * 4.685 deviations, 95 % efficient on normal errors.
 */
final class RobustWeights {
  private static final double REACH = 4.685;

  private RobustWeights() {}

  /**
   * The residuals' spread: their median size times 1.4826, which is the deviation of normal ones.
   */
  static double spread(double[] residuals) {
    double[] sizes = Arrays.stream(residuals).map(Math::abs).sorted().toArray();
    int n = sizes.length;
    double median = n % 2 == 1 ? sizes[n / 2] : 0.5 * (sizes[n / 2 - 1] + sizes[n / 2]);
    return 1.4826 * median;
  }

  static double weight(double residual, double spread) {
    double u = residual / (REACH * spread);
    double rest = 1 - u * u;
    return Math.abs(u) < 1 ? rest * rest : 0;
  }

  static boolean isOutlier(double residual, double spread) {
    return Math.abs(residual) >= REACH * spread;
  }
}
