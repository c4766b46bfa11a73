package ebbline.curve;

/** The symmetric positive system Σⱼ H(uᵢ,uⱼ) wⱼ = sᵢ of Smith and Wilson's kernel, factorised. */
final class KernelSystem {
  private final double[][] kernel;
  private final double[][] factor;

  KernelSystem(double[] times, double speed) {
    int n = times.length;
    kernel = new double[n][n];
    factor = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        kernel[i][j] = SmithWilsonCurve.kernel(times[i], times[j], speed);
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = kernel[i][j];
        for (int k = 0; k < j; k++) {
          sum -= factor[i][k] * factor[j][k];
        }
        if (i > j) {
          factor[i][j] = sum / factor[j][j];
        } else if (sum > 0) {
          factor[i][i] = Math.sqrt(sum);
        } else {
          throw new IllegalArgumentException(
              "nodes must lie far enough apart for the speed of a smith-wilson curve, found "
                  + times[i]
                  + " with a speed of "
                  + speed);
        }
      }
    }
  }

  /** The solution, with one step of refinement. */
  double[] solve(double[] side) {
    double[] found = substitute(side);
    double[] rest = new double[side.length];
    for (int i = 0; i < rest.length; i++) {
      double sum = side[i];
      for (int j = 0; j < rest.length; j++) {
        sum = Math.fma(-kernel[i][j], found[j], sum);
      }
      rest[i] = sum;
    }
    double[] correction = substitute(rest);
    for (int i = 0; i < rest.length; i++) {
      found[i] += correction[i];
    }
    return found;
  }

  private double[] substitute(double[] side) {
    int n = side.length;
    double[] x = new double[n];
    for (int i = 0; i < n; i++) {
      double sum = side[i];
      for (int k = 0; k < i; k++) {
        sum -= factor[i][k] * x[k];
      }
      x[i] = sum / factor[i][i];
    }
    for (int i = n - 1; i >= 0; i--) {
      double sum = x[i];
      for (int k = i + 1; k < n; k++) {
        sum -= factor[k][i] * x[k];
      }
      x[i] = sum / factor[i][i];
    }
    return x;
  }
}
