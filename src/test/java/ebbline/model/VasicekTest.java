package ebbline.model;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.DiscountCurve;
import org.junit.jupiter.api.Test;

class VasicekTest {

  @Test
  void bondPricesMatchTheQuadratureTable() {
    ReferenceTable table = ReferenceTable.read(VasicekTest.class, "vasicek-bond");
    double worst = 0;
    for (int i = 0; i < table.size(); i++) {
      Vasicek model =
          new Vasicek(
              table.number(i, "short_rate"),
              table.number(i, "long_run_mean"),
              table.number(i, "mean_reversion"),
              table.number(i, "volatility"));
      double price = model.rates().curve().discount(table.number(i, "maturity"));
      worst = Math.max(worst, table.relativeError(i, "price", price));
    }
    assertThat(worst)
        .isLessThanOrEqualTo(table.tolerance())
        .as("tolerance is tight")
        .isGreaterThan(table.tolerance() / 40);
  }

  @Test
  void theForwardRateIsTheSlopeOfTheLogDiscount() {
    for (double reversion : new double[] {-0.05, 0, 1e-9, 0.1, 2}) {
      DiscountCurve curve = new Vasicek(0.03, 0.06, reversion, 0.02).rates().curve();
      double h = 1e-3;
      for (double t : new double[] {0.5, 3, 30}) {
        double slope = (curve.logDiscount(t - h) - curve.logDiscount(t + h)) / (2 * h);
        assertThat(curve.forward(t)).isCloseTo(slope, within(1e-7 + 2e-6 * Math.abs(slope)));
        double bend = (curve.forward(t + h) - curve.forward(t - h)) / (2 * h);
        assertThat(curve.forwardSlope(t)).isCloseTo(bend, within(1e-7));
      }
      assertThat(curve.forward(0)).isEqualTo(0.03);
      assertThat(curve.zero(0)).isEqualTo(0.03);
      assertThat(curve.discount(0)).isEqualTo(1);
    }
  }

  @Test
  void theFittedDriftOfVasiceksCurveIsItsOwn() {
    Vasicek model = new Vasicek(0.03, 0.06, 0.25, 0.02);
    for (double t : new double[] {0, 0.1, 4, 40}) {
      assertThat(model.rates().drift(t)).isCloseTo(0.25 * 0.06, within(1e-16));
    }
  }

  @Test
  void pricesPassSmoothlyThroughZeroMeanReversion() {
    double at = new Vasicek(0.03, 0.05, 0, 0.015).rates().curve().discount(30);
    double below = new Vasicek(0.03, 0.05, -1e-13, 0.015).rates().curve().discount(30);
    double above = new Vasicek(0.03, 0.05, 1e-13, 0.015).rates().curve().discount(30);
    // One κ either side moves ln P by θτ²/2 − rτ²/2 + σ²τ⁴/8 times κ, about 1e-11.
    double slope = -(0.05 - 0.03) * 450 - 0.015 * 0.015 * 810000 / 8;
    assertThat(above / at - 1).isCloseTo(1e-13 * slope, within(3e-16));
    assertThat(below / at - 1).isCloseTo(-1e-13 * slope, within(3e-16));
  }

  @Test
  void bothSidesOfTheSeriesLimitAgree() {
    double limit = 5.0 / 50;
    double below = new Vasicek(0.03, 0.05, Math.nextDown(limit), 0.03).rates().curve().discount(50);
    double above = new Vasicek(0.03, 0.05, Math.nextUp(limit), 0.03).rates().curve().discount(50);
    assertThat(above / below - 1).isCloseTo(0, within(2e-15));
    below = new Vasicek(3e-4, 5e-4, Math.nextUp(-limit), 3e-5).rates().curve().discount(50);
    above = new Vasicek(3e-4, 5e-4, Math.nextDown(-limit), 3e-5).rates().curve().discount(50);
    assertThat(above / below - 1).isCloseTo(0, within(2e-15));
  }

  @Test
  void theConditionalLawGrowsIntoTheLimitingLaw() {
    Vasicek model = new Vasicek(0.01, 0.04, 0.5, 0.02);
    NormalLaw now = model.after(0, 0.01);
    assertThat(now).isEqualTo(new NormalLaw(0.01, 0));
    NormalLaw far = model.after(200, 0.01);
    assertThat(far.mean()).isCloseTo(model.limitingLaw().mean(), within(1e-17));
    assertThat(far.standardDeviation())
        .isCloseTo(model.limitingLaw().standardDeviation(), within(1e-17));
    assertThat(model.limitingLaw().standardDeviation()).isEqualTo(0.02);
    NormalLaw half = model.after(model.halfLife(), 0.01);
    assertThat(half.mean()).isCloseTo(0.025, within(1e-17));
    assertThat(half.standardDeviation()).isCloseTo(0.02 * Math.sqrt(0.75), within(1e-17));
    assertThat(half.probabilityBelow(0.025)).isCloseTo(0.5, within(1e-15));
    assertThat(new NormalLaw(1, 0).probabilityBelow(1)).isZero();
    assertThat(new NormalLaw(1, 0).probabilityBelow(2)).isEqualTo(1);
  }

  @Test
  void withoutReversionTheVarianceGrowsWithTime() {
    Vasicek model = new Vasicek(0.01, 0.04, 0, 0.02);
    assertThat(model.after(4, 0.01)).isEqualTo(new NormalLaw(0.01, 0.04));
    assertThatThrownBy(model::limitingLaw)
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("positive mean reversion, found 0.0");
    assertThatThrownBy(model::halfLife).hasMessageContaining("half-life");
    assertThatThrownBy(() -> model.riskNeutral(0.1)).hasMessageContaining("found 0");
  }

  @Test
  void aMeasureChangeMovesTheMeanOnlyAndComesBack() {
    Vasicek historical = new Vasicek(0.01, 0.04, 0.5, 0.02);
    Vasicek pricing = historical.riskNeutral(-0.25);
    assertThat(pricing).isEqualTo(new Vasicek(0.01, 0.05, 0.5, 0.02));
    assertThat(pricing.historical(-0.25)).isEqualTo(historical);
  }

  @Test
  void parametersThatMakeNoModelAreRefused() {
    assertThatThrownBy(() -> new Vasicek(Double.NaN, 0, 0, 0))
        .hasMessage("short rate must be finite, found NaN");
    assertThatThrownBy(() -> new Vasicek(0, Double.NaN, 0, 0))
        .hasMessageContaining("long-run mean");
    assertThatThrownBy(() -> new Vasicek(0, 0, Double.NaN, 0)).hasMessageContaining("reversion");
    assertThatThrownBy(() -> new Vasicek(0, 0, 0, -0.01)).hasMessageContaining("found -0.01");
    assertThatThrownBy(() -> new Vasicek(0, 0, 0, Double.NaN)).hasMessageContaining("at least 0");
    assertThatThrownBy(() -> new Vasicek(0, 0, 0.1, 0.1).after(-1, 0)).hasMessageContaining("-1.0");
    assertThatThrownBy(() -> new Vasicek(0, 0, 0.1, 0.1).riskNeutral(Double.NaN))
        .hasMessageContaining("market price of risk");
  }

  @Test
  void aFormulaCurveHasNoNodes() {
    DiscountCurve curve = new Vasicek(0.01, 0.04, 0.5, 0.02).rates().curve();
    assertThat(curve.nodes()).isEmpty();
    assertThat(curve.breaks()).containsExactly(0);
    curve.addLogDiscountGradient(3, 1, new double[0]);
  }
}
