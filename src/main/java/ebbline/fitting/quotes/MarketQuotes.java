package ebbline.fitting.quotes;

import ebbline.curve.Compounding;

/**
 * The instruments of the market as equations in discount factors. Times in years from today,
 * accruals in years by the instrument's own day count, rates as decimals per year.
 */
public final class MarketQuotes {
  private MarketQuotes() {}

  /**
   * Simple interest from start to end: (1 + q δ) P(end) = P(start). Also a forward-rate agreement.
   */
  public static QuoteEquation deposit(
      String id, double start, double end, double accrual, double rate) {
    requirePeriod(id, start, end, accrual);
    return QuoteEquation.of(
        id, rate, new Terms.Builder().add(end, 1, accrual).add(start, -1, 0).build());
  }

  /** A bill quoted by its discount rate: P(end) = (1 − q δ) P(start). */
  public static QuoteEquation billDiscount(
      String id, double start, double end, double accrual, double rate) {
    requirePeriod(id, start, end, accrual);
    return QuoteEquation.of(
        id, rate, new Terms.Builder().add(end, 1, 0).add(start, -1, accrual).build());
  }

  /** A forward-rate agreement on simple interest; the same equation as a deposit's. */
  public static QuoteEquation forwardRate(
      String id, double start, double end, double accrual, double rate) {
    return deposit(id, start, end, accrual, rate);
  }

  /**
   * A future on simple interest, quoted as 100 less the rate in percent. Its rate is brought down
   * to a forward by the convexity adjustment of a Gaussian short rate [Kirikos & Novak 1997, Risk
   * 10(3)].
   *
   * @param price 100 × (1 − rate)
   * @param meanReversion per year, any sign
   * @param volatility per year^(3/2), at least 0; 0 leaves no adjustment
   */
  public static QuoteEquation future(
      String id,
      double start,
      double end,
      double accrual,
      double price,
      double meanReversion,
      double volatility) {
    requirePeriod(id, start, end, accrual);
    double kept = Math.exp(-futureConvexity(start, end, meanReversion, volatility) * (end - start));
    // (1 + δ (100 − q)/100) e^(−convexity (end − start)) P(end) = P(start)
    return QuoteEquation.of(
        id,
        price,
        new Terms.Builder()
            .add(end, kept * (1 + accrual), -kept * accrual / 100)
            .add(start, -1, 0)
            .build());
  }

  /** By how much a future's rate exceeds the forward, both continuously compounded, per year. */
  public static double futureConvexity(
      double start, double end, double meanReversion, double volatility) {
    if (!(volatility >= 0 && Double.isFinite(volatility) && Double.isFinite(meanReversion))) {
      throw new IllegalArgumentException(
          "a convexity adjustment needs a finite mean reversion and a volatility of at least 0,"
              + " found "
              + meanReversion
              + " and "
              + volatility);
    }
    double length = end - start;
    double over = reached(meanReversion, length);
    double before = reached(meanReversion, start);
    double twice = reached(2 * meanReversion, start);
    return 0.5 * volatility * volatility * over / length * (over * twice + before * before);
  }

  /** (1 − e^(−at))/a, t at a = 0. */
  private static double reached(double a, double t) {
    return a == 0 ? t : -Math.expm1(-a * t) / a;
  }

  /**
   * A fixed–float swap on one curve: Σ q δⱼ P(payⱼ) = P(start) − P(end).
   *
   * @param end of the floating leg
   */
  public static QuoteEquation swap(
      String id, double start, double end, double[] payments, double[] accruals, double rate) {
    requireLegs(id, payments, accruals);
    Terms.Builder terms = new Terms.Builder().add(start, -1, 0).add(end, 1, 0);
    for (int j = 0; j < payments.length; j++) {
      terms.add(payments[j], 0, accruals[j]);
    }
    return QuoteEquation.of(id, rate, terms.build());
  }

