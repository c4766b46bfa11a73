package ebbline.curve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class ParametricCurveTest {
  /** Parameters of 2013-10-08 [Gürkaynak, Sack & Wright 2007, Fed data file feds200628.csv]. */
  private static final SvenssonCurve PUBLISHED =
      SvenssonCurve.of(
          0.0424093854440214,
          -0.040192010570678,
          -0.0593306072006047,
          0.0243959006657427,
          2.29299258787334,
          5.96162847847292);

  @Test
  void thePublishedYieldsAndForwardsAreMet() {
    double[][] printed = {
      {1, 0.1940, 0.3154}, {2, 0.4088, 0.9828}, {5, 1.4596, 3.2097},
      {10, 2.7905, 4.6240}, {20, 3.7177, 4.5176}, {30, 3.9460, 4.3209}
    };
    for (double[] row : printed) {
      assertThat(100 * PUBLISHED.zero(row[0])).isCloseTo(row[1], within(0.00005));
      assertThat(100 * PUBLISHED.forward(row[0])).isCloseTo(row[2], within(0.00005));
    }
  }

  @Test
  void forwardsAndSlopesAreDerivatives() {
    for (double t : new double[] {1e-6, 0.01, 0.5, 2.2929, 2.5, 7, 30, 60}) {
      double h = Math.min(1e-4, t / 2);
      double slope = (PUBLISHED.logDiscount(t - h) - PUBLISHED.logDiscount(t + h)) / (2 * h);
      assertThat(PUBLISHED.forward(t)).isCloseTo(slope, within(1e-9));
      double bend = (PUBLISHED.forward(t + h) - PUBLISHED.forward(t - h)) / (2 * h);
      assertThat(PUBLISHED.forwardSlope(t)).isCloseTo(bend, within(1e-9));
    }
    assertThat(PUBLISHED.zero(0)).isCloseTo(0.0424093854440214 - 0.040192010570678, within(1e-17));
    assertThat(PUBLISHED.logDiscount(0)).isZero();
  }

  @Test
  void theLoadingsAreSmoothWhereTheirFormulaeChange() {
    assertThat(Loadings.curvature(Math.nextUp(1.0)))
        .isCloseTo(Loadings.curvature(1.0), within(2e-16));
    // (1 − e^(−u))/u − e^(−u) to 17 digits, evaluated with 50 digits
    assertThat(Loadings.curvature(1e-9)).isCloseTo(4.999999996666667e-10, within(1e-25));
    assertThat(Loadings.curvature(1.0)).isCloseTo(0.2642411176571154, within(1e-16));
    assertThat(Loadings.curvature(0)).isZero();
  }

  @Test
  void nelsonAndSiegelIsSvenssonWithoutItsLastTerm() {
    SvenssonCurve curve = SvenssonCurve.nelsonSiegel(0.04, -0.02, 0.01, 1.5);
    double u = 3 / 1.5;
    double slope = (1 - Math.exp(-u)) / u;
    assertThat(curve.zero(3))
        .isCloseTo(0.04 - 0.02 * slope + 0.01 * (slope - Math.exp(-u)), within(1e-16));
  }

  @Test
  void parametersThatMakeNoCurveAreRefused() {
    assertThatThrownBy(() -> SvenssonCurve.of(0, 0, 0, 0, 0, 1)).hasMessageContaining("found 0.0");
    assertThatThrownBy(() -> SvenssonCurve.of(Double.NaN, 0, 0, 0, 1, 1))
        .hasMessageContaining("NaN");
    assertThatThrownBy(() -> FlatCurve.of(Double.POSITIVE_INFINITY))
        .hasMessageContaining("Infinity");
  }

  @Test
  void ratesAndDiscountsConvertBothWays() {
    for (Compounding compounding : Compounding.values()) {
      for (double rate : new double[] {-0.02, 0, 0.05, 0.9}) {
        for (double t : new double[] {0.01, 1, 7.3, 40}) {
          if (compounding == Compounding.SIMPLE && 1 + rate * t <= 0) {
            continue;
          }
          double log = compounding.logDiscount(rate, t);
          assertThat(compounding.rate(log, t)).isCloseTo(rate, within(1e-14));
        }
      }
      assertThat(Compounding.of(compounding.label())).isEqualTo(compounding);
    }
    assertThat(Compounding.SEMI_ANNUAL.discount(0.06, 2))
        .isCloseTo(Math.pow(1.03, -4), within(1e-15));
    assertThat(Compounding.SIMPLE.discount(0.06, 0.5)).isCloseTo(1 / 1.03, within(1e-16));
    assertThatThrownBy(() -> Compounding.ANNUAL.discount(-1, 1)).hasMessageContaining("annual");
    assertThatThrownBy(() -> Compounding.of("weekly")).hasMessageContaining("semi-annual");
  }

  @Test
  void tausOfAnySizeLeaveFiniteFigures() {
    for (double tau : new double[] {1e-300, 1e-9, 1e9, 1e300}) {
      SvenssonCurve curve = SvenssonCurve.of(0.03, -0.01, 0.02, 0.01, tau, tau);
      for (double t : new double[] {0, 1e-300, 1, 800 * Math.min(tau, 1e6), 1000}) {
        assertThat(curve.zero(t)).isFinite();
        assertThat(curve.logDiscount(t)).isFinite();
        assertThat(curve.forward(t)).isFinite();
      }
      assertThat(curve.forwardSlope(1)).isFinite();
    }
    assertThat(SvenssonCurve.of(0.03, -0.01, 0.02, 0.01, 1e-300, 1e-300).zero(1)).isEqualTo(0.03);
  }

  @Test
  void ratesThatNoDiscountFactorHasAreRefused() {
    assertThatThrownBy(() -> Compounding.SIMPLE.logDiscount(-0.5, 2))
        .hasMessageContaining("found -0.5 over 2.0 years");
    assertThat(Compounding.SIMPLE.logDiscount(-0.5, 1.99)).isPositive();
    assertThatThrownBy(() -> Compounding.CONTINUOUS.logDiscount(Double.NaN, 2))
        .hasMessageContaining("NaN");
    assertThatThrownBy(() -> Compounding.ANNUAL.rate(-0.1, 0)).hasMessageContaining("above 0");
  }
}
