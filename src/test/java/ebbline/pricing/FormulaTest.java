package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.model.GaussLegendre;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.StandardNormal;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import org.junit.jupiter.api.Test;

class FormulaTest {
  private static final GaussLegendre RULE = GaussLegendre.of(60);

  @Test
  void blacksFormulaIsTheIntegralItStandsFor() {
    for (double strike : new double[] {0.5, 1, 1.7}) {
      double v = 0.4;
      double kink = Math.log(strike) / v + 0.5 * v;
      double call =
          RULE.integrate(
              z -> (Math.exp(v * z - 0.5 * v * v) - strike) * StandardNormal.density(z), kink, 14);
      assertThat(BlackFormula.call(1, strike, v)).isCloseTo(call, within(1e-14));
      assertThat(BlackFormula.put(1, strike, v)).isCloseTo(call - 1 + strike, within(1e-14));
    }
  }

  @Test
  void blacksFormulaKeepsItsLimits() {
    assertThat(BlackFormula.call(2, 1, 0)).isEqualTo(1);
    assertThat(BlackFormula.put(2, 1, 0)).isZero();
    assertThat(BlackFormula.call(2, 0, 0.3)).isEqualTo(2);
    assertThat(BlackFormula.call(2, -1, 0.3)).isEqualTo(3);
    assertThat(BlackFormula.put(2, -1, 0.3)).isZero();
    assertThat(BlackFormula.call(2, 1, 1e-9)).isCloseTo(1, within(1e-15));
    assertThat(BlackFormula.call(2, 2, 80)).isEqualTo(2);
    assertThatThrownBy(() -> BlackFormula.call(0, 1, 0.1)).hasMessageContaining("found 0.0");
    assertThatThrownBy(() -> BlackFormula.put(1, 1, Double.NaN)).hasMessageContaining("NaN");
  }

  @Test
  void bacheliersFormulaIsTheIntegralItStandsFor() {
    for (double strike : new double[] {-0.02, 0.01, 0.03}) {
      double s = 0.015;
      double kink = (strike - 0.01) / s;
      double call =
          RULE.integrate(z -> (0.01 + s * z - strike) * StandardNormal.density(z), kink, 14);
      assertThat(BachelierFormula.call(0.01, strike, s)).isCloseTo(call, within(1e-16));
      assertThat(BachelierFormula.put(0.01, strike, s))
          .isCloseTo(call - 0.01 + strike, within(1e-16));
    }
    assertThat(BachelierFormula.call(0.01, 0.01, 0.02))
        .isCloseTo(0.02 / Math.sqrt(2 * Math.PI), within(1e-17));
    assertThat(BachelierFormula.call(0.03, 0.01, 0)).isCloseTo(0.02, within(1e-17));
    assertThat(BachelierFormula.put(0.03, 0.01, 0)).isZero();
    assertThatThrownBy(() -> BachelierFormula.put(1, 1, -1)).hasMessageContaining("found -1.0");
  }

  @Test
  void convexityIsTheCovarianceOfRateAndDiscountingUntilTheStart() {
    // ∫₀^T₁ of σ² (G(T₂−s) − G(T₁−s)) G(T₂−s) ds over the period's length, by quadrature.
    double sigma = 0.012;
    for (double a : new double[] {-0.05, 0, 1e-12, 0.03, 0.2}) {
      GaussianRates rates =
          new HullWhite(a, VolatilitySteps.constant(sigma))
              .on(new Vasicek(0.03, 0.03, 0, 0).rates().curve());
      double t1 = 6;
      double t2 = 6.25;
      double integral =
          RULE.integrate(
              s -> (rates.g(t2 - s) - rates.g(t1 - s)) * rates.g(t2 - s) * sigma * sigma, 0, t1);
      double integral0 =
          RULE.integrate(
              s -> 0.5 * sigma * sigma * square(rates.g(t2 - s) - rates.g(t1 - s)), 0, t1);
      assertThat(FuturesConvexity.gaussian(a, sigma, t1, t2))
          .isCloseTo((integral - integral0) / 0.25, within(1e-14));
    }
    assertThat(FuturesConvexity.gaussian(0, sigma, 6, 6.25))
        .isCloseTo(FuturesConvexity.withoutReversion(sigma, 6, 6.25), within(1e-17));
    assertThatThrownBy(() -> FuturesConvexity.gaussian(0, 0.01, 2, 2)).hasMessageContaining("2.0");
    assertThatThrownBy(() -> FuturesConvexity.withoutReversion(0.01, -1, 2))
        .hasMessageContaining("-1.0");
  }

  private static double square(double x) {
    return x * x;
  }

  @Test
  void aRateInArrearsVariesMoreThanOneFixedInAdvance() {
    GaussianRates rates =
        new HullWhite(0.1, VolatilitySteps.of(new double[] {2}, new double[] {0.01, 0.02}))
            .on(new Vasicek(0.03, 0.03, 0, 0).rates().curve());
    double first =
        RULE.integrate(s -> square(rates.g(2.25 - s) - rates.g(1.75 - s)) * 1e-4, 0, 1.75);
    double during = RULE.integrate(s -> square(rates.g(2.25 - s)) * 1e-4, 1.75, 2);
    double after = RULE.integrate(s -> square(rates.g(2.25 - s)) * 4e-4, 2, 2.25);
    double v = BackwardCaplet.deviation(rates, 1.75, 2.25);
    assertThat(v * v).isCloseTo(first + during + after, within(1e-18));
    double caplet = BackwardCaplet.caplet(rates, 1.75, 2.25, 0.5, 0.03);
    double floorlet = BackwardCaplet.floorlet(rates, 1.75, 2.25, 0.5, 0.03);
    double forward = rates.curve().discount(1.75) - (1 + 0.5 * 0.03) * rates.curve().discount(2.25);
    assertThat(caplet - floorlet).isCloseTo(forward, within(1e-16));
    assertThat(caplet).isPositive();
    assertThatThrownBy(() -> BackwardCaplet.caplet(rates, 2, 1, 0.5, 0))
        .hasMessageContaining("2.0");
  }
}
