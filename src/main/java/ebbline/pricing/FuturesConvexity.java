package ebbline.pricing;

import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;

/**
 * How far a futures rate lies above the forward rate for the same period, continuous compounding.
 */
public final class FuturesConvexity {
  private FuturesConvexity() {}

  /**
   * (G(τ)/τ) [G(τ)(1 − e^(−2aT₁)) + 2a G(T₁)²] σ²/(4a), τ = T₂ − T₁. Kirikos and Novak 1997, Risk
   * 10(3).
   *
   * @param meanReversion a, per year; may be 0
   * @param volatility σ, per year^(3/2)
   * @param start T₁, years
   * @param end T₂, years, after start
   */
  public static double gaussian(double meanReversion, double volatility, double start, double end) {
    check(start, end);
    GaussianRates rates =
        new HullWhite(meanReversion, VolatilitySteps.constant(volatility))
            .on(new Vasicek(0, 0, 0, 0).rates().curve());
    double g = rates.g(end - start);
    double reached = rates.g(start);
    // (1 − e^(−2aT₁))/2a times σ² is the state's variance, so nothing is divided by a.
    return g
        / (end - start)
        * 0.5
        * (g * rates.variance(start) + volatility * volatility * reached * reached);
  }

  /** ½σ²T₁T₂, the case without mean reversion. */
  public static double withoutReversion(double volatility, double start, double end) {
    check(start, end);
    return 0.5 * volatility * volatility * start * end;
  }

  private static void check(double start, double end) {
    if (!(start >= 0 && end > start)) {
      throw new IllegalArgumentException(
          "a rate's period starts today or later and has a length, found " + start + " to " + end);
    }
  }
}
