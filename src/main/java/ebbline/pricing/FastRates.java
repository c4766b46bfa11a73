package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.model.GaussianRates;

/** The two functions of a Gaussian short rate that options need, prepared for many calls. */
final class FastRates {
  final DiscountCurve curve;
  private final double reversion;
  private final double inverse;
  private final double[] starts;
  private final double[] squares;
  private final double[] reached;

  FastRates(GaussianRates rates) {
    curve = rates.curve();
    // Below this aτ is nothing, and 1/a would overflow.
    reversion = Math.abs(rates.meanReversion()) < 1e-290 ? 0 : rates.meanReversion();
    inverse = reversion == 0 ? 0 : 1 / reversion;
    int n = rates.volatility().count();
    starts = new double[n];
    squares = new double[n];
    reached = new double[n];
    for (int i = 0; i < n; i++) {
      starts[i] = rates.volatility().from(i);
      squares[i] = rates.volatility().value(i) * rates.volatility().value(i);
      reached[i] = rates.variance(starts[i]);
    }
  }

  /** G(τ). */
  double g(double tau) {
    return decay(reversion, inverse, tau);
  }

  /** √y(t). */
  double deviation(double t) {
    int i = starts.length - 1;
    while (i > 0 && starts[i] >= t) {
      i--;
    }
    double h = t - starts[i];
    double y = squares[i] * decay(2 * reversion, 0.5 * inverse, h);
    if (i > 0) {
      y += reached[i] * Math.exp(-2 * reversion * h);
    }
    return Math.sqrt(y);
  }

  /** out[i] = G(τ[i]); {@code out} may not be {@code tau}. */
  void g(double[] tau, double[] work, double[] out, int n) {
    if (reversion == 0) {
      System.arraycopy(tau, 0, out, 0, n);
      return;
    }
    scale(tau, -reversion, work, n);
    FastExp.expm1(work, out, n);
    scale(out, -inverse, out, n);
  }

  /** out[i] = √y(t[i]). */
  void deviation(double[] t, double[] work, double[] out, int n) {
    if (starts.length > 1 || reversion == 0) {
      for (int i = 0; i < n; i++) {
        out[i] = deviation(t[i]);
      }
      return;
    }
    scale(t, -2 * reversion, work, n);
    FastExp.expm1(work, out, n);
    double factor = -0.5 * squares[0] * inverse;
    for (int i = 0; i < n; i++) {
      out[i] = Math.sqrt(factor * out[i]);
    }
  }

  private static void scale(double[] x, double factor, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = factor * x[i];
    }
  }

  /** (1 − e^(−aτ))/a, from 1/a. */
  private static double decay(double a, double inverse, double tau) {
    return a == 0 ? tau : -inverse * FastExp.expm1(-a * tau);
  }
}
