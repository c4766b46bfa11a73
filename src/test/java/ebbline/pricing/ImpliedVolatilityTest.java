package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.instrument.OptionKind;
import ebbline.model.ReferenceTable;
import org.junit.jupiter.api.Test;

class ImpliedVolatilityTest {

  @Test
  void pricesGiveTheVolatilityOfTheReferenceTable() {
    ReferenceTable table = ReferenceTable.read(ImpliedVolatilityTest.class, "implied-volatility");
    double worst = 0;
    for (int i = 0; i < table.size(); i++) {
      OptionKind option = OptionKind.of(table.text(i, "option"));
      double f = table.number(i, "forward");
      double k = table.number(i, "strike");
      double price = table.number(i, "price");
      double found =
          table.text(i, "law").equals("black")
              ? ImpliedVolatility.black(option, f, k, 1, price, 0)
              : ImpliedVolatility.normal(option, f, k, 1, price);
      double exact = table.number(i, "deviation");
      double error = Math.abs(found / exact - 1);
      assertThat(error).as("row %d: %s", i, found).isLessThanOrEqualTo(table.tolerance());
      worst = Math.max(worst, error);
    }
    assertThat(worst).as("tolerance is tight").isGreaterThan(table.tolerance() / 20);
  }

  @Test
  void aVolatilityComesBackFromItsOwnPrice() {
    for (double years : new double[] {0.01, 1, 30}) {
      for (double moneyness = -6; moneyness <= 0; moneyness += 0.25) {
        for (double vol : new double[] {1e-5, 0.01, 0.2, 1.1}) {
          double v = vol * Math.sqrt(years);
          double k = 0.04 * Math.exp(-moneyness * v);
          double call = BlackFormula.call(0.04, k, v);
          assertThat(ImpliedVolatility.black(OptionKind.CALL, 0.04, k, years, call, 0))
              .isCloseTo(vol, within(1e-13 * vol));
          double shifted = BlackFormula.call(0.05, k + 0.01, v);
          assertThat(ImpliedVolatility.black(OptionKind.CALL, 0.04, k, years, shifted, 0.01))
              .isCloseTo(vol, within(1e-10 * vol + 1e-12));
          double low = 0.04 + moneyness * v;
          double put = BachelierFormula.put(0.04, low, v);
          assertThat(ImpliedVolatility.normal(OptionKind.PUT, 0.04, low, years, put))
              .isCloseTo(vol, within(1e-13 * vol));
        }
      }
    }
  }

  @Test
  void aPriceOf1eMinus300StillHoldsItsVolatility() {
    double found = ImpliedVolatility.normal(OptionKind.CALL, 0.02, 0.5, 1, 1e-300);
    assertThat(Math.log(BachelierFormula.call(0.02, 0.5, found)))
        .isCloseTo(Math.log(1e-300), within(1e-12));
    double black = ImpliedVolatility.black(OptionKind.CALL, 0.02, 0.5, 1, 1e-300, 0);
    assertThat(Math.log(BlackFormula.call(0.02, 0.5, black)))
        .isCloseTo(Math.log(1e-300), within(1e-12));
  }

  @Test
  void theIntrinsicValueImpliesNoVolatility() {
    assertThat(ImpliedVolatility.normal(OptionKind.CALL, 0.05, 0.03, 1, 0.02)).isZero();
    assertThat(ImpliedVolatility.black(OptionKind.PUT, 0.03, 0.05, 1, 0.02, 0)).isZero();
    assertThat(ImpliedVolatility.normal(OptionKind.CALL, 0.03, 0.05, 1, 0)).isZero();
  }

  @Test
  void aPriceBelowTheIntrinsicValueIsRefusedInWords() {
    assertThatThrownBy(() -> ImpliedVolatility.normal(OptionKind.CALL, 0.05, 0.03, 1, 0.0199))
        .hasMessage(
            "the price 0.0199000000 is below the intrinsic value 0.0200000000: no volatility gives it");
    assertThatThrownBy(() -> ImpliedVolatility.black(OptionKind.PUT, 0.03, 0.05, 1, 0.0199, 0))
        .hasMessageContaining("below the intrinsic value");
    assertThatThrownBy(() -> ImpliedVolatility.black(OptionKind.CALL, 0.03, 0.05, 1, -1e-9, 0))
        .hasMessageContaining("below the intrinsic value");
  }

  @Test
  void aPriceAtItsUpperBoundIsRefusedInWords() {
    assertThatThrownBy(() -> ImpliedVolatility.black(OptionKind.CALL, 0.03, 0.05, 1, 0.03, 0))
        .hasMessageContaining("not below 0.0300000000, the most the option can be worth");
    assertThatThrownBy(() -> ImpliedVolatility.black(OptionKind.PUT, 0.03, 0.05, 1, 0.0601, 0.01))
        .hasMessageContaining("not below 0.0600000000");
  }

  @Test
  void aForwardOrStrikeThatBlackCannotTakeIsRefused() {
    assertThatThrownBy(() -> ImpliedVolatility.black(OptionKind.CALL, -0.01, 0.01, 1, 0.001, 0))
        .hasMessageContaining("minus the shift");
    assertThat(ImpliedVolatility.black(OptionKind.CALL, -0.01, 0.01, 1, 0.001, 0.03)).isPositive();
    assertThatThrownBy(() -> ImpliedVolatility.normal(OptionKind.CALL, 0.01, 0.01, 0, 0.001))
        .hasMessageContaining("before expiry");
    assertThatThrownBy(() -> ImpliedVolatility.normal(OptionKind.CALL, Double.NaN, 0.01, 1, 0.001))
        .hasMessageContaining("finite");
  }
}
