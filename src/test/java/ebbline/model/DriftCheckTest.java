package ebbline.model;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.DiscountCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import java.util.List;
import org.junit.jupiter.api.Test;

class DriftCheckTest {
  private static final VolatilitySteps STEPS =
      VolatilitySteps.of(new double[] {0.7, 2.5, 11.0}, new double[] {0.005, 0.02, 0, 0.013});
  private static final double[] TIMES = {0.25, 1, 2, 3, 5, 7, 10, 20, 30, 50};

  @Test
  void theDriftRepricesAFormulaCurve() {
    for (double reversion : new double[] {-0.05, 0, 1e-9, 0.1, 1, 5}) {
      for (VolatilitySteps volatility :
          new VolatilitySteps[] {STEPS, VolatilitySteps.constant(0.01)}) {
        DiscountCurve curve = new Vasicek(0.03, 0.06, 0.3, 0.01).rates().curve();
        GaussianRates rates = new HullWhite(reversion, volatility).on(curve);
        DriftCheck check = DriftCheck.at(rates, TIMES);
        assertThat(check.worst()).as("a = %s", reversion).isLessThan(1e-13);
        assertThat(check.points()).isEqualTo(TIMES.length);
      }
    }
  }

  @Test
  void theDriftRepricesTheNodesOfEveryInterpolation() {
    double[] nodes = {0.25, 0.5, 1, 2, 3, 5, 7, 10, 15, 20, 30, 50};
    double[] logs = new double[nodes.length];
    for (int i = 0; i < nodes.length; i++) {
      logs[i] = -nodes[i] * (0.03 + 0.01 * Math.sin(nodes[i]) / (1 + nodes[i]));
    }
    for (Interpolation interpolation : Interpolation.values()) {
      if (interpolation == Interpolation.SMITH_WILSON) {
        continue; // not made from nodes alone
      }
      DiscountCurve curve = InterpolatedCurve.of(interpolation, nodes, logs);
      for (double reversion : new double[] {0, 0.1, 1}) {
        for (VolatilitySteps volatility : List.of(STEPS, VolatilitySteps.constant(0.01))) {
          DriftCheck check = DriftCheck.of(new HullWhite(reversion, volatility).on(curve));
          assertThat(check.points()).isEqualTo(nodes.length);
          assertThat(check.worst()).as("%s, a = %s", interpolation, reversion).isLessThan(1e-13);
        }
      }
    }
  }

  @Test
  void aWrongForwardRateIsSeen() {
    DiscountCurve curve = new OffByALittle(new Vasicek(0.03, 0.06, 0.3, 0.01).rates().curve());
    DriftCheck check =
        DriftCheck.at(new HullWhite(0.1, VolatilitySteps.constant(0.01)).on(curve), TIMES);
    assertThat(check.worst()).isBetween(0.4e-9, 0.6e-9);
    assertThat(check.at()).isEqualTo(50);
  }

  @Test
  void aCurveWithoutNodesHasNothingToCheckUnlessTimesAreGiven() {
    GaussianRates rates = new Vasicek(0.03, 0.06, 0.3, 0.01).rates();
    assertThat(DriftCheck.of(rates)).isEqualTo(new DriftCheck(0, 0, 0));
    assertThatThrownBy(() -> DriftCheck.at(rates, new double[] {2, 1}))
        .hasMessageContaining("found 1.0");
  }

  @Test
  void aRuleOfNPointsIsExactToDegreeTwiceNLessOne() {
    GaussLegendre rule = GaussLegendre.of(5);
    assertThat(rule.points()).isEqualTo(5);
    assertThat(rule.integrate(x -> Math.pow(x, 8), -1, 1)).isCloseTo(2.0 / 9, within(1e-15));
    assertThat(rule.integrate(x -> Math.pow(x, 9), 0, 1)).isCloseTo(0.1, within(1e-15));
    GaussLegendre fine = GaussLegendre.of(64);
    assertThat(fine.integrate(Math::exp, 0, 1)).isCloseTo(Math.expm1(1), within(1e-15));
    assertThat(fine.node(0)).isEqualTo(-fine.node(63));
    assertThat(fine.weight(0)).isEqualTo(fine.weight(63)).isPositive();
    assertThatThrownBy(() -> GaussLegendre.of(0)).hasMessageContaining("found 0");
  }

  private record OffByALittle(DiscountCurve curve) implements DiscountCurve {
    @Override
    public double logDiscount(double t) {
      return curve.logDiscount(t);
    }

    @Override
    public double forward(double t) {
      return curve.forward(t) + 1e-11;
    }

    @Override
    public double forwardSlope(double t) {
      return curve.forwardSlope(t);
    }

    @Override
    public double[] nodes() {
      return curve.nodes();
    }

    @Override
    public void addLogDiscountGradient(double t, double weight, double[] gradient) {}

    @Override
    public double[] breaks() {
      return curve.breaks();
    }

    @Override
    public boolean hasContinuousForward() {
      return true;
    }
  }
}
