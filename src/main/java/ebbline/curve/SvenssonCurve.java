package ebbline.curve;

/**
 * Svensson's zero curve, z(t) = β₀ + β₁ slope(t/τ₁) + β₂ curvature(t/τ₁) + β₃ curvature(t/τ₂)
 * [Svensson 1994, NBER working paper 4871]; without the last term Nelson and Siegel's [1987, J. of
 * Business 60(4)].
 */
public final class SvenssonCurve implements FormulaCurve {
  private final double beta0;
  private final double beta1;
  private final double beta2;
  private final double beta3;
  private final double tau1;
  private final double tau2;

  private SvenssonCurve(
      double beta0, double beta1, double beta2, double beta3, double tau1, double tau2) {
    this.beta0 = beta0;
    this.beta1 = beta1;
    this.beta2 = beta2;
    this.beta3 = beta3;
    this.tau1 = tau1;
    this.tau2 = tau2;
  }

  /**
   * @param beta0 level, and beta1 to beta3: continuously compounded rates, decimals per year
   * @param tau1 years, above 0
   * @param tau2 years, above 0
   * @throws IllegalArgumentException if a figure is not finite or a tau not positive
   */
  public static SvenssonCurve of(
      double beta0, double beta1, double beta2, double beta3, double tau1, double tau2) {
    Loadings.check(new double[] {beta0, beta1, beta2, beta3}, new double[] {tau1, tau2});
    return new SvenssonCurve(beta0, beta1, beta2, beta3, tau1, tau2);
  }

  /** Nelson and Siegel's curve: no second hump. */
  public static SvenssonCurve nelsonSiegel(double beta0, double beta1, double beta2, double tau1) {
    return of(beta0, beta1, beta2, 0, tau1, tau1);
  }

  /** (1 − e^(−u))/u at u = t/τ: how β₁ enters a zero rate. */
  public static double slopeLoading(double t, double tau) {
    return Loadings.slope(t / tau);
  }

  /** (1 − e^(−u))/u − e^(−u) at u = t/τ: how β₂ and β₃ enter a zero rate. */
  public static double curvatureLoading(double t, double tau) {
    return Loadings.curvature(t / tau);
  }

  /** β₀ to β₃. A fresh array. */
  public double[] betas() {
    return new double[] {beta0, beta1, beta2, beta3};
  }

  /** τ₁ and τ₂. A fresh array. */
  public double[] taus() {
    return new double[] {tau1, tau2};
  }

  @Override
  public double zero(double t) {
    double u = t / tau1;
    return beta0
        + beta1 * Loadings.slope(u)
        + beta2 * Loadings.curvature(u)
        + beta3 * Loadings.curvature(t / tau2);
  }

  @Override
  public double logDiscount(double t) {
    return -t * zero(t);
  }

  @Override
  public double forward(double t) {
    double u = t / tau1;
    return beta0
        + beta1 * Loadings.decay(u)
        + beta2 * Loadings.hump(u)
        + beta3 * Loadings.hump(t / tau2);
  }

  @Override
  public double forwardSlope(double t) {
    double u = t / tau1;
    return (beta2 * Loadings.humpSlope(u) - beta1 * Loadings.decay(u)) / tau1
        + beta3 * Loadings.humpSlope(t / tau2) / tau2;
  }
}
