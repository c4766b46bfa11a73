package ebbline.fitting.quotes;

import ebbline.curve.Compounding;
import ebbline.curve.DiscountCurve;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/** Quote sheets for tests, invented. */
final class QuoteSheets {
  private QuoteSheets() {}

  /** Every instrument once or more, out of order, overlapping, with a lag and odd accruals. */
  static List<QuoteEquation> mixed() {
    List<QuoteEquation> quotes = new ArrayList<>();
    quotes.add(
        MarketQuotes.swap("swap-10", 0.005, 10.005, every(0.005, 0.5, 20), same(0.5, 20), 0.034));
    quotes.add(MarketQuotes.deposit("on", 0, 1 / 365.0, 1 / 360.0, 0.0525));
    quotes.add(MarketQuotes.deposit("3m", 2 / 365.0, 0.26, 92 / 360.0, 0.053));
    quotes.add(MarketQuotes.billDiscount("bill", 0.003, 0.5, 0.505, 0.0505));
    quotes.add(MarketQuotes.forwardRate("fra", 0.5, 0.75, 0.253, 0.0489));
    quotes.add(MarketQuotes.future("future", 0.7, 0.95, 0.25, 95.4, 0.05, 0.012));
    quotes.add(
        MarketQuotes.overnightSwap(
            "ois-2",
            0.005,
            new double[] {1.005, 2.005},
            new double[] {1.0105, 2.0105},
            new double[] {1.0139, 1.0139},
            0.0402));
    quotes.add(
        MarketQuotes.bondPrice("bond-4", every(0.2, 0.5, 9), bond(2, 9), 2 / 365.0, 1.2, 101.37));
    quotes.add(
        MarketQuotes.bondYield(
            "bond-6", every(0.1, 1, 7), bond(3, 7), 2 / 365.0, yielding(0.1, 3, 7), 0.0331));
    quotes.add(MarketQuotes.zero("zero-15", 15, Compounding.ANNUAL, 0.036));
    quotes.add(
        MarketQuotes.swap("swap-30", 0.005, 30.005, every(0.005, 1, 30), same(1, 30), 0.0345));
    return quotes;
  }

  /** first + step, first + 2 step, … but {@code count} times from the first on. */
  static double[] every(double from, double step, int count) {
    double[] times = new double[count];
    for (int i = 0; i < count; i++) {
      times[i] = from + step * (from > 0.05 ? i : i + 1);
    }
    return times;
  }

  static double[] same(double value, int count) {
    double[] values = new double[count];
    java.util.Arrays.fill(values, value);
    return values;
  }

  static double[] bond(double coupon, int count) {
    double[] amounts = same(coupon, count);
    amounts[count - 1] += 100;
    return amounts;
  }

  private static QuoteEquation.QuotedValue yielding(double first, double coupon, int count) {
    double[] times = every(first, 1, count);
    double[] amounts = bond(coupon, count);
    return new QuoteEquation.QuotedValue() {
      @Override
      public double value(double quote) {
        double sum = 0;
        for (int i = 0; i < count; i++) {
          sum += amounts[i] * Math.pow(1 + quote, -times[i]);
        }
        return sum;
      }

      @Override
      public double slope(double quote) {
        double sum = 0;
        for (int i = 0; i < count; i++) {
          sum -= times[i] * amounts[i] * Math.pow(1 + quote, -times[i] - 1);
        }
        return sum;
      }
    };
  }

  /** Par bonds of a curve with noise of the given size on their prices. */
  static List<QuoteEquation> noisyBonds(DiscountCurve curve, int count, double noise, long seed) {
    Random random = new Random(seed);
    List<QuoteEquation> quotes = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      int flows = 1 + i % 30;
      double[] times = every(0.1 + 0.8 * random.nextDouble(), 1, flows);
      double[] amounts = bond(3, flows);
      double price = 0;
      for (int k = 0; k < flows; k++) {
        price += amounts[k] * curve.discount(times[k]);
      }
      quotes.add(
          MarketQuotes.bondPrice(
              "bond-" + i, times, amounts, 0, 0, price + noise * random.nextGaussian()));
    }
    return quotes;
  }
}
