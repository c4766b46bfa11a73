package ebbline.check;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.Vasicek;
import ebbline.pricing.ClosedForm;
import java.util.List;
import java.util.Optional;

/** Closed forms under Vasicek: bonds, options on zero bonds, decomposed options on coupon bonds. */
final class VasicekCases implements ShortRateCases.Computation {

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in) {
    if (c.id().startsWith("VAS-TN15-")) {
      return Optional.of(couponBondPut(c, in));
    } else if (c.id().startsWith("VAS-HULL32.3-") || c.id().startsWith("VAS-HULL32.4-")) {
      return Optional.of(zeroBondOption(c, in));
    } else if (c.id().startsWith("VAS-HULL32.5-")) {
      return Optional.of(couponBondOption(c, in));
    } else if (c.id().startsWith("VAS-HULL31.9-")) {
      return Optional.of(zeroBond(c, in));
    } else if (c.id().equals("VAS-HULL31.1-duration")) {
      return Optional.of(
          CaseResult.of(
              c,
              "duration of a zero bond to the short rate",
              duration(in.number("a"), in.number("T"))));
    } else if (c.id().equals("VAS-SOA-alpha")) {
      return Optional.of(expectedReturn(c, in));
    }
    return Optional.empty();
  }

  private static Vasicek model(CaseInputs in) {
    return new Vasicek(in.number("r0"), in.number("b"), in.number("a"), in.number("sigma"));
  }

  private static double duration(double a, double tau) {
    return new Vasicek(0, 0, a, 0).rates().g(tau);
  }

  private static CaseResult zeroBond(PublishedCase c, CaseInputs in) {
    GaussianRates rates = model(in).rates();
    double t = in.number("T");
    double b = rates.g(t);
    double price = rates.curve().discount(t);
    return switch (part(c)) {
      case "B" -> CaseResult.of(c, "B(0,10)", b);
      case "A" -> CaseResult.of(c, "A(0,10)", price * Math.exp(b * in.number("r0")));
      default -> CaseResult.of(c, "zero bond of ten years", price);
    };
  }

  private static CaseResult couponBondPut(PublishedCase c, CaseInputs in) {
    Decomposition parts = Decomposition.of(model(in).rates(), in);
    String part = part(c);
    if (part.startsWith("A(3,")) {
      double maturity = Double.parseDouble(part.substring(4, part.length() - 1));
      return CaseResult.of(c, "A(3," + maturity + ")", parts.a(maturity));
    } else if (part.startsWith("B(3,")) {
      double maturity = Double.parseDouble(part.substring(4, part.length() - 1));
      return CaseResult.of(c, "B(3," + maturity + ")", parts.b(maturity));
    } else if (part.startsWith("P(0,")) {
      double maturity = Double.parseDouble(part.substring(4, part.length() - 1));
      return CaseResult.of(c, "zero bond to " + maturity, parts.rates().curve().discount(maturity));
    } else if (part.startsWith("K")) {
      int i = Integer.parseInt(part.substring(1)) - 1;
      return CaseResult.of(c, "strike of part " + (i + 1), parts.strike(i));
    } else if (part.startsWith("put")) {
      int i = Integer.parseInt(part.substring(3)) - 1;
      return CaseResult.of(c, "put on part " + (i + 1), parts.put(i));
    } else if (part.equals("rK")) {
      return CaseResult.of(c, "short rate at the strike", parts.boundaryRate());
    } else if (part.equals("sigmaP4")) {
      return CaseResult.of(c, "volatility of part 4", parts.volatility(3));
    }
    return CaseResult.of(c, "put on the coupon bond", parts.bondOption(-1));
  }

  private static CaseResult couponBondOption(PublishedCase c, CaseInputs in) {
    Decomposition parts = Decomposition.of(model(in).rates(), in);
    return switch (part(c)) {
      case "r*" -> CaseResult.of(c, "short rate at the strike", parts.boundaryRate());
      case "call" -> CaseResult.of(c, "call on the coupon bond", parts.bondOption(1));
      default -> CaseResult.of(c, "put on the coupon bond", parts.bondOption(-1));
    };
  }

  private static CaseResult zeroBondOption(PublishedCase c, CaseInputs in) {
    GaussianRates rates = model(in).rates();
    double expiry = in.number("T");
    double maturity = in.number("S");
    double strike = in.number("K");
    double face = in.number("L");
    double sd = Math.sqrt(rates.variance(expiry)) * rates.g(maturity - expiry);
    double h =
        Math.log(
                    face
                        * rates.curve().discount(maturity)
                        / (strike * rates.curve().discount(expiry)))
                / sd
            + sd / 2;
    return switch (part(c)) {
      case "sigmaP" -> CaseResult.of(c, "volatility of the bond's log price", sd);
      case "P(0,1)" -> CaseResult.of(c, "zero bond of one year", rates.curve().discount(expiry));
      case "P(0,3)" ->
          CaseResult.of(c, "zero bond of three years", rates.curve().discount(maturity));
      case "h" -> CaseResult.of(c, "h", h);
      case "h-sigmaP" -> CaseResult.of(c, "h less the volatility", h - sd);
      case "call" ->
          CaseResult.of(c, "call on a zero bond", option(rates, 1, expiry, maturity, face, strike));
      default ->
          CaseResult.of(c, "put on a zero bond", option(rates, -1, expiry, maturity, face, strike));
    };
  }

  /** Call (sign 1) or put (sign −1) on one flow. */
  static double option(
      GaussianRates rates, int sign, double expiry, double maturity, double face, double strike) {
    CashFlows received =
        CashFlows.of(new double[] {expiry, maturity}, new double[] {-sign * strike, sign * face});
    Right right = new Right(Right.Party.HOLDER, expiry, expiry, received);
    return ClosedForm.value(new Claim(CashFlows.NONE, List.of(right), 0, 0), rates).presentValue();
  }

  /*
   * Under one source of risk every bond earns the short rate plus one price of risk times its
   * volatility σ B(τ), so the excess return at (r, t, T) is the given one times B(T − t)/B(2).
   */
  private static CaseResult expectedReturn(PublishedCase c, CaseInputs in) {
    double a = in.number("a");
    double excess = in.number("alpha_r04_0_2") - 0.04;
    double alpha = 0.05 + excess * duration(a, 3) / duration(a, 2);
    return CaseResult.of(c, "expected return of a bond, short rate 5 %, from 1 to 4", alpha);
  }

  private static String part(PublishedCase c) {
    String id = c.id();
    String stem =
        id.startsWith("VAS-TN15-") ? "VAS-TN15-" : id.substring(0, id.indexOf('-', 4) + 1);
    return id.substring(stem.length());
  }
}
