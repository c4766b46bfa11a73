package ebbline.fitting.history;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import ebbline.fitting.history.HistoryEstimate.Reverting;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class HistoryReferenceTest {
  /** Relative; the worst is 2e-12, in standard errors of which the reference holds 12 digits. */
  private static final double ESTIMATE = 2e-11;

  private static void check(double value, String set, String quantity) {
    double expected = Histories.reference(set, quantity);
    double error = Math.abs(value / expected - 1);
    assertThat(error).as(set + " " + quantity + " " + value).isLessThan(ESTIMATE);
  }

  private static Reverting estimate(String set, HistoryMethod method) {
    return (Reverting) HistoryEstimator.estimate(Histories.of(set), method);
  }

  @ParameterizedTest
  @ValueSource(strings = {"tb3_full", "tb3_1954_1982", "tb3_1983_2008", "tips5_real"})
  void leastSquaresMatchTheReference(String set) {
    Reverting ols = estimate(set, HistoryMethod.OLS);
    check(ols.regression().intercept(), set, "ols.a");
    check(ols.regression().slope(), set, "ols.b");
    check(ols.regression().interceptError(), set, "ols.se_a");
    check(ols.regression().slopeError(), set, "ols.se_b");
    check(ols.regression().residualSd(), set, "ols.resid_sd_n_minus_2");
    check(ols.logLikelihood(), set, "ols.loglik_conditional");
    checkLaw(ols, set, "vasicek_ols_n_minus_2.");
  }

  @ParameterizedTest
  @ValueSource(strings = {"tb3_full", "tb3_1954_1982", "tb3_1983_2008", "tips5_real"})
  void conditionalLikelihoodMatchesTheReference(String set) {
    Reverting exact = estimate(set, HistoryMethod.EXACT);
    check(exact.regression().residualSd(), set, "ols.resid_sd_n");
    checkLaw(exact, set, "vasicek_cond_ml_n.");
  }

  private static void checkLaw(Reverting estimate, String set, String prefix) {
    RateLaw law = estimate.law();
    check(law.meanReversion(), set, prefix + "kappa");
    check(law.longRunMean(), set, prefix + "theta");
    check(law.volatility(), set, prefix + "sigma");
    check(law.halfLife(), set, prefix + "half_life");
    check(law.stationary().standardDeviation(), set, prefix + "stationary_sd");
    check(estimate.precision().meanReversionError(), set, prefix + "se_kappa");
    check(estimate.precision().longRunMeanError(), set, prefix + "se_theta");
    check(estimate.precision().volatilityError(), set, prefix + "se_sigma");
    check(estimate.precision().halfLifeError(law.meanReversion()), set, prefix + "se_half_life");
  }

  @ParameterizedTest
  @ValueSource(strings = {"tb3_full", "tb3_1954_1982", "tb3_1983_2008", "tips5_real"})
  void stationaryLikelihoodMatchesTheReference(String set) {
    Reverting full = estimate(set, HistoryMethod.STATIONARY);
    check(full.law().meanReversion(), set, "exact_ml.kappa");
    check(full.law().longRunMean(), set, "exact_ml.theta");
    check(full.law().volatility(), set, "exact_ml.sigma");
    check(full.regression().intercept(), set, "exact_ml.a");
    check(full.regression().slope(), set, "exact_ml.b");
    check(full.regression().residualSd(), set, "exact_ml.innov_sd");
    check(full.logLikelihood(), set, "exact_ml.loglik");
    check(full.precision().meanReversionError(), set, "exact_ml.se_observed_info.kappa");
    check(full.precision().longRunMeanError(), set, "exact_ml.se_observed_info.theta");
    check(full.precision().volatilityError(), set, "exact_ml.se_observed_info.sigma");
  }

  @ParameterizedTest
  @ValueSource(strings = {"tb3_full", "tb3_1954_1982", "tb3_1983_2008", "tips5_real"})
  void yuleWalkerMatchesTheReference(String set) {
    Reverting yule = estimate(set, HistoryMethod.YULE_WALKER);
    check(yule.law().meanReversion(), set, "yule_walker_biased_acov.kappa");
    check(yule.law().longRunMean(), set, "yule_walker_biased_acov.theta");
    check(yule.law().volatility(), set, "yule_walker_biased_acov.sigma");
    check(yule.regression().slope(), set, "yule_walker_biased_acov.b");
  }

  @Test
  void aSampleWithoutReversionMatchesTheReferenceAndGetsTheRandomWalk() {
    for (String set : new String[] {"tb3_1958_1981", "cmt10y_1953_1981"}) {
      HistoryEstimate found = HistoryEstimator.estimate(Histories.of(set), HistoryMethod.OLS);
      assertThat(found).isInstanceOf(HistoryEstimate.Undetermined.class);
      HistoryEstimate.Undetermined none = (HistoryEstimate.Undetermined) found;
      assertThat(none.reason()).isEqualTo(HistoryEstimate.Reason.NO_REVERSION);
      check(none.slope().orElseThrow(), set, "b");
      assertThat(none.explanation())
          .startsWith("no mean reversion in this sample: the slope of each rate")
          .contains("A random walk fits it with volatility");
      HistoryEstimate exact = HistoryEstimator.estimate(Histories.of(set), HistoryMethod.EXACT);
      assertThat(exact).isInstanceOf(HistoryEstimate.Undetermined.class);
    }
  }

  @Test
  void aWeaklyIdentifiedMeanIsSaidAloud() {
    Reverting ols = estimate("tb3_1983_2008", HistoryMethod.OLS);
    assertThat(ols.warnings())
        .anyMatch(w -> w.startsWith("the long-run mean is not identified: -22.48"))
        .anyMatch(w -> w.contains("is not told apart from 1"));
  }

  @Test
  void thePublishedTwentyOnePointPathIsReproduced() {
    // van den Berg, Calibrating the Ornstein-Uhlenbeck (Vasicek) model, 2011: 3.1287, 0.9075,
    // 0.5831 (least squares), 0.5532 (likelihood); the figures are from memory.
    double[] path = {
      3.0, 1.76, 1.2693, 1.196, 0.9468, 0.9532, 0.6252, 0.8604, 1.0984, 1.431, 1.3019, 1.4005,
      1.2686, 0.7147, 0.9237, 0.7297, 0.7105, 0.8683, 0.7406, 0.7314, 0.6232
    };
    RateHistory history = RateHistory.ofStep(0.25, path);
    Reverting ols = (Reverting) HistoryEstimator.estimate(history, HistoryMethod.OLS);
    assertThat(ols.law().meanReversion()).isCloseTo(3.1287, within(5e-5));
    assertThat(ols.law().longRunMean()).isCloseTo(0.9075, within(5e-5));
    assertThat(ols.law().volatility()).isCloseTo(0.5831, within(5e-5));
    Reverting exact = (Reverting) HistoryEstimator.estimate(history, HistoryMethod.EXACT);
    assertThat(exact.law().volatility()).isCloseTo(0.5532, within(5e-5));
  }
}
