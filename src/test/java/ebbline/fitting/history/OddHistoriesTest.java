package ebbline.fitting.history;

import static org.assertj.core.api.Assertions.assertThat;

import ebbline.fitting.history.HistoryEstimate.RandomWalk;
import ebbline.fitting.history.HistoryEstimate.Reverting;
import ebbline.fitting.history.HistoryEstimate.Undetermined;
import java.util.Arrays;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Histories nobody would choose: every one ends in finite figures or in words. */
class OddHistoriesTest {
  private static final Resampling FEW = new Resampling(99, 1);

  @Test
  void everyFigureIsFiniteWhateverTheHistory() {
    SplittableRandom random = new SplittableRandom(20261);
    int reverting = 0;
    for (int k = 0; k < 1500; k++) {
      RateHistory history = odd(random);
      for (HistoryMethod method : HistoryMethod.values()) {
        if (method == HistoryMethod.YULE_WALKER && !history.isRegular()) {
          continue;
        }
        HistoryEstimate estimate = HistoryEstimator.estimate(history, method);
        String label = "history " + k + " " + method;
        if (estimate instanceof Reverting found) {
          reverting++;
          checkEstimate(found, label);
          if (k % 10 == 0) {
            checkRest(history, found, label);
          }
        } else {
          Undetermined none = (Undetermined) estimate;
          assertThat(none.explanation()).as(label).doesNotContain("NaN", "Infinity");
          none.walk().ifPresent(walk -> checkWalk(walk, label));
          if (k % 10 == 0) {
            checkTests(Diagnostics.of(history, none, FEW), label);
          }
        }
      }
    }
    assertThat(reverting).isBetween(500, 5500);
  }

  private static RateHistory odd(SplittableRandom random) {
    int n = random.nextInt(40);
    double scale = Math.pow(10, -6 + 6 * random.nextDouble());
    double level = random.nextBoolean() ? 0 : scale * 100 * (random.nextDouble() - 0.5);
    double keep = random.nextInt(3) == 0 ? 0 : random.nextInt(2) == 0 ? 1 : random.nextDouble();
    int kind = random.nextInt(6);
    double[] rates = new double[n];
    for (int i = 1; i < n; i++) {
      double noise = scale * (random.nextDouble() - 0.5);
      rates[i] =
          switch (kind) {
            case 0 -> keep * rates[i - 1] + noise;
            case 1 -> keep * rates[i - 1] + Math.rint(noise / scale * 4) * scale / 4;
            case 2 -> random.nextInt(10) == 0 ? noise : rates[i - 1];
            case 3 -> rates[i - 1] * (1 + 0.3 * (random.nextDouble() - 0.3));
            case 4 -> (i % 2 == 0 ? scale : -scale) + 1e-3 * noise;
            default -> scale * i * i;
          };
    }
    for (int i = 0; i < n; i++) {
      rates[i] += level;
    }
    if (random.nextInt(3) == 0 && n > 0) {
      rates[random.nextInt(n)] = Double.NaN;
    }
    if (random.nextBoolean()) {
      return RateHistory.ofStep(Math.pow(10, -3 + 4 * random.nextDouble()), rates);
    }
    double[] times = new double[n];
    for (int i = 1; i < n; i++) {
      times[i] = times[i - 1] + (1 + random.nextInt(4)) * (random.nextInt(20) == 0 ? 10 : 0.01);
    }
    return RateHistory.of(times, rates);
  }

  private static void checkEstimate(Reverting found, String label) {
    RateLaw law = found.law();
    finite(
        label,
        law.halfLife(),
        law.stationary().standardDeviation(),
        law.conditional(0.01, 1).mean(),
        found.logLikelihood(),
        found.regression().intercept(),
        found.regression().slope(),
        found.regression().residualSd(),
        found.regression().interceptError(),
        found.regression().slopeError(),
        found.precision().meanReversionError(),
        found.precision().longRunMeanError(),
        found.precision().volatilityError(),
        found.precision().halfLifeError(law.meanReversion()));
    assertThat(String.join(" ", found.warnings())).as(label).doesNotContain("NaN", "Infinity");
  }

  private static void checkRest(RateHistory history, Reverting found, String label) {
    Bootstrap bootstrap = Bootstrap.of(history, found, FEW);
    finite(label, bootstrap.meanReversionBias());
    HistoryIntervals intervals = HistoryIntervals.of(history, found, bootstrap, 0.95, FEW);
    for (Interval interval :
        new Interval[] {
          intervals.meanReversion(),
          intervals.longRunMean(),
          intervals.volatility(),
          intervals.halfLife(),
          bootstrap.meanReversionPercentiles(0.9),
          bootstrap.longRunMeanPercentiles(0.9)
        }) {
      interval.low().ifPresent(v -> finite(label, v));
      interval.high().ifPresent(v -> finite(label, v));
    }
    checkTests(Diagnostics.of(history, found, FEW), label);
    finite(label, BiasCorrection.analytic(found).corrected());
    try {
      finite(label, BiasCorrection.jackknife(history, found).corrected());
    } catch (IllegalArgumentException e) {
      assertThat(e.getMessage()).startsWith("the jackknife");
    }
  }

  private static void checkTests(Diagnostics tests, String label) {
    tests.dickeyFuller().forEach(t -> finite(label, t.statistic(), t.pValue()));
    tests.ljungBox().ifPresent(t -> finite(label, t.statistic(), t.pValue()));
    tests.jarqueBera().ifPresent(t -> finite(label, t.statistic(), t.pValue()));
    tests.arch().ifPresent(t -> finite(label, t.statistic(), t.pValue()));
    tests.noReversion().ifPresent(t -> finite(label, t.statistic(), t.pValue()));
    tests.outOfSample().ifPresent(t -> finite(label, t.uniformityPValue(), t.oneStep().share()));
  }

  private static void checkWalk(RandomWalk walk, String label) {
    finite(
        label,
        walk.drift(),
        walk.driftError(),
        walk.volatility(),
        walk.volatilityError(),
        walk.logLikelihood());
  }

  private static void finite(String label, double... values) {
    assertThat(Arrays.stream(values).allMatch(Double::isFinite))
        .as(label + " " + Arrays.toString(values))
        .isTrue();
  }
}
