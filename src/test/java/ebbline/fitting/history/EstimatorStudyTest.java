package ebbline.fitting.history;

import static org.assertj.core.api.Assertions.assertThat;

import ebbline.fitting.history.HistoryEstimate.Reverting;
import java.util.Locale;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The estimator on histories whose law is known: 20 years of monthly rates. The table that it
 * prints stands in docs/estimation.md.
 */
class EstimatorStudyTest {
  private static final int HISTORIES = 800;
  private static final double CONFIDENCE = 0.95;
  private static final Resampling CRITICAL = new Resampling(4999, 77);

  @ParameterizedTest
  @ValueSource(doubles = {0.1, 0.2, 0.5})
  void theBiasGoesAndTheIntervalsCover(double kappa) {
    RateLaw truth = new RateLaw(kappa, 0.04, 0.01);
    double[] times = Histories.evenTimes(241, 1.0 / 12);
    ReversionLaw law = new ReversionLaw(240, CRITICAL);
    double[] error = new double[4];
    double[] square = new double[4];
    int estimated = 0;
    int jackknifed = 0;
    int reversionCovered = 0;
    int meanCovered = 0;
    int volatilityCovered = 0;
    int gaussianCovered = 0;
    int percentileCovered = 0;
    for (int k = 0; k < HISTORIES; k++) {
      RateHistory history = RateHistory.of(times, Histories.draw(truth, times, 5_000_000L + k));
      if (!(HistoryEstimator.estimate(history, HistoryMethod.EXACT) instanceof Reverting found)) {
        continue;
      }
      estimated++;
      Bootstrap bootstrap = Bootstrap.of(history, found, new Resampling(199, k));
      double[] estimates = {
        found.law().meanReversion(),
        BiasCorrection.analytic(found).corrected(),
        BiasCorrection.bootstrap(found, bootstrap).corrected()
      };
      for (int i = 0; i < 3; i++) {
        error[i] += estimates[i] - kappa;
        square[i] += (estimates[i] - kappa) * (estimates[i] - kappa);
      }
      double jackknife = BiasCorrection.jackknife(history, found).corrected() - kappa;
      jackknifed++;
      error[3] += jackknife;
      square[3] += jackknife * jackknife;
      TestedHistory tested = TestedHistory.of(history);
      reversionCovered +=
          HistoryIntervals.keepsReversion(tested, law, kappa, history, CONFIDENCE) ? 1 : 0;
      meanCovered += HistoryIntervals.keepsMean(tested, law, 0.04, history, CONFIDENCE) ? 1 : 0;
      volatilityCovered += bootstrap.volatilityByRatio(CONFIDENCE).contains(0.01) ? 1 : 0;
      percentileCovered += bootstrap.meanReversionPercentiles(CONFIDENCE).contains(kappa) ? 1 : 0;
      gaussianCovered +=
          Interval.gaussian(
                      found.law().meanReversion(),
                      found.precision().meanReversionError(),
                      CONFIDENCE)
                  .contains(kappa)
              ? 1
              : 0;
    }
    double n = estimated;
    System.out.printf(
        Locale.ROOT,
        "kappa %.1f: %d of %d estimated; bias (rmse): raw %.4f (%.4f), analytic %.4f (%.4f),"
            + " bootstrap %.4f (%.4f), jackknife %.4f (%.4f); coverage of 95 %%: kappa %.4f, theta"
            + " %.4f, sigma %.4f; percentile %.4f, Gaussian %.4f%n",
        kappa,
        estimated,
        HISTORIES,
        error[0] / n,
        Math.sqrt(square[0] / n),
        error[1] / n,
        Math.sqrt(square[1] / n),
        error[2] / n,
        Math.sqrt(square[2] / n),
        error[3] / jackknifed,
        Math.sqrt(square[3] / jackknifed),
        reversionCovered / n,
        meanCovered / n,
        volatilityCovered / n,
        percentileCovered / n,
        gaussianCovered / n);
    assertThat(error[0] / n).as("raw bias").isBetween(0.15, 0.35);
    assertThat(Math.abs(error[2] / error[0])).as("bias left by the bootstrap").isLessThan(0.25);
    assertThat(reversionCovered / n).isBetween(0.93, 0.97);
    assertThat(meanCovered / n).isBetween(0.93, 0.97);
    assertThat(volatilityCovered / n).isBetween(0.93, 0.97);
    assertThat(percentileCovered / n).as("why percentiles come second").isLessThan(0.93);
  }
}
