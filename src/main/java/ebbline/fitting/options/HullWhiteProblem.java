package ebbline.fitting.options;

import ebbline.model.VolatilitySteps;
import ebbline.pricing.OptionSheet;

/**
 * Errors of a Hull–White model as a function of free coordinates without bounds: mean reversion is
 * the middle of its range plus half of it times a sine, a volatility likewise in its logarithm.
 */
final class HullWhiteProblem implements MarquardtSearch.Problem {
  private static final double LOWEST = Math.log(CalibrationTerms.LOWEST_VOLATILITY);
  private static final double HIGHEST = Math.log(CalibrationTerms.HIGHEST_VOLATILITY);
  private static final double MIDDLE_LOG = 0.5 * (LOWEST + HIGHEST);
  private static final double HALF_LOG = 0.5 * (HIGHEST - LOWEST);

  private final OptionSheet sheet;
  private final QuoteTargets targets;
  private final CalibrationTerms terms;
  private final double[] ends;
  private final boolean reversionIsFree;
  private final int firstFree;
  private final int freeSteps;
  private final double middle;
  private final double half;
  private boolean exact;
  private double reversion;
  private final double[] sigma;

  private final double[] values;
  private final double[] byReversion;
  private final double[][] byVolatility;
  private final double[][] slopeRows;

  /**
   * @param reversion where it is not free
   * @param firstFree first step whose volatility is free
   * @param freeSteps how many are, from there on; later steps move with the last of them
   */
  HullWhiteProblem(
      OptionSheet sheet,
      QuoteTargets targets,
      CalibrationTerms terms,
      double reversion,
      boolean reversionIsFree,
      double[] sigma,
      int firstFree,
      int freeSteps) {
    this.sheet = sheet;
    this.targets = targets;
    this.terms = terms;
    this.ends = terms.stepEnds();
    this.reversion = reversion;
    this.reversionIsFree = reversionIsFree;
    this.sigma = sigma.clone();
    this.firstFree = firstFree;
    this.freeSteps = freeSteps;
    this.middle = 0.5 * (terms.lowestMeanReversion() + terms.highestMeanReversion());
    this.half = 0.5 * (terms.highestMeanReversion() - terms.lowestMeanReversion());
    values = new double[targets.size()];
    byReversion = new double[targets.size()];
    byVolatility = new double[sigma.length][targets.size()];
    slopeRows = new double[sigma.length + 1][];
    slopeRows[0] = byReversion;
    System.arraycopy(byVolatility, 0, slopeRows, 1, sigma.length);
  }

  /** Whether errors are differences of volatilities, or premium errors over vega. */
  void setExact(boolean exact) {
    this.exact = exact;
  }

  @Override
  public int residuals() {
    return targets.size();
  }

  @Override
  public int parameters() {
    return (reversionIsFree ? 1 : 0) + freeSteps;
  }

  double[] coordinates(double meanReversion, double[] volatility) {
    double[] point = new double[parameters()];
    int at = 0;
    if (reversionIsFree) {
      point[at++] = Math.asin(Math.max(-1, Math.min(1, (meanReversion - middle) / half)));
    }
    for (int k = 0; k < freeSteps; k++) {
      double share = (Math.log(volatility[firstFree + k]) - MIDDLE_LOG) / HALF_LOG;
      point[at++] = Math.asin(Math.max(-1, Math.min(1, share)));
    }
    return point;
  }

  double meanReversion(double[] point) {
    return reversionIsFree ? middle + half * Math.sin(point[0]) : reversion;
  }

  double[] volatility(double[] point) {
    double[] all = sigma.clone();
    int at = reversionIsFree ? 1 : 0;
    for (int k = 0; k < freeSteps; k++) {
      all[firstFree + k] = Math.exp(MIDDLE_LOG + HALF_LOG * Math.sin(point[at + k]));
    }
    for (int k = firstFree + freeSteps; k < all.length; k++) {
      all[k] = all[firstFree + freeSteps - 1];
    }
    return all;
  }

  @Override
  public void at(double[] point, double[] residual, double[][] slopes) {
    double a = meanReversion(point);
    double[] all = volatility(point);
    natural(a, all, residual);
    int at = 0;
    if (reversionIsFree) {
      double chain = half * Math.cos(point[0]);
      for (int i = 0; i < residual.length; i++) {
        slopes[0][i] = byReversion[i] * chain;
      }
      at = 1;
    }
    for (int k = 0; k < freeSteps; k++) {
      double chain = all[firstFree + k] * HALF_LOG * Math.cos(point[at + k]);
      double[] row = slopes[at + k];
      double[] from = byVolatility[firstFree + k];
      for (int i = 0; i < residual.length; i++) {
        row[i] = from[i] * chain;
      }
    }
    for (int k = firstFree + freeSteps; k < all.length; k++) {
      // Steps beyond the last free one move with it.
      double[] row = slopes[at + freeSteps - 1];
      double chain = all[k] * HALF_LOG * Math.cos(point[at + freeSteps - 1]);
      for (int i = 0; i < residual.length; i++) {
        row[i] += byVolatility[k][i] * chain;
      }
    }
  }

  /** Errors and their slopes in a and every σ, which {@link #naturalSlopes} then holds. */
  void natural(double a, double[] all, double[] residual) {
    sheet.evaluate(a, VolatilitySteps.of(ends, all), values, byReversion, byVolatility);
    if (exact) {
      targets.exact(values, slopeRows, residual);
    } else {
      targets.scaled(values, slopeRows, residual);
    }
  }

  /** Premiums of the last evaluation. */
  double[] values() {
    return values.clone();
  }

  /** Slopes of the last evaluation: in a, then in each σ. */
  double[][] naturalSlopes() {
    return slopeRows;
  }

  CalibrationTerms terms() {
    return terms;
  }
}
