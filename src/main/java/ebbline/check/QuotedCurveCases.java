package ebbline.check;

import ebbline.curve.DiscountCurve;
import ebbline.curve.Interpolation;
import ebbline.curve.SmithWilsonCurve;
import ebbline.fitting.quotes.CurveBuilder;
import ebbline.fitting.quotes.MarketQuotes;
import ebbline.fitting.quotes.QuoteEquation;
import ebbline.fitting.quotes.SmithWilsonBuilder;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Curves built from quotes: the textbook bootstrap, and the regulator's euro curve. */
final class QuotedCurveCases implements ShortRateCases.Computation {
  /** The released weights carry the rounding of the arithmetic that made them. */
  private static final double KERNEL_WEIGHT = 1e-9;

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in) {
    String part = c.id().substring(c.id().lastIndexOf('-') + 1);
    if (c.id().startsWith("CRV-HULL4.7-")) {
      return Optional.of(bootstrap(c, in, part));
    } else if (c.id().startsWith("CRV-EIOPA-")) {
      return Optional.of(regulator(c, in, part));
    }
    return Optional.empty();
  }

  /** Bonds by price, maturity after maturity; rates continuous. */
  private static CaseResult bootstrap(PublishedCase c, CaseInputs in, String part) {
    List<QuoteEquation> quotes = new ArrayList<>();
    for (Object each : in.list("bonds")) {
      double[] bond = ((List<?>) each).stream().mapToDouble(CaseInputs::asNumber).toArray();
      quotes.add(bond("bond of " + bond[0], bond[0], bond[1], in.integer("freq"), bond[2]));
    }
    DiscountCurve curve = CurveBuilder.of(Interpolation.LINEAR_ZERO).build(quotes).curve();
    return part.startsWith("df")
        ? CaseResult.of(c, "discount factor", curve.discount(Double.parseDouble(part.substring(2))))
        : CaseResult.of(c, "zero rate of " + part + " years", curve.zero(Double.parseDouble(part)));
  }

  /** A bond between coupons of the given frequency; a coupon of 0 leaves the redemption. */
  static QuoteEquation bond(
      String id, double maturity, double coupon, int frequency, double price) {
    int count = coupon == 0 ? 1 : (int) Math.round(maturity * frequency);
    double[] times = new double[count];
    double[] amounts = new double[count];
    for (int k = 0; k < count; k++) {
      times[k] = maturity - (double) (count - 1 - k) / frequency;
      amounts[k] = coupon / frequency + (k == count - 1 ? 100 : 0);
    }
    return MarketQuotes.bondPrice(id, times, amounts, 0, 0, price);
  }

  /** A swap of whole periods from start to end; its rate on a curve is the par yield. */
  static QuoteEquation par(double start, double end, int frequency, double rate) {
    int count = (int) Math.round((end - start) * frequency);
    double[] times = new double[count];
    double[] accruals = new double[count];
    Arrays.fill(accruals, 1.0 / frequency);
    for (int k = 0; k < count; k++) {
      times[k] = end - (double) (count - 1 - k) / frequency;
    }
    return MarketQuotes.swap(start + " to " + end, start, end, times, accruals, rate);
  }

  private static CaseResult regulator(PublishedCase c, CaseInputs in, String part) {
    CaseInputs rates = in.object("par_swap_pct_after_CRA");
    List<QuoteEquation> quotes = new ArrayList<>();
    for (String years : rates.names()) {
      quotes.add(par(0, Integer.parseInt(years), 1, rates.number(years) / 100));
    }
    SmithWilsonBuilder builder =
        SmithWilsonBuilder.of(in.number("UFR_annual"), in.number("convergence_point"))
            .withTolerance(in.number("tolerance_bp") / 1e4);
    if (part.equals("alpha")) {
      SmithWilsonCurve searched = (SmithWilsonCurve) builder.build(quotes).curve();
      return CaseResult.of(c, "speed, searched in steps of 1e-6", searched.speed());
    }
    SmithWilsonCurve curve =
        (SmithWilsonCurve) builder.withSpeed(in.number("alpha")).build(quotes).curve();
    if (part.startsWith("Qb")) {
      int years = Integer.parseInt(part.substring(2));
      return CaseResult.of(
          c, "kernel weight at " + years + " years", curve.weights()[years - 1], KERNEL_WEIGHT, "");
    }
    int years = Integer.parseInt(part.substring("spot".length()));
    return CaseResult.of(
        c,
        "annual zero rate of " + years + " years, per cent",
        100 * Math.expm1(curve.zero(years)));
  }
}
