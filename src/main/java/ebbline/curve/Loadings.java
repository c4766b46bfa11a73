package ebbline.curve;

/**
 * The shapes of which parametric zero curves are made, as functions of u = t/τ and smooth at u = 0:
 * slope (1 − e^(−u))/u, curvature slope − e^(−u).
 */
final class Loadings {
  private Loadings() {}

  static double slope(double u) {
    return u == 0 ? 1 : -Math.expm1(-u) / u;
  }

  /**
   * (1 − e^(−u))/u − e^(−u). Below 1 its terms cancel, so it is summed as e^(−u) Σ_{k≥1}
   * u^k/(k+1)!, all terms positive.
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
}
