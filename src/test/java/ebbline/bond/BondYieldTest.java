package ebbline.bond;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.FlatCurve;
import ebbline.instrument.Bill;
import ebbline.instrument.Bond;
import ebbline.instrument.BondTerms;
import ebbline.instrument.CashFlows;
import ebbline.instrument.LastPeriodRule;
import ebbline.instrument.PlacedLeg;
import ebbline.instrument.PriceRounding;
import ebbline.instrument.QuoteTerms;
import ebbline.instrument.YieldKind;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.Random;
import org.junit.jupiter.api.Test;

class BondYieldTest {

  private static BondYield street(PlacedLeg leg) {
    return BondYield.of(leg.yieldTerms(), QuoteTerms.STANDARD);
  }

  private static BondYield kind(PlacedLeg leg, YieldKind kind) {
    return BondYield.of(
        leg.yieldTerms(), new QuoteTerms(kind, LastPeriodRule.SIMPLE, PriceRounding.NONE));
  }

  private static BondYield street(String settle, String maturity, double coupon, int frequency) {
    Bond bond = Bond.of(Moment.parse(maturity), coupon, frequency, DayCount.ACT_ACT_ICMA, 100, 0);
    return street(bond.leg().on(TimeAxis.from(LocalDate.parse(settle))));
  }

  private static BondYield timed(double maturity, double coupon, int frequency) {
    Bond bond = Bond.of(Moment.ofYears(maturity), coupon, frequency, DayCount.ACT_ACT_ICMA, 100, 0);
    return street(bond.leg().on(TimeAxis.undated()));
  }

  /** ISO/IEC 29500-1 sec. 18.17.7, worked examples of DURATION and MDURATION, basis 1. */
  @Test
  void thePublishedDurationsAreMet() {
    assertThat(street("2018-07-01", "2048-01-01", 0.08, 2).macaulayDuration(0.09))
        .isCloseTo(10.9191452815919, within(5e-14));
    assertThat(street("2008-01-01", "2016-01-01", 0.08, 2).modifiedDuration(0.09))
        .isCloseTo(5.73566981391884, within(5e-15));
  }

  /** Fabozzi, Bond Markets, Analysis and Strategies, ch. 4 (from memory). */
  @Test
  void theTextbookBondsAreMet() {
    BondYield five = timed(5, 0.09, 2);
    assertThat(five.price(0.09)).isCloseTo(100, within(1e-12));
    assertThat(five.macaulayDuration(0.09)).isCloseTo(4.13, within(0.005));
    assertThat(five.convexity(0.09)).isCloseTo(19.45, within(0.005));
    BondYield long25 = timed(25, 0.09, 2);
    assertThat(long25.modifiedDuration(0.09)).isCloseTo(9.88, within(0.005));
    assertThat(long25.convexity(0.09)).isCloseTo(160.72, within(0.005));
    assertThat(timed(5, 0.06, 2).price(0.09)).isCloseTo(88.1309, within(0.00005));
  }

  /** The spreadsheet standard's PRICE with one coupon left: 100.119716209 clean. */
  @Test
  void theLastPeriodHasSimpleInterest() {
    BondYield last = street("2025-09-01", "2025-11-15", 0.0475, 2);
    double accrued = 2.375 * 109 / 184;
    assertThat(last.price(0.041) - accrued).isCloseTo(100.119716209, within(5e-10));
    assertThat(last.yieldOf(last.price(-0.03))).isCloseTo(-0.03, within(1e-14));
  }

  @Test
  void yieldsComeBackFromPrices() {
    Random random = new Random(11);
    for (int i = 0; i < 10_000; i++) {
      BondYield bond =
          timed(
              0.05 + 40 * random.nextDouble(),
              0.1 * random.nextDouble(),
              new int[] {1, 2, 4, 12}[random.nextInt(4)]);
      double yield = -0.02 + 0.2 * random.nextDouble();
      double price = bond.price(yield);
      assertThat(bond.yieldOf(price)).isCloseTo(yield, within(1e-12));
    }
  }

  @Test
  void derivativesAgreeWithFiniteDifferences() {
    Random random = new Random(12);
    for (int i = 0; i < 500; i++) {
      BondYield bond = timed(0.05 + 30 * random.nextDouble(), 0.06, 2);
      double yield = -0.01 + 0.1 * random.nextDouble();
      double h = 1e-5;
      double up = bond.price(yield + h);
      double down = bond.price(yield - h);
      double price = bond.price(yield);
      assertThat(bond.modifiedDuration(yield))
          .isCloseTo((down - up) / (2 * h * price), within(1e-6));
      assertThat(bond.convexity(yield))
          .isCloseTo((up - 2 * price + down) / (h * h * price), within(2e-2));
      assertThat(bond.dv01(yield))
          .isCloseTo((bond.price(yield - 1e-4) - bond.price(yield + 1e-4)) / 2, within(1e-15));
    }
  }

  @Test
  void extremePricesStillHaveYieldsOrAreRefused() {
    BondYield bond = timed(30, 0.05, 2);
    assertThat(bond.price(bond.yieldOf(1e-3))).isCloseTo(1e-3, within(1e-15));
    assertThat(bond.price(bond.yieldOf(1e6))).isCloseTo(1e6, within(1e-6));
    assertThatThrownBy(() -> bond.yieldOf(0)).hasMessageContaining("not above 0");
    assertThatThrownBy(() -> bond.yieldOf(Double.NaN)).hasMessageContaining("NaN");
    assertThatThrownBy(() -> bond.price(-2)).hasMessageContaining("above -2.0");
    assertThatThrownBy(() -> timed(5, -0.05, 2).yieldOf(60)).hasMessageContaining("both signs");
  }

