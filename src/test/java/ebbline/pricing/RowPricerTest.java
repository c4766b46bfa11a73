package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.instrument.Bond;
import ebbline.instrument.BookRow;
import ebbline.instrument.Instrument;
import ebbline.instrument.OptionKind;
import ebbline.instrument.ZeroBond;
import ebbline.instrument.ZeroOption;
import ebbline.model.Vasicek;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class RowPricerTest {
  private static final Market FLAT = Market.of(TimeAxis.undated(), FlatCurve.of(0.05));
  private static final Bond BOND =
      Bond.of(Moment.ofYears(2.25), 0.06, 2, DayCount.ACT_ACT_ICMA, 100, 0);

  private static BookRow row(Instrument instrument, double face) {
    return new BookRow(
        "a", instrument, face, OptionalDouble.empty(), OptionalDouble.empty(), Map.of());
  }

  private static double figure(PricedRow row, PriceFigure figure) {
    return row.figure(figure).orElseThrow();
  }

  @Test
  void aBondIsTheSumOfItsDiscountedFlows() {
    PricedRow priced = new RowPricer(FLAT, PricingRequest.STANDARD).price(row(BOND, -2000));
    double sum = 0;
    for (int k = 0; k < 5; k++) {
      double t = 0.25 + 0.5 * k;
      sum += (k == 4 ? 103 : 3) * Math.exp(-0.05 * t);
    }
    assertThat(figure(priced, PriceFigure.PRESENT_VALUE)).isCloseTo(-20 * sum, within(1e-11));
    assertThat(figure(priced, PriceFigure.DIRTY_PRICE)).isCloseTo(sum, within(1e-12));
    assertThat(figure(priced, PriceFigure.ACCRUED)).isCloseTo(1.5, within(1e-14));
    assertThat(figure(priced, PriceFigure.CLEAN_PRICE)).isCloseTo(sum - 1.5, within(1e-12));
    assertThat(figure(priced, PriceFigure.ERROR_BOUND)).isBetween(1e-14, 1e-9);
    assertThat(priced.method()).contains(Method.DISCOUNTING);
    assertThat(priced.figure(PriceFigure.MARKET_YIELD)).isEmpty();
  }

  @Test
  void theDirtyPriceIsCarriedToSettlement() {
    TimeAxis axis = TimeAxis.from(LocalDate.of(2026, 11, 27));
    Bond bond = Bond.of(Moment.parse("2028-12-01"), 0.04, 2, DayCount.ACT_ACT_ICMA, 100, 2);
    PricedRow priced =
        new RowPricer(Market.of(axis, FlatCurve.of(0.05)), PricingRequest.STANDARD)
            .price(row(bond, 100));
    double settlement = 4 / 365.0;
    assertThat(figure(priced, PriceFigure.DIRTY_PRICE))
        .isCloseTo(
            figure(priced, PriceFigure.PRESENT_VALUE) * Math.exp(0.05 * settlement), within(1e-12));
  }

  @Test
  void aQuotedPriceGivesMarketFiguresBesideTheCurves() {
    BookRow quoted =
        new BookRow("a", BOND, 100, OptionalDouble.of(101), OptionalDouble.empty(), Map.of());
    PricedRow priced = new RowPricer(FLAT, PricingRequest.STANDARD).price(quoted);
    assertThat(figure(priced, PriceFigure.MARKET_CLEAN_PRICE)).isCloseTo(101, within(1e-13));
    assertThat(figure(priced, PriceFigure.RICHNESS))
        .isCloseTo(101 - figure(priced, PriceFigure.CLEAN_PRICE), within(1e-12));
    BookRow byYield =
        new BookRow(
            "a",
            BOND,
            100,
            OptionalDouble.empty(),
            OptionalDouble.of(figure(priced, PriceFigure.MARKET_YIELD)),
            Map.of());
    PricedRow again = new RowPricer(FLAT, PricingRequest.STANDARD).price(byYield);
    assertThat(figure(again, PriceFigure.MARKET_CLEAN_PRICE)).isCloseTo(101, within(1e-10));
    assertThat(figure(again, PriceFigure.Z_SPREAD))
        .isCloseTo(figure(priced, PriceFigure.Z_SPREAD), within(1e-12));
  }

  @Test
  void theSpreadOfTheCurvesOwnPriceIsZero() {
    PricedRow fair = new RowPricer(FLAT, PricingRequest.STANDARD).price(row(BOND, 100));
    BookRow quoted =
        new BookRow(
            "a",
            BOND,
            100,
            OptionalDouble.of(figure(fair, PriceFigure.CLEAN_PRICE)),
            OptionalDouble.empty(),
            Map.of());
    PricedRow priced = new RowPricer(FLAT, PricingRequest.STANDARD).price(quoted);
    assertThat(figure(priced, PriceFigure.Z_SPREAD)).isCloseTo(0, within(1e-14));
    assertThat(figure(priced, PriceFigure.RICHNESS)).isCloseTo(0, within(1e-12));
  }

  @Test
  void anOptionNeedsAModelAndSaysSo() {
    ZeroOption option =
        new ZeroOption(OptionKind.CALL, Moment.ofYears(1), ZeroBond.of(Moment.ofYears(3), 100), 87);
    PricedRow failed = new RowPricer(FLAT, PricingRequest.STANDARD).price(row(option, 100));
    assertThat(failed.hasFailed()).isTrue();
    assertThat(failed.message()).contains("needs a model");
    assertThat(failed.method()).isEmpty();
    Market vasicek = Market.of(TimeAxis.undated(), new Vasicek(0.05, 0.08, 0.1, 0.015).rates());
    PricedRow priced = new RowPricer(vasicek, PricingRequest.STANDARD).price(row(option, 1000));
    // Hull, Options, Futures, and Other Derivatives, 11th ed., Problem 32.3: 2.59 per 100
    assertThat(figure(priced, PriceFigure.PRESENT_VALUE)).isCloseTo(25.92983062, within(1e-8));
    assertThat(priced.figure(PriceFigure.CLEAN_PRICE)).isEmpty();
    assertThat(priced.method()).contains(Method.CLOSED_FORM);
  }

  @Test
  void aMethodThatDoesNotApplyIsRefusedInTheRow() {
    PricedRow failed =
        new RowPricer(FLAT, new PricingRequest(Optional.of(Method.QUOTED), 500, Optional.empty()))
            .price(row(BOND, 100));
    assertThat(failed.hasFailed()).isTrue();
    assertThat(failed.message()).contains("does not price this row");
  }

  @Test
  void aBondPastItsMaturityFailsInItsRow() {
    Bond old = Bond.of(Moment.ofYears(-1), 0.06, 2, DayCount.ACT_ACT_ICMA, 100, 0);
    PricedRow failed = new RowPricer(FLAT, PricingRequest.STANDARD).price(row(old, 100));
    assertThat(failed.hasFailed()).isTrue();
    assertThat(failed.message()).isEqualTo("maturity must lie after today, found -1.0");
  }

  @Test
  void aPaymentBeyondTheCurveIsSaid() {
    Market two =
        Market.of(
            TimeAxis.undated(),
            InterpolatedCurve.of(
                Interpolation.LOG_LINEAR, new double[] {1, 2}, new double[] {-0.05, -0.1}));
    assertThat(new RowPricer(two, PricingRequest.STANDARD).price(row(BOND, 100)).message())
        .isEqualTo("pays beyond the curve's last node at 2.000 years, where it is extended");
    assertThat(new RowPricer(FLAT, PricingRequest.STANDARD).price(row(BOND, 100)).message())
        .isEmpty();
  }
}