  /**
   * An overnight-index swap: each period's compounded interest P(start)/P(end) − 1 against q δ,
   * both paid at the period's payment, which may lag its end.
   *
   * @param start of the first period
   * @param ends of the periods; each starts where the last one ended
   */
  public static QuoteEquation overnightSwap(
      String id, double start, double[] ends, double[] payments, double[] accruals, double rate) {
    requireLegs(id, payments, accruals);
    requireLegs(id, ends, accruals);
    Terms.Builder terms = new Terms.Builder();
    double from = start;
    for (int j = 0; j < ends.length; j++) {
      terms.add(payments[j], 1, accruals[j]);
      if (payments[j] == ends[j]) {
        terms.add(from, -1, 0);
      } else {
        terms.add(payments[j], from, ends[j], -1, 0);
      }
      from = ends[j];
    }
    return QuoteEquation.of(id, rate, terms.build());
  }

  /**
   * A bond by its clean price: Σ cⱼ P(tⱼ) = (q + accrued) P(settlement).
   *
   * @param amounts per 100 face, those due to the buyer
   * @param accrued per 100 at settlement
   * @param cleanPrice per 100
   */
  public static QuoteEquation bondPrice(
      String id,
      double[] times,
      double[] amounts,
      double settlement,
      double accrued,
      double cleanPrice) {
    if (!(cleanPrice > 0)) {
      throw new IllegalArgumentException(
          "a bond's price must be above 0, found " + cleanPrice + " for " + id);
    }
    Terms.Builder terms = flows(id, times, amounts, settlement).add(settlement, -accrued, -1);
    return QuoteEquation.of(id, cleanPrice, terms.build());
  }

  /**
   * A bond by its yield: Σ cⱼ P(tⱼ) = dirty(q) P(settlement).
   *
   * @param amounts per 100 face, those due to the buyer
   * @param dirty the dirty price per 100 at a yield, and its derivative
   */
  public static QuoteEquation bondYield(
      String id,
      double[] times,
      double[] amounts,
      double settlement,
      QuoteEquation.QuotedValue dirty,
      double yield) {
    return QuoteEquation.of(
        id, yield, flows(id, times, amounts, settlement).build(), dirty, settlement);
  }

  /** A zero rate: P(t) is what the rate leaves. */
  public static QuoteEquation zero(String id, double time, Compounding compounding, double rate) {
    compounding.logDiscount(rate, time); // refuses a rate that no discount factor has
    QuoteEquation.QuotedValue value =
        new QuoteEquation.QuotedValue() {
          @Override
          public double value(double quote) {
            return compounding.discount(quote, time);
          }

          @Override
          public double slope(double quote) {
            return compounding.discountSlope(quote, time);
          }
        };
    return QuoteEquation.of(id, rate, new Terms.Builder().add(time, 1, 0).build(), value, 0);
  }

  private static Terms.Builder flows(
      String id, double[] times, double[] amounts, double settlement) {
    requireLegs(id, times, amounts);
    Terms.Builder terms = new Terms.Builder();
    for (int j = 0; j < times.length; j++) {
      if (!(times[j] > settlement)) {
        throw new IllegalArgumentException(
            "a bond's flows must fall after settlement, found " + times[j] + " for " + id);
      }
      terms.add(times[j], amounts[j], 0);
    }
    return terms;
  }

  private static void requirePeriod(String id, double start, double end, double accrual) {
    if (!(start >= 0 && end > start && accrual > 0)) {
      throw new IllegalArgumentException(
          "a period must end after its start and accrue, found "
              + start
              + " to "
              + end
              + " with accrual "
              + accrual
              + " for "
              + id);
    }
  }

  private static void requireLegs(String id, double[] times, double[] amounts) {
    if (times.length == 0 || times.length != amounts.length) {
      throw new IllegalArgumentException(
          "a leg needs as many amounts as times and at least one, found "
              + amounts.length
              + " and "
              + times.length
              + " for "
              + id);
    }
    for (int j = 1; j < times.length; j++) {
      if (!(times[j] > times[j - 1])) {
        throw new IllegalArgumentException(
            "times of a leg must increase, found " + times[j] + " for " + id);
      }
    }
  }
}
