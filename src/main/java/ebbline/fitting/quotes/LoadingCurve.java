package ebbline.fitting.quotes;

import ebbline.curve.DiscountCurve;
import ebbline.curve.SvenssonCurve;

/**
 * A parametric curve whose nodes, as far as sensitivities go, are its betas and then its ln τ: so
 * the equations of quotes give their derivatives by the parameters as they do by nodes.
 */
final class LoadingCurve implements DiscountCurve {
  private final double[] betas;
  private final double[] taus;

  LoadingCurve(double[] betas, double[] logTaus) {
    this.betas = betas;
    taus = new double[logTaus.length];
    for (int i = 0; i < taus.length; i++) {
      taus[i] = Math.exp(logTaus[i]);
    }
  }

  static SvenssonCurve curve(double[] betas, double[] logTaus) {
    double tau1 = Math.exp(logTaus[0]);
    return betas.length == 3
        ? SvenssonCurve.nelsonSiegel(betas[0], betas[1], betas[2], tau1)
        : SvenssonCurve.of(betas[0], betas[1], betas[2], betas[3], tau1, Math.exp(logTaus[1]));
  }

  /** Fills the zero rate's derivatives by the betas. */
  static void fillLoadings(double t, double[] taus, double[] loadings) {
    loadings[0] = 1;
    loadings[1] = SvenssonCurve.slopeLoading(t, taus[0]);
    loadings[2] = SvenssonCurve.curvatureLoading(t, taus[0]);
    if (taus.length == 2) {
      loadings[3] = SvenssonCurve.curvatureLoading(t, taus[1]);
    }
  }

  /** ∂ zero rate/∂ ln τₖ: ∂ slope = curvature, ∂ curvature = curvature − u e^(−u). */
  static double byLogTau(double t, double[] betas, double[] taus, int k) {
    double curvature = SvenssonCurve.curvatureLoading(t, taus[k]);
    double u = t / taus[k];
    double bent = curvature - u * Math.exp(-u);
    return k == 0 ? betas[1] * curvature + betas[2] * bent : betas[3] * bent;
  }

  @Override
  public double logDiscount(double t) {
    double[] loadings = new double[betas.length];
    fillLoadings(t, taus, loadings);
    double zero = 0;
    for (int k = 0; k < betas.length; k++) {
      zero += betas[k] * loadings[k];
    }
    return -t * zero;
  }

  @Override
  public void addLogDiscountGradient(double t, double weight, double[] gradient) {
    double[] loadings = new double[betas.length];
    fillLoadings(t, taus, loadings);
    for (int k = 0; k < loadings.length; k++) {
      gradient[k] -= weight * t * loadings[k];
    }
    for (int k = 0; k < taus.length; k++) {
      gradient[betas.length + k] -= weight * t * byLogTau(t, betas, taus, k);
    }
  }

  @Override
  public double forward(double t) {
    return asCurve().forward(t);
  }

  @Override
  public double forwardSlope(double t) {
    return asCurve().forwardSlope(t);
  }

  private SvenssonCurve asCurve() {
    double[] logs = new double[taus.length];
    for (int k = 0; k < logs.length; k++) {
      logs[k] = Math.log(taus[k]);
    }
    return curve(betas, logs);
  }

  @Override
  public double[] nodes() {
    return new double[0];
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
