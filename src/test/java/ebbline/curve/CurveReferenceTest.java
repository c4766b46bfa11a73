package ebbline.curve;

import static org.assertj.core.api.Assertions.assertThat;

import ebbline.model.ReferenceTable;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

class CurveReferenceTest {
  private static double[] numbers(String text) {
    return Arrays.stream(text.split(" ")).mapToDouble(Double::parseDouble).toArray();
  }

  private static void assertTight(double worst, double tolerance) {
    assertThat(worst).isLessThanOrEqualTo(tolerance);
    assertThat(worst).as("tolerance is tight").isGreaterThan(tolerance / 20);
  }

  @Test
  void parametricCurvesMatchTheQuadratureOfTheirForwards() {
    ReferenceTable table = ReferenceTable.read(CurveReferenceTest.class, "svensson");
    double worst = 0;
    for (int row = 0; row < table.size(); row++) {
      SvenssonCurve curve =
          SvenssonCurve.of(
              table.number(row, "beta0"),
              table.number(row, "beta1"),
              table.number(row, "beta2"),
              table.number(row, "beta3"),
              table.number(row, "tau1"),
              table.number(row, "tau2"));
      double t = table.number(row, "time");
      worst = Math.max(worst, table.error(row, "zero", curve.zero(t)));
      worst = Math.max(worst, table.error(row, "forward", curve.forward(t)));
      worst = Math.max(worst, table.error(row, "slope", curve.forwardSlope(t)));
      assertThat(curve.logDiscount(t)).isEqualTo(-t * curve.zero(t));
    }
    assertTight(worst, table.tolerance());
  }

  @Test
  void naturalSplinesMatchTheDenseSystem() {
    ReferenceTable table = ReferenceTable.read(CurveReferenceTest.class, "natural-spline");
    double worst = 0;
    for (int row = 0; row < table.size(); row++) {
      InterpolatedCurve curve =
          InterpolatedCurve.of(
              Interpolation.CUBIC,
              numbers(table.text(row, "times")),
              numbers(table.text(row, "logs")));
      double t = table.number(row, "time");
      worst = Math.max(worst, table.error(row, "log_discount", curve.logDiscount(t)));
      worst = Math.max(worst, table.error(row, "forward", curve.forward(t)));
    }
    assertTight(worst, table.tolerance());
  }
}
