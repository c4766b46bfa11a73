package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.FlatCurve;
import ebbline.instrument.BondTerms;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Instrument;
import ebbline.instrument.Right;
import ebbline.instrument.Swap;
import ebbline.instrument.SwapSide;
import ebbline.instrument.Swaption;
import ebbline.instrument.ZeroBond;
import ebbline.model.GaussianRates;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class ParameterDeviationTest {
  private static final List<List<Double>> COVARIANCE =
      List.of(List.of(4e-6, 3e-8), List.of(3e-8, 9e-10));
  private static final FittedParameters TWO =
      new FittedParameters(List.of("mean_reversion", "volatility"), COVARIANCE, Optional.empty());
  private static final Instrument SWAPTION =
      Swaption.of(SwapSide.PAYER, Moment.ofYears(5), Tenor.parse("5Y"), 1, OptionalDouble.of(0.03));

  private static Market market(double a, double... sigma) {
    double[] ends = new double[sigma.length - 1];
    for (int k = 0; k < ends.length; k++) {
      ends[k] = 2 * (k + 1);
    }
    return Market.of(
        TimeAxis.undated(),
        new GaussianRates(FlatCurve.of(0.03), a, VolatilitySteps.of(ends, sigma)));
  }

  private static double price(Instrument instrument, Market market) {
    return BestMethod.value(market.claim(instrument), market.rates().orElseThrow()).presentValue();
  }

  private static double deviation(FittedParameters fitted, Instrument instrument, Market market) {
    return fitted.deviation(instrument, market.claim(instrument), market);
  }

  @Test
  void itIsTheGradientThroughTheCovariance() {
    double h = 1e-5;
    double byA =
        (price(SWAPTION, market(0.05 + h, 0.01)) - price(SWAPTION, market(0.05 - h, 0.01)));
    double byS =
        (price(SWAPTION, market(0.05, 0.01 + h)) - price(SWAPTION, market(0.05, 0.01 - h)));
    byA /= 2 * h;
    byS /= 2 * h;
    double variance = byA * byA * 4e-6 + 2 * byA * byS * 3e-8 + byS * byS * 9e-10;
    assertThat(deviation(TWO, SWAPTION, market(0.05, 0.01)))
        .isCloseTo(Math.sqrt(variance), within(1e-6 * Math.sqrt(variance)));
  }

  @Test
  void stepsCarryTheirOwnUncertainty() {
    FittedParameters second =
        new FittedParameters(
            List.of("volatility_2", "market_price_of_risk"),
            List.of(List.of(1e-8, 0.0), List.of(0.0, 1.0)),
            Optional.empty());
    double h = 1e-6;
    double slope =
        (price(SWAPTION, market(0.05, 0.01, 0.012 + h, 0.009))
                - price(SWAPTION, market(0.05, 0.01, 0.012 - h, 0.009)))
            / (2 * h);
    assertThat(deviation(second, SWAPTION, market(0.05, 0.01, 0.012, 0.009)))
        .isCloseTo(1e-4 * slope, within(1e-8));
  }

  @Test
  void aBondUnderHullAndWhiteDoesNotDependOnItsParameters() {
    assertThat(deviation(TWO, ZeroBond.of(Moment.ofYears(7), 100), market(0.05, 0.01))).isZero();
  }

  @Test
  void underVasicekBondsAndSwapsMoveWithTheParameters() {
    Vasicek model = new Vasicek(0.02, 0.04, 0.2, 0.01);
    FittedParameters rate =
        new FittedParameters(List.of("short_rate"), List.of(List.of(1e-6)), Optional.of(model));
    Market market = Market.of(TimeAxis.undated(), model.rates());
    double g = model.rates().g(7);
    double bond = 100 * model.rates().curve().discount(7);
    assertThat(deviation(rate, ZeroBond.of(Moment.ofYears(7), 100), market))
        .isCloseTo(1e-3 * g * bond, within(1e-12));
    Instrument swap =
        new Swap(
            SwapSide.PAYER,
            BondTerms.of(Moment.ofYears(7), 1, DayCount.ACT_ACT_ICMA),
            0.03,
            OptionalDouble.empty());
    double h = 1e-5;
    double up =
        price(swap, Market.of(TimeAxis.undated(), new Vasicek(0.02 + h, 0.04, 0.2, 0.01).rates()));
    double down =
        price(swap, Market.of(TimeAxis.undated(), new Vasicek(0.02 - h, 0.04, 0.2, 0.01).rates()));
    assertThat(deviation(rate, swap, market)).isCloseTo(1e-3 * (up - down) / (2 * h), within(1e-6));
  }

  @Test
  void claimsWithoutAFormulaTakeDifferences() {
    CashFlows flows = CashFlows.of(new double[] {1, 2, 3, 4}, new double[] {3, 3, 3, 103});
    Claim callable =
        new Claim(
            flows,
            List.of(
                new Right(Right.Party.ISSUER, 2, 2, CashFlows.single(2, 100)),
                new Right(Right.Party.ISSUER, 3, 3, CashFlows.single(3, 100))),
            0,
            0);
    Market market = market(0.05, 0.01);
    FittedParameters sigma =
        new FittedParameters(List.of("volatility"), List.of(List.of(9e-10)), Optional.empty());
    double h = 1e-5;
    double slope =
        (BackwardInduction.value(callable, market(0.05, 0.01 + h).rates().orElseThrow())
                    .presentValue()
                - BackwardInduction.value(callable, market(0.05, 0.01 - h).rates().orElseThrow())
                    .presentValue())
            / (2 * h);
    assertThat(sigma.deviation(SWAPTION, callable, market))
        .isCloseTo(3e-5 * Math.abs(slope), within(1e-6));
  }

  @Test
  void aCovarianceHasARowAParameter() {
    assertThatThrownBy(
            () -> new FittedParameters(List.of("volatility"), COVARIANCE, Optional.empty()))
        .hasMessageContaining("a row and a column a parameter");
  }
}
