package ebbline.model;

import ebbline.curve.DiscountCurve;
import java.util.Objects;

/**
 * The one-factor Gaussian short rate on top of a discount curve: r(t) = f(0,t) + x(t), dx = (y(t) −
 * a x) dt + σ(t) dW, x(0) = 0. Every pricer works against this type only.
 *
 * <p>Time in years, rates as decimals per year. Immutable.
 *
 * @param curve today's curve P(0,·)
 * @param meanReversion a, per year; finite, may be 0 or negative
 * @param volatility σ(·), per year^(3/2)
 */
public record GaussianRates(DiscountCurve curve, double meanReversion, VolatilitySteps volatility) {

  public GaussianRates {
    Objects.requireNonNull(curve, "curve");
    Objects.requireNonNull(volatility, "volatility");
    if (!Double.isFinite(meanReversion)) {
      throw new IllegalArgumentException("mean reversion must be finite, found " + meanReversion);
    }
  }

  /** G(τ) = (1 − e^(−aτ))/a, τ at a = 0. */
  public double g(double tau) {
    return decay(meanReversion, tau);
  }

  /** y(t), the variance of x(t): ∫₀ᵗ e^(−2a(t−s)) σ(s)² ds. */
  public double variance(double t) {
    double sum = 0;
    for (int i = 0; i < volatility.count() && volatility.from(i) < t; i++) {
      double from = volatility.from(i);
      double to = Math.min(t, volatility.until(i));
      double sigma = volatility.value(i);
      sum +=
          sigma
              * sigma
              * Math.exp(-2 * meanReversion * (t - to))
              * decay(2 * meanReversion, to - from);
    }
    return sum;
  }

  /** ln P(t,T | x), the bond for T seen from time t with the state at x. */
  public double logBond(double t, double maturity, double x) {
    double g = g(maturity - t);
    return curve.logDiscount(maturity) - curve.logDiscount(t) - x * g - 0.5 * variance(t) * g * g;
  }

  static double decay(double a, double tau) {
    double z = a * tau;
    return z == 0 ? tau : -Math.expm1(-z) / z * tau;
  }
}
