package ebbline.fitting;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.fitting.history.HistoryEstimate.Reverting;
import ebbline.fitting.history.HistoryEstimator;
import ebbline.fitting.history.HistoryMethod;
import ebbline.fitting.history.RateHistory;
import ebbline.model.Vasicek;
import java.util.Map;
import org.junit.jupiter.api.Test;

/**
 * The daily Treasury bill example, Hull, Options, Futures, and Other Derivatives, 11th ed., Sec.
 * 31.4; the text misprints b* as 0.168.
 */
class MarketPriceOfRiskTest {
  private static final double[] TIMES = {0.5, 1, 2, 3, 5, 7, 10, 20, 30};
  private static final double[] MARKET = {0.45, 0.58, 0.74, 0.86, 1.15, 1.40, 1.55, 1.88, 2.24};
  private static final double[] PRINTED = {0.40, 0.49, 0.65, 0.80, 1.06, 1.27, 1.52, 2.02, 2.26};

  private static double[] decimals(double[] percent) {
    double[] result = percent.clone();
    for (int i = 0; i < result.length; i++) {
      result[i] /= 100;
    }
    return result;
  }

  @Test
  void thePublishedDailyHistoryGivesItsPrintedFigures() {
    ReferenceCsv table = ReferenceCsv.read("history/bill3m-daily.csv");
    RateHistory history = RateHistory.ofStep(1.0 / 250, decimals(table.column("dgs3mo_pct")));
    assertThat(history.size()).isEqualTo(8664);
    Reverting ols = (Reverting) HistoryEstimator.estimate(history, HistoryMethod.OLS);
    assertThat(ols.regression().slope() - 1).isCloseTo(-0.000545, within(5e-7));
    assertThat(ols.regression().residualSd()).isCloseTo(0.000754, within(5e-7));
    // The last digit printed is 5; the data give 9.143e-6.
    assertThat(ols.regression().intercept()).isCloseTo(0.00000915, within(1e-8));
    assertThat(ols.law().meanReversion()).isCloseTo(0.136, within(5e-4));
    assertThat(ols.law().longRunMean()).isCloseTo(0.0168, within(5e-5));
    assertThat(ols.law().volatility()).isCloseTo(0.0119, within(5e-5));
  }

  @Test
  void thePublishedMarketPriceOfRiskAndTableAreReproduced() {
    Vasicek historical = new Vasicek(0.0030, 0.0168, 0.136, 0.0119);
    MarketPriceOfRisk found = MarketPriceOfRisk.of(historical, TIMES, decimals(MARKET));
    assertThat(found.value()).isCloseTo(-0.175, within(5e-4));
    assertThat(found.value()).isCloseTo(-0.17479966, within(1e-8));
    assertThat(found.riskNeutral().longRunMean())
        .isCloseTo(0.0168 + 0.17479966 * 0.0119 / 0.136, within(1e-9));
    for (int i = 0; i < TIMES.length; i++) {
      // The table uses λ = −0.175.
      double rate = historical.riskNeutral(-0.175).rates().curve().zero(TIMES[i]);
      assertThat(100 * rate).isCloseTo(PRINTED[i], within(0.005));
      assertThat(found.quotes().get(i).fitted())
          .isCloseTo(found.riskNeutral().rates().curve().zero(TIMES[i]), within(1e-15));
    }
    assertThat(found.standardError().orElseThrow()).isBetween(0.001, 0.02);
  }

  @Test
  void theFitOfTheMeanAloneIsTheSameProblem() {
    Vasicek historical = new Vasicek(0.02, 0.03, 0.2, 0.01);
    double[] rates = decimals(MARKET);
    MarketPriceOfRisk found = MarketPriceOfRisk.of(historical, TIMES, rates);
    FitPoint mean =
        VasicekCurveFit.fit(
                TIMES,
                rates,
                Map.of(
                    Parameter.SHORT_RATE,
                    0.02,
                    Parameter.MEAN_REVERSION,
                    0.2,
                    Parameter.VOLATILITY,
                    0.01),
                VasicekCurveFit.Settings.standard())
            .best();
    assertThat(found.riskNeutral().longRunMean())
        .isCloseTo(mean.value(Parameter.LONG_RUN_MEAN), within(1e-13));
    assertThat(found.rmse()).isCloseTo(mean.rmse(), within(1e-15));
    assertThat(found.standardError().orElseThrow() * 0.01 / 0.2)
        .isCloseTo(
            mean.uncertainty().standardError(Parameter.LONG_RUN_MEAN).orElseThrow(), within(1e-13));
    assertThat(VasicekCurveFit.model(mean).meanReversion()).isEqualTo(0.2);
  }

  @Test
  void aModelWithoutNoiseHasNoPriceOfRisk() {
    assertThatThrownBy(
            () -> MarketPriceOfRisk.of(new Vasicek(0.02, 0.03, 0.2, 0), TIMES, decimals(MARKET)))
        .hasMessageContaining("a volatility above 0");
    assertThat(
            MarketPriceOfRisk.of(
                    new Vasicek(0.02, 0.03, 0.2, 0.01), new double[] {5}, new double[] {0.03})
                .standardError())
        .isEmpty();
  }
}
