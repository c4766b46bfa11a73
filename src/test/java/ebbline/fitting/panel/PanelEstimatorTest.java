package ebbline.fitting.panel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.fitting.VasicekZero;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PanelEstimatorTest {

  private static void check(double value, String set, String quantity, double tolerance) {
    double expected = Panels.reference(set, quantity);
    assertThat(value)
        .as(set + " " + quantity)
        .isCloseTo(expected, within(tolerance * Math.abs(expected)));
  }

  @ParameterizedTest
  @ValueSource(strings = {"p8_1990_2007", "p8_full"})
  void theMaximumMatchesTheReference(String set) {
    PanelEstimate estimate = PanelEstimator.estimate(Panels.of(set));
    assertThat(estimate).isInstanceOf(PanelEstimate.Converged.class);
    PanelEstimate.Best best = estimate.best();
    PanelParameters found = best.parameters();
    assertThat(best.logLikelihood()).isCloseTo(Panels.reference(set, "loglik"), within(2e-9));
    check(found.meanReversion(), set, "params.kappa", 3e-9);
    check(found.longRunMean(), set, "params.theta", 3e-9);
    check(found.volatility(), set, "params.sigma", 3e-9);
    check(found.marketPriceOfRisk(), set, "params.lambda_", 3e-9);
    check(found.measurementSd(), set, "params.h", 3e-9);
    check(found.pricingMean(), set, "params.thetaQ", 3e-9);
    PanelErrors errors = best.errors();
    check(errors.meanReversion().orElseThrow(), set, "se_observed_info.kappa", 3e-9);
    check(errors.longRunMean().orElseThrow(), set, "se_observed_info.theta", 3e-9);
    check(errors.volatility().orElseThrow(), set, "se_observed_info.sigma", 3e-9);
    check(errors.marketPriceOfRisk().orElseThrow(), set, "se_observed_info.lambda_", 3e-9);
    check(errors.measurementSd().orElseThrow(), set, "se_observed_info.h", 3e-9);
    int last = best.rates().size() - 1;
    check(best.rates().rate(0), set, "filtered_r_first", 3e-9);
    check(best.rates().rate(last), set, "filtered_r_last", 3e-9);
    check(Math.pow(best.rates().sd(last), 2), set, "filtered_var_last", 3e-9);
    for (int j = 0; j < Panels.COLUMNS.length; j++) {
      check(best.rates().rmse(j) * 1e4, set, "fit_rmse_bp." + Panels.COLUMNS[j], 3e-9);
    }
    if (set.equals("p8_full")) {
      assertThat(best.warnings())
          .anyMatch(w -> w.startsWith("the historical long-run mean is weakly identified: 7.96 %"))
          .anyMatch(w -> w.startsWith("a long-run mean of 32.37 % under the pricing measure"));
    }
  }

  /** A panel drawn from the model, a fifth of its cells missing and every fifth row empty. */
  private static YieldPanel drawn(PanelParameters truth, int rows, long seed) {
    double[] taus = {0.5, 2, 5, 10};
    SplittableRandom random = new SplittableRandom(seed);
    double[] times = new double[rows];
    double[][] yields = new double[rows][taus.length];
    double kappa = truth.meanReversion();
    double r = truth.longRunMean();
    for (int i = 0; i < rows; i++) {
      if (i > 0) {
        double step = (1 + i % 3) / 12.0;
        times[i] = times[i - 1] + step;
        double sd = truth.volatility() * Math.sqrt(-Math.expm1(-2 * kappa * step) / (2 * kappa));
        r += -Math.expm1(-kappa * step) * (truth.longRunMean() - r) + sd * gaussian(random);
      }
      for (int j = 0; j < taus.length; j++) {
        double tau = taus[j];
        double drift = kappa * (truth.pricingMean() - r);
        yields[i][j] =
            VasicekZero.at(kappa * tau).rate(tau, drift, truth.volatility(), r)
                + truth.measurementSd() * gaussian(random);
        if (i % 5 == 4 || (i * 4 + j) % 7 == 2) {
          yields[i][j] = Double.NaN;
        }
      }
    }
    return YieldPanel.of(times, taus, yields);
  }

  private static double gaussian(SplittableRandom random) {
    return Math.sqrt(-2 * Math.log(1 - random.nextDouble()))
        * Math.cos(2 * Math.PI * random.nextDouble());
  }

  @Test
  void aDrawnPanelWithGapsGivesItsParametersBack() {
    PanelParameters truth = new PanelParameters(0.25, 0.04, 0.012, -0.2, 0.001);
    YieldPanel panel = drawn(truth, 400, 5);
    PanelEstimate.Best best = PanelEstimator.estimate(panel).best();
    PanelErrors errors = best.errors();
    PanelParameters found = best.parameters();
    assertThat((found.meanReversion() - 0.25) / errors.meanReversion().orElseThrow())
        .isBetween(-3.0, 3.0);
    assertThat((found.longRunMean() - 0.04) / errors.longRunMean().orElseThrow())
        .isBetween(-3.0, 3.0);
    assertThat((found.volatility() - 0.012) / errors.volatility().orElseThrow())
        .isBetween(-3.0, 3.0);
    assertThat((found.marketPriceOfRisk() + 0.2) / errors.marketPriceOfRisk().orElseThrow())
        .isBetween(-3.0, 3.0);
    assertThat((found.measurementSd() - 0.001) / errors.measurementSd().orElseThrow())
        .isBetween(-3.0, 3.0);
    assertThat(errors.meanReversion().orElseThrow()).isLessThan(0.02);
    assertThat(best.rates().size()).isEqualTo(400);
    assertThat(best.rates().sd(4)).as("an empty row is forecast").isGreaterThan(best.rates().sd(3));
  }

  @Test
  void panelsThatCannotBeEstimatedAreRefusedInWords() {
    double[] times = {0, 1, 2, 3};
    double[][] one = {{0.01}, {0.02}, {0.03}, {0.02}};
    assertThatThrownBy(() -> PanelEstimator.estimate(YieldPanel.of(times, new double[] {1}, one)))
        .hasMessage("a panel needs at least 2 maturities, 4 dates and 12 yields, found 1, 4 and 4");
    double[] taus = {1, 2, 3};
    double[][] flat = new double[4][];
    for (int i = 0; i < 4; i++) {
      flat[i] = new double[] {0.03, 0.03, 0.03};
    }
    assertThatThrownBy(() -> PanelEstimator.estimate(YieldPanel.of(times, taus, flat)))
        .hasMessageStartingWith("all yields of the panel are equal");
    assertThatThrownBy(() -> YieldPanel.of(times, new double[] {1, 1}, flat))
        .hasMessage("maturities of a panel must differ, found 1.0 twice");
    assertThatThrownBy(() -> YieldPanel.of(new double[] {0, 0}, taus, new double[2][3]))
        .hasMessage("times of a panel must increase, found 0.0 in row 2");
    assertThatThrownBy(() -> YieldPanel.of(times, new double[] {1, 2}, flat))
        .hasMessage("row 1 of a panel has 3 cells, expected 2");
  }

  @Test
  void aPanelOfNoiseEndsInWordsOrNumbersAndNeverInNan() {
    for (long seed = 1; seed <= 6; seed++) {
      SplittableRandom random = new SplittableRandom(seed);
      double[] times = new double[30];
      double[][] yields = new double[30][3];
      for (int i = 0; i < 30; i++) {
        times[i] = i / 12.0;
        for (int j = 0; j < 3; j++) {
          yields[i][j] = 0.03 + 0.01 * (seed % 2 == 0 ? random.nextDouble() : i / 30.0);
        }
      }
      PanelEstimate estimate =
          PanelEstimator.estimate(YieldPanel.of(times, new double[] {1, 5, 10}, yields));
      PanelParameters found = estimate.best().parameters();
      assertThat(found.pricingMean()).isFinite();
      assertThat(estimate.best().logLikelihood()).isFinite();
      estimate.best().errors().meanReversion().ifPresent(e -> assertThat(e).isPositive());
    }
  }
}
