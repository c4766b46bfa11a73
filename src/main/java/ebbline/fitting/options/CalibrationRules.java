package ebbline.fitting.options;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Locale;

/** What quotes must have for a fit to make sense, with messages for the user. */
final class CalibrationRules {
  /** Expiries closer than this many years are one. */
  static final double SAME = 1e-6;

  private CalibrationRules() {}

  static void check(List<OptionQuote> quotes, CalibrationTerms terms) {
    int counted = counted(quotes);
    if (quotes.isEmpty()) {
      throw new IllegalArgumentException("a calibration needs quotes, found none");
    }
    if (counted == 0) {
      throw new IllegalArgumentException(
          "weight must be above 0 for some quote: with all weights 0 nothing is fitted");
    }
    boolean free = terms.meanReversion().isEmpty();
    int parameters = terms.steps() + (free ? 1 : 0);
    double first = Double.POSITIVE_INFINITY;
    double last = 0;
    for (OptionQuote quote : quotes) {
      if (quote.weight() > 0) {
        first = Math.min(first, quote.terms().lastExpiry());
        last = Math.max(last, quote.terms().lastExpiry());
      }
    }
    if (free && counted > 1 && last - first <= SAME) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "expiry must differ between quotes where mean reversion is fitted; all expire in %s"
                  + " years: hold it with --fix mean-reversion=VALUE",
              years(last)));
    }
    if (counted < parameters) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "%d parameters cannot be fitted to %d %s with a weight",
              parameters,
              counted,
              counted == 1 ? "quote" : "quotes"));
    }
    checkSteps(quotes, terms);
  }

  private static void checkSteps(List<OptionQuote> quotes, CalibrationTerms terms) {
    double[] ends = terms.stepEnds();
    for (int k = 0; k < terms.steps() && terms.steps() > 1; k++) {
      double from = k == 0 ? 0 : ends[k - 1];
      double to = k < ends.length ? ends[k] : Double.POSITIVE_INFINITY;
      boolean told =
          quotes.stream()
              .filter(q -> q.weight() > 0)
              .mapToDouble(q -> q.terms().lastExpiry())
              .anyMatch(t -> t > from + SAME && (!terms.bootstrap() || t <= to + SAME));
      if (!told) {
        throw new IllegalArgumentException(
            String.format(
                Locale.ROOT,
                "no quote expires in the volatility step that starts in %s years%s: nothing tells its"
                    + " volatility",
                years(from),
                Double.isInfinite(to) ? "" : " and ends in " + years(to)));
      }
    }
  }

  private static String years(double value) {
    return new BigDecimal(value).round(new MathContext(6)).stripTrailingZeros().toPlainString();
  }

  static int counted(List<OptionQuote> quotes) {
    return (int) quotes.stream().filter(q -> q.weight() > 0).count();
  }

  /** {@code volatility}, or {@code volatility_1} and so on where there are steps. */
  static String volatilityName(CalibrationTerms terms, int step) {
    return terms.steps() == 1 ? "volatility" : "volatility_" + (step + 1);
  }
}
