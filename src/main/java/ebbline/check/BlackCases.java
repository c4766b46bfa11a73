package ebbline.check;

import ebbline.pricing.BlackFormula;
import ebbline.pricing.FuturesConvexity;
import java.util.Optional;

/** Black's formula for a caplet, a swaption and a bond option, and the futures convexity. */
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

  private static CaseResult caplet(PublishedCase c, CaseInputs in) {
    double discount = Math.exp(-in.number("df_rate_cc") * in.number("pay"));
    double sd = in.number("vol") * Math.sqrt(in.number("T"));
    double forward = in.number("F");
    double strike = in.number("K");
    return switch (part(c)) {
      case "P" -> CaseResult.of(c, "discount factor", discount);
      case "d1" -> CaseResult.of(c, "d1", d1(forward, strike, sd));
      default ->
          CaseResult.of(
              c,
              "caplet, millions",
              10 * in.number("delta") * discount * BlackFormula.call(forward, strike, sd));
    };
  }

  private static CaseResult swaption(PublishedCase c, CaseInputs in) {
    double annuity = 0;
    for (double t : in.numbers("pay_times")) {
      annuity += 0.5 * Math.exp(-in.number("flat_cc") * t);
    }
    double sd = in.number("vol") * Math.sqrt(in.number("T"));
    double forward = in.number("sF");
    double strike = in.number("K");
    return switch (part(c)) {
      case "A" -> CaseResult.of(c, "annuity", annuity);
      case "d1" -> CaseResult.of(c, "d1", d1(forward, strike, sd));
      default ->
          CaseResult.of(
              c,
              "payer swaption, millions",
              100 * annuity * BlackFormula.call(forward, strike, sd));
    };
  }

  private static double d1(double forward, double strike, double sd) {
    return Math.log(forward / strike) / sd + sd / 2;
  }

  /*
   * The yield volatility becomes one of the forward price by the bond's modified duration at its
   * forward yield, both of the coupon frequency. A quoted strike has accrued interest added.
   */
  private static CaseResult bondOption(PublishedCase c, CaseInputs in) {
    double rate = in.number("flat_cc");
    double expiry = in.number("T");
    int frequency = in.integer("freq");
    double coupon = in.number("coupon") / frequency;
    double maturity = in.number("mat");
    int count = (int) Math.round(maturity * frequency);
    double price = 100 * Math.exp(-rate * maturity);
    double forward = 100 * Math.exp(-rate * (maturity - expiry));
    double weighted = forward * (maturity - expiry);
    double accrued = 0;
    for (int k = 1; k <= count; k++) {
      double t = (double) k / frequency;
      price += coupon * Math.exp(-rate * t);
      if (t > expiry) {
        double value = coupon * Math.exp(-rate * (t - expiry));
        forward += value;
        weighted += value * (t - expiry);
        accrued = accrued == 0 ? coupon * (1 - (t - expiry) * frequency) : accrued;
      }
    }
    double yield = frequency * Math.expm1(rate / frequency);
    double modifiedDuration = weighted / forward / (1 + yield / frequency);
    double sd = modifiedDuration * yield * in.number("yield_vol") * Math.sqrt(expiry);
    double discount = Math.exp(-rate * expiry);
    double strike = in.number("K");
    return switch (part(c)) {
      case "bond" -> CaseResult.of(c, "price of the bond", price);
      case "quotedK" ->
          CaseResult.of(
              c,
              "put with a quoted strike",
              discount * BlackFormula.put(forward, strike + accrued, sd));
      default ->
          CaseResult.of(
              c, "put with a cash strike", discount * BlackFormula.put(forward, strike, sd));
    };
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
