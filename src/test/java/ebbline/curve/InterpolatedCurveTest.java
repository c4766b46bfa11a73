package ebbline.curve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class InterpolatedCurveTest {
  private static final GaussIntegrator GAUSS = new GaussIntegratorFactory().legendre(8);

  /** Nodes at random times; forwards between them uniform in the given range. */
  private static InterpolatedCurve random(
      Interpolation interpolation, Random random, double lowest, double highest) {
    int n = 1 + random.nextInt(30);
    double[] times = new double[n];
    double[] logs = new double[n];
    double t = 0;
    double log = 0;
    for (int i = 0; i < n; i++) {
      double step = 0.05 + 2 * random.nextDouble();
      log -= step * (lowest + (highest - lowest) * random.nextDouble());
      t += step;
      times[i] = t;
      logs[i] = log;
    }
    return InterpolatedCurve.of(interpolation, times, logs);
  }

  @ParameterizedTest
  @EnumSource(value = Interpolation.class, names = "SMITH_WILSON", mode = EnumSource.Mode.EXCLUDE)
  void nodesAreMetToTheLastBit(Interpolation interpolation) {
    Random random = new Random(1);
    for (int i = 0; i < 200; i++) {
      InterpolatedCurve curve = random(interpolation, random, -0.02, 0.08);
      double[] times = curve.nodes();
      double[] logs = curve.nodeLogDiscounts();
      for (int k = 0; k < times.length; k++) {
        assertThat(curve.logDiscount(times[k])).isEqualTo(logs[k]);
      }
      assertThat(curve.logDiscount(0)).isZero();
      assertThat(curve.discount(0)).isEqualTo(1);
    }
  }

  @ParameterizedTest
  @EnumSource(value = Interpolation.class, names = "SMITH_WILSON", mode = EnumSource.Mode.EXCLUDE)
  void theForwardIsTheSlopeOfTheLogDiscount(Interpolation interpolation) {
    Random random = new Random(2);
    double worst = 0;
    for (int i = 0; i < 200; i++) {
      InterpolatedCurve curve = random(interpolation, random, -0.02, 0.08);
      double[] breaks = curve.breaks();
      for (int k = 0; k < breaks.length; k++) {
        double from = breaks[k];
        double to = k + 1 < breaks.length ? breaks[k + 1] : from + 10;
        double sum = 0;
        double slopes = 0;
        for (int p = 0; p < GAUSS.getNumberOfPoints(); p++) {
          double t = from + 0.5 * (to - from) * (1 + GAUSS.getPoint(p));
          sum += 0.5 * (to - from) * GAUSS.getWeight(p) * curve.forward(t);
          slopes += 0.5 * (to - from) * GAUSS.getWeight(p) * curve.forwardSlope(t);
        }
        double change = curve.logDiscount(from) - curve.logDiscount(to);
        worst = Math.max(worst, Math.abs(sum - change));
        double end = to - 1e-12 * (to - from);
        assertThat(slopes).isCloseTo(curve.forward(end) - curve.forward(from), within(1e-11));
      }
    }
    assertThat(worst).isLessThan(1e-14);
  }

  @ParameterizedTest
  @EnumSource(value = Interpolation.class, names = "SMITH_WILSON", mode = EnumSource.Mode.EXCLUDE)
  void sensitivitiesToTheNodesAgreeWithFiniteDifferences(Interpolation interpolation) {
    Random random = new Random(3);
    for (int i = 0; i < 100; i++) {
      InterpolatedCurve curve = random(interpolation, random, -0.01, 0.06);
      double[] times = curve.nodes();
      double[] logs = curve.nodeLogDiscounts();
      double t = random.nextDouble() * (times[times.length - 1] + 3);
      double[] gradient = new double[times.length];
      curve.addLogDiscountGradient(t, 2, gradient);
      for (int k = 0; k < times.length; k++) {
        double h = 1e-7;
        double[] up = logs.clone();
        up[k] += h;
        double[] down = logs.clone();
        down[k] -= h;
        double difference =
            (InterpolatedCurve.of(interpolation, times, up).logDiscount(t)
                    - InterpolatedCurve.of(interpolation, times, down).logDiscount(t))
                / (2 * h);
        assertThat(gradient[k] / 2).isCloseTo(difference, within(2e-7));
      }
    }
  }

  @Test
  void monotoneConvexForwardsAreContinuousAndNotNegativeOnPositiveInput() {
    Random random = new Random(4);
    for (int i = 0; i < 10_000; i++) {
      InterpolatedCurve curve = random(Interpolation.MONOTONE_CONVEX, random, 0, 0.1);
      double[] breaks = curve.breaks();
      for (int k = 0; k < breaks.length; k++) {
        double t = breaks[k];
        assertThat(curve.forward(t)).isGreaterThanOrEqualTo(-1e-15);
        if (k > 0) {
          // A narrow piece is steep: the last double before t is its slope times that step away.
          double before = Math.nextDown(t);
          double step = 4 * Math.ulp(t) * Math.abs(curve.forwardSlope(before));
          assertThat(curve.forward(before)).isCloseTo(curve.forward(t), within(1e-14 + step));
          assertThat(lowest(curve, breaks[k - 1], t)).isGreaterThanOrEqualTo(-1e-15);
        }
      }
    }
  }

  /** The lowest forward of a piece, where it is a parabola: at its turn or at an end. */
  private static double lowest(InterpolatedCurve curve, double from, double to) {
    double slope = curve.forwardSlope(from);
    double end = curve.forwardSlope(Math.nextDown(to));
    double turn = from + (to - from) * slope / (slope - end);
    double ends = Math.min(curve.forward(from), curve.forward(Math.nextDown(to)));
    return turn > from && turn < to ? Math.min(ends, curve.forward(turn)) : ends;
  }

  @Test
  void monotoneConvexForwardsAverageToTheirIntervals() {
    Random random = new Random(41);
    double worst = 0;
    for (int i = 0; i < 10_000; i++) {
      InterpolatedCurve curve = random(Interpolation.MONOTONE_CONVEX, random, 0, 0.1);
      double[] nodes = curve.nodes();
      double[] logs = curve.nodeLogDiscounts();
      double[] breaks = curve.breaks();
      double from = 0;
      double log = 0;
      for (int n = 0; n < nodes.length; n++) {
        double sum = 0;
        for (int k = 0; k < breaks.length && breaks[k] < nodes[n]; k++) {
          double to = k + 1 < breaks.length ? Math.min(breaks[k + 1], nodes[n]) : nodes[n];
          if (breaks[k] >= from) {
            // Simpson's rule is exact on a parabola.
            double ends = curve.forward(breaks[k]) + curve.forward(Math.nextDown(to));
            double middle = curve.forward(0.5 * (breaks[k] + to));
            sum += (to - breaks[k]) * (ends + 4 * middle) / 6;
          }
        }
        double average = (log - logs[n]) / (nodes[n] - from);
        worst = Math.max(worst, Math.abs(sum / (nodes[n] - from) - average));
        from = nodes[n];
        log = logs[n];
      }
    }
    assertThat(worst).isLessThan(1e-14);
  }

  @Test
  void monotoneConvexMovesContinuouslyWhenAnAverageChangesSign() {
    // Left and right limits at an average of 0, for neighbours of either sign.
    for (double other : new double[] {-0.03, -0.001, 0.001, 0.03}) {
      for (double t = 0.1; t < 3; t += 0.2) {
        double[] values = new double[2];
        for (int side = 0; side < 2; side++) {
          double small = side == 0 ? -1e-13 : 1e-13;
          values[side] =
              InterpolatedCurve.of(
                      Interpolation.MONOTONE_CONVEX,
                      new double[] {1, 2, 3},
                      new double[] {-other, -other - small, -other - small + 0.5 * other})
                  .logDiscount(t);
        }
        assertThat(values[0]).isCloseTo(values[1], within(1e-11));
      }
    }
  }

  @Test
  void monotoneConvexSaysWhereEqualAveragesMakeItsForwardJump() {
    InterpolatedCurve curve =
        InterpolatedCurve.of(
            Interpolation.MONOTONE_CONVEX,
            new double[] {1, 2, 3},
            new double[] {-0.015625, -0.046875, -0.078125}); // 1, 3 and 5 of 64: no rounding
    assertThat(curve.hasContinuousForward()).isFalse();
    assertThat(curve.forward(Math.nextDown(1.0))).isCloseTo(1.5 / 64, within(1e-15));
    assertThat(curve.forward(1)).isCloseTo(2.0 / 64, within(1e-15));
    InterpolatedCurve rounded =
        InterpolatedCurve.of(
            Interpolation.MONOTONE_CONVEX,
            new double[] {1, 2, 3},
            new double[] {-0.02, -0.06, -0.10});
    assertThat(rounded.hasContinuousForward()).isFalse();
  }

  @Test
  void monotoneConvexLeavesNegativeForwardsAlone() {
    InterpolatedCurve curve =
        InterpolatedCurve.of(
            Interpolation.MONOTONE_CONVEX,
            new double[] {1, 2, 3, 4},
            new double[] {0.005, 0.012, 0.015, 0.01});
    assertThat(curve.forward(1.5)).isNegative();
    assertThat(curve.logDiscount(2)).isEqualTo(0.012);
    assertThat(curve.forward(2)).isCloseTo(-0.005, within(1e-15)); // the line through the averages
  }

  @Test
  void logLinearForwardsJumpToTheRightAndGoOnBeyondTheLastNode() {
    InterpolatedCurve curve =
        InterpolatedCurve.of(
            Interpolation.LOG_LINEAR, new double[] {1, 3}, new double[] {-0.02, -0.08});
    assertThat(curve.forward(0)).isCloseTo(0.02, within(1e-17));
    assertThat(curve.zero(0)).isCloseTo(0.02, within(1e-17));
    assertThat(curve.forward(1)).isCloseTo(0.03, within(1e-16));
    assertThat(curve.forward(100)).isCloseTo(0.03, within(1e-16));
    assertThat(curve.logDiscount(5)).isCloseTo(-0.14, within(1e-16));
    assertThat(curve.hasContinuousForward()).isFalse();
  }

  @Test
  void linearZeroHoldsTheFirstAndTheLastZeroRate() {
    InterpolatedCurve curve =
        InterpolatedCurve.of(
            Interpolation.LINEAR_ZERO, new double[] {1, 3}, new double[] {-0.02, -0.12});
    assertThat(curve.zero(0)).isCloseTo(0.02, within(1e-17));
    assertThat(curve.zero(0.3)).isCloseTo(0.02, within(1e-17));
    assertThat(curve.zero(2)).isCloseTo(0.03, within(1e-16));
    assertThat(curve.zero(9)).isCloseTo(0.04, within(1e-16));
    assertThat(curve.forward(0.5)).isCloseTo(0.02, within(1e-17));
  }

  @Test
  void theNaturalSplineHasNoCurvatureAtItsEnds() {
    InterpolatedCurve curve =
        InterpolatedCurve.of(
            Interpolation.CUBIC,
            new double[] {1, 2, 4, 7},
            new double[] {-0.02, -0.05, -0.11, -0.2});
    assertThat(curve.forwardSlope(0)).isCloseTo(0, within(1e-16));
    assertThat(curve.forwardSlope(7 - 1e-9)).isCloseTo(0, within(1e-10));
    assertThat(curve.forward(7 - 1e-9)).isCloseTo(curve.forward(7), within(1e-10));
    for (double t : new double[] {1, 2, 4}) {
      assertThat(curve.forward(t - 1e-9)).isCloseTo(curve.forward(t), within(1e-10));
      assertThat(curve.forwardSlope(t - 1e-9)).isCloseTo(curve.forwardSlope(t), within(1e-9));
    }
    assertThat(curve.forward(50)).isEqualTo(curve.forward(7));
  }

  @Test
  void aSingleNodeIsAFlatCurve() {
    for (Interpolation interpolation : Interpolation.values()) {
      if (interpolation == Interpolation.SMITH_WILSON) {
        continue;
      }
      InterpolatedCurve curve =
          InterpolatedCurve.of(interpolation, new double[] {2}, new double[] {-0.06});
      assertThat(curve.zero(0.5)).isCloseTo(0.03, within(1e-17));
      assertThat(curve.zero(20)).isCloseTo(0.03, within(1e-17));
      assertThat(curve.forward(20)).isCloseTo(0.03, within(1e-17));
    }
  }

  @Test
  void nodesThatMakeNoCurveAreRefusedInWords() {
    assertThatThrownBy(
            () ->
                InterpolatedCurve.of(
                    Interpolation.CUBIC, new double[] {1, 1}, new double[] {-0.1, -0.2}))
        .hasMessage("node times must be positive and increase, found 1.0 after 1.0");
    assertThatThrownBy(
            () -> InterpolatedCurve.of(Interpolation.CUBIC, new double[] {0}, new double[] {-0.1}))
        .hasMessageContaining("found 0.0");
    assertThatThrownBy(
            () ->
                InterpolatedCurve.of(
                    Interpolation.CUBIC, new double[] {1}, new double[] {Double.NaN}))
        .hasMessageContaining("NaN");
    assertThatThrownBy(
            () -> InterpolatedCurve.of(Interpolation.CUBIC, new double[0], new double[0]))
        .hasMessageContaining("at least one");
    assertThatThrownBy(() -> Interpolation.of("spline")).hasMessageContaining("monotone-convex");
    assertThat(Interpolation.of(" Log-Linear ")).isEqualTo(Interpolation.LOG_LINEAR);
  }

  @Test
  void anOrdinaryMonotoneConvexCurveHasNoJumpAtItsEnds() {
    // At both ends the shape sits on the border of two regions, within rounding.
    Random random = new Random(9);
    for (int i = 0; i < 200; i++) {
      double[] times = {0.5, 1, 2, 3.5};
      double[] logs = new double[4];
      double log = 0;
      for (int k = 0; k < 4; k++) {
        log -= (times[k] - (k == 0 ? 0 : times[k - 1])) * (0.02 + 0.03 * random.nextDouble());
        logs[k] = log;
      }
      assertThat(
              InterpolatedCurve.of(Interpolation.MONOTONE_CONVEX, times, logs)
                  .hasContinuousForward())
          .isTrue();
    }
  }
}
