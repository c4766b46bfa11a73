package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.FlatCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import java.util.List;
import org.junit.jupiter.api.Test;

class ExtremeModelTest {
  private static Claim option(double amountNow, double amountLater) {
    CashFlows received = CashFlows.of(new double[] {1, 3}, new double[] {amountNow, amountLater});
    return new Claim(CashFlows.NONE, List.of(new Right(Right.Party.HOLDER, 1, 1, received)), 0, 0);
  }

  @Test
  void anOptionOnABondBeyondCountingIsRefusedAndNotWorthless() {
    for (double meanReversion : new double[] {-5, -10, -50}) {
      GaussianRates rates = new Vasicek(0.05, 0.08, meanReversion, 0.015).rates();
      assertThatThrownBy(() -> ClosedForm.value(option(-87, 100), rates))
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessage(
              "under these parameters a flow is worth more than can be counted; they are too"
                  + " extreme");
    }
  }

  @Test
  void aVolatilityWithoutBoundIsRefusedAndALargeOneReachesItsLimit() {
    GaussianRates large = new HullWhite(0.1, VolatilitySteps.constant(100)).on(FlatCurve.of(0.05));
    double limit = 98 * Math.exp(-0.05); // a put on a bond that is almost surely worth nothing
    assertThat(ClosedForm.value(option(98, -100), large).presentValue())
        .isCloseTo(limit, within(1e-12 * limit));
    GaussianRates endless =
        new HullWhite(0.1, VolatilitySteps.constant(1e298)).on(FlatCurve.of(0.05));
    assertThatThrownBy(() -> ClosedForm.value(option(98, -100), endless))
        .hasMessageContaining("too extreme");
  }
}
