package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.bond.ZSpread;
import ebbline.curve.FlatCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.instrument.Right.Party;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import java.util.List;
import org.junit.jupiter.api.Test;

class OptionAdjustedTest {
  private static final GaussianRates RATES =
      new HullWhite(0.1, VolatilitySteps.constant(0.01)).on(FlatCurve.of(0.05));
  private static final Claim CALLABLE =
      BackwardInductionTest.bond(20, 2, 5, Party.ISSUER, 4, 19, 100);

  private static OptionAdjusted callable() {
    return new OptionAdjusted(CALLABLE, RATES);
  }

  @Test
  void aSpreadGivesAPriceThatGivesTheSpread() {
    for (double spread : new double[] {-0.012, 0, 0.0035, 0.02, 0.3}) {
      double price = callable().dirtyPrice(spread).presentValue();
      assertThat(callable().spread(price)).isCloseTo(spread, within(1e-10));
    }
  }

  @Test
  void aSpreadOnAFlatCurveIsAHigherFlatCurve() {
    GaussianRates higher = new HullWhite(0.1, RATES.volatility()).on(FlatCurve.of(0.06));
    assertThat(callable().dirtyPrice(0.01).presentValue())
        .isCloseTo(BackwardInduction.value(CALLABLE, higher).presentValue(), within(1e-11));
    assertThat(callable().rightsValue(0.01).presentValue())
        .isCloseTo(BackwardInduction.rightsValue(CALLABLE, higher).presentValue(), within(1e-11));
  }

  @Test
  void withoutRightsTheSpreadIsTheZSpreadAndTheDurationThatOfTheFlows() {
    Claim settled = new Claim(CALLABLE.flows(), List.of(), 0.1, 0);
    OptionAdjusted straight = new OptionAdjusted(settled, RATES);
    double z = ZSpread.of(settled.flows(), RATES.curve(), 0.1, 97);
    assertThat(straight.spread(97)).isCloseTo(z, within(1e-11));
    double sum = 0;
    double first = 0;
    double second = 0;
    for (int i = 0; i < settled.flows().size(); i++) {
      double t = settled.flows().time(i) - 0.1;
      double value = settled.flows().amount(i) * Math.exp(-(0.05 + z) * t);
      sum += value;
      first += Math.sinh(0.001 * t) / 0.001 * value;
      second += 2 * (Math.cosh(0.001 * t) - 1) / 1e-6 * value;
    }
    assertThat(straight.effectiveDuration(z)).isCloseTo(first / sum, within(1e-11));
    assertThat(straight.effectiveConvexity(z)).isCloseTo(second / sum, within(1e-6));
    assertThat(straight.rightsValue(z).presentValue()).isZero();
    assertThat(straight.vega(z)).containsExactly(0);
  }

  @Test
  void aCallShortensTheBondAndBendsItTheOtherWay() {
    OptionAdjusted straight = new OptionAdjusted(Claim.of(CALLABLE.flows()), RATES);
    assertThat(callable().effectiveDuration(-0.01))
        .isLessThan(0.7 * straight.effectiveDuration(-0.01));
    assertThat(callable().effectiveConvexity(0)).isNegative();
    assertThat(straight.effectiveConvexity(0)).isPositive();
    assertThat(callable().rightsValue(0).presentValue()).isNegative();
    assertThat(callable().spread(95)).isLessThan(straight.spread(95));
  }

  @Test
  void vegasOfTheStepsAddUpToTheVegaOfTheLevel() {
    GaussianRates stepped =
        new HullWhite(0.1, VolatilitySteps.of(new double[] {2, 5}, new double[] {.01, .01, .01}))
            .on(RATES.curve());
    double[] parts = new OptionAdjusted(CALLABLE, stepped).vega(0.002);
    double whole = callable().vega(0.002)[0];
    assertThat(parts).hasSize(3);
    assertThat(parts[0] + parts[1] + parts[2]).isCloseTo(whole, within(1e-6));
    assertThat(whole).isNegative();
    double wide =
        new OptionAdjusted(
                    CALLABLE,
                    new HullWhite(0.1, VolatilitySteps.constant(0.0101)).on(RATES.curve()))
                .dirtyPrice(0.002)
                .presentValue()
            - callable().dirtyPrice(0.002).presentValue();
    assertThat(whole).isCloseTo(wide, within(2e-4));
  }

  @Test
  void aPriceBeyondReachIsRefusedInWords() {
    Claim option =
        new Claim(
            CashFlows.NONE, List.of(new Right(Party.HOLDER, 1, 1, CashFlows.single(2, 1))), 0, 0);
    OptionAdjusted adjusted = new OptionAdjusted(option, RATES);
    assertThatThrownBy(() -> adjusted.spread(-3)).hasMessageContaining("found -3.0");
    assertThatThrownBy(() -> adjusted.spread(Double.NaN)).hasMessageContaining("found NaN");
  }
}
