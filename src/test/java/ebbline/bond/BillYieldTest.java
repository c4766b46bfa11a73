package ebbline.bond;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.FlatCurve;
import ebbline.instrument.CashFlows;
import org.junit.jupiter.api.Test;

class BillYieldTest {

  @Test
  void pricesAndRatesAreEachOthersInverse() {
    for (double rate : new double[] {-0.01, 0, 0.001, 0.05, 0.3}) {
      for (int days : new int[] {1, 91, 182, 364}) {
        assertThat(BillYield.discountRate(BillYield.priceAtDiscount(rate, days, 360), days, 360))
            .isCloseTo(rate, within(1e-11));
        assertThat(BillYield.simpleYield(BillYield.priceAtSimple(rate, days, 365), days, 365))
            .isCloseTo(rate, within(1e-11));
        double years = days / 252.0;
        assertThat(BillYield.annualYield(BillYield.priceAtAnnual(rate, years), years))
            .isCloseTo(rate, within(1e-11));
      }
    }
  }

  @Test
  void theCouponEquivalentSolvesItsEquation() {
    double price = 92.265;
    double i = BillYield.couponEquivalent(price, 364, 365);
    assertThat(price * (1 + (364.0 / 365 - 0.5) * i) * (1 + i / 2)).isCloseTo(100, within(1e-11));
    assertThat(BillYield.couponEquivalent(98, 182, 365))
        .isEqualTo(BillYield.simpleYield(98, 182, 365));
  }

  @Test
  void whatMakesNoPriceIsSaidInWords() {
    assertThatThrownBy(() -> BillYield.simpleYield(0, 91, 360)).hasMessageContaining("price");
    assertThatThrownBy(() -> BillYield.priceAtDiscount(0.05, 0, 360)).hasMessageContaining("days");
    assertThatThrownBy(() -> BillYield.priceAtSimple(-5, 91, 360)).hasMessageContaining("above");
    assertThatThrownBy(() -> BillYield.priceAtAnnual(-1, 1)).hasMessageContaining("above -1");
  }

  @Test
  void aBondAtItsPriceOnTheCurveSwapsAtNoSpread() {
    CashFlows flows = CashFlows.of(new double[] {0.5, 1}, new double[] {3, 103});
    FlatCurve curve = FlatCurve.of(0.04);
    double price = 3 * curve.discount(0.5) + 103 * curve.discount(1);
    double[] times = {0.5, 1};
    assertThat(AssetSwap.spread(flows, curve, 0, times, price)).isCloseTo(0, within(1e-15));
    double annuity = 0.5 * (curve.discount(0.5) + curve.discount(1));
    assertThat(AssetSwap.spread(flows, curve, 0, times, price - annuity))
        .isCloseTo(0.01, within(1e-14));
  }

  @Test
  void aNoteWhoseMarginIsItsSpreadIsWorthPar() {
    DiscountMargin note = new DiscountMargin(0.03, 0.002);
    assertThat(note.price(0, new int[] {91, 92, 90}, 0.002)).isCloseTo(100, within(1e-12));
    assertThat(new DiscountMargin(-0.01, 0.001).interest(90)).isZero();
  }
}
