package ebbline.fitting;

import static ebbline.fitting.Parameter.LONG_RUN_MEAN;
import static ebbline.fitting.Parameter.MEAN_REVERSION;
import static ebbline.fitting.Parameter.SHORT_RATE;
import static ebbline.fitting.Parameter.VOLATILITY;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class VasicekCurveFitTest {
  private static final VasicekCurveFit.Settings STANDARD = VasicekCurveFit.Settings.standard();
  private static final double[] TIMES = {0.25, 0.5, 1, 2, 3, 5, 7, 10, 15, 20, 30};

  private static double[] rates(
      double[] times, double kappa, double theta, double sigma, double r0) {
    double[] rates = new double[times.length];
    for (int i = 0; i < rates.length; i++) {
      rates[i] = VasicekZero.at(kappa * times[i]).rate(times[i], kappa * (theta - r0), sigma, r0);
    }
    return rates;
  }

  @Test
  void parametersThatMadeTheRatesAreRecovered() {
    SplittableRandom random = new SplittableRandom(11);
    double worst = 0;
    for (int i = 0; i < 60; i++) {
      double kappa = 0.03 * Math.exp(random.nextDouble() * Math.log(1 / 0.03));
      double theta = -0.01 + 0.12 * random.nextDouble();
      double r0 = theta + (random.nextBoolean() ? 1 : -1) * (0.005 + 0.03 * random.nextDouble());
      double sigma = 0.003 + 0.02 * random.nextDouble();
      FitPoint best =
          VasicekCurveFit.fit(TIMES, rates(TIMES, kappa, theta, sigma, r0), Map.of(), STANDARD)
              .best();
      assertThat(best.largestError()).isLessThan(1e-14);
      worst = Math.max(worst, Math.abs(best.value(MEAN_REVERSION) - kappa));
      worst = Math.max(worst, Math.abs(best.value(LONG_RUN_MEAN) - theta));
      worst = Math.max(worst, Math.abs(best.value(VOLATILITY) - sigma));
      worst = Math.max(worst, Math.abs(best.value(SHORT_RATE) - r0));
    }
    // Rounding of the rates, 1e-17, times the condition of the problem.
    assertThat(worst).isLessThan(1e-8);
  }

  @Test
  void negativeMeanReversionIsRecoveredAndSaidAloud() {
    double[] rates = rates(TIMES, -0.04, 0.01, 0.004, 0.03);
    FitPoint best = VasicekCurveFit.fit(TIMES, rates, Map.of(), STANDARD).best();
    assertThat(best.value(MEAN_REVERSION)).isCloseTo(-0.04, within(1e-8));
    assertThat(best.warnings()).anyMatch(w -> w.contains("mean reversion is negative (-0.04"));
  }

  @Test
  void meanReversionNearZeroIsFittedThroughTheDrift() {
    double[] rates = rates(TIMES, 1e-7, 0.02 + 0.001 / 1e-7, 0.01, 0.02);
    FitPoint best = VasicekCurveFit.fit(TIMES, rates, Map.of(VOLATILITY, 0.01), STANDARD).best();
    assertThat(best.largestError()).isLessThan(1e-14);
    double drift =
        best.value(MEAN_REVERSION) * (best.value(LONG_RUN_MEAN) - best.value(SHORT_RATE));
    assertThat(drift).isCloseTo(0.001, within(1e-10));
    assertThat(best.warnings()).anyMatch(w -> w.contains("is no rate to believe"));
  }

  @Test
  void heldParametersStayAndTheOthersAreRecovered() {
    double[] rates = rates(TIMES, 0.2, 0.05, 0.009, 0.02);
    Map<Parameter, Double> truth =
        Map.of(MEAN_REVERSION, 0.2, LONG_RUN_MEAN, 0.05, VOLATILITY, 0.009, SHORT_RATE, 0.02);
    for (int mask = 0; mask < 16; mask++) {
      Map<Parameter, Double> held = new EnumMap<>(Parameter.class);
      int rest = mask;
      for (Parameter p : Parameter.values()) {
        if (rest % 2 == 1) {
          held.put(p, truth.get(p));
        }
        rest /= 2;
      }
      Fit fit = VasicekCurveFit.fit(TIMES, rates, held, STANDARD);
      assertThat(fit.isConverged()).isTrue();
      for (Parameter p : Parameter.values()) {
        assertThat(fit.best().value(p)).as(held + " " + p).isCloseTo(truth.get(p), within(1e-9));
        assertThat(fit.best().uncertainty().standardError(p).isPresent())
            .isEqualTo(!held.containsKey(p));
      }
    }
  }

  @Test
  void slopesAgreeWithDifferencesInEveryCoordinate() {
    double[] rates = rates(TIMES, 0.1, 0.05, 0.01, 0.02);
    for (Map<Parameter, Double> held :
        List.<Map<Parameter, Double>>of(
            Map.of(), Map.of(LONG_RUN_MEAN, 0.04), Map.of(SHORT_RATE, 0.03))) {
      for (double kappa : new double[] {-0.1, -1e-9, 1e-9, 0.05, 0.4}) {
        VasicekProblem problem = new VasicekProblem(TIMES, rates, held, false, STANDARD);
        double[] point = problem.coordinates(kappa, 0.002, 0.013, 0.03);
        int n = point.length;
        double[][] jacobian = new double[TIMES.length][n];
        problem.at(point, new double[TIMES.length], jacobian);
        for (int j = 0; j < n; j++) {
          double step = 1e-6;
          double[] up = shifted(problem, point, j, step);
          double[] down = shifted(problem, point, j, -step);
          for (int i = 0; i < TIMES.length; i++) {
            double slope = (up[i] - down[i]) / (2 * step);
            assertThat(jacobian[i][j]).isCloseTo(slope, within(2e-8 * (1 + Math.abs(slope))));
          }
        }
      }
    }
  }

  private static double[] shifted(VasicekProblem problem, double[] point, int j, double step) {
    double[] moved = point.clone();
    moved[j] += step;
    return problem.fitted(moved);
  }

  @Test
  void slopesInTheParametersThemselvesAgreeWithDifferences() {
    VasicekProblem problem = new VasicekProblem(TIMES, TIMES, Map.of(), false, STANDARD);
    double[] at = {0.15, 0.05, 0.012, 0.02};
    double[][] jacobian =
        problem.jacobian(
            Map.of(
                MEAN_REVERSION, at[0], LONG_RUN_MEAN, at[1], VOLATILITY, at[2], SHORT_RATE, at[3]));
    for (int j = 0; j < 4; j++) {
      double[] up = at.clone();
      double[] down = at.clone();
      up[j] += 1e-5;
      down[j] -= 1e-5;
      double[] high = rates(TIMES, up[0], up[1], up[2], up[3]);
      double[] low = rates(TIMES, down[0], down[1], down[2], down[3]);
      for (int i = 0; i < TIMES.length; i++) {
        assertThat(jacobian[i][j]).isCloseTo((high[i] - low[i]) / 2e-5, within(1e-8));
      }
    }
  }

  @Test
  void aFlatCurveIdentifiesTheLevelOnly() {
    double[] rates = new double[TIMES.length];
    Arrays.fill(rates, 0.03);
    Fit fit = VasicekCurveFit.fit(TIMES, rates, Map.of(), STANDARD);
    FitPoint best = fit.best();
    assertThat(fit.isConverged()).isTrue();
    assertThat(best.largestError()).isLessThan(1e-12);
    assertThat(best.value(SHORT_RATE)).isCloseTo(0.03, within(1e-9));
    assertThat(best.uncertainty().identified()).doesNotContain(MEAN_REVERSION, VOLATILITY);
    assertThat(best.warnings())
        .anyMatch(w -> w.contains("mean reversion") && w.contains("the points are flat"));
  }

  @Test
  void fewerPointsThanParametersAreRefusedInWords() {
    double[] two = {1, 5};
    double[] rates = {0.02, 0.03};
    assertThatThrownBy(() -> VasicekCurveFit.fit(two, rates, Map.of(), STANDARD))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage("4 parameters cannot be fitted to 2 points: hold at least 2 of them");
    assertThatThrownBy(
            () ->
                VasicekCurveFit.fit(
                    new double[] {1, 1, 5},
                    new double[] {0.02, 0.02, 0.03},
                    Map.of(VOLATILITY, 0.01),
                    STANDARD))
        .hasMessage("3 parameters cannot be fitted to 2 points: hold at least 1 of them");
  }

  @Test
  void asManyPointsAsParametersGiveNoStandardErrors() {
    double[] two = {1, 5};
    double[] rates = {0.02, 0.03};
    FitPoint best =
        VasicekCurveFit.fit(two, rates, Map.of(MEAN_REVERSION, 0.1, VOLATILITY, 0.01), STANDARD)
            .best();
    assertThat(best.largestError()).isLessThan(1e-15);
    assertThat(best.uncertainty().standardError(LONG_RUN_MEAN)).isEmpty();
    assertThat(best.warnings()).anyMatch(w -> w.contains("as many parameters as points"));
  }

  @Test
  void allParametersHeldGivesTheErrorsAndNoSearch() {
    Fit fit =
        VasicekCurveFit.fit(
            new double[] {2},
            new double[] {0.02},
            Map.of(MEAN_REVERSION, 0.1, LONG_RUN_MEAN, 0.03, VOLATILITY, 0.0, SHORT_RATE, 0.03),
            STANDARD);
    assertThat(fit.isConverged()).isTrue();
    assertThat(fit.best().iterations()).isZero();
    assertThat(fit.best().rmse()).isCloseTo(0.01, within(1e-15));
    assertThat(fit.best().quotes().get(0).id()).isEqualTo("2");
  }

  @Test
  void withoutReversionALongRunMeanHasNoEffect() {
    double[] rates = rates(TIMES, 0, 0, 0.01, 0.03);
    FitPoint best = VasicekCurveFit.fit(TIMES, rates, Map.of(MEAN_REVERSION, 0.0), STANDARD).best();
    assertThat(best.value(VOLATILITY)).isCloseTo(0.01, within(1e-10));
    assertThat(best.value(LONG_RUN_MEAN)).isEqualTo(best.value(SHORT_RATE));
    assertThat(best.warnings()).anyMatch(w -> w.contains("has no effect"));
  }

  @Test
  void noStartFarAwayEndsLower() {
    SplittableRandom random = new SplittableRandom(5);
    for (int trial = 0; trial < 5; trial++) {
      double[] rates = rates(TIMES, 0.1 + 0.2 * trial, 0.05, 0.01, 0.02);
      for (int i = 0; i < rates.length; i++) {
        rates[i] += 0.001 * (random.nextDouble() - 0.5);
      }
      FitPoint best = VasicekCurveFit.fit(TIMES, rates, Map.of(), STANDARD).best();
      double squares = best.rmse() * best.rmse() * TIMES.length;
      VasicekProblem problem = new VasicekProblem(TIMES, rates, Map.of(), false, STANDARD);
      for (int i = 0; i < 20; i++) {
        double kappa = -0.1 + 5 * random.nextDouble();
        double[] start =
            problem.coordinates(
                kappa,
                kappa * 0.2 * (random.nextDouble() - 0.5),
                0.05 * random.nextDouble(),
                0.2 * (random.nextDouble() - 0.5));
        double far = LeastSquares.minimise(problem, TIMES.length, start, 1000).squares();
        assertThat(far).isGreaterThan(squares * (1 - 1e-9));
      }
    }
  }

  @Test
  void standardErrorsAndCovarianceAreThoseOfLinearLeastSquares() {
    // With κ and σ held the rates are linear in θ and r₀: weights 1 − g and g.
    double[] rates = rates(TIMES, 0.3, 0.05, 0.01, 0.02);
    for (int i = 0; i < rates.length; i++) {
      rates[i] += 1e-4 * Math.cos(7.0 * i);
    }
    FitPoint best =
        VasicekCurveFit.fit(TIMES, rates, Map.of(MEAN_REVERSION, 0.3, VOLATILITY, 0.01), STANDARD)
            .best();
    double mm = 0;
    double mr = 0;
    double rr = 0;
    for (double t : TIMES) {
      double g = -Math.expm1(-0.3 * t) / (0.3 * t);
      mm += (1 - g) * (1 - g);
      mr += (1 - g) * g;
      rr += g * g;
    }
    double s2 = best.rmse() * best.rmse() * TIMES.length / (TIMES.length - 2);
    double det = mm * rr - mr * mr;
    Uncertainty u = best.uncertainty();
    assertThat(u.standardError(LONG_RUN_MEAN).orElseThrow())
        .isCloseTo(Math.sqrt(s2 * rr / det), within(1e-15));
    assertThat(u.standardError(SHORT_RATE).orElseThrow())
        .isCloseTo(Math.sqrt(s2 * mm / det), within(1e-15));
    assertThat(u.covariance(LONG_RUN_MEAN, SHORT_RATE).orElseThrow())
        .isCloseTo(-s2 * mr / det, within(1e-18));
    assertThat(u.correlation(LONG_RUN_MEAN, SHORT_RATE).orElseThrow())
        .isCloseTo(-mr / Math.sqrt(mm * rr), within(1e-12));
    double cosine = mr / Math.sqrt(mm * rr);
    assertThat(u.conditionNumber())
        .isCloseTo(Math.sqrt((1 + cosine) / (1 - cosine)), within(1e-10));
  }

  @Test
  void aCurveThatBendsUpwardsSetsVolatilityToZeroAndSaysSo() {
    double[] rates = new double[TIMES.length];
    for (int i = 0; i < rates.length; i++) {
      rates[i] = 0.02 + 1e-5 * TIMES[i] * TIMES[i];
    }
    FitPoint best = VasicekCurveFit.fit(TIMES, rates, Map.of(MEAN_REVERSION, 0.1), STANDARD).best();
    assertThat(best.value(VOLATILITY)).isLessThan(1e-7);
    assertThat(best.warnings()).anyMatch(w -> w.contains("volatility fell to 0"));
  }

  @Test
  void tooFewIterationsStopWithAReasonAndTheBestPoint() {
    double[] rates = rates(TIMES, 0.2, 0.05, 0.01, 0.02);
    rates[3] += 0.002;
    VasicekCurveFit.Settings hasty = new VasicekCurveFit.Settings(1, 100, -0.5, 10);
    Fit fit = VasicekCurveFit.fit(TIMES, rates, Map.of(), hasty);
    assertThat(fit).isInstanceOf(Fit.Stopped.class);
    assertThat(((Fit.Stopped) fit).reason()).contains("after 1 iterations");
    assertThat(fit.best().rmse()).isLessThan(0.01);
  }

  @Test
  void figuresOutOfTheirDomainAreRefused() {
    double[] one = {1};
    Map<Parameter, Double> none = Map.of();
    assertThatThrownBy(() -> VasicekCurveFit.fit(one, new double[0], none, STANDARD))
        .hasMessageContaining("as many zero rates as times");
    assertThatThrownBy(
            () -> VasicekCurveFit.fit(new double[] {0}, new double[] {0.02}, none, STANDARD))
        .hasMessageContaining("above 0 and at most 200 years, found 0.0");
    assertThatThrownBy(() -> VasicekCurveFit.fit(one, new double[] {Double.NaN}, none, STANDARD))
        .hasMessageContaining("found NaN");
    assertThatThrownBy(
            () -> VasicekCurveFit.fit(one, new double[] {0.02}, Map.of(VOLATILITY, -0.1), STANDARD))
        .hasMessage("volatility must be at least 0, found -0.1");
  }

  @Test
  void anyPointsEndInFiniteFigures() {
    SplittableRandom random = new SplittableRandom(77);
    for (int trial = 0; trial < 60; trial++) {
      int n = 4 + random.nextInt(9);
      double[] times = new double[n];
      double[] rates = new double[n];
      for (int i = 0; i < n; i++) {
        times[i] = (i == 0 ? 0 : times[i - 1]) + 0.003 * Math.exp(8 * random.nextDouble());
        rates[i] = random.nextInt(3) == 0 ? 0.02 : 0.2 * (random.nextDouble() - 0.5);
      }
      double longest = Math.min(1, 200 / times[n - 1]);
      for (int i = 0; i < n; i++) {
        times[i] *= longest;
      }
      FitPoint best = VasicekCurveFit.fit(times, rates, Map.of(), STANDARD).best();
      assertThat(best.rmse()).isBetween(0.0, 0.2);
      assertThat(best.uncertainty().conditionNumber()).isFinite();
      for (Parameter p : best.uncertainty().free()) {
        best.uncertainty().standardError(p).ifPresent(e -> assertThat(e).isFinite());
      }
      assertThat(String.join(" ", best.warnings())).doesNotContain("NaN", "Infinity");
    }
  }
}
