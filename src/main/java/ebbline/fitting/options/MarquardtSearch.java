package ebbline.fitting.options;

/**
 * Levenberg and Marquardt's search for the least sum of squares, for a handful of parameters and
 * many residuals. The best point is kept whatever ends the search.
 */
final class MarquardtSearch {
  private static final double FIRST_DAMPING = 1e-3;
  private static final double LEAST_DAMPING = 1e-12;

  /** With steps this short nothing is left to gain that rounding does not hide. */
  private static final double MOST_DAMPING = 1e10;

  private static final double SHORT_STEP = 1e-11;

  private MarquardtSearch() {}

  /** Residuals with their slopes. */
  interface Problem {
    int residuals();

    int parameters();

    /**
     * @param residual filled
     * @param slopes filled, a row a parameter, a column a residual
     */
    void at(double[] point, double[] residual, double[][] slopes);
  }

  /**
   * Where a search ended.
   *
   * @param squares infinite where not even the start has a finite value
   * @param reason empty where it converged
   */
  @SuppressWarnings("ArrayRecordComponent")
  record Outcome(double[] point, double squares, int iterations, int evaluations, String reason) {
    boolean converged() {
      return reason.isEmpty();
    }
  }

  static Outcome minimise(Problem problem, double[] start, int iterations) {
    int p = problem.parameters();
    int n = problem.residuals();
    double[] point = start.clone();
    double[] residual = new double[n];
    double[][] slopes = new double[p][n];
    double[] nextResidual = new double[n];
    double[][] nextSlopes = new double[p][n];
    problem.at(point, residual, slopes);
    int evaluations = 1;
    double squares = squares(residual);
    if (!(squares < Double.POSITIVE_INFINITY)) {
      return new Outcome(
          point, Double.POSITIVE_INFINITY, 0, evaluations, "the start has no finite prices");
    }
    double damping = FIRST_DAMPING;
    double[][] normal = new double[p][p];
    double[] descent = new double[p];
    double[] next = new double[p];
    for (int iteration = 1; iteration <= iterations; iteration++) {
      normalEquations(residual, slopes, normal, descent);
      boolean moved = false;
      while (!moved) {
        double[] step = solve(normal, descent, damping);
        boolean still = true;
        for (int j = 0; j < p; j++) {
          next[j] = point[j] + step[j];
          still &= Math.abs(step[j]) <= SHORT_STEP * (1e-2 + Math.abs(point[j]));
        }
        if (still || damping > MOST_DAMPING) {
          return new Outcome(point, squares, iteration, evaluations, "");
        }
        problem.at(next, nextResidual, nextSlopes);
        evaluations++;
        double found = squares(nextResidual);
        if (found <= squares) {
          moved = true;
          squares = found;
          System.arraycopy(next, 0, point, 0, p);
          double[] r = residual;
          residual = nextResidual;
          nextResidual = r;
          double[][] s = slopes;
          slopes = nextSlopes;
          nextSlopes = s;
          damping = Math.max(LEAST_DAMPING, 0.1 * damping);
        } else {
          damping *= 10;
        }
      }
    }
    return new Outcome(
        point,
        squares,
        iterations,
        evaluations,
        "the errors still fell after " + iterations + " iterations");
  }

  /** NaN counts as infinite. */
  static double squares(double[] residual) {
    double sum = 0;
    for (double r : residual) {
      sum = Math.fma(r, r, sum);
    }
    return Double.isNaN(sum) ? Double.POSITIVE_INFINITY : sum;
  }

  private static void normalEquations(
      double[] residual, double[][] slopes, double[][] normal, double[] descent) {
    for (int i = 0; i < slopes.length; i++) {
      descent[i] = -dot(slopes[i], residual);
      for (int j = 0; j <= i; j++) {
        normal[i][j] = dot(slopes[i], slopes[j]);
        normal[j][i] = normal[i][j];
      }
    }
  }

  private static double dot(double[] one, double[] other) {
    double a = 0;
    double b = 0;
    int i = 0;
    for (; i + 1 < one.length; i += 2) {
      a = Math.fma(one[i], other[i], a);
      b = Math.fma(one[i + 1], other[i + 1], b);
    }
    return i < one.length ? Math.fma(one[i], other[i], a) + b : a + b;
  }

  /** Cholesky on the matrix scaled to a unit diagonal, damped; a direction without slope stays. */
  private static double[] solve(double[][] normal, double[] right, double damping) {
    int p = right.length;
    double[] scale = new double[p];
    for (int i = 0; i < p; i++) {
      scale[i] = normal[i][i] > 0 ? 1 / Math.sqrt(normal[i][i]) : 0;
    }
    double[][] lower = new double[p][p];
    for (int i = 0; i < p; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = i == j ? 1 + damping : normal[i][j] * scale[i] * scale[j];
        for (int k = 0; k < j; k++) {
          sum -= lower[i][k] * lower[j][k];
        }
        // 1 + damping less squares: above 0 but for rounding.
        lower[i][j] = i == j ? Math.sqrt(Math.max(sum, 1e-300)) : sum / lower[j][j];
      }
    }
    double[] x = new double[p];
    for (int i = 0; i < p; i++) {
      double sum = right[i] * scale[i];
      for (int k = 0; k < i; k++) {
        sum -= lower[i][k] * x[k];
      }
      x[i] = sum / lower[i][i];
    }
    for (int i = p - 1; i >= 0; i--) {
      double sum = x[i];
      for (int k = i + 1; k < p; k++) {
        sum -= lower[k][i] * x[k];
      }
      x[i] = sum / lower[i][i];
    }
    for (int i = 0; i < p; i++) {
      x[i] *= scale[i];
    }
    return x;
  }
}
