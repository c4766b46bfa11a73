package ebbline.curve;

/**
 * The shapes of which parametric zero curves are made, as functions of u = t/τ ≥ 0 and smooth at 0:
 * slope (1 − e^(−u))/u and curvature slope − e^(−u) of the zero rate, decay e^(−u) and hump u
 * e^(−u) of the forward.
 */
final class Loadings {
  /** e^(−u) is 0 from here on, whatever power of u stands before it. */
  private static final double GONE = 800;

  private Loadings() {}

  static double slope(double u) {
    return u == 0 ? 1 : -Math.expm1(-u) / u;
  }

  /**
   * (1 − e^(−u))/u − e^(−u). Below 1 its terms cancel, so it is summed as e^(−u) Σ_{k≥1}
   * u^k/(k+1)!, all terms positive; the 18th is below 1e-17 of the sum at u = 1.
   */
  static double curvature(double u) {
    if (u > 1) {
      return slope(u) - Math.exp(-u);
    }
    double sum = 0;
    double term = 1;
    for (int k = 1; k <= 18; k++) {
      term *= u / (k + 1);
      sum += term;
    }
    return Math.exp(-u) * sum;
  }

  static double decay(double u) {
    return Math.exp(-u);
  }

  static double hump(double u) {
    return u < GONE ? u * Math.exp(-u) : 0;
  }

  /** (1 − u) e^(−u), the derivative of the hump. */
  static double humpSlope(double u) {
    return u < GONE ? (1 - u) * Math.exp(-u) : 0;
  }

  /** Refuses what is no parameter of a parametric curve. */
  static void check(double[] betas, double[] taus) {
    for (double beta : betas) {
      if (!Double.isFinite(beta)) {
        throw new IllegalArgumentException("betas must be finite, found " + beta);
      }
    }
    for (double tau : taus) {
      if (!(tau > 0 && Double.isFinite(tau))) {
        throw new IllegalArgumentException("taus must be positive years, found " + tau);
      }
    }
  }
}
