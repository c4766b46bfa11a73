package ebbline.fitting.history;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.fitting.history.HistoryEstimate.Reverting;
import org.junit.jupiter.api.Test;

class HistoryIntervalsTest {
  private static final Resampling FEW = new Resampling(499, 3);

  private static Reverting exact(RateHistory history) {
    return (Reverting) HistoryEstimator.estimate(history, HistoryMethod.EXACT);
  }

  private static HistoryIntervals intervals(RateHistory history, double confidence) {
    Reverting estimate = exact(history);
    return HistoryIntervals.of(
        history, estimate, Bootstrap.of(history, estimate, FEW), confidence, FEW);
  }

  private static RateHistory reverting() {
    double[] times = Histories.evenTimes(481, 1.0 / 12);
    return RateHistory.of(times, Histories.draw(new RateLaw(0.8, 0.03, 0.01), times, 15));
  }

  @Test
  void endsAreWhereTheTestTurns() {
    RateHistory history = reverting();
    HistoryIntervals found = intervals(history, 0.8);
    TestedHistory tested = TestedHistory.of(history);
    ReversionLaw law = new ReversionLaw(tested.transitions(), FEW);
    double low = found.meanReversion().low().orElseThrow();
    double high = found.meanReversion().high().orElseThrow();
    assertThat(low).isPositive();
    for (double inside : new double[] {low * 1.01, high * 0.99}) {
      assertThat(HistoryIntervals.keepsReversion(tested, law, inside, history, 0.8)).isTrue();
    }
    for (double outside : new double[] {low * 0.99, high * 1.01}) {
      assertThat(HistoryIntervals.keepsReversion(tested, law, outside, history, 0.8)).isFalse();
    }
    double bottom = found.longRunMean().low().orElseThrow();
    double top = found.longRunMean().high().orElseThrow();
    assertThat(HistoryIntervals.keepsMean(tested, law, bottom + 1e-6, history, 0.8)).isTrue();
    assertThat(HistoryIntervals.keepsMean(tested, law, bottom - 1e-6, history, 0.8)).isFalse();
    assertThat(HistoryIntervals.keepsMean(tested, law, top - 1e-6, history, 0.8)).isTrue();
    assertThat(HistoryIntervals.keepsMean(tested, law, top + 1e-6, history, 0.8)).isFalse();
    assertThat(found.halfLife().high().orElseThrow()).isCloseTo(Math.log(2) / low, within(1e-12));
    assertThat(found.remark()).isEmpty();
  }

  @Test
  void aSampleThatMayNotRevertHasNoUpperHalfLifeAndNoBoundOfItsMean() {
    HistoryIntervals found = intervals(Histories.of("tb3_1983_2008"), 0.95);
    assertThat(found.meanReversion().low()).hasValue(0);
    assertThat(found.halfLife().high()).isEmpty();
    assertThat(found.halfLife().low()).isPresent();
    assertThat(found.longRunMean().low()).isEmpty();
    assertThat(found.remark())
        .startsWith("no mean reversion is not refused at this confidence")
        .contains("does not bound the long-run mean");
    // σ is known well in any case.
    assertThat(found.volatility().contains(0.0083)).isTrue();
    assertThat(found.volatility().low().orElseThrow()).isGreaterThan(0.0075);
  }

  @Test
  void higherConfidenceHoldsLower() {
    RateHistory history = reverting();
    HistoryIntervals narrow = intervals(history, 0.8);
    HistoryIntervals wide = intervals(history, 0.99);
    double inside = narrow.meanReversion().high().orElseThrow();
    assertThat(wide.meanReversion().contains(inside)).isTrue();
    assertThat(wide.longRunMean().contains(narrow.longRunMean().low().orElseThrow())).isTrue();
  }

  @Test
  void theUnevenRoadAgreesWithTheClosedFormsOnEvenSteps() {
    RateHistory history = Histories.of("tips5_real");
    TestedHistory even = new EvenHistory(history);
    TestedHistory uneven = new UnevenHistory(history);
    assertThat(uneven.meanReversion()).isCloseTo(even.meanReversion(), within(1e-9));
    for (double kappa : new double[] {0, 0.05, 0.3, 0.5, 2}) {
      assertThat(uneven.ratio(kappa)).isCloseTo(even.ratio(kappa), within(1e-6));
    }
    for (double theta : new double[] {-0.1, 0.0, 0.003, 0.02}) {
      TestedHistory.MeanTest one = uneven.test(theta);
      TestedHistory.MeanTest other = even.test(theta);
      assertThat(one.likelihood()).isCloseTo(other.likelihood(), within(1e-6));
      assertThat(one.meanReversion()).isCloseTo(other.meanReversion(), within(1e-4));
    }
    assertThat(uneven.againstWalk()).isCloseTo(even.againstWalk(), within(1e-6));
  }

