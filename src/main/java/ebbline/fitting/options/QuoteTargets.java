package ebbline.fitting.options;

import java.util.List;

/**
 * Weighted errors of model premiums against quotes in the unit of the objective.
 *
 * <p>Two measures of the same error: premium error over the quote's vega, which costs nothing, and
 * the difference of the volatilities themselves. They agree to first order; a search takes the
 * first to come near and the second to end.
 */
final class QuoteTargets {
  private final List<OptionQuote> quotes;
  private final Objective objective;
  private final double[] premium;
  private final double[] figure;
  private final double[] root;
  private final double[] scale;

  /**
   * @throws IllegalArgumentException in words if a quote has no figure in the objective's unit
   */
  QuoteTargets(List<OptionQuote> quotes, Objective objective) {
    this.quotes = quotes;
    this.objective = objective;
    int n = quotes.size();
    premium = new double[n];
    figure = new double[n];
    root = new double[n];
    scale = new double[n];
    for (int i = 0; i < n; i++) {
      OptionQuote quote = quotes.get(i);
      premium[i] = quote.premium();
      try {
        figure[i] =
            quote.unit() == objective.unit()
                ? quote.quoted()
                : objective.unit().figure(quote.terms(), premium[i], quote.shift());
      } catch (IllegalArgumentException e) {
        throw new IllegalArgumentException("quote " + quote.id() + ": " + e.getMessage(), e);
      }
      root[i] = Math.sqrt(quote.weight());
      scale[i] = root[i] / objective.unit().slope(quote.terms(), figure[i], quote.shift());
    }
  }

  int size() {
    return premium.length;
  }

  boolean isLinear() {
    return objective == Objective.PREMIUM;
  }

  /** Turns premiums into errors, and slopes of premiums into slopes of errors, to first order. */
  void scaled(double[] values, double[][] slopes, double[] residual) {
    for (int i = 0; i < premium.length; i++) {
      residual[i] = scale[i] * (values[i] - premium[i]);
    }
    for (double[] row : slopes) {
      for (int i = 0; i < premium.length; i++) {
        row[i] *= scale[i];
      }
    }
  }

  /** As {@link #scaled}, with the volatility of each premium; NaN where it has none. */
  void exact(double[] values, double[][] slopes, double[] residual) {
    for (int i = 0; i < premium.length; i++) {
      double factor = scale[i];
      if (root[i] == 0) {
        residual[i] = 0;
      } else {
        double implied = implied(i, values[i]);
        residual[i] = root[i] * (implied - figure[i]);
        factor =
            root[i] / objective.unit().slope(quotes.get(i).terms(), implied, quotes.get(i).shift());
      }
      for (double[] row : slopes) {
        row[i] *= factor;
      }
    }
  }

  private double implied(int i, double value) {
    try {
      double implied = objective.unit().figure(quotes.get(i).terms(), value, quotes.get(i).shift());
      return implied > 0 ? implied : Double.NaN;
    } catch (IllegalArgumentException e) {
      return Double.NaN;
    }
  }
}
