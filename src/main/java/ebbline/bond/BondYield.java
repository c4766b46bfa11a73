package ebbline.bond;

import ebbline.instrument.LastPeriodRule;
import ebbline.instrument.QuoteTerms;
import ebbline.instrument.YieldKind;
import ebbline.instrument.YieldTerms;

/**
 * Price and yield of paper with fixed payments, for every kind of yield. Prices are dirty, per 100;
 * yields decimals per year.
 *
 * <ul>
 *   <li>{@code street}: Σ c (1 + y/f)^(−p), p coupon periods to the coupon date; simple or as
 *       {@link LastPeriodRule} says once one period is left
 *   <li>{@code treasury}: simple over the first fraction of a period [31 CFR 356, Appendix B]
 *   <li>{@code true}: street, to the days on which payments are made
 *   <li>{@code simple}: (coupon + (redemption − clean)/years)/clean, years by act/365f (common
 *       practice, Japan)
 *   <li>{@code discount}: (1 − P/R)/t, t by the paper's day count, one payment left
 *   <li>{@code money-market}: (R/P − 1)/t, likewise
 *   <li>{@code annual}, {@code continuous}: compounded once a year, or continuously, over p/f years
 *       (business days over 252 with {@code bus/252})
 * </ul>
 */
public final class BondYield {
  private static final double BASIS_POINT = 1e-4;

  private final YieldFormula formula;

  private BondYield(YieldFormula formula) {
    this.formula = formula;
  }

  /**
   * The yield of a row's kind.
   *
   * @throws IllegalArgumentException in words if the paper has no yield of this kind
   */
  public static BondYield of(YieldTerms terms, QuoteTerms quote) {
    return new BondYield(formula(terms, quote.kind(), quote.lastPeriod()));
  }

  private static YieldFormula formula(YieldTerms terms, YieldKind kind, LastPeriodRule lastRule) {
    return switch (kind) {
      case STREET -> street(terms, terms.periods(), lastRule);
      case TRUE -> street(terms, terms.paidPeriods(), lastRule);
      case TREASURY -> treasury(terms);
      case SIMPLE ->
          new SimpleFormula(terms.annualCoupon(), repaid(terms), terms.life(), terms.accrued());
      case DISCOUNT -> new DiscountFormula(single(terms, kind), terms.countedLife());
      case MONEY_MARKET -> {
        double[] amount = {single(terms, kind)};
        yield compound(amount, new double[1], 1, terms.countedLife(), false);
      }
      case ANNUAL -> compound(terms.amounts(), terms.years(), 1, 0, false);
      case CONTINUOUS -> compound(terms.amounts(), terms.years(), 1, 0, true);
    };
  }

  private static YieldFormula compound(
      double[] amounts, double[] periods, double frequency, double simple, boolean continuous) {
    boolean positive = false;
    for (double amount : amounts) {
      if (!(amount >= 0)) {
        throw new IllegalArgumentException(
            "payments of both signs may have several yields; none is given");
      }
      positive |= amount > 0;
    }
    if (positive) {
      return new CompoundFormula(amounts, periods, frequency, simple, continuous);
    }
    throw new IllegalArgumentException("paper that pays nothing has no yield");
  }

  private static YieldFormula street(YieldTerms terms, double[] periods, LastPeriodRule lastRule) {
    if (terms.periodsLeft() > 1 || lastRule == LastPeriodRule.COMPOUND) {
      return compound(terms.amounts(), periods, terms.frequency(), 0, false);
    }
    double[] now = new double[terms.size()];
    return lastRule == LastPeriodRule.SIMPLE
        ? compound(terms.amounts(), now, terms.frequency(), periods[periods.length - 1], false)
        : compound(terms.amounts(), now, 1, terms.life(), false);
  }

  /** The part of a period before the first whole one is simple, whole ones compound. */
  private static YieldFormula treasury(YieldTerms terms) {
    double[] periods = terms.periods();
    double first = periods[0] - Math.ceil(periods[0]) + 1;
    for (int k = 0; k < periods.length; k++) {
      periods[k] -= first;
    }
    return compound(terms.amounts(), periods, terms.frequency(), first, false);
  }

  private static double single(YieldTerms terms, YieldKind kind) {
    if (terms.size() == 1) {
      return terms.amounts()[0];
    }
    throw new IllegalArgumentException(
        "a " + kind.label() + " yield needs a single payment to come, found " + terms.size());
  }

  private static double repaid(YieldTerms terms) {
    return terms
        .redemption()
        .orElseThrow(
            () ->
                new IllegalArgumentException(
                    "a simple yield needs a single repayment, found several"));
  }

  /**
   * Dirty price at a yield.
   *
   * @throws IllegalArgumentException if growth over a period is not positive
   */
  public double price(double yield) {
    return at(yield).price();
  }

  private YieldPoint at(double yield) {
    if (!(yield > formula.lowest() && Double.isFinite(yield))) {
      throw new IllegalArgumentException(
          "a yield must lie above " + formula.lowest() + " here, found " + yield);
    } else if (!(yield < formula.highest())) {
      throw new IllegalArgumentException(
          "a yield must lie below " + formula.highest() + " here, found " + yield);
    }
    return formula.at(yield);
  }

  /**
   * The yield of a dirty price, to 1e-14.
   *
   * @throws IllegalArgumentException in words if no yield gives it
   */
  public double yieldOf(double price) {
    return YieldSolver.solve(formula, price);
  }

  /** −P′/P, years. */
  public double modifiedDuration(double yield) {
    YieldPoint point = at(yield);
    return -point.slope() / point.price();
  }

  /** Mean time of the payments weighted by their present values, years. */
  public double macaulayDuration(double yield) {
    return at(yield).meanTime();
  }

  /** P″/P, years². */
  public double convexity(double yield) {
    YieldPoint point = at(yield);
    return point.bend() / point.price();
  }

  /** Price gained when the yield falls by one basis point, two-sided, per 100. */
  public double dv01(double yield) {
    return (price(yield - BASIS_POINT) - price(yield + BASIS_POINT)) / 2;
  }
}
