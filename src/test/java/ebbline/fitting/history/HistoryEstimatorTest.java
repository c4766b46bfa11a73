package ebbline.fitting.history;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.fitting.history.HistoryEstimate.Reason;
import ebbline.fitting.history.HistoryEstimate.Reverting;
import ebbline.fitting.history.HistoryEstimate.Undetermined;
import ebbline.model.NormalLaw;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class HistoryEstimatorTest {
  private static final RateLaw LAW = new RateLaw(0.4, 0.03, 0.012);

  private static Undetermined refused(double[] rates, HistoryMethod method) {
    HistoryEstimate estimate =
        HistoryEstimator.estimate(RateHistory.ofStep(1.0 / 12, rates), method);
    assertThat(estimate).isInstanceOf(Undetermined.class);
    return (Undetermined) estimate;
  }

  @Test
  void theLikelihoodSearchFindsWhatTheRegressionFinds() {
    for (String set : new String[] {"tb3_full", "tb3_1983_2008", "tips5_real"}) {
      RateHistory even = Histories.of(set);
      Reverting line = (Reverting) HistoryEstimator.estimate(even, HistoryMethod.EXACT);
      ExactLikelihood profile = new ExactLikelihood(even, false);
      assertThat(LikelihoodSearch.maximise(profile, even)).isEqualTo(LikelihoodSearch.End.INSIDE);
      assertThat(profile.meanReversion).isCloseTo(line.law().meanReversion(), within(1e-10));
      assertThat(profile.longRunMean() / line.law().longRunMean()).isCloseTo(1, within(1e-9));
      assertThat(profile.logLikelihood).isCloseTo(line.logLikelihood(), within(1e-9));
      assertThat(profile.logLikelihood(line.law())).isCloseTo(line.logLikelihood(), within(1e-9));
      double[][] one = Precision.invert(profile.information()).covariance();
      double[][] other = line.precision().covariance();
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          double size = Math.sqrt(other[i][i] * other[j][j]);
          assertThat((one[i][j] - other[i][j]) / size).isCloseTo(0, within(1e-8));
        }
      }
    }
  }

  @Test
  void unevenStepsAndGapsUseEveryRate() {
    double[] times = new double[900];
    double[] rates = new double[900];
    for (int i = 1; i < 900; i++) {
      times[i] = times[i - 1] + (i % 5 == 0 ? 0.25 : 1.0 / 12);
    }
    double[] drawn = Histories.draw(LAW, times, 3);
    for (int i = 0; i < 900; i++) {
      rates[i] = i % 7 == 3 ? Double.NaN : drawn[i];
    }
    RateHistory history = RateHistory.of(times, rates);
    assertThat(history.missing()).isEqualTo(129);
    assertThat(history.isRegular()).isFalse();
    for (HistoryMethod method :
        new HistoryMethod[] {HistoryMethod.OLS, HistoryMethod.EXACT, HistoryMethod.STATIONARY}) {
      Reverting estimate = (Reverting) HistoryEstimator.estimate(history, method);
      double error = estimate.precision().meanReversionError();
      assertThat(error).isBetween(0.03, 0.12);
      assertThat(estimate.law().meanReversion()).isCloseTo(0.4, within(3 * error));
      assertThat(estimate.law().volatility())
          .isCloseTo(0.012, within(3 * estimate.precision().volatilityError()));
    }
    assertThatThrownBy(() -> HistoryEstimator.estimate(history, HistoryMethod.YULE_WALKER))
        .hasMessageContaining("yule-walker needs evenly spaced rates");
  }

  @Test
  void theMaximumOnUnevenStepsIsOneInAllThreeParameters() {
    double[] times = new double[200];
    for (int i = 1; i < 200; i++) {
      times[i] = times[i - 1] + (1 + i % 3) / 12.0;
    }
    RateHistory history = RateHistory.of(times, Histories.draw(LAW, times, 8));
    for (boolean stationary : new boolean[] {false, true}) {
      ExactLikelihood profile = new ExactLikelihood(history, stationary);
      LikelihoodSearch.maximise(profile, history);
      double[] at = {profile.meanReversion, profile.longRunMean(), Math.sqrt(profile.variance)};
      double top = profile.logLikelihood;
      double[][] information = profile.information();
      double[] h = {1e-3, 1e-4, 1e-5};
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          double mixed = 0;
          for (int a = -1; a <= 1; a += 2) {
            for (int b = -1; b <= 1; b += 2) {
              double[] moved = at.clone();
              moved[i] += a * h[i];
              moved[j] += b * h[j];
              double value = profile.logLikelihood(new RateLaw(moved[0], moved[1], moved[2]));
              assertThat(value).isLessThanOrEqualTo(top + 1e-9);
              mixed += a * b * value;
            }
          }
          double size = Math.sqrt(information[i][i] * information[j][j]);
          assertThat(-mixed / (4 * h[i] * h[j]) / size)
              .isCloseTo(information[i][j] / size, within(2e-3));
        }
      }
    }
  }

  @ParameterizedTest
  @EnumSource(HistoryMethod.class)
  void constantRatesAreAnsweredInWords(HistoryMethod method) {
    double[] rates = new double[50];
    Arrays.fill(rates, 0.0325);
    Undetermined none = refused(rates, method);
    assertThat(none.reason()).isEqualTo(Reason.CONSTANT);
    assertThat(none.explanation()).startsWith("all 50 rates are 3.2500 %");
  }

  @ParameterizedTest
  @EnumSource(HistoryMethod.class)
  void threeRatesAreTooFew(HistoryMethod method) {
    Undetermined none = refused(new double[] {0.01, 0.02, 0.015}, method);
    assertThat(none.reason()).isEqualTo(Reason.TOO_FEW);
    assertThat(none.explanation()).startsWith("3 rates are too few").contains("1.5000 %");
    assertThat(refused(new double[0], method).explanation()).contains("no rate at all");
  }

  @ParameterizedTest
  @EnumSource(HistoryMethod.class)
  void aSingleJumpIsNoHistory(HistoryMethod method) {
    double[] rates = new double[40];
    Arrays.fill(rates, 0, 25, 0.02);
    Arrays.fill(rates, 25, 40, 0.03);
    Undetermined none = refused(rates, method);
    assertThat(none.reason()).isEqualTo(Reason.SINGLE_JUMP);
    assertThat(none.explanation())
        .startsWith("the rate moves once, from 2.0000 % to 3.0000 % after 25 of 39 steps");
  }

  @Test
  void aRateThatFollowsALineHasNoNoise() {
    double[] rates = new double[30];
    rates[0] = 0.1;
    for (int i = 1; i < 30; i++) {
      rates[i] = 0.001 + 0.9 * rates[i - 1];
    }
    assertThat(refused(rates, HistoryMethod.OLS).reason()).isEqualTo(Reason.WITHOUT_NOISE);
    for (int i = 1; i < 30; i++) {
      rates[i] = rates[i - 1] + 0.01;
    }
    assertThat(refused(rates, HistoryMethod.OLS).reason()).isEqualTo(Reason.WITHOUT_NOISE);
  }

  @Test
  void aNegativeSlopeMeansTheStepIsTooLong() {
    double[] rates = new double[60];
    for (int i = 0; i < 60; i++) {
      rates[i] = 0.03 + (i % 2 == 0 ? 0.01 : -0.01) + 0.001 * Math.sin(i * i);
    }
    for (HistoryMethod method : HistoryMethod.values()) {
      Undetermined none = refused(rates, method);
      assertThat(none.reason()).isEqualTo(Reason.STEP_TOO_LONG);
      assertThat(none.explanation()).contains("is too long to see the reversion");
    }
  }

  @Test
  void oneMoveThatCarriesTheEstimateIsSaidAloud() {
    double[] rates = Histories.draw(new RateLaw(2, 0.03, 0.001), Histories.evenTimes(100, 0.1), 4);
    for (int i = 50; i < 100; i++) {
      rates[i] += 0.05;
    }
    Reverting estimate =
        (Reverting) HistoryEstimator.estimate(RateHistory.ofStep(0.1, rates), HistoryMethod.OLS);
    assertThat(estimate.warnings()).anyMatch(w -> w.contains("of all squared moves"));
  }

  @Test
  void aHistoryRefusesTimesThatDoNotIncreaseAndRatesThatAreNotFinite() {
    assertThatThrownBy(() -> RateHistory.of(new double[] {0, 0}, new double[] {1, 1}))
        .hasMessage("times of a history must increase, found 0.0 in place 2");
    assertThatThrownBy(() -> RateHistory.ofStep(1, new double[] {Double.POSITIVE_INFINITY}))
        .hasMessageContaining("found Infinity");
    assertThatThrownBy(() -> RateHistory.ofStep(Double.NaN, new double[0]))
        .hasMessage("the step must be positive, found NaN");
  }

  @Test
  void sumsOverManyValuesAgreeWithThePlainTwoPassFormulas() {
    double[] x = Histories.draw(LAW, Histories.evenTimes(5001, 1.0 / 250), 6);
    LaggedSums sums = LaggedSums.of(x);
    int n = 5000;
    double meanX = 0;
    double meanY = 0;
    for (int i = 0; i < n; i++) {
      meanX += x[i] / n;
      meanY += x[i + 1] / n;
    }
    double sxx = 0;
    double sxy = 0;
    double syy = 0;
    for (int i = 0; i < n; i++) {
      sxx += (x[i] - meanX) * (x[i] - meanX);
      sxy += (x[i] - meanX) * (x[i + 1] - meanY);
      syy += (x[i + 1] - meanY) * (x[i + 1] - meanY);
    }
    assertThat(sums.square / sxx).isCloseTo(1, within(1e-13));
    assertThat(1 + sums.changeSlope()).isCloseTo(sxy / sxx, within(1e-13));
    assertThat(sums.residuals() / (syy - sxy * sxy / sxx)).isCloseTo(1, within(1e-10));
    assertThat(sums.intercept()).isCloseTo(meanY - sxy / sxx * meanX, within(1e-15));
  }

  @Test
  void theLawForgetsItsStartAtTheHalfLife() {
    assertThat(LAW.halfLife()).isCloseTo(1.7328679513998633, within(1e-15));
    NormalLaw there = LAW.conditional(0.05, LAW.halfLife());
    assertThat(there.mean()).isCloseTo(0.04, within(1e-15));
    assertThat(there.standardDeviation())
        .isCloseTo(LAW.stationary().standardDeviation() * Math.sqrt(0.75), within(1e-15));
    assertThat(LAW.conditional(0.05, 0)).isEqualTo(new NormalLaw(0.05, 0));
    assertThat(LAW.conditional(0.05, 1e4).standardDeviation())
        .isCloseTo(LAW.stationary().standardDeviation(), within(1e-16));
  }

  @Test
  void decayAndItsSlopesJoinSmoothlyAndMatchDifferences() {
    for (double x : new double[] {-3, -1.0000001, -0.9999999, -1e-9, 0, 1e-9, 0.5, 1, 4}) {
      Decay at = Decay.at(x);
      double h = 1e-4;
      assertThat(at.slope)
          .isCloseTo((Decay.at(x + h).g - Decay.at(x - h).g) / (2 * h), within(2e-8));
      assertThat(at.bend)
          .isCloseTo((Decay.at(x + h).slope - Decay.at(x - h).slope) / (2 * h), within(2e-8));
    }
    assertThat(Decay.at(0).g).isEqualTo(1);
    assertThat(Decay.at(0).bend).isCloseTo(1 / 3.0, within(1e-16));
  }
}
