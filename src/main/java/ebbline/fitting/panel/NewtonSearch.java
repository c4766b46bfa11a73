package ebbline.fitting.panel;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;
import org.apache.commons.math3.linear.RealMatrix;

/** Climbs a smooth function by damped Newton steps; curvature by differences of its gradient. */
final class NewtonSearch {
  private NewtonSearch() {}

  /** A function with its gradient. */
  interface Hill {
    /**
     * The value at x, with its gradient written into {@code gradient}; not finite out of domain.
     */
    double at(double[] x, double[] gradient);
  }

  /**
   * Where the climb ended.
   *
   * @param converged whether no step could gain
   */
  @SuppressWarnings("ArrayRecordComponent")
  record Top(double[] x, double value, int iterations, boolean converged) {}

  /**
   * Climbs.
   *
   * @param scale size of each coordinate: differences are a ten-thousandth of it
   * @param longest a step never moves a coordinate farther than this many of its {@code scale}
   */
  static Top climb(Hill hill, double[] start, double[] scale, double longest, int iterations) {
    int n = start.length;
    double[] x = start.clone();
    double[] gradient = new double[n];
    double value = hill.at(x, gradient);
    double damping = 1e-3;
    for (int k = 1; k <= iterations; k++) {
      double[][] bend = curvature(hill, x, scale, 1e-4);
      boolean moved = false;
      while (damping < 1e12) {
        double[] step = step(bend, gradient, scale, damping);
        if (step.length == 0) {
          damping = Math.max(10 * damping, 1e-6);
          continue;
        }
        shorten(step, scale, longest);
        double[] next = new double[n];
        double gain = 0;
        double size = 0;
        for (int i = 0; i < n; i++) {
          next[i] = x[i] + step[i];
          gain += gradient[i] * step[i];
          size = Math.max(size, Math.abs(step[i]) / scale[i]);
        }
        double[] slope = new double[n];
        double there = hill.at(next, slope);
        if (there > value || (size < 1e-6 && there > value - 1e-11 * Math.abs(value))) {
          x = next;
          value = there;
          gradient = slope;
          damping = damping < 1e-9 ? 0 : damping / 10;
          moved = true;
          if (size < 1e-10 || gain < 1e-16 * Math.abs(value)) {
            return new Top(x, value, k, true);
          }
          break;
        }
        if (gain < 1e-13 * (1 + Math.abs(value))) {
          return new Top(x, value, k, true);
        }
        damping = Math.max(10 * damping, 1e-6);
      }
      if (!moved) {
        return new Top(x, value, k, false);
      }
    }
    return new Top(x, value, iterations, false);
  }

  /**
   * Minus the second derivatives, by central differences of the gradient, error of fourth order.
   */
  static double[][] curvature(Hill hill, double[] x, double[] scale, double share) {
    int n = x.length;
    double[][] bend = new double[n][n];
    double[] up = new double[n];
    double[] down = new double[n];
    for (int j = 0; j < n; j++) {
      for (int half = 1; half <= 2; half++) {
        double h = half * share * scale[j];
        double[] moved = x.clone();
        moved[j] = x[j] + h;
        hill.at(moved, up);
        moved[j] = x[j] - h;
        hill.at(moved, down);
        double weight = half == 1 ? 4.0 / 3 : -1.0 / 3;
        for (int i = 0; i < n; i++) {
          bend[i][j] -= weight * (up[i] - down[i]) / (2 * h);
        }
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        double mean = 0.5 * (bend[i][j] + bend[j][i]);
        bend[i][j] = mean;
        bend[j][i] = mean;
      }
    }
    return bend;
  }

  private static double[] step(double[][] bend, double[] gradient, double[] scale, double damping) {
    int n = gradient.length;
    RealMatrix matrix = new Array2DRowRealMatrix(n, n);
    double[] right = new double[n];
    for (int i = 0; i < n; i++) {
      right[i] = gradient[i] * scale[i];
      for (int j = 0; j < n; j++) {
        double value = bend[i][j] * scale[i] * scale[j];
        if (!Double.isFinite(value)) {
          return new double[0];
        }
        matrix.setEntry(i, j, value);
      }
      double own = Math.abs(bend[i][i]) * scale[i] * scale[i];
      matrix.addToEntry(i, i, damping * Math.max(own, 1));
    }
    try {
      double[] step =
          new CholeskyDecomposition(matrix, 1e-9, 1e-14)
              .getSolver()
              .solve(new ArrayRealVector(right, false))
              .toArray();
      for (int i = 0; i < n; i++) {
        step[i] *= scale[i];
      }
      return step;
    } catch (NonPositiveDefiniteMatrixException e) {
      return new double[0];
    }
  }

  private static void shorten(double[] step, double[] scale, double longest) {
    double size = 0;
    for (int i = 0; i < step.length; i++) {
      size = Math.max(size, Math.abs(step[i]) / scale[i]);
    }
    if (size > longest) {
      for (int i = 0; i < step.length; i++) {
        step[i] *= longest / size;
      }
    }
  }
}
