package ebbline.fitting.panel;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;

/**
 * Maximum likelihood of the Vasicek model on a panel of yields [Duan and Simonato 1999; Babbs and
 * Nowman 1999, J. Financial and Quantitative Analysis 34].
 *
 * <p>The drifts of both measures enter linearly and are solved for, so the search runs over the
 * logarithms of κ, σ and the noise only, from eight starts that are the same on every run; the
 * highest maximum is then polished in all five.
 */
public final class PanelEstimator {
  private static final int ITERATIONS = 200;
  private static final double[] REVERSIONS = {0.01, 0.05, 0.2, 0.8};
  private static final double[] NOISES = {0.1, 0.6};

  /** κ × span below this cannot be told from 0 on any panel. */
  private static final double NO_REVERSION = 1e-5;

  private PanelEstimator() {}

  /**
   * Estimates.
   *
   * @throws IllegalArgumentException in words if there are fewer than 2 maturities, 4 rows or 12
   *     cells, or the yields do not vary
   */
  public static PanelEstimate estimate(YieldPanel panel) {
    requireEnough(panel);
    PanelFilter filter = new PanelFilter(panel);
    NewtonSearch.Hill profile = (x, gradient) -> profile(filter, x, gradient);
    double[] ones = {1, 1, 1};
    double volatility = startVolatility(panel);
    double spread = spread(panel);
    List<NewtonSearch.Top> tops = new ArrayList<>();
    for (double reversion : REVERSIONS) {
      for (double noise : NOISES) {
        double[] start = {Math.log(reversion), Math.log(volatility), Math.log(noise * spread)};
        NewtonSearch.Top top = NewtonSearch.climb(profile, start, ones, 1, ITERATIONS);
        if (Double.isFinite(top.value())) {
          tops.add(top);
        }
      }
    }
    if (tops.isEmpty()) {
      throw new IllegalArgumentException("the likelihood of this panel is finite at no start");
    }
    tops.sort(Comparator.comparingDouble(NewtonSearch.Top::value).reversed());
    return finish(panel, filter, tops);
  }

  private static double profile(PanelFilter filter, double[] x, double[] gradient) {
    if (!(Math.abs(x[0]) < 40 && Math.abs(x[1]) < 40 && Math.abs(x[2]) < 40)) {
      return Double.NEGATIVE_INFINITY;
    }
    double[] u = {Math.exp(x[0]), 0, Math.exp(x[1]), 0, Math.exp(x[2])};
    filter.bestDrifts(u);
    filter.evaluate(u);
    gradient[0] = filter.gradient[PanelFilter.KAPPA] * u[PanelFilter.KAPPA];
    gradient[1] = filter.gradient[PanelFilter.SIGMA] * u[PanelFilter.SIGMA];
    gradient[2] = filter.gradient[PanelFilter.H] * u[PanelFilter.H];
    double value = filter.logLikelihood;
    return Double.isFinite(value) ? value : Double.NEGATIVE_INFINITY;
  }

  private static double full(PanelFilter filter, double[] u, double[] gradient) {
    if (!(u[PanelFilter.KAPPA] > 0 && u[PanelFilter.SIGMA] > 0 && u[PanelFilter.H] > 0)) {
      return Double.NEGATIVE_INFINITY;
    }
    filter.evaluate(u);
    System.arraycopy(filter.gradient, 0, gradient, 0, gradient.length);
    return filter.logLikelihood;
  }

  private static PanelEstimate finish(
      YieldPanel panel, PanelFilter filter, List<NewtonSearch.Top> tops) {
    NewtonSearch.Top first = tops.get(0);
    double[] u = {Math.exp(first.x()[0]), 0, Math.exp(first.x()[1]), 0, Math.exp(first.x()[2])};
    filter.bestDrifts(u);
    double[] scale = new double[5];
    double drift = Math.max(u[PanelFilter.KAPPA], 0.01) * 0.01;
    for (int k = 0; k < 5; k++) {
      boolean positive = k == PanelFilter.KAPPA || k == PanelFilter.SIGMA || k == PanelFilter.H;
      scale[k] = positive ? u[k] : Math.max(Math.abs(u[k]), drift);
    }
    NewtonSearch.Hill hill = (x, gradient) -> full(filter, x, gradient);
    NewtonSearch.Top top = NewtonSearch.climb(hill, u, scale, 0.5, ITERATIONS);
    PanelParameters found = PanelFilter.parameters(top.x());
    double[][] information = natural(NewtonSearch.curvature(hill, top.x(), scale, 1e-3), found);
    PanelErrors errors = PanelErrors.invert(information);
    PanelEstimate.Best best =
        new PanelEstimate.Best(
            found,
            errors,
            top.value(),
            filter.filtered(top.x()),
            first.iterations() + top.iterations(),
            others(tops, top.value()),
            warnings(found, errors));
    if (found.meanReversion() * panel.span() < NO_REVERSION) {
      return new PanelEstimate.Stopped(
          best,
          String.format(
              Locale.ROOT,
              "mean reversion runs to 0 (%.3g a year): the panel shows none, and its long-run mean"
                  + " means nothing",
              found.meanReversion()));
    }
    return top.converged()
        ? new PanelEstimate.Converged(best)
        : new PanelEstimate.Stopped(
            best, "the likelihood still rose after " + top.iterations() + " steps");
  }

