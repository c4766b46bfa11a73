package ebbline.model;

import java.util.Objects;

/**
 * How the moments of the state move with mean reversion and with the volatility of each step. All
 * derivatives are analytic and smooth through a = 0. Immutable.
 */
public final class MomentSlopes {
  private final GaussianRates rates;
  private final double a;
  private final VolatilitySteps steps;

  private MomentSlopes(GaussianRates rates) {
    this.rates = Objects.requireNonNull(rates, "rates");
    this.a = rates.meanReversion();
    this.steps = rates.volatility();
  }

  public static MomentSlopes of(GaussianRates rates) {
    return new MomentSlopes(rates);
  }

  /** ∂G(τ)/∂a. */
  public double ofG(double tau) {
    return Reversion.slopeOfG(a, tau);
  }

  /**
   * Adds {@code weight} × ∂y(t)/∂σ of every step.
   *
   * @param byVolatility one entry a step
   * @return {@code weight} × ∂y(t)/∂a
   */
  public double addVariance(double t, double weight, double[] byVolatility) {
    double byReversion = 0;
    for (int i = 0; i < steps.count() && steps.from(i) < t; i++) {
      double end = Math.min(t, steps.until(i));
      double h = end - steps.from(i);
      double sigma = steps.value(i);
      double decay = Math.exp(-2 * a * (t - end));
      double g = Reversion.g(2 * a, h);
      byVolatility[i] += weight * 2 * sigma * decay * g;
      byReversion += sigma * sigma * decay * 2 * (Reversion.slopeOfG(2 * a, h) - (t - end) * g);
    }
    return weight * byReversion;
  }

  /** As {@link #addVariance} for the variance of ∫ x over [from, to] given x(from). */
  public double addIntegralVariance(double from, double to, double weight, double[] byVolatility) {
    double byReversion = 0;
    for (int i = 0; i < steps.count() && steps.from(i) < to; i++) {
      double start = Math.max(from, steps.from(i));
      double end = Math.min(to, steps.until(i));
      if (!(start < end)) {
        continue;
      }
      double h = end - start;
      double sigma = steps.value(i);
      double g = rates.g(to - end);
      double gSlope = Reversion.slopeOfG(a, to - end);
      double decay = Math.exp(-a * (to - end));
      double decaySlope = -(to - end) * decay;
      double first = Reversion.integralOfG(a, h);
      double second = Reversion.integralOfSquare(a, h);
      byVolatility[i] +=
          weight * 2 * sigma * (g * g * h + 2 * g * decay * first + decay * decay * second);
      byReversion +=
          sigma
              * sigma
              * (2 * g * gSlope * h
                  + 2
                      * (gSlope * decay * first
                          + g * decaySlope * first
                          + g * decay * Reversion.slopeOfIntegral(a, h))
                  + 2 * decay * decaySlope * second
                  + decay * decay * Reversion.slopeOfSquare(a, h));
    }
    return weight * byReversion;
  }
}
