package ebbline.bond;

/**
 * Price, discount rate and yield of paper that pays 100 once. Rates are decimals per year; days are
 * actual; a base is the days that a convention gives the year.
 */
public final class BillYield {
  private BillYield() {}

  /** Price at a bank discount rate: 100 (1 − d days/base). */
  public static double priceAtDiscount(double rate, double days, double base) {
    requireDays(days, base);
    return 100 * (1 - rate * days / base);
  }

  /** Bank discount rate of a price. */
  public static double discountRate(double price, double days, double base) {
    requireDays(days, base);
    return (100 - requirePrice(price)) / 100 * base / days;
  }

  /**
   * Price at a simple yield: 100/(1 + y days/base).
   *
   * @throws IllegalArgumentException if the growth is not positive
   */
  public static double priceAtSimple(double yield, double days, double base) {
    requireDays(days, base);
    double growth = 1 + yield * days / base;
    if (!(growth > 0 && Double.isFinite(growth))) {
      throw new IllegalArgumentException(
          "a yield must be above " + -base / days + ", found " + yield);
    }
    return 100 / growth;
  }

  /** Simple yield of a price: (100/P − 1) base/days. */
  public static double simpleYield(double price, double days, double base) {
    requireDays(days, base);
    return (100 - requirePrice(price)) / price * base / days;
  }

  /** Annually compounded yield of a price over a number of years. */
  public static double annualYield(double price, double years) {
    requireDays(years, 1);
    return Math.expm1(Math.log(100 / requirePrice(price)) / years);
  }

  /**
   * Price at an annually compounded yield.
   *
   * @throws IllegalArgumentException if the yield is not above −1
   */
  public static double priceAtAnnual(double yield, double years) {
    requireDays(years, 1);
    if (!(yield > -1 && Double.isFinite(yield))) {
      throw new IllegalArgumentException("an annual yield must be above -1, found " + yield);
    }
    return 100 * Math.exp(-years * Math.log1p(yield));
  }

  /**
   * Coupon equivalent of a bill: simple up to half a year, and beyond it the i of P (1 + (r/y − ½)
   * i) (1 + i/2) = 100 [31 CFR 356, Appendix B, section VI].
   *
   * @param days r, days to maturity
   * @param year y, days of the year that follows the issue
   */
  public static double couponEquivalent(double price, int days, int year) {
    requireDays(days, year);
    if (2 * days <= year) {
      return simpleYield(price, days, year);
    }
    double a = days / (2.0 * year) - 0.25;
    double b = (double) days / year;
    double c = (requirePrice(price) - 100) / price;
    double root = b * b - 4 * a * c;
    if (!(root >= 0)) {
      throw new IllegalArgumentException("no coupon equivalent gives the price " + price);
    }
    // The form without a difference of near numbers; it stays good where a is small.
    return -2 * c / (b + Math.sqrt(root));
  }

  private static void requireDays(double days, double base) {
    if (!(days > 0 && base > 0 && Double.isFinite(days) && Double.isFinite(base))) {
      throw new IllegalArgumentException(
          "days to maturity and days of a year must be above 0, found " + days + " and " + base);
    }
  }

  private static double requirePrice(double price) {
    if (!(price > 0 && Double.isFinite(price))) {
      throw new IllegalArgumentException("a price must be above 0, found " + price);
    }
    return price;
  }
}