  /** Carries the information from (κ, m, σ, n, h) to (κ, θ, σ, λ, h); the gradient is 0. */
  private static double[][] natural(double[][] bend, PanelParameters p) {
    double[][] map = new double[5][5];
    map[PanelFilter.KAPPA] = new double[] {1, 0, 0, 0, 0};
    map[PanelFilter.M] = new double[] {p.longRunMean(), p.meanReversion(), 0, 0, 0};
    map[PanelFilter.SIGMA] = new double[] {0, 0, 1, 0, 0};
    map[PanelFilter.N] =
        new double[] {
          p.longRunMean(), p.meanReversion(), -p.marketPriceOfRisk(), -p.volatility(), 0
        };
    map[PanelFilter.H] = new double[] {0, 0, 0, 0, 1};
    double[][] result = new double[5][5];
    for (int i = 0; i < 5; i++) {
      for (int j = 0; j < 5; j++) {
        for (int a = 0; a < 5; a++) {
          for (int b = 0; b < 5; b++) {
            result[i][j] += map[a][i] * bend[a][b] * map[b][j];
          }
        }
      }
    }
    return result;
  }

  private static List<Double> others(List<NewtonSearch.Top> tops, double highest) {
    List<Double> others = new ArrayList<>();
    double last = highest;
    for (NewtonSearch.Top top : tops) {
      if (top.converged() && top.value() < last - 1e-4) {
        others.add(top.value());
        last = top.value();
      }
    }
    return others;
  }

  private static List<String> warnings(PanelParameters found, PanelErrors errors) {
    List<String> warnings = new ArrayList<>();
    if (errors.meanReversion().isEmpty()) {
      warnings.add(
          "the likelihood does not bend down in every direction: some parameter is not identified,"
              + " and there are no standard errors");
      return warnings;
    }
    if (errors.longRunMean().orElseThrow() > 0.03) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "the historical long-run mean is weakly identified: %.2f %% with a standard error of"
                  + " %.2f %%, and the market price of risk with it",
              100 * found.longRunMean(),
              100 * errors.longRunMean().orElseThrow()));
    }
    if (Math.abs(found.pricingMean()) > 0.2) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "a long-run mean of %.2f %% under the pricing measure is no rate to believe: the"
                  + " panel holds its product with the mean reversion only",
              100 * found.pricingMean()));
    }
    return warnings;
  }

  private static void requireEnough(YieldPanel panel) {
    if (!(panel.columns() >= 2 && panel.size() >= 4 && panel.cells() >= 12)) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "a panel needs at least 2 maturities, 4 dates and 12 yields, found %d, %d and %d",
              panel.columns(),
              panel.size(),
              panel.cells()));
    }
    if (!(spread(panel) > 1e-9)) {
      throw new IllegalArgumentException(
          "all yields of the panel are equal: nothing can be estimated from them");
    }
  }

  /** Root of the mean squared deviation of all cells from their mean. */
  private static double spread(YieldPanel panel) {
    double mean = panel.mean();
    double sum = 0;
    for (int i = 0; i < panel.size(); i++) {
      for (int j = 0; j < panel.columns(); j++) {
        double y = panel.cell(i, j);
        sum += Double.isNaN(y) ? 0 : (y - mean) * (y - mean);
      }
    }
    return Math.sqrt(sum / panel.cells());
  }

  /** From the moves of each maturity between two rows that have it. */
  private static double startVolatility(YieldPanel panel) {
    double sum = 0;
    int count = 0;
    for (int j = 0; j < panel.columns(); j++) {
      for (int i = 1; i < panel.size(); i++) {
        double move = panel.cell(i, j) - panel.cell(i - 1, j);
        if (!Double.isNaN(move)) {
          sum += move * move / (panel.time(i) - panel.time(i - 1));
          count++;
        }
      }
    }
    return count == 0 || sum == 0 ? 0.01 : Math.sqrt(sum / count);
  }
}