  @Test
  void theSpreadOverACurveIsFoundAndRefused() {
    CashFlows flows = CashFlows.of(new double[] {0.5, 1, 1.5}, new double[] {3, 3, 103});
    FlatCurve curve = FlatCurve.of(0.04);
    double dirty = 0;
    for (int i = 0; i < 3; i++) {
      dirty += flows.amount(i) * Math.exp(-(0.04 + 0.0123) * (flows.time(i) - 0.25));
    }
    assertThat(ZSpread.of(flows, curve, 0.25, dirty)).isCloseTo(0.0123, within(1e-14));
    assertThat(ZSpread.of(flows, curve, 0.25, 1000)).isNegative();
    assertThatThrownBy(() -> ZSpread.of(flows, curve, 0, -1)).hasMessageContaining("found -1");
    assertThatThrownBy(() -> ZSpread.of(flows.times(-1), curve, 0, 90))
        .hasMessageContaining("both signs");
  }

  @Test
  void everyKindIsTheFormulaItsNameSays() {
    Bond bond = Bond.of(Moment.ofYears(2.25), 0.06, 2, DayCount.ACT_ACT_ICMA, 100, 0);
    PlacedLeg leg = bond.leg().on(TimeAxis.undated());
    double dirty = 103.25;
    double clean = dirty - 1.5;
    double street = kind(leg, YieldKind.STREET).yieldOf(dirty);
    assertThat(kind(leg, YieldKind.TRUE).yieldOf(dirty)).isCloseTo(street, within(1e-15));
    assertThat(kind(leg, YieldKind.ANNUAL).yieldOf(dirty))
        .isCloseTo(Math.pow(1 + street / 2, 2) - 1, within(1e-14));
    assertThat(kind(leg, YieldKind.CONTINUOUS).yieldOf(dirty))
        .isCloseTo(2 * Math.log1p(street / 2), within(1e-14));
    assertThat(kind(leg, YieldKind.SIMPLE).yieldOf(dirty))
        .isCloseTo((6 + (100 - clean) / 2.25) / clean, within(1e-15));
    double y = 0.04;
    double sum = 0;
    for (int k = 0; k < 5; k++) {
      sum += (k == 4 ? 103 : 3) / Math.pow(1 + y / 2, k);
    }
    assertThat(kind(leg, YieldKind.TREASURY).price(y)).isCloseTo(sum / 1.01, within(1e-12));
    assertThatThrownBy(() -> kind(leg, YieldKind.DISCOUNT)).hasMessageContaining("single payment");
  }

  @Test
  void aBillHasItsDiscountAndItsMoneyMarketYield() {
    PlacedLeg bill =
        new Bill(BondTerms.of(Moment.parse("2027-03-01"), 2, DayCount.ACT_360))
            .leg()
            .on(TimeAxis.from(LocalDate.of(2026, 12, 1)));
    assertThat(kind(bill, YieldKind.DISCOUNT).price(0.04))
        .isCloseTo(100 * (1 - 0.04 * 90 / 360), within(1e-13));
    assertThat(kind(bill, YieldKind.MONEY_MARKET).price(0.04))
        .isCloseTo(100 / (1 + 0.04 * 90 / 360), within(1e-13));
    assertThat(kind(bill, YieldKind.DISCOUNT).yieldOf(99)).isCloseTo(0.04, within(1e-14));
    assertThat(kind(bill, YieldKind.DISCOUNT).modifiedDuration(0.04))
        .isCloseTo(0.25 / 0.99, within(1e-14));
  }

  @Test
  void theLastPeriodFollowsItsRule() {
    PlacedLeg leg =
        Bond.of(Moment.parse("2027-03-01"), 0.06, 2, DayCount.ACT_ACT_ICMA, 100, 0)
            .leg()
            .on(TimeAxis.from(LocalDate.of(2026, 12, 1)));
    double w = 90.0 / 181;
    assertThat(last(leg, LastPeriodRule.SIMPLE)).isCloseTo(103 / (1 + w * 0.02), within(1e-13));
    assertThat(last(leg, LastPeriodRule.COMPOUND))
        .isCloseTo(103 / Math.pow(1.02, w), within(1e-13));
    assertThat(last(leg, LastPeriodRule.SIMPLE_ACT_365))
        .isCloseTo(103 / (1 + 0.04 * 90 / 365), within(1e-13));
  }

  private static double last(PlacedLeg leg, LastPeriodRule rule) {
    return BondYield.of(
            leg.yieldTerms(), new QuoteTerms(YieldKind.STREET, rule, PriceRounding.NONE))
        .price(0.04);
  }

  @Test
  void aPriceThatNoDoubleReachesIsRefusedInWords() {
    PlacedLeg leg =
        Bond.of(Moment.ofYears(9.7), 0.04, 2, DayCount.ACT_ACT_ICMA, 100, 0)
            .leg()
            .on(TimeAxis.undated());
    for (YieldKind kind :
        new YieldKind[] {
          YieldKind.STREET, YieldKind.TREASURY, YieldKind.SIMPLE, YieldKind.ANNUAL
        }) {
      assertThatThrownBy(() -> kind(leg, kind).yieldOf(1e300)).hasMessageContaining("no yield");
      BondYield bond = kind(leg, kind);
      assertThat(bond.price(bond.yieldOf(1e4))).isCloseTo(1e4, within(1e-6));
    }
    assertThatThrownBy(() -> kind(leg, YieldKind.STREET).yieldOf(1e-300))
        .hasMessageContaining("no yield");
  }
}