  @Test
  void unevenHistoriesGetIntervalsToo() {
    double[] times = new double[300];
    for (int i = 1; i < 300; i++) {
      times[i] = times[i - 1] + (1 + i % 2) / 12.0;
    }
    RateLaw law = new RateLaw(0.6, 0.03, 0.01);
    RateHistory history = RateHistory.of(times, Histories.draw(law, times, 21));
    HistoryIntervals found = intervals(history, 0.95);
    assertThat(found.meanReversion().contains(0.6)).isTrue();
    assertThat(found.longRunMean().contains(0.03)).isTrue();
    assertThat(found.volatility().contains(0.01)).isTrue();
    assertThat(found.meanReversion().high().orElseThrow()).isLessThan(2);
  }

  @Test
  void simulatedQuantilesWithoutReversionAreThoseOfDickeyAndFuller() {
    // MacKinnon 2010, constant, n = 500: −2.8673 at 5 %, −3.4435 at 1 %.
    ReversionLaw law = new ReversionLaw(500, new Resampling(20000, 5));
    assertThat(law.at(0).ratioQuantile(0.05)).isCloseTo(-2.8673, within(0.05));
    assertThat(law.at(0).ratioQuantile(0.01)).isCloseTo(-3.4435, within(0.08));
    // Far from no reversion the ratio is normal and the likelihood ratio χ² with one degree.
    assertThat(law.at(400).ratioQuantile(0.975)).isCloseTo(1.9600, within(0.2));
    assertThat(law.at(400).likelihoodQuantile(0.95)).isCloseTo(3.8415, within(0.2));
    // The law is continuous where the reversion vanishes.
    assertThat(law.at(1e-9).ratioQuantile(0.05))
        .isCloseTo(law.at(0).ratioQuantile(0.05), within(0.05));
    assertThat(law.at(1e-9).likelihoodQuantile(0.95))
        .isCloseTo(law.at(0).likelihoodQuantile(0.95), within(0.3));
  }

  @Test
  void theSameSeedGivesTheSameFigures() {
    RateHistory history = Histories.of("tips5_real");
    Reverting estimate = exact(history);
    Bootstrap one = Bootstrap.of(history, estimate, new Resampling(199, 9));
    Bootstrap other = Bootstrap.of(history, estimate, new Resampling(199, 9));
    Bootstrap third = Bootstrap.of(history, estimate, new Resampling(199, 10));
    assertThat(one.meanReversionBias()).isEqualTo(other.meanReversionBias());
    assertThat(one.meanReversionBias()).isNotEqualTo(third.meanReversionBias());
    assertThat(intervals(history, 0.9)).isEqualTo(intervals(history, 0.9));
  }

  @Test
  void everyMethodCanBeBootstrapped() {
    RateLaw law = new RateLaw(0.8, 0.03, 0.01);
    double[] times = Histories.evenTimes(361, 1.0 / 12);
    RateHistory history = RateHistory.of(times, Histories.draw(law, times, 2));
    for (HistoryMethod method : HistoryMethod.values()) {
      Reverting estimate = (Reverting) HistoryEstimator.estimate(history, method);
      Bootstrap bootstrap = Bootstrap.of(history, estimate, new Resampling(199, 4));
      assertThat(bootstrap.replications()).isEqualTo(199);
      // About 4 over a span of 30 years; half of it where the first rate counts.
      assertThat(bootstrap.meanReversionBias()).isBetween(0.03, 0.25);
      assertThat(bootstrap.longRunMeanPercentiles(0.95).contains(0.03)).isTrue();
    }
  }

  @Test
  void analyticAndJackknifeCorrectionsAreTheirFormulas() {
    RateHistory history = Histories.of("tb3_full");
    Reverting estimate = exact(history);
    double kappa = estimate.law().meanReversion();
    double grown = Math.exp(kappa / 12);
    BiasCorrection analytic = BiasCorrection.analytic(estimate);
    assertThat(analytic.bias())
        .isCloseTo((grown * grown + 2 * grown + 5) / (2 * 1064.0 / 12), within(1e-14));
    assertThat(analytic.corrected()).isEqualTo(kappa - analytic.bias());
    double parts = 0;
    for (int part = 0; part < 3; part++) {
      RateHistory third = history.between(354 * part, 354 * part + 355);
      LaggedSums sums = LaggedSums.of(third.ratesInPlace());
      parts -= Math.log(1 + sums.changeSlope()) * 12 / 3;
    }
    assertThat(BiasCorrection.jackknife(history, estimate).corrected())
        .isCloseTo(1.5 * kappa - 0.5 * parts, within(1e-12));
  }

  @Test
  void confidenceAndReplicationsAreChecked() {
    assertThatThrownBy(() -> Interval.gaussian(0, 1, 1))
        .hasMessage("confidence must lie between 0 and 100 %, found 1.0");
    assertThatThrownBy(() -> new Resampling(98, 1)).hasMessageContaining("found 98");
    assertThat(Interval.gaussian(1, 2, 0.95).high().orElseThrow())
        .isCloseTo(1 + 2 * 1.959963984540054, within(1e-14));
  }
}
