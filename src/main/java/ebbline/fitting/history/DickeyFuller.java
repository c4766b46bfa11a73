package ebbline.fitting.history;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.QRDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;
import org.apache.commons.math3.linear.SingularMatrixException;
import org.apache.commons.statistics.distribution.NormalDistribution;

/**
 * The augmented Dickey-Fuller test of a unit root, with a constant: the t ratio of the earlier
 * level in a regression of the change on it, a constant and earlier changes.
 *
 * <p>Critical values by the response surface of MacKinnon 2010 (Queen's Economics Department
 * Working Paper 1227), p-value by that of MacKinnon 1994 (Journal of Business and Economic
 * Statistics 12).
 *
 * @param lags earlier changes in the regression
 * @param statistic the t ratio; the more negative, the less a unit root
 * @param pValue of the unit root
 * @param observations used by the regression
 */
public record DickeyFuller(int lags, double statistic, double pValue, int observations) {
  private static final double[] AT_1 = {-3.43035, -6.5393, -16.786, -79.433};
  private static final double[] AT_5 = {-2.86154, -2.8903, -4.234, -40.04};
  private static final double[] AT_10 = {-2.56677, -1.5384, -2.809, 0};
  private static final double[] SMALL = {2.1659, 1.4412, 0.038269};
  private static final double[] LARGE = {1.7339, 0.93202, -0.12745, -0.010368};
  private static final double LOWEST = -18.83;
  private static final double TURN = -1.61;
  private static final double HIGHEST = 2.74;

  /**
   * Tests a history.
   *
   * @throws IllegalArgumentException in words if the steps are uneven, the history is too short for
   *     the lags, or its changes do not vary
   */
  public static DickeyFuller of(RateHistory history, int lags) {
    if (!history.isRegular()) {
      throw new IllegalArgumentException("the Dickey-Fuller test needs evenly spaced rates");
    }
    double[] x = history.ratesInPlace();
    int n = x.length - 1 - lags;
    int columns = lags + 2;
    if (lags < 0 || n <= columns) {
      throw new IllegalArgumentException(
          "the Dickey-Fuller test with "
              + lags
              + " lags needs more than "
              + (2 * lags + 3)
              + " rates, found "
              + x.length);
    }
    if (lags == 0) {
      LaggedSums sums = LaggedSums.of(x);
      double error = Math.sqrt(sums.residuals() / ((n - 2) * sums.square));
      return result(lags, sums.changeSlope() / error, n);
    }
    RealMatrix design = new Array2DRowRealMatrix(n, columns);
    RealVector change = new ArrayRealVector(n);
    for (int i = 0; i < n; i++) {
      int t = i + lags;
      change.setEntry(i, x[t + 1] - x[t]);
      design.setEntry(i, 0, 1);
      design.setEntry(i, 1, x[t] - x[0]);
      for (int j = 1; j <= lags; j++) {
        design.setEntry(i, 1 + j, x[t - j + 1] - x[t - j]);
      }
    }
    try {
      QRDecomposition qr = new QRDecomposition(design, 1e-13);
      RealVector solution = qr.getSolver().solve(change);
      RealVector residual = change.subtract(design.operate(solution));
      double s2 = residual.dotProduct(residual) / (n - columns);
      RealMatrix r = qr.getR().getSubMatrix(0, columns - 1, 0, columns - 1);
      // Row 1 of R⁻¹ gives the variance of the level's coefficient.
      RealVector unit = new ArrayRealVector(columns);
      unit.setEntry(1, 1);
      RealVector row = new QRDecomposition(r.transpose(), 0).getSolver().solve(unit);
      return result(lags, solution.getEntry(1) / Math.sqrt(s2 * row.dotProduct(row)), n);
    } catch (SingularMatrixException e) {
      throw new IllegalArgumentException(
          "the Dickey-Fuller test needs rates whose changes vary", e);
    }
  }

  private static DickeyFuller result(int lags, double statistic, int observations) {
    if (!Double.isFinite(statistic)) {
      throw new IllegalArgumentException("the Dickey-Fuller test needs rates whose changes vary");
    }
    return new DickeyFuller(lags, statistic, pValue(statistic), observations);
  }

  /** The p-value of a statistic, by the response surface for a constant. */
  static double pValue(double statistic) {
    if (statistic > HIGHEST) {
      return 1;
    }
    if (statistic < LOWEST) {
      return 0;
    }
    double[] surface = statistic <= TURN ? SMALL : LARGE;
    return NormalDistribution.of(0, 1).cumulativeProbability(polynomial(surface, statistic));
  }

  /**
   * The statistic below which a unit root is refused.
   *
   * @param percent 1, 5 or 10
   */
  public double criticalValue(int percent) {
    return criticalValue(percent, observations);
  }

  /**
   * The statistic below which a unit root is refused.
   *
   * @param percent 1, 5 or 10
   * @param observations of the regression
   */
  public static double criticalValue(int percent, int observations) {
    double[] surface =
        switch (percent) {
          case 1 -> AT_1;
          case 5 -> AT_5;
          case 10 -> AT_10;
          default ->
              throw new IllegalArgumentException(
                  "critical values are known at 1, 5 and 10 %, found " + percent);
        };
    return polynomial(surface, 1.0 / observations);
  }

  private static double polynomial(double[] coefficients, double x) {
    double sum = 0;
    for (int i = coefficients.length - 1; i >= 0; i--) {
      sum = sum * x + coefficients[i];
    }
    return sum;
  }
}
