package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.DiscountCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.curve.SpreadCurve;
import ebbline.instrument.BondTerms;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Instrument;
import ebbline.instrument.OptionKind;
import ebbline.instrument.RateBasis;
import ebbline.instrument.RateOption;
import ebbline.instrument.RateOptionStrip;
import ebbline.instrument.Right;
import ebbline.instrument.Swap;
import ebbline.instrument.SwapSide;
import ebbline.instrument.Swaption;
import ebbline.instrument.ZeroBond;
import ebbline.instrument.ZeroOption;
import ebbline.model.GaussLegendre;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.StandardNormal;
import ebbline.model.StateStep;
import ebbline.model.VolatilitySteps;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class RateOptionsTest {
  private static final DiscountCurve CURVE =
      InterpolatedCurve.ofDiscounts(
          Interpolation.MONOTONE_CONVEX,
          new double[] {0.5, 1, 2, 5, 10, 20, 30},
          new double[] {0.985, 0.968, 0.934, 0.83, 0.672, 0.43, 0.29});
  private static final HullWhite MODEL =
      new HullWhite(
          0.04, VolatilitySteps.of(new double[] {1.5, 4}, new double[] {0.007, 0.011, 0.009}));
  private static final Market MARKET = Market.of(TimeAxis.undated(), MODEL.on(CURVE));
  private static final OptionalDouble ATM = OptionalDouble.empty();

  private static double price(Instrument instrument, Market market) {
    Claim claim = market.claim(instrument);
    return claim.isCertain()
        ? Discounting.value(claim, market.curve()).presentValue()
        : ClosedForm.value(claim, market.rates().orElseThrow()).presentValue();
  }

  private static Swaption swaption(SwapSide side, double strike) {
    return Swaption.of(side, Moment.ofYears(3), Tenor.parse("7Y"), 2, OptionalDouble.of(strike));
  }

  private static Swap swap(SwapSide side, double start, double end, int frequency, double rate) {
    BondTerms terms =
        BondTerms.of(Moment.ofYears(end), frequency, DayCount.ACT_ACT_ICMA)
            .withEnds(ebbline.instrument.OddPeriods.from(Moment.ofYears(start)));
    return new Swap(side, terms, rate, OptionalDouble.empty());
  }

  private static RateOptionStrip strip(OptionKind option, OptionalDouble strike, RateBasis basis) {
    return new RateOptionStrip(
        option, BondTerms.of(Moment.ofYears(5), 4, DayCount.ACT_ACT_ICMA), strike, basis);
  }

  @Test
  void payerLessReceiverIsTheForwardSwap() {
    Market two = MARKET.withProjection(new SpreadCurve(CURVE, 0.004));
    for (Market market : new Market[] {MARKET, two}) {
      for (double strike : new double[] {-0.01, 0.02, 0.04, 0.09}) {
        double difference =
            price(swaption(SwapSide.PAYER, strike), market)
                - price(swaption(SwapSide.RECEIVER, strike), market);
        assertThat(difference)
            .isCloseTo(price(swap(SwapSide.PAYER, 3, 10, 2, strike), market), within(1e-12));
      }
    }
  }

  @Test
  void capLessFloorIsTheSwapWhetherRatesAreKnownBeforeOrAfter() {
    Market two = MARKET.withProjection(new SpreadCurve(CURVE, -0.002));
    for (Market market : new Market[] {MARKET, two}) {
      for (RateBasis basis : RateBasis.values()) {
        for (double strike : new double[] {-0.03, 0.01, 0.035, 0.2}) {
          OptionalDouble k = OptionalDouble.of(strike);
          double difference =
              price(strip(OptionKind.CALL, k, basis), market)
                  - price(strip(OptionKind.PUT, k, basis), market);
          assertThat(difference)
              .isCloseTo(price(swap(SwapSide.PAYER, 0.25, 5, 4, strike), market), within(1e-12));
        }
      }
    }
  }

  @Test
  void aReceiverSwaptionIsACallOnTheFixedLegWithItsNotional() {
    double[] times = new double[14];
    double[] amounts = new double[14];
    for (int j = 0; j < 14; j++) {
      times[j] = 3 + 0.5 * (j + 1);
      amounts[j] = 0.5 * 3.5 + (j == 13 ? 100 : 0);
    }
    CashFlows bond = CashFlows.single(3, -100).plus(CashFlows.of(times, amounts));
    Claim call =
        new Claim(
            CashFlows.NONE, java.util.List.of(new Right(Right.Party.HOLDER, 3, 3, bond)), 0, 0);
    assertThat(price(swaption(SwapSide.RECEIVER, 0.035), MARKET))
        .isCloseTo(
            ClosedForm.value(call, MARKET.rates().orElseThrow()).presentValue(), within(1e-13));
  }

  @Test
  void aCapletIsPutsOnTheBondOfItsEnd() {
    RateOption caplet =
        new RateOption(
            OptionKind.CALL,
            Moment.ofYears(2),
            BondTerms.of(Moment.ofYears(2.25), 4, DayCount.ACT_ACT_ICMA),
            OptionalDouble.of(0.03),
            RateBasis.FORWARD);
    double puts = 1 + 0.25 * 0.03;
    ZeroOption put =
        new ZeroOption(
            OptionKind.PUT, Moment.ofYears(2), ZeroBond.of(Moment.ofYears(2.25), 100), 100 / puts);
    assertThat(price(caplet, MARKET)).isCloseTo(puts * price(put, MARKET), within(1e-13));
  }

  @Test
  void atTheMoneyBothSidesAreWorthTheSame() {
    for (Market market :
        new Market[] {MARKET, MARKET.withProjection(new SpreadCurve(CURVE, 0.004))}) {
      Swaption payer = Swaption.of(SwapSide.PAYER, Moment.ofYears(2), Tenor.parse("5Y"), 1, ATM);
      Swaption receiver =
          Swaption.of(SwapSide.RECEIVER, Moment.ofYears(2), Tenor.parse("5Y"), 1, ATM);
      assertThat(price(payer, market)).isCloseTo(price(receiver, market), within(1e-12));
      for (RateBasis basis : RateBasis.values()) {
        assertThat(price(strip(OptionKind.CALL, ATM, basis), market))
            .isCloseTo(price(strip(OptionKind.PUT, ATM, basis), market), within(1e-12));
      }
    }
    ZeroBond zero = ZeroBond.of(Moment.ofYears(4), 100);
    assertThat(price(new ZeroOption(OptionKind.CALL, Moment.ofYears(1), zero, ATM), MARKET))
        .isCloseTo(
            price(new ZeroOption(OptionKind.PUT, Moment.ofYears(1), zero, ATM), MARKET),
            within(1e-12));
  }

  @Test
  void theForwardSwapRateIsTheStrikeAtTheMoney() {
    Swaption payer = Swaption.of(SwapSide.PAYER, Moment.ofYears(2), Tenor.parse("5Y"), 1, ATM);
    double strike =
        MARKET.claim(payer).rights().get(0).strike().orElseThrow().value().orElseThrow();
    double annuity = 0;
    for (int t = 3; t <= 7; t++) {
      annuity += CURVE.discount(t);
    }
    assertThat(strike).isCloseTo((CURVE.discount(2) - CURVE.discount(7)) / annuity, within(1e-16));
  }

  @Test
  void noPriceFallsWhenVolatilityRises() {
    double[] before = new double[4];
    for (double sigma = 0; sigma < 0.03; sigma += 0.001) {
      Market market =
          Market.of(
              TimeAxis.undated(), new HullWhite(0.04, VolatilitySteps.constant(sigma)).on(CURVE));
      double[] now = {
        price(swaption(SwapSide.PAYER, 0.05), market),
        price(swaption(SwapSide.RECEIVER, 0.03), market),
        price(strip(OptionKind.CALL, OptionalDouble.of(0.05), RateBasis.BACKWARD), market),
        price(strip(OptionKind.PUT, OptionalDouble.of(0.03), RateBasis.FORWARD), market)
      };
      for (int i = 0; i < now.length; i++) {
        assertThat(now[i]).isGreaterThanOrEqualTo(before[i]);
      }
      before = now;
    }
  }

  /** ∫ of the payoff over the growth's law, its variance itself an integral. */
  @Test
  void aBackwardLookingCapletIsTheQuadratureOfItsPayoff() {
    GaussLegendre rule = GaussLegendre.of(64);
    GaussianRates rates = MARKET.rates().orElseThrow();
    double[] edges = {0, 1.5, 3, 4, 4.5};
    double start = 3;
    double end = 4.5;
    double variance = 0;
    for (int i = 1; i < edges.length; i++) {
      double sigma = MODEL.volatility().at(edges[i - 1]);
      variance +=
          rule.integrate(
              s -> {
                double loading =
                    s < start ? rates.g(end - s) - rates.g(start - s) : rates.g(end - s);
                return sigma * sigma * loading * loading;
              },
              edges[i - 1],
              edges[i]);
    }
    double v = Math.sqrt(variance);
    double strike = 0.031;
    double ratio = CURVE.discount(start) / CURVE.discount(end);
    double kink = (Math.log((1 + 1.5 * strike) / ratio) + 0.5 * variance) / v;
    double pays =
        rule.integrate(
            z ->
                (ratio * Math.exp(v * z - 0.5 * v * v) - 1 - 1.5 * strike)
                    * StandardNormal.density(z),
            kink,
            12);
    RateOption caplet =
        new RateOption(
            OptionKind.CALL,
            Moment.ofYears(start),
            BondTerms.of(Moment.ofYears(end), 1, DayCount.ACT_ACT_ICMA),
            OptionalDouble.of(strike),
            RateBasis.BACKWARD);
    assertThat(price(caplet, MARKET)).isCloseTo(100 * CURVE.discount(end) * pays, within(1e-12));
  }

  /** Exact joint steps of the state and its integral; the payoff is discounted along each path. */
  @Test
  void aBackwardLookingCapletIsTheMeanOfItsSimulatedPayoff() {
    GaussianRates rates = MARKET.rates().orElseThrow();
    double start = 1.75;
    double end = 2;
    StateStep first = rates.step(0, start);
    StateStep second = rates.step(start, end);
    double ratio = CURVE.discount(start) / CURVE.discount(end);
    double strike = 0.034;
    SplittableRandom random = new SplittableRandom(20261130);
    int paths = 400_000;
    double sum = 0;
    double squares = 0;
    for (int i = 0; i < paths; i++) {
      double[] a = state(first, 0, random);
      double[] b = state(second, a[0], random);
      double growth = ratio * Math.exp(b[1]);
      double pays =
          Math.max(0, growth - 1 - 0.25 * strike)
              * CURVE.discount(end)
              * Math.exp(-a[1] - b[1])
              * 100;
      sum += pays;
      squares += pays * pays;
    }
    double mean = sum / paths;
    double error = Math.sqrt((squares / paths - mean * mean) / paths);
    RateOption caplet =
        new RateOption(
            OptionKind.CALL,
            Moment.ofYears(start),
            BondTerms.of(Moment.ofYears(end), 4, DayCount.ACT_ACT_ICMA),
            OptionalDouble.of(strike),
            RateBasis.BACKWARD);
    assertThat(price(caplet, MARKET)).isCloseTo(mean, within(3 * error));
  }

  private static double[] state(StateStep step, double x, SplittableRandom random) {
    double z = random.nextGaussian();
    double w = random.nextGaussian();
    double sd = Math.sqrt(step.stateVariance());
    return new double[] {
      step.decay() * x + step.stateMean() + sd * z,
      step.loading() * x
          + step.integralMean()
          + step.covariance() / sd * z
          + step.residualDeviation() * w
    };
  }

  @Test
  void datedOptionsRunOnTheirSchedules() {
    TimeAxis axis = TimeAxis.from(LocalDate.of(2026, 11, 30));
    Market market = Market.of(axis, MODEL.on(CURVE));
    Claim cap =
        market.claim(
            new RateOptionStrip(
                OptionKind.CALL,
                BondTerms.of(Moment.parse("2Y"), 4, DayCount.ACT_360),
                OptionalDouble.of(0.03),
                RateBasis.FORWARD));
    assertThat(cap.optionlets()).hasSize(7);
    assertThat(cap.optionlets().get(0).start()).isEqualTo(axis.years(LocalDate.of(2027, 2, 28)));
    assertThat(cap.optionlets().get(0).accrual()).isEqualTo(91 / 360.0);
    Claim option =
        market.claim(
            new Swaption(
                SwapSide.PAYER,
                Moment.parse("1Y"),
                Tenor.parse("2Y"),
                1,
                ebbline.instrument.Conventions.of(DayCount.ACT_360),
                OptionalDouble.of(0.03)));
    Right right = option.rights().get(0);
    assertThat(right.received().time(0)).isEqualTo(1);
    assertThat(right.received().amount(1)).isCloseTo(-3 * 366 / 360.0, within(1e-14));
    assertThat(right.received().size()).isEqualTo(3);
  }

  @Test
  void whatMakesNoSenseIsRefusedInWords() {
    assertThatThrownBy(() -> price(swaptionAt("-1"), MARKET))
        .hasMessageContaining("expiry must not lie before today");
    assertThatThrownBy(
            () -> Swaption.of(SwapSide.PAYER, Moment.ofYears(1), Tenor.parse("0D"), 2, ATM))
        .hasMessageContaining("tenor must be above 0");
    assertThatThrownBy(
            () ->
                MARKET.claim(
                    new RateOptionStrip(
                        OptionKind.CALL,
                        BondTerms.of(Moment.ofYears(0.25), 4, DayCount.ACT_ACT_ICMA),
                        ATM,
                        RateBasis.FORWARD)))
        .hasMessageContaining("maturity must lie after start");
    assertThatThrownBy(() -> swaption(SwapSide.PAYER, Double.NaN))
        .hasMessageContaining("strike must be finite");
    Claim open = swaptionAt("1").claim(TimeAxis.undated());
    assertThatThrownBy(() -> ClosedForm.value(open, MARKET.rates().orElseThrow()))
        .hasMessageContaining("known only where there is a curve");
  }

  private static Swaption swaptionAt(String expiry) {
    return Swaption.of(SwapSide.PAYER, Moment.parse(expiry), Tenor.parse("5Y"), 2, ATM);
  }
}
