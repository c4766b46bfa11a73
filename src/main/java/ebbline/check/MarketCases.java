package ebbline.check;

import ebbline.bond.BillYield;
import ebbline.bond.FirstFraction;
import ebbline.bond.PeriodYield;
import ebbline.instrument.PeriodFlows;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.Arrays;
import java.util.Map;
import java.util.Optional;

/** Formulae of the debt offices of the United Kingdom and Australia, and of Brazil's bills. */
final class MarketCases implements BondCases.Computation {

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all) {
    if (c.id().startsWith("GILT-AI-")) {
      return Optional.of(giltAccrued(c, in));
    } else if (c.id().startsWith("GILT-") && in.has("r")) {
      return Optional.of(CaseResult.of(c, "dirty price of a gilt", gilt(in)));
    } else if (c.id().startsWith("AU-TN-")) {
      double price = BillYield.priceAtSimple(in.number("yield"), in.number("days"), 365);
      return Optional.of(CaseResult.of(c, "price of a Treasury note", price));
    } else if (c.id().startsWith("AU-TB-")) {
      return Optional.of(CaseResult.of(c, "dirty price of a Treasury bond", australian(c, in)));
    } else if (c.id().startsWith("BR-LTN-")) {
      return Optional.of(brazilian(c, in));
    }
    return Optional.empty();
  }

  private static CaseResult giltAccrued(PublishedCase c, CaseInputs in) {
    double fraction = in.number("t") / in.number("s");
    double periods = BondCases.part(c).equals("ex") ? fraction - 1 : fraction;
    return CaseResult.of(c, "accrued interest of a gilt", in.number("c") / 2 * periods);
  }

  private static double gilt(CaseInputs in) {
    int f = in.integer("f");
    int n = in.integer("n");
    double[] amounts = new double[n + 1];
    Arrays.fill(amounts, in.number("c") / f);
    amounts[0] = in.number("d1");
    if (n > 0) {
      amounts[1] = in.number("d2", in.number("c") / f);
    }
    amounts[n] += 100;
    PeriodFlows flows = new PeriodFlows(f, in.number("r") / in.number("s"), amounts);
    return new PeriodYield(flows, FirstFraction.COMPOUND).price(in.number("y"));
  }

  /** Half-yearly coupons g and yield i; ex-interest the next coupon is left out. */
  private static double australian(PublishedCase c, CaseInputs in) {
    double coupon = in.number("g");
    if (BondCases.part(c).equals("near")) {
      return BillYield.priceAtSimple(in.number("i_annual"), in.number("f"), 365)
          * (1 + coupon / 100);
    }
    int n = in.integer("n");
    double[] amounts = new double[n + 1];
    Arrays.fill(amounts, coupon);
    amounts[0] = BondCases.part(c).equals("ex") ? 0 : coupon;
    amounts[n] += 100;
    PeriodFlows flows = new PeriodFlows(2, in.number("f") / in.number("d"), amounts);
    return new PeriodYield(flows, FirstFraction.COMPOUND).price(2 * in.number("i"));
  }

  private static CaseResult brazilian(PublishedCase c, CaseInputs in) {
    double years = in.number("business_days") / 252;
    if (in.has("rate")) {
      double exact = BillYield.priceAtAnnual(in.number("rate"), years) * in.number("face") / 100;
      // The published prices are cut, not rounded, to whole cents.
      double cut = BigDecimal.valueOf(exact).setScale(2, RoundingMode.DOWN).doubleValue();
      return CaseResult.of(c, "price at an annual yield over business days, cut to cents", cut);
    }
    double rate = BillYield.annualYield(in.number("price") / 10, years);
    return c.id().contains("134")
        ? CaseResult.of(c, "annual yield over business days, per cent", 100 * rate)
        : CaseResult.of(c, "annual yield over business days", rate);
  }
}
