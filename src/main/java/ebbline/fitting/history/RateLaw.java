package ebbline.fitting.history;

import ebbline.model.NormalLaw;
import ebbline.model.Vasicek;

/**
 * The estimated law of the rate, dr = κ(θ − r)dt + σ dW under the historical measure, and what
 * follows from it at any horizon.
 *
 * @param meanReversion κ, per year, positive
 * @param longRunMean θ, decimal per year
 * @param volatility σ, per year^(3/2), at least 0
 */
public record RateLaw(double meanReversion, double longRunMean, double volatility) {

  public RateLaw {
    if (!(meanReversion > 0 && Double.isFinite(meanReversion))) {
      throw new IllegalArgumentException("mean reversion must be positive, found " + meanReversion);
    }
    if (!Double.isFinite(longRunMean)) {
      throw new IllegalArgumentException("the long-run mean must be finite, found " + longRunMean);
    }
    if (!(volatility >= 0 && Double.isFinite(volatility))) {
      throw new IllegalArgumentException("volatility must be at least 0, found " + volatility);
    }
  }

  /** Years until half of a distance from the mean is gone, ln 2/κ. */
  public double halfLife() {
    return Math.log(2) / meanReversion;
  }

  /** The law of the rate after very long: mean θ, variance σ²/2κ. */
  public NormalLaw stationary() {
    return new NormalLaw(longRunMean, volatility / Math.sqrt(2 * meanReversion));
  }

  /**
   * The law of the rate {@code horizon} years after it was {@code rate}.
   *
   * @param horizon years, at least 0
   */
  public NormalLaw conditional(double rate, double horizon) {
    if (!(horizon >= 0 && Double.isFinite(horizon))) {
      throw new IllegalArgumentException("a horizon must be at least 0, found " + horizon);
    }
    double moved = -Math.expm1(-meanReversion * horizon);
    double variance = Decay.at(2 * meanReversion * horizon).g * horizon;
    return new NormalLaw(rate + moved * (longRunMean - rate), volatility * Math.sqrt(variance));
  }

  /** The model of this law, historical measure, with the rate now at {@code shortRate}. */
  public Vasicek from(double shortRate) {
    return new Vasicek(shortRate, longRunMean, meanReversion, volatility);
  }
}
