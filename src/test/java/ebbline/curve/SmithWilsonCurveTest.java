package ebbline.curve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.junit.jupiter.api.Test;

class SmithWilsonCurveTest {
  private static final double[] TIMES = {0.25, 1, 2, 5, 10, 20};
  private static final double[] LOGS = {-0.003, -0.015, -0.04, -0.11, -0.25, -0.55};
  private static final SmithWilsonCurve CURVE = SmithWilsonCurve.of(TIMES, LOGS, 0.034, 0.13);

  @Test
  void nodesAreMetAndTimeZeroIsWorthOne() {
    for (int i = 0; i < TIMES.length; i++) {
      assertThat(CURVE.logDiscount(TIMES[i])).isCloseTo(LOGS[i], within(1e-14));
      assertThat(CURVE.nodeLogDiscounts()[i]).isEqualTo(CURVE.logDiscount(TIMES[i]));
    }
    assertThat(CURVE.logDiscount(0)).isZero();
    assertThat(CURVE.zero(0)).isCloseTo(CURVE.zero(1e-6), within(1e-7));
  }

  @Test
  void theTabledSumsAreTheSumOverTheKernels() {
    double[] weights = CURVE.weights();
    for (double t : new double[] {0.01, 0.25, 0.7, 3, 9.9, 20, 20.1, 60, 200}) {
      double sum = 1;
      for (int j = 0; j < TIMES.length; j++) {
        double a = Math.min(t, TIMES[j]);
        double b = Math.max(t, TIMES[j]);
        sum += weights[j] * (0.13 * a - Math.exp(-0.13 * b) * Math.sinh(0.13 * a));
      }
      assertThat(CURVE.discount(t)).isCloseTo(Math.pow(1.034, -t) * sum, within(1e-14));
    }
  }

  @Test
  void forwardsAndSlopesAreDerivatives() {
    GaussIntegrator gauss = new GaussIntegratorFactory().legendre(16);
    double[] breaks = CURVE.breaks();
    assertThat(breaks).containsExactly(0, 0.25, 1, 2, 5, 10, 20);
    for (int i = 0; i < breaks.length; i++) {
      double from = breaks[i];
      double to = i + 1 < breaks.length ? breaks[i + 1] : 45;
      double sum = 0;
      double slopes = 0;
      for (int p = 0; p < gauss.getNumberOfPoints(); p++) {
        double t = from + 0.5 * (to - from) * (1 + gauss.getPoint(p));
        sum += 0.5 * (to - from) * gauss.getWeight(p) * CURVE.forward(t);
        slopes += 0.5 * (to - from) * gauss.getWeight(p) * CURVE.forwardSlope(t);
      }
      assertThat(sum).isCloseTo(CURVE.logDiscount(from) - CURVE.logDiscount(to), within(1e-14));
      assertThat(slopes).isCloseTo(CURVE.forward(to) - CURVE.forward(from), within(1e-14));
    }
  }

  @Test
  void forwardsTendToTheUltimateOne() {
    assertThat(CURVE.forward(300)).isCloseTo(Math.log(1.034), within(1e-15));
    assertThat(CURVE.gap(60))
        .isCloseTo(Math.abs(CURVE.forward(60) - Math.log(1.034)), within(1e-15));
    assertThat(CURVE.gap(80)).isLessThan(CURVE.gap(60));
    assertThat(CURVE.discount(5000)).isGreaterThanOrEqualTo(0).isLessThan(1e-60);
  }

  @Test
  void sensitivitiesToTheNodesAgreeWithFiniteDifferences() {
    for (double t : new double[] {0.1, 1, 3, 7, 20, 50}) {
      double[] gradient = new double[TIMES.length];
      CURVE.addLogDiscountGradient(t, 3, gradient);
      for (int i = 0; i < TIMES.length; i++) {
        double[] up = LOGS.clone();
        up[i] += 1e-5;
        double[] down = LOGS.clone();
        down[i] -= 1e-5;
        double difference =
            (SmithWilsonCurve.of(TIMES, up, 0.034, 0.13).logDiscount(t)
                    - SmithWilsonCurve.of(TIMES, down, 0.034, 0.13).logDiscount(t))
                / 2e-5;
        assertThat(gradient[i] / 3).isCloseTo(difference, within(1e-7));
      }
    }
  }

  @Test
  void curvesOfGivenWeightsAreTheSame() {
    SmithWilsonCurve again = SmithWilsonCurve.ofWeights(TIMES, CURVE.weights(), 0.034, 0.13);
    assertThat(again.logDiscount(33)).isEqualTo(CURVE.logDiscount(33));
    assertThat(again.ultimateForward()).isEqualTo(0.034);
    assertThat(again.speed()).isEqualTo(0.13);
  }

  @Test
  void curvesWhoseDiscountFactorsWouldNotStayPositiveAreRefused() {
    assertThatThrownBy(
            () -> SmithWilsonCurve.of(new double[] {19, 20}, new double[] {-0.1, -3}, 0.04, 0.05))
        .hasMessageContaining("must stay positive");
    assertThatThrownBy(() -> SmithWilsonCurve.of(TIMES, LOGS, 0.03, Double.NaN))
        .hasMessageContaining("NaN");
    assertThatThrownBy(() -> SmithWilsonCurve.of(TIMES, LOGS, -1, 0.1))
        .hasMessageContaining("found -1.0");
    assertThatThrownBy(
            () ->
                InterpolatedCurve.of(
                    Interpolation.SMITH_WILSON, new double[] {1}, new double[] {-0.1}))
        .hasMessageContaining("ultimate forward rate");
  }
}
