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
  /*
   * All moments are integrals of σ(s)² times a product of e^(−a(t−s)) and G(t−s). On one volatility step, with
   * τ = t − s running from τ₁ (the step's end) over a length h,
   *   G(τ₁ + u) = G(τ₁) + e^(−aτ₁) G(u),   ∫ e^(−aτ) G(τ) dτ = ½ [G²],
   * so each integral is a sum of positive terms: nothing cancels, whatever a is.
   */

  public GaussianRates {
    Objects.requireNonNull(curve, "curve");
    Objects.requireNonNull(volatility, "volatility");
    if (!Double.isFinite(meanReversion)) {
      throw new IllegalArgumentException("mean reversion must be finite, found " + meanReversion);
    }
  }

  /** G(τ) = (1 − e^(−aτ))/a, τ at a = 0. */
  public double g(double tau) {
    return Reversion.g(meanReversion, tau);
  }

  /** y(t), the variance of x(t): ∫₀ᵗ e^(−2a(t−s)) σ(s)² ds. */
  public double variance(double t) {
    return stateVariance(0, t);
  }

  /** ln P(t,T | x), the bond for T seen from time t with the state at x. */
  public double logBond(double t, double maturity, double x) {
    double g = g(maturity - t);
    return curve.logDiscount(maturity) - curve.logDiscount(t) - x * g - 0.5 * variance(t) * g * g;
  }

  /** Mean of x(t) under the risk-neutral measure, ∫₀ᵗ e^(−a(t−s)) y(s) ds, per year. */
  public double stateMean(double t) {
    return covariance(0, t);
  }

  /** α(t) = f(0,t) + mean of x(t): the mean of the short rate under the risk-neutral measure. */
  public double expectedShortRate(double t) {
    return curve.forward(t) + stateMean(t);
  }

  /**
   * θ(t) = ∂f(0,t)/∂t + a f(0,t) + y(t) of dr = (θ(t) − a r) dt + σ(t) dW, per year².
   *
   * @throws IllegalArgumentException if the curve's forward rate jumps, so that no such function
   *     exists
   */
  public double drift(double t) {
    if (curve.hasContinuousForward()) {
      return curve.forwardSlope(t) + meanReversion * curve.forward(t) + variance(t);
    }
    throw new IllegalArgumentException(
        "the drift is a function only where the forward rate is continuous, found an interpolation"
            + " whose forward rate jumps at its nodes");
  }

  /** Variance of ∫ x over [from, to] given x(from); with {@code from} 0, seen from today. */
  public double integralVariance(double from, double to) {
    double sum = 0;
    for (int i = 0; i < volatility.count() && volatility.from(i) < to; i++) {
      double start = Math.max(from, volatility.from(i));
      double end = Math.min(to, volatility.until(i));
      if (start < end) {
        double h = end - start;
        double sigma = volatility.value(i);
        double g = g(to - end);
        double decay = Math.exp(-meanReversion * (to - end));
        sum +=
            sigma
                * sigma
                * (g * g * h
                    + 2 * g * decay * Reversion.integralOfG(meanReversion, h)
                    + decay * decay * Reversion.integralOfSquare(meanReversion, h));
      }
    }
    return sum;
  }

  /** Variance of x(to) given x(from). */
  public double stateVariance(double from, double to) {
    double sum = 0;
    for (int i = 0; i < volatility.count() && volatility.from(i) < to; i++) {
      double start = Math.max(from, volatility.from(i));
      double end = Math.min(to, volatility.until(i));
      if (start < end) {
        double sigma = volatility.value(i);
        sum +=
            sigma
                * sigma
                * Math.exp(-2 * meanReversion * (to - end))
                * Reversion.g(2 * meanReversion, end - start);
      }
    }
    return sum;
  }

  /** Covariance of x(to) with ∫ x over [from, to], given x(from). */
  public double covariance(double from, double to) {
    double sum = 0;
    for (int i = 0; i < volatility.count() && volatility.from(i) < to; i++) {
      double start = Math.max(from, volatility.from(i));
      double end = Math.min(to, volatility.until(i));
      if (start < end) {
        double sigma = volatility.value(i);
        double difference = Math.exp(-meanReversion * (to - end)) * g(end - start);
        sum += 0.5 * sigma * sigma * difference * (g(to - start) + g(to - end));
      }
    }
    return sum;
  }

  /**
   * Variance of z(to) − z(from), z(t) = ∫₀ᵗ e^(as) σ(s) dW, the Gaussian martingale that drives all
   * bonds under any forward measure: ∫ e^(2as) σ(s)² ds.
   */
  public double martingaleVariance(double from, double to) {
    return Math.exp(2 * meanReversion * to) * stateVariance(from, to);
  }

  /** The joint law of x(to) and ∫ x over [from, to] given x(from), risk-neutral. */
  public StateStep step(double from, double to) {
    if (!(from >= 0 && to >= from && Double.isFinite(to))) {
      throw new IllegalArgumentException(
          "a step runs forward from today or later, found " + from + " to " + to);
    }
    double g = g(to - from);
    double decay = Math.exp(-meanReversion * (to - from));
    double y = variance(from);
    double covariance = covariance(from, to);
    double integral = integralVariance(from, to);
    return new StateStep(
        decay,
        g,
        y * decay * g + covariance,
        stateVariance(from, to),
        0.5 * y * g * g + 0.5 * integral,
        integral,
        covariance);
  }
}
