package ebbline.model;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class GaussianRatesTest {
  private static final VolatilitySteps STEPS =
      VolatilitySteps.of(new double[] {0.7, 2.5, 11.0}, new double[] {0.005, 0.02, 0, 0.013});

  private static GaussianRates rates(double reversion, VolatilitySteps volatility) {
    return new HullWhite(reversion, volatility).on(new Vasicek(0.03, 0.03, 0, 0).rates().curve());
  }

  @Test
  void momentsMatchTheQuadratureTable() {
    ReferenceTable table = ReferenceTable.read(GaussianRatesTest.class, "gaussian-moments");
    double worst = 0;
    for (int i = 0; i < table.size(); i++) {
      VolatilitySteps volatility =
          table.text(i, "volatility").equals("constant") ? VolatilitySteps.constant(0.012) : STEPS;
      GaussianRates rates = rates(table.number(i, "mean_reversion"), volatility);
      double from = table.number(i, "from");
      double to = table.number(i, "to");
      StateStep step = rates.step(from, to);
      double[] found = {
        step.stateMean(),
        step.stateVariance(),
        step.integralMean(),
        step.integralVariance(),
        step.covariance(),
        rates.martingaleVariance(from, to)
      };
      String[] names = {
        "state_mean",
        "state_variance",
        "integral_mean",
        "integral_variance",
        "covariance",
        "martingale_variance"
      };
      for (int k = 0; k < found.length; k++) {
        // e^(2at) at at = 150 has the rounding of 2at in it.
        double room = 1 + Math.abs(2 * rates.meanReversion() * to) / 20;
        worst = Math.max(worst, table.relativeError(i, names[k], found[k]) / room);
      }
    }
    assertThat(worst).isLessThanOrEqualTo(table.tolerance()).isGreaterThan(table.tolerance() / 20);
  }

  @Test
  void twoStepsMakeOne() {
    GaussianRates rates = rates(0.2, STEPS);
    StateStep one = rates.step(0.5, 2);
    StateStep two = rates.step(2, 13);
    StateStep both = rates.step(0.5, 13);
    assertThat(two.decay() * one.decay()).isCloseTo(both.decay(), within(1e-16));
    assertThat(one.loading() + one.decay() * two.loading())
        .isCloseTo(both.loading(), within(1e-14));
    assertThat(two.decay() * one.stateMean() + two.stateMean())
        .isCloseTo(both.stateMean(), within(1e-17));
    assertThat(two.decay() * two.decay() * one.stateVariance() + two.stateVariance())
        .isCloseTo(both.stateVariance(), within(1e-18));
    double l = two.loading();
    assertThat(
            one.integralVariance()
                + 2 * l * one.covariance()
                + l * l * one.stateVariance()
                + two.integralVariance())
        .isCloseTo(both.integralVariance(), within(1e-16));
    assertThat(one.integralMean() + l * one.stateMean() + two.integralMean())
        .isCloseTo(both.integralMean(), within(1e-16));
  }

  @Test
  void bondsSeenLaterAverageToTodaysCurve() {
    // E[e^(−∫x) P(t,T|x)] over the joint normal law is P(0,T)/e^(−∫f).
    for (double reversion : new double[] {-0.05, 0, 1e-12, 0.1, 3}) {
      GaussianRates rates = rates(reversion, STEPS);
      StateStep step = rates.step(0, 6);
      double g = rates.g(20 - 6);
      double mean = step.integralMean() + g * step.stateMean();
      double variance =
          step.integralVariance() + 2 * g * step.covariance() + g * g * step.stateVariance();
      double log = rates.logBond(6, 20, 0) - mean + 0.5 * variance + rates.curve().logDiscount(6);
      assertThat(log).isCloseTo(rates.curve().logDiscount(20), within(1e-14));
    }
  }

  @Test
  void theMeanUnderConstantVolatilityIsHalfSigmaSquaredGSquared() {
    GaussianRates rates = rates(0.1, VolatilitySteps.constant(0.01));
    double g = rates.g(7);
    assertThat(rates.stateMean(7)).isCloseTo(0.5e-4 * g * g, within(1e-18));
    assertThat(rates.expectedShortRate(7)).isCloseTo(0.03 + 0.5e-4 * g * g, within(1e-17));
  }

  @Test
  void whatTheStateDoesNotExplainIsNeverNegative() {
    GaussianRates rates = rates(0.1, VolatilitySteps.constant(0.01));
    StateStep step = rates.step(0, 1);
    double explained = step.covariance() * step.covariance() / step.stateVariance();
    assertThat(step.residualDeviation())
        .isCloseTo(Math.sqrt(step.integralVariance() - explained), within(1e-10));
    assertThat(rates.step(2, 2).residualDeviation()).isZero();
    assertThat(rates(0.1, VolatilitySteps.constant(0)).step(0, 5).residualDeviation()).isZero();
  }

  @Test
  void aStepThatRunsBackwardsIsRefused() {
    GaussianRates rates = rates(0.1, STEPS);
    assertThatThrownBy(() -> rates.step(2, 1)).hasMessageContaining("found 2.0 to 1.0");
    assertThatThrownBy(() -> rates.step(-1, 1)).hasMessageContaining("found -1.0 to 1.0");
    assertThatThrownBy(() -> rates(Double.NaN, STEPS)).hasMessageContaining("must be finite");
  }
}
