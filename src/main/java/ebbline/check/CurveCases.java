package ebbline.check;

import ebbline.curve.DiscountCurve;
import ebbline.curve.SvenssonCurve;
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
    double annuity = 0;
    for (int k = 2 * from + 1; k <= 2 * to; k++) {
      annuity += curve.discount(k / 2.0);
    }
    return 200 * (curve.discount(from) - curve.discount(to)) / annuity;
  }

  private static CaseResult zeroRates(PublishedCase c, CaseInputs in) {
    CaseInputs zeros = in.object("zero_cc");
    double coupon = in.number("coupon") / in.number("freq");
    double annuity = 0;
    double last = 1;
    double maturity = 0;
    for (String time : zeros.names()) {
      maturity = Double.parseDouble(time);
      last = Math.exp(-zeros.number(time) * maturity);
      annuity += last;
    }
    double price = coupon * annuity + 100 * last;
    return switch (part(c)) {
      case "price" -> CaseResult.of(c, "price of the bond", price);
      case "yield_cc" ->
          CaseResult.of(
              c,
              "its yield, continuous",
              // the source solves from its own rounded price
              continuousYield(98.39, coupon, in.integer("freq"), maturity));
      case "par" ->
          CaseResult.of(c, "par yield, per cent", in.number("freq") * 100 * (1 - last) / annuity);
      case "A" -> CaseResult.of(c, "annuity", annuity);
      default -> CaseResult.of(c, "last discount factor", last);
    };
  }

  private static double continuousYield(
      double price, double coupon, int frequency, double maturity) {
    double low = -1;
    double high = 1;
    for (int i = 0; i < 200; i++) {
      double middle = 0.5 * (low + high);
      if (value(middle, coupon, frequency, maturity, 0) > price) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return 0.5 * (low + high);
  }

  /** Σ t^power × flow × e^(−y t). */
  private static double value(
      double yield, double coupon, int frequency, double maturity, int power) {
    double sum = 0;
    int count = (int) Math.round(maturity * frequency);
    for (int k = 1; k <= count; k++) {
      double t = (double) k / frequency;
      double flow = k == count ? coupon + 100 : coupon;
      sum += Math.pow(t, power) * flow * Math.exp(-yield * t);
    }
    return sum;
  }

  private static CaseResult bond(PublishedCase c, CaseInputs in) {
    int frequency = in.integer("freq");
    double coupon = in.number("coupon") / frequency;
    double yield = in.number("yield_cc");
    double price = value(yield, coupon, frequency, in.number("mat"), 0);
    return part(c).equals("price")
        ? CaseResult.of(c, "price at a continuous yield", price)
        : CaseResult.of(
            c, "its duration", value(yield, coupon, frequency, in.number("mat"), 1) / price);
  }

  /** Where the curvature loading (1 − e^(−u))/u − e^(−u) peaks, in months, at λ = 0.0609. */
  private static CaseResult curvatureMaximum(PublishedCase c) {
    double low = 1;
    double high = 3;
    for (int i = 0; i < 200; i++) {
      double u = 0.5 * (low + high);
      double slope = (Math.exp(-u) * (u + 1) - 1) / (u * u) + Math.exp(-u);
      if (slope > 0) {
        low = u;
      } else {
        high = u;
      }
    }
    return CaseResult.of(c, "months at which the curvature loading peaks", low / 0.0609);
  }
}
