package ebbline.curve;

/**
 * Svensson's zero curve, z(t) = β₀ + β₁ slope(t/τ₁) + β₂ curvature(t/τ₁) + β₃ curvature(t/τ₂)
 * [Svensson 1994, NBER working paper 4871]; without the last term Nelson and Siegel's [1987, J. of
 * Business 60(4)].
 */
public final class SvenssonCurve implements DiscountCurve {
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
    for (double beta : new double[] {beta0, beta1, beta2, beta3}) {
      if (!Double.isFinite(beta)) {
        throw new IllegalArgumentException("betas must be finite, found " + beta);
      }
    }
    for (double tau : new double[] {tau1, tau2}) {
      if (!(tau > 0 && Double.isFinite(tau))) {
        throw new IllegalArgumentException("taus must be positive years, found " + tau);
      }
    }
    return new SvenssonCurve(beta0, beta1, beta2, beta3, tau1, tau2);
  }

  /** Nelson and Siegel's curve: no second hump. */
  public static SvenssonCurve nelsonSiegel(double beta0, double beta1, double beta2, double tau1) {
    return of(beta0, beta1, beta2, 0, tau1, tau1);
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
    double v = t / tau2;
    return beta0 + (beta1 + beta2 * u) * Math.exp(-u) + beta3 * v * Math.exp(-v);
  }

  @Override
  public double forwardSlope(double t) {
    double u = t / tau1;
    double v = t / tau2;
    return (beta2 * (1 - u) - beta1) * Math.exp(-u) / tau1 + beta3 * (1 - v) * Math.exp(-v) / tau2;
  }

  @Override
  public double[] nodes() {
    return new double[0];
  }

  @Override
  public void addLogDiscountGradient(double t, double weight, double[] gradient) {
    if (gradient.length != 0) {
      throw new IllegalArgumentException("a curve from a formula has no nodes");
    }
  }

  @Override
  public double[] breaks() {
    return new double[] {0};
  }

  @Override
  public boolean hasContinuousForward() {
    return true;
  }
}
