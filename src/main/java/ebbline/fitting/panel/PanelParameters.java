package ebbline.fitting.panel;

import ebbline.model.Vasicek;

/**
 * Vasicek under both measures with measurement noise. Historical: dr = κ(θ − r)dt + σ dW; pricing:
 * drift κ(θ − r) − λσ.
 *
 * @param meanReversion κ, per year, positive
 * @param longRunMean θ, historical, decimal per year
 * @param volatility σ, per year^(3/2), positive
 * @param marketPriceOfRisk λ, per year^(1/2); below 0 where long bonds earn more than short ones
 * @param measurementSd standard deviation of each yield about its model value, positive
 */
public record PanelParameters(
    double meanReversion,
    double longRunMean,
    double volatility,
    double marketPriceOfRisk,
    double measurementSd) {

  public PanelParameters {
    if (!(meanReversion > 0
        && volatility > 0
        && measurementSd > 0
        && Double.isFinite(meanReversion + volatility + measurementSd))) {
      throw new IllegalArgumentException(
          "mean reversion, volatility and measurement noise must be positive, found "
              + meanReversion
              + ", "
              + volatility
              + " and "
              + measurementSd);
    }
    if (!Double.isFinite(longRunMean + marketPriceOfRisk)) {
      throw new IllegalArgumentException(
          "long-run mean and market price of risk must be finite, found "
              + longRunMean
              + " and "
              + marketPriceOfRisk);
    }
  }

  /** θ − λσ/κ, the long-run mean under the pricing measure. */
  public double pricingMean() {
    return longRunMean - marketPriceOfRisk * volatility / meanReversion;
  }

  /** The model under the historical measure, the rate now at {@code shortRate}. */
  public Vasicek historical(double shortRate) {
    return new Vasicek(shortRate, longRunMean, meanReversion, volatility);
  }

  /** The model under the pricing measure, the rate now at {@code shortRate}. */
  public Vasicek riskNeutral(double shortRate) {
    return historical(shortRate).riskNeutral(marketPriceOfRisk);
  }
}
