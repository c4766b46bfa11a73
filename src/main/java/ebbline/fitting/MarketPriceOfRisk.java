package ebbline.fitting;

import ebbline.model.Vasicek;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/**
 * The market price of risk that brings a historical Vasicek model nearest to today's curve: least
 * squares in zero rates over λ alone, in which they are linear.
 *
 * @param value λ, per year^(1/2); below 0 where long bonds earn more than short ones
 * @param standardError from the errors of the curve's points, the historical estimate taken as
 *     known; absent for a single point
 * @param riskNeutral the model under the pricing measure, long-run mean θ − λσ/κ
 * @param quotes fitted zero rates at the points
 */
public record MarketPriceOfRisk(
    double value, OptionalDouble standardError, Vasicek riskNeutral, List<FittedQuote> quotes) {

  public MarketPriceOfRisk {
    quotes = List.copyOf(quotes);
  }

  /** Root of the mean squared error of the zero rates. */
  public double rmse() {
    double sum = 0;
    for (FittedQuote quote : quotes) {
      sum += quote.error() * quote.error();
    }
    return Math.sqrt(sum / quotes.size());
  }

  /**
   * Fits λ.
   *
   * @param historical with today's short rate, volatility and mean reversion not 0
   * @param times years, positive
   * @param zeroRates continuously compounded, decimals per year
   * @throws IllegalArgumentException in words if a rule above is broken
   */
  public static MarketPriceOfRisk of(Vasicek historical, double[] times, double[] zeroRates) {
    VasicekCurveFit.requirePoints(times, zeroRates);
    double sigma = historical.volatility();
    double kappa = historical.meanReversion();
    if (!(sigma > 0 && kappa != 0)) {
      throw new IllegalArgumentException(
          "a market price of risk needs a volatility above 0 and some mean reversion, found "
              + sigma
              + " and "
              + kappa);
    }
    double drift = kappa * (historical.longRunMean() - historical.shortRate());
    int n = times.length;
    double square = 0;
    double cross = 0;
    double[] weight = new double[n];
    double[] bare = new double[n];
    for (int i = 0; i < n; i++) {
      VasicekZero zero = VasicekZero.at(kappa * times[i]);
      bare[i] = zero.rate(times[i], drift, sigma, historical.shortRate());
      weight[i] = -sigma * zero.byDrift(times[i]);
      square += weight[i] * weight[i];
      cross += weight[i] * (zeroRates[i] - bare[i]);
    }
    double lambda = cross / square;
    List<FittedQuote> quotes = new ArrayList<>();
    double squares = 0;
    for (int i = 0; i < n; i++) {
      FittedQuote quote =
          new FittedQuote(
              VasicekCurveFit.label(times[i]), zeroRates[i], bare[i] + lambda * weight[i]);
      squares += quote.error() * quote.error();
      quotes.add(quote);
    }
    OptionalDouble error =
        n > 1 ? OptionalDouble.of(Math.sqrt(squares / (n - 1) / square)) : OptionalDouble.empty();
    return new MarketPriceOfRisk(lambda, error, historical.riskNeutral(lambda), quotes);
  }
}
