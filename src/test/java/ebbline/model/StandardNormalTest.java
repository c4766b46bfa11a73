package ebbline.model;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class StandardNormalTest {
  private static final ReferenceTable TABLE =
      ReferenceTable.read(StandardNormalTest.class, "normal-law");

  @Test
  void theDistributionFunctionIsGoodToThreeUnitsOfTheLastPlace() {
    double worst = 0;
    double worstDensity = 0;
    double worstLog = 0;
    for (int i = 0; i < TABLE.size(); i++) {
      double x = TABLE.number(i, "x");
      worst = Math.max(worst, TABLE.ulps(i, "cdf", StandardNormal.cdf(x)));
      worst = Math.max(worst, TABLE.ulps(i, "cdf", StandardNormal.upper(-x)));
      worstDensity = Math.max(worstDensity, TABLE.ulps(i, "density", StandardNormal.density(x)));
      worstLog = Math.max(worstLog, TABLE.ulps(i, "log_cdf", StandardNormal.logCdf(x)));
    }
    assertThat(worst).isLessThanOrEqualTo(TABLE.tolerance()).isGreaterThan(TABLE.tolerance() / 20);
    assertThat(worstDensity).isLessThanOrEqualTo(TABLE.tolerance());
    assertThat(worstLog).isLessThanOrEqualTo(TABLE.tolerance());
  }

  @Test
  void theTailsEndInZeroAndOne() {
    assertThat(StandardNormal.cdf(-38.4)).isPositive();
    assertThat(StandardNormal.cdf(-39)).isZero();
    assertThat(StandardNormal.cdf(Double.NEGATIVE_INFINITY)).isZero();
    assertThat(StandardNormal.cdf(8.2)).isLessThan(1);
    assertThat(StandardNormal.cdf(9)).isEqualTo(1);
    assertThat(StandardNormal.cdf(Double.POSITIVE_INFINITY)).isEqualTo(1);
    assertThat(StandardNormal.density(1e200)).isZero();
    assertThat(StandardNormal.cdf(Double.NaN)).isNaN();
  }

  @Test
  void theLogarithmGoesOnWhereTheFunctionIsZero() {
    // Leading terms of the tail's expansion: −x²/2 − ln(x√(2π)) + ln(1 − 1/x²).
    double x = 1000;
    double expected =
        -0.5 * x * x - Math.log(x * Math.sqrt(2 * Math.PI)) + Math.log1p(-1 / (x * x));
    assertThat(StandardNormal.logCdf(-x)).isCloseTo(expected, within(1e-10));
    assertThat(StandardNormal.logCdf(40)).isZero();
  }

  @Test
  void theProbabilityBetweenTwoValuesIsTakenFromTheSmallSide() {
    double far = StandardNormal.between(9, 10);
    assertThat(far).isEqualTo(StandardNormal.between(-10, -9)).isPositive();
    assertThat(StandardNormal.between(-1, 1)).isCloseTo(0.6826894921370859, within(3e-16));
  }
}
