package ebbline.check;

import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.instrument.Bond;
import ebbline.instrument.BondOption;
import ebbline.instrument.BondTerms;
import ebbline.instrument.CashFlows;
import ebbline.instrument.FixedLeg;
import ebbline.instrument.Instrument;
import ebbline.instrument.OptionKind;
import ebbline.instrument.RateBasis;
import ebbline.instrument.RateOption;
import ebbline.instrument.SwapSide;
import ebbline.instrument.Swaption;
import ebbline.pricing.Discounting;
import ebbline.pricing.FuturesConvexity;
import ebbline.pricing.Market;
import ebbline.pricing.VolatilityLaw;
import ebbline.pricing.VolatilityTerms;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Black's volatilities of a caplet, a swaption and a bond option turned into premiums as the quotes
 * of a calibration are, and the futures convexity.
 */
final class BlackCases implements ShortRateCases.Computation {

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in) {
    if (c.id().startsWith("BLK-HULL29.3-")) {
      return Optional.of(caplet(c, in));
    } else if (c.id().startsWith("BLK-HULL29.4-")) {
      return Optional.of(swaption(c, in));
    } else if (c.id().startsWith("BLK-HULL29.2-")) {
      return Optional.of(bondOption(c, in));
    } else if (c.id().startsWith("CVX-HULL6.4-")) {
      return Optional.of(convexity(c, in));
    }
    return Optional.empty();
  }

  private static String part(PublishedCase c) {
    return c.id().substring(c.id().lastIndexOf('-') + 1);
  }

  /** A curve of the source's two figures: the bond of payment, and the forward rate before it. */
  private static CaseResult caplet(PublishedCase c, CaseInputs in) {
    double pay = in.number("pay");
    double start = in.number("T");
    double accrual = in.number("delta");
    double forward = in.number("F");
    double strike = in.number("K");
    double log = -in.number("df_rate_cc") * pay;
    DiscountCurve curve =
        InterpolatedCurve.of(
            Interpolation.LOG_LINEAR,
            new double[] {start, pay},
            new double[] {log + Math.log1p(accrual * forward), log});
    Market market = Market.of(TimeAxis.undated(), curve);
    RateOption caplet =
        new RateOption(
            OptionKind.CALL,
            Moment.ofYears(start),
            BondTerms.of(Moment.ofYears(pay), 4, DayCount.ACT_ACT_ICMA),
            OptionalDouble.of(strike),
            RateBasis.FORWARD);
    return switch (part(c)) {
      case "P" -> CaseResult.of(c, "discount factor", curve.discount(pay));
      case "d1" -> CaseResult.of(c, "d1", d1(forward, strike, in.number("vol") * Math.sqrt(start)));
      default ->
          CaseResult.of(c, "caplet, millions", 0.1 * premium(market, caplet, in.number("vol")));
    };
  }

  /** The forward rate is given and not the curve's: it comes from a curve of its own. */
  private static CaseResult swaption(PublishedCase c, CaseInputs in) {
    double forward = in.number("sF");
    double strike = in.number("K");
    double expiry = in.number("T");
    Market market =
        Market.of(TimeAxis.undated(), FlatCurve.of(in.number("flat_cc")))
            .withProjection(FlatCurve.of(2 * Math.log1p(0.5 * forward)));
    double[] pays = in.numbers("pay_times");
    Swaption payer =
        Swaption.of(
            SwapSide.PAYER,
            Moment.ofYears(expiry),
            new Tenor((int) Math.round(12 * (pays[pays.length - 1] - expiry)), 0),
            2,
            OptionalDouble.of(strike));
    CashFlows perUnit = market.claim(payer).rights().get(0).strike().orElseThrow().perUnit();
    return switch (part(c)) {
      case "A" ->
          CaseResult.of(
              c, "annuity", -Discounting.value(perUnit, market.curve()).presentValue() / 100);
      case "d1" ->
          CaseResult.of(c, "d1", d1(forward, strike, in.number("vol") * Math.sqrt(expiry)));
      default ->
          CaseResult.of(c, "payer swaption, millions", premium(market, payer, in.number("vol")));
    };
  }

  private static double premium(Market market, Instrument option, double volatility) {
    return VolatilityTerms.of(market.claim(option), market.curve())
        .premium(VolatilityLaw.BLACK, volatility, 0);
  }

  private static double d1(double forward, double strike, double sd) {
    return Math.log(forward / strike) / sd + sd / 2;
  }

  /*
   * The yield volatility becomes one of the forward price by the bond's modified duration at its
   * forward yield, both of the coupon frequency.
   */
  private static CaseResult bondOption(PublishedCase c, CaseInputs in) {
    double rate = in.number("flat_cc");
    double expiry = in.number("T");
    int frequency = in.integer("freq");
    double coupon = in.number("coupon") / frequency;
    double maturity = in.number("mat");
    int count = (int) Math.round(maturity * frequency);
    double forward = 100 * Math.exp(-rate * (maturity - expiry));
    double weighted = forward * (maturity - expiry);
    for (int k = 1; k <= count; k++) {
      double t = (double) k / frequency;
      if (t > expiry) {
        double value = coupon * Math.exp(-rate * (t - expiry));
        forward += value;
        weighted += value * (t - expiry);
      }
    }
    double yield = frequency * Math.expm1(rate / frequency);
    double modifiedDuration = weighted / forward / (1 + yield / frequency);
    double sd = modifiedDuration * yield * in.number("yield_vol") * Math.sqrt(expiry);
    Market market = Market.of(TimeAxis.undated(), FlatCurve.of(rate));
    Bond bond =
        new Bond(
            FixedLeg.of(
                BondTerms.of(Moment.ofYears(maturity), frequency, DayCount.ACT_ACT_ICMA),
                in.number("coupon") / 100));
    boolean quoted = part(c).equals("quotedK");
    BondOption put =
        new BondOption(
            OptionKind.PUT,
            Moment.ofYears(expiry),
            bond,
            in.number("K"),
            quoted ? BondOption.StrikeKind.CLEAN : BondOption.StrikeKind.CASH);
    if (part(c).equals("bond")) {
      return CaseResult.of(
          c,
          "price of the bond",
          Discounting.value(market.claim(bond), market.curve()).presentValue());
    }
    return CaseResult.of(
        c,
        quoted ? "put with a quoted strike" : "put with a cash strike",
        premium(market, put, sd / Math.sqrt(expiry)));
  }

  private static CaseResult convexity(PublishedCase c, CaseInputs in) {
    double adjustment =
        FuturesConvexity.withoutReversion(in.number("sigma"), in.number("T1"), in.number("T2"));
    String part = part(c);
    if (part.endsWith("y")) {
      return CaseResult.of(c, "convexity adjustment, bp", 1e4 * adjustment);
    }
    // A quarter of 90 days on act/360, compounded continuously on act/365.
    double continuous = 365.0 / 90 * Math.log1p((100 - in.number("quote")) / 100 * 90 / 360);
    return part.equals("futcc")
        ? CaseResult.of(c, "futures rate, continuous", continuous)
        : CaseResult.of(c, "forward rate, continuous", continuous - adjustment);
  }
}
