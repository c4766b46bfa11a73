package ebbline.fitting.history;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.fitting.history.HistoryEstimate.Reverting;
import java.util.List;
import org.apache.commons.math3.stat.inference.KolmogorovSmirnovTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class DiagnosticsTest {
  private static final Resampling FEW = new Resampling(999, 3);

  private static Diagnostics of(RateHistory history) {
    Reverting ols = (Reverting) HistoryEstimator.estimate(history, HistoryMethod.OLS);
    return Diagnostics.of(history, ols, FEW);
  }

  private static void check(double value, String set, String quantity, double tolerance) {
    double expected = Histories.reference(set, quantity);
    assertThat(value)
        .as(set + " " + quantity)
        .isCloseTo(expected, within(tolerance * Math.abs(expected)));
  }

  @ParameterizedTest
  @ValueSource(strings = {"tb3_full", "tb3_1954_1982", "tb3_1983_2008", "tips5_real"})
  void testsMatchTheReference(String set) {
    Diagnostics found = of(Histories.of(set));
    int[] lags = {0, 1, 4};
    for (int i = 0; i < 3; i++) {
      DickeyFuller test = found.dickeyFuller().get(i);
      String key = "adf_const." + lags[i] + ".";
      check(test.statistic(), set, key + "stat", 1e-11);
      check(test.pValue(), set, key + "pvalue", 1e-9);
      check(test.observations(), set, key + "nobs", 1e-15);
      // The reference prints seven decimals of the critical values.
      for (int percent : new int[] {1, 5, 10}) {
        assertThat(test.criticalValue(percent))
            .isCloseTo(Histories.reference(set, key + "crit." + percent + "%"), within(5.1e-8));
      }
    }
    ResidualTest box = found.ljungBox().orElseThrow();
    check(box.statistic(), set, "ljung_box_10.Q", 1e-11);
    check(box.pValue(), set, "ljung_box_10.p_df10", 1e-8);
    ResidualTest normal = found.jarqueBera().orElseThrow();
    check(normal.statistic(), set, "jarque_bera.JB", 1e-11);
    check(normal.pValue(), set, "jarque_bera.p", 1e-8);
    ResidualTest arch = found.arch().orElseThrow();
    check(arch.statistic(), set, "arch_lm_1.LM", 1e-11);
    check(arch.pValue(), set, "arch_lm_1.p", 1e-8);
    assertThat(found.notes()).isEmpty();
  }

  @Test
  void thePValueSurfaceMatchesTheReference() {
    for (String t :
        List.of("-4", "-3", "-2.86", "-2", "-1.61", "-1.5", "-0.5", "0", "1", "2", "2.74")) {
      check(DickeyFuller.pValue(Double.parseDouble(t)), "mackinnon", "p(" + t + ")", 1e-10);
    }
    assertThat(DickeyFuller.pValue(-19)).isZero();
    assertThat(DickeyFuller.pValue(2.75)).isEqualTo(1);
    for (int n : new int[] {50, 100, 500}) {
      for (int percent : new int[] {1, 5, 10}) {
        check(
            DickeyFuller.criticalValue(percent, n),
            "mackinnon",
            "cv(T=" + n + ")." + percent + "%",
            1e-9);
      }
    }
  }

  @Test
  void theSimulatedPValueOfAWalkIsUniform() {
    double[] rates = new double[201];
    int below = 0;
    for (int k = 0; k < 200; k++) {
      double[] noise = Histories.draw(new RateLaw(200, 0, 1), Histories.evenTimes(201, 1), 500 + k);
      for (int i = 1; i < rates.length; i++) {
        rates[i] = rates[i - 1] + noise[i];
      }
      NoReversionTest test =
          NoReversionTest.of(RateHistory.ofStep(1, rates.clone()), new Resampling(199, 1));
      below += test.pValue() <= 0.2 ? 1 : 0;
    }
    assertThat(below).isBetween(25, 57);
  }

  @Test
  void strongReversionIsSeenByTheRatioAndWeakIsNot() {
    double[] times = Histories.evenTimes(361, 1.0 / 12);
    RateHistory strong =
        RateHistory.of(times, Histories.draw(new RateLaw(2, 0.03, 0.01), times, 3));
    assertThat(NoReversionTest.of(strong, FEW).pValue()).isEqualTo(1 / 1000.0);
    assertThat(NoReversionTest.of(Histories.of("tb3_1983_2008"), FEW).pValue()).isGreaterThan(0.1);
  }

  @Test
  void forecastsFromTheRightModelCoverAndAreUniform() {
    RateLaw law = new RateLaw(0.8, 0.03, 0.01);
    double[] times = Histories.evenTimes(2001, 1.0 / 12);
    RateHistory history = RateHistory.of(times, Histories.draw(law, times, 12));
    OutOfSample forecasts = OutOfSample.of(history, 12, 0.95);
    assertThat(forecasts.oneStep().forecasts()).isEqualTo(1001);
    assertThat(forecasts.farther().forecasts()).isEqualTo(990);
    assertThat(forecasts.oneStep().share()).isBetween(0.935, 0.965);
    assertThat(forecasts.farther().share()).isBetween(0.90, 0.98);
    assertThat(forecasts.uniformityPValue()).isGreaterThan(0.05);
    // Rates whose volatility doubles half-way are caught.
    double[] bent = new double[2001];
    for (int i = 0; i < 2001; i++) {
      bent[i] =
          i < 1000
              ? history.rate(i)
              : history.rate(999) + 3 * (history.rate(i) - history.rate(999));
    }
    OutOfSample wrong = OutOfSample.of(RateHistory.of(times, bent), 12, 0.95);
    assertThat(wrong.oneStep().share()).isLessThan(0.9);
    assertThat(wrong.uniformityPValue()).isLessThan(1e-6);
  }

  @Test
  void theDistanceLawAgreesWithTheExactOne() {
    KolmogorovSmirnovTest exact = new KolmogorovSmirnovTest();
    for (int n : new int[] {20, 100}) {
      for (double x : new double[] {0.5, 0.8, 1.2, 1.6}) {
        double distance = x / Math.sqrt(n);
        assertThat(OutOfSample.kolmogorov(distance, n))
            .isCloseTo(1 - exact.cdf(distance, n), within(0.015));
      }
    }
    assertThat(OutOfSample.kolmogorov(0.001, 50)).isEqualTo(1);
  }

  @Test
  void rollingWindowsShowAChangeOfLaw() {
    double[] times = Histories.evenTimes(600, 1.0 / 12);
    double[] rates = Histories.draw(new RateLaw(2, 0.02, 0.005), times, 6);
    double[] later = Histories.draw(new RateLaw(2, 0.02, 0.02), times, 7);
    System.arraycopy(later, 300, rates, 300, 300);
    List<RollingWindow> path =
        RollingWindow.over(RateHistory.of(times, rates), HistoryMethod.OLS, 240, 60);
    assertThat(path).hasSize(7);
    assertThat(path.get(6).lastTime()).isEqualTo(times[599]);
    double first = ((Reverting) path.get(0).estimate()).law().volatility();
    double last = ((Reverting) path.get(6).estimate()).law().volatility();
    assertThat(last / first).isBetween(3.0, 5.0);
    assertThatThrownBy(
            () -> RollingWindow.over(RateHistory.of(times, rates), HistoryMethod.OLS, 601, 1))
        .hasMessageContaining("a window holds 4 to 600 rates");
  }

  @Test
  void testsThatCannotBeMadeAreAbsentWithANote() {
    double[] times = {0, 1, 2, 3, 5, 6, 7, 8};
    double[] rates = {0.03, 0.033, 0.034, 0.032, 0.029, 0.0285, 0.0295, 0.031};
    RateHistory history = RateHistory.of(times, rates);
    Reverting estimate = (Reverting) HistoryEstimator.estimate(history, HistoryMethod.STATIONARY);
    Diagnostics found = Diagnostics.of(history, estimate, FEW);
    assertThat(found.dickeyFuller()).isEmpty();
    assertThat(found.ljungBox()).isEmpty();
    assertThat(found.outOfSample()).isEmpty();
    assertThat(found.jarqueBera()).isPresent();
    assertThat(found.noReversion()).isPresent();
    assertThat(found.notes())
        .containsExactly(
            "the Dickey-Fuller test needs evenly spaced rates",
            "Ljung-Box over 10 lags needs more than 11 residuals, found 7",
            "forecasts out of sample need at least 16 rates, found 8");
  }

  @Test
  void testsOfResidualsThatDoNotVaryAreRefused() {
    assertThatThrownBy(() -> ResidualTest.ljungBox(new double[20], 10))
        .hasMessage("Ljung-Box needs residuals that vary");
    assertThatThrownBy(() -> ResidualTest.arch(new double[] {1, -1, 1, -1, 1}))
        .hasMessage("ARCH-LM needs residuals that vary");
    assertThatThrownBy(() -> ResidualTest.jarqueBera(new double[] {1, 1, 1, 1}))
        .hasMessage("Jarque-Bera needs residuals that vary");
    assertThatThrownBy(
            () -> DickeyFuller.of(RateHistory.ofStep(1, new double[] {1, 2, 3, 4, 5, 6, 7, 8}), 1))
        .hasMessageContaining("whose changes vary");
  }

  @Test
  void aRandomWalkIsDiagnosedToo() {
    RateHistory history = Histories.of("tb3_1958_1981");
    HistoryEstimate none = HistoryEstimator.estimate(history, HistoryMethod.OLS);
    assertThat(none).isInstanceOf(HistoryEstimate.Undetermined.class);
    Diagnostics found = Diagnostics.of(history, none, FEW);
    assertThat(found.dickeyFuller()).hasSize(3);
    assertThat(found.dickeyFuller().get(0).statistic()).isPositive();
    assertThat(found.jarqueBera().orElseThrow().pValue()).isLessThan(1e-6);
    assertThat(found.noReversion().orElseThrow().pValue()).isGreaterThan(0.05);
    assertThat(found.notes()).isEmpty();
  }

  @Test
  void aHistoryThatHoldsNothingHasNotesInPlaceOfTests() {
    for (double[] rates : new double[][] {{}, {0.02, 0.03}, new double[30]}) {
      RateHistory history = RateHistory.ofStep(1, rates);
      Diagnostics found =
          Diagnostics.of(history, HistoryEstimator.estimate(history, HistoryMethod.OLS), FEW);
      assertThat(found.dickeyFuller()).isEmpty();
      assertThat(found.ljungBox()).isEmpty();
      assertThat(found.jarqueBera()).isEmpty();
      assertThat(found.arch()).isEmpty();
      assertThat(found.noReversion()).isEmpty();
      assertThat(found.outOfSample()).isEmpty();
      assertThat(found.notes()).hasSizeGreaterThanOrEqualTo(5);
    }
  }
}
