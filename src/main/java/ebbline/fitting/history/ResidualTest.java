package ebbline.fitting.history;

import org.apache.commons.statistics.distribution.ChiSquaredDistribution;

/**
 * A test of residuals that are independent and normal if the model is right.
 *
 * @param name of the test, for the reader
 * @param statistic χ² under the model
 * @param degrees of freedom
 * @param pValue chance of a statistic at least as large under the model
 * @param observations used
 */
public record ResidualTest(
    String name, double statistic, int degrees, double pValue, int observations) {

  /**
   * Autocorrelation up to a lag [Ljung and Box 1978, Biometrika 65]; as many degrees as lags.
   *
   * @throws IllegalArgumentException if there are not more residuals than lags, or they are all 0
   */
  public static ResidualTest ljungBox(double[] residuals, int lags) {
    int n = residuals.length;
    if (!(lags >= 1 && n > lags + 1)) {
      throw new IllegalArgumentException(
          "Ljung-Box over "
              + lags
              + " lags needs more than "
              + (lags + 1)
              + " residuals, found "
              + n);
    }
    double[] d = centred(residuals);
    double zero = squares(d);
    double sum = 0;
    for (int lag = 1; lag <= lags; lag++) {
      double cross = 0;
      for (int i = lag; i < n; i++) {
        cross += d[i] * d[i - lag];
      }
      double correlation = cross / zero;
      sum += correlation * correlation / (n - lag);
    }
    return of("Ljung-Box", n * (n + 2.0) * sum, lags, n);
  }

  /**
   * Skewness and kurtosis of a normal law [Jarque and Bera 1980, Economics Letters 6].
   *
   * @throws IllegalArgumentException if there are fewer than four residuals, or they are all equal
   */
  public static ResidualTest jarqueBera(double[] residuals) {
    int n = residuals.length;
    if (n < 4) {
      throw new IllegalArgumentException("Jarque-Bera needs at least 4 residuals, found " + n);
    }
    double[] d = centred(residuals);
    double variance = squares(d) / n;
    double third = 0;
    double fourth = 0;
    for (double e : d) {
      third += e * e * e;
      fourth += e * e * e * e;
    }
    double skew = third / n / (variance * Math.sqrt(variance));
    double excess = fourth / n / (variance * variance) - 3;
    return of("Jarque-Bera", n / 6.0 * (skew * skew + excess * excess / 4), 2, n);
  }

  /**
   * Volatility that depends on the last residual [Engle 1982, Econometrica 50]: (n − 1) R² of
   * squared residuals on the ones before.
   *
   * @throws IllegalArgumentException if there are fewer than four residuals or their squares do not
   *     vary
   */
  public static ResidualTest arch(double[] residuals) {
    int n = residuals.length - 1;
    if (n < 3) {
      throw new IllegalArgumentException(
          "the ARCH test needs at least 4 residuals, found " + residuals.length);
    }
    double[] earlier = new double[n];
    double[] later = new double[n];
    for (int i = 0; i < n; i++) {
      earlier[i] = residuals[i] * residuals[i];
      later[i] = residuals[i + 1] * residuals[i + 1];
    }
    double[] x = centred(earlier);
    double[] y = centred(later);
    double cross = 0;
    for (int i = 0; i < n; i++) {
      cross += x[i] * y[i];
    }
    return of("ARCH-LM", n * cross * cross / (squares(x) * squares(y)), 1, n);
  }

  private static ResidualTest of(String name, double statistic, int degrees, int observations) {
    if (!Double.isFinite(statistic)) {
      throw new IllegalArgumentException(name + " needs residuals that vary");
    }
    return new ResidualTest(
        name,
        statistic,
        degrees,
        ChiSquaredDistribution.of(degrees).survivalProbability(statistic),
        observations);
  }

  private static double[] centred(double[] values) {
    double mean = 0;
    for (double v : values) {
      mean += v / values.length;
    }
    double[] result = new double[values.length];
    for (int i = 0; i < values.length; i++) {
      result[i] = values[i] - mean;
    }
    return result;
  }

  private static double squares(double[] values) {
    double sum = 0;
    for (double v : values) {
      sum += v * v;
    }
    return sum;
  }
}
