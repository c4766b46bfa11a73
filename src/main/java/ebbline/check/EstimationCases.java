package ebbline.check;

import ebbline.fitting.MarketPriceOfRisk;
import ebbline.fitting.history.DickeyFuller;
import ebbline.fitting.history.HistoryEstimate.Regression;
import ebbline.fitting.history.HistoryEstimate.Reverting;
import ebbline.fitting.history.HistoryEstimator;
import ebbline.fitting.history.HistoryMethod;
import ebbline.fitting.history.RateHistory;
import ebbline.model.Vasicek;
import java.util.Optional;

/** The model from histories: the daily bill example, the 21-point path, critical values. */
final class EstimationCases implements ShortRateCases.Computation {
  private static final double DAYS = 250;

  private static final String SIMULATED =
      "the table was simulated; this is MacKinnon's response surface of 2010";

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in) {
    String id = c.id();
    if (id.startsWith("EST-VDB-")) {
      return Optional.of(path(c, in, id.substring("EST-VDB-".length())));
    } else if (id.startsWith("EST-HULL31.4-R(")) {
      String years = id.substring("EST-HULL31.4-R(".length(), id.length() - 1);
      return Optional.of(zeroRate(c, in, Double.parseDouble(years)));
    } else if (id.equals("EST-HULL31.4-lambda")) {
      return Optional.of(priceOfRisk(c, in));
    } else if (id.startsWith("EST-HULL31.4-")) {
      return Optional.of(bills(c, id.substring("EST-HULL31.4-".length())));
    } else if (id.startsWith("EST-DF-")) {
      return Optional.of(criticalValue(c, in));
    }
    return Optional.empty();
  }

  private static Reverting estimate(RateHistory history, HistoryMethod method) {
    return (Reverting) HistoryEstimator.estimate(history, method);
  }

  private static CaseResult path(PublishedCase c, CaseInputs in, String part) {
    RateHistory history = RateHistory.ofStep(in.number("dt"), in.numbers("S"));
    Reverting ols = estimate(history, HistoryMethod.OLS);
    return switch (part) {
      case "lambda" -> CaseResult.of(c, "mean reversion", ols.law().meanReversion());
      case "mu" -> CaseResult.of(c, "long-run mean", ols.law().longRunMean());
      case "sigma_LS(n-2)" ->
          CaseResult.of(c, "volatility by least squares", ols.law().volatility());
      case "sigma_ML" ->
          CaseResult.of(
              c,
              "volatility by highest likelihood",
              estimate(history, HistoryMethod.EXACT).law().volatility());
      case "regr_slope" -> CaseResult.of(c, "slope", ols.regression().slope());
      case "regr_intercept" -> CaseResult.of(c, "intercept", ols.regression().intercept());
      default -> CaseResult.of(c, "residual deviation", ols.regression().residualSd());
    };
  }

  /*
   * The source regresses the change on the rate and reads a and sigma off to first order in the
   * step; the estimate's own, exact in the step, are 0.13617 and 0.01192 to its digits.
   */
  private static CaseResult bills(PublishedCase c, String part) {
    RateHistory history = RateHistory.ofStep(1 / DAYS, PublishedSeries.dailyBills());
    Reverting ols = estimate(history, HistoryMethod.OLS);
    Regression line = ols.regression();
    return switch (part) {
      case "intercept" -> CaseResult.of(c, "intercept of the change", line.intercept());
      case "slope" -> CaseResult.of(c, "slope of the change", line.slope() - 1);
      case "se" -> CaseResult.of(c, "standard error of the regression", line.residualSd());
      case "a" -> CaseResult.of(c, "mean reversion, first order", (1 - line.slope()) * DAYS);
      case "b*" -> CaseResult.of(c, "long-run mean", ols.law().longRunMean());
      default -> CaseResult.of(c, "volatility, first order", line.residualSd() * Math.sqrt(DAYS));
    };
  }

  private static Vasicek historical(CaseInputs in) {
    String today = in.text("r0"); // the rate, a blank, and where it is from
    double shortRate = Double.parseDouble(today.substring(0, today.indexOf(' ')));
    return new Vasicek(shortRate, in.number("b_star"), in.number("a"), in.number("sigma"));
  }

  private static CaseResult zeroRate(PublishedCase c, CaseInputs in, double years) {
    Vasicek pricing = historical(in).riskNeutral(in.number("lam"));
    return CaseResult.of(
        c, "zero rate of " + years + " years, per cent", 100 * pricing.rates().curve().zero(years));
  }

  private static CaseResult priceOfRisk(PublishedCase c, CaseInputs in) {
    CaseInputs market = in.object("market");
    double[] times = market.names().stream().mapToDouble(Double::parseDouble).sorted().toArray();
    double[] rates = new double[times.length];
    for (String name : market.names()) {
      int at = java.util.Arrays.binarySearch(times, Double.parseDouble(name));
      rates[at] = market.number(name) / 100;
    }
    return CaseResult.of(
        c, "market price of risk", MarketPriceOfRisk.of(historical(in), times, rates).value());
  }

  private static CaseResult criticalValue(PublishedCase c, CaseInputs in) {
    int percent = (int) in.number("level");
    CaseResult result =
        CaseResult.of(
            c,
            "Dickey-Fuller critical value at " + percent + " %",
            DickeyFuller.criticalValue(percent, in.integer("T")));
    return result.verdict() == Verdict.SOURCE_ROUNDED ? result.shown(SIMULATED) : result;
  }
}
