package ebbline.fitting.panel;

import ebbline.fitting.VasicekZero;
import java.util.Arrays;

/**
 * The Kalman filter of a panel, one maturity at a time [Koopman and Durbin 2000, J. Time Series
 * Analysis 21], started in the stationary law, with the derivatives of the log-likelihood.
 *
 * <p>Coordinates (κ, m, σ, n, h) with m = κθ and n = κθ − λσ, the drifts at rate 0 under the two
 * measures: the model's yields and transitions are smooth in them through κ = 0, and linear in m
 * and n.
 */
final class PanelFilter {
  static final int KAPPA = 0;
  static final int M = 1;
  static final int SIGMA = 2;
  static final int N = 3;
  static final int H = 4;
  private static final double LOG_2_PI = Math.log(2 * Math.PI);

  private final YieldPanel panel;
  private final int columns;

  /** Of the yields: value at rate 0 by n and by σ²/2, loading on the rate, and slopes in κ. */
  private final double[] byN;

  private final double[] byNSlope;
  private final double[] convexity;
  private final double[] convexitySlope;
  private final double[] loading;
  private final double[] loadingSlope;

  double logLikelihood;
  final double[] gradient = new double[5];

  PanelFilter(YieldPanel panel) {
    this.panel = panel;
    this.columns = panel.columns();
    this.byN = new double[columns];
    this.byNSlope = new double[columns];
    this.convexity = new double[columns];
    this.convexitySlope = new double[columns];
    this.loading = new double[columns];
    this.loadingSlope = new double[columns];
  }

  static double[] coordinates(PanelParameters p) {
    double m = p.meanReversion() * p.longRunMean();
    return new double[] {
      p.meanReversion(),
      m,
      p.volatility(),
      m - p.marketPriceOfRisk() * p.volatility(),
      p.measurementSd()
    };
  }

  static PanelParameters parameters(double[] u) {
    return new PanelParameters(u[KAPPA], u[M] / u[KAPPA], u[SIGMA], (u[M] - u[N]) / u[SIGMA], u[H]);
  }

  private void loadings(double kappa) {
    for (int j = 0; j < columns; j++) {
      double tau = panel.maturity(j);
      VasicekZero zero = VasicekZero.at(kappa * tau);
      byN[j] = zero.byDrift(tau);
      byNSlope[j] = zero.byDriftAndMeanReversion(tau);
      loading[j] = 1 - kappa * byN[j];
      loadingSlope[j] = -byN[j] - kappa * byNSlope[j];
      // −½σ²τ²h: by σ it is −σ τ²h, by κ through its own slope.
      convexity[j] = zero.byVolatility(tau, 1);
      convexitySlope[j] = 2 * zero.byMeanReversion(tau, 0, 1);
    }
  }

  /** A step of the rate: decay, reach, and variance per σ², with slopes in κ. */
  private static final class Step {
    double years = -1;
    double decay;
    double reach;
    double reachSlope;
    double width;
    double widthSlope;

    void over(double dt, double kappa) {
      if (dt == years) {
        return;
      }
      years = dt;
      decay = Math.exp(-kappa * dt);
      VasicekZero one = VasicekZero.at(kappa * dt);
      VasicekZero two = VasicekZero.at(2 * kappa * dt);
      // (1 − e^(−κt))/κ = t(1 − κ t k(κt)), and its slope in κ.
      reach = dt * (1 - kappa * one.byDrift(dt));
      reachSlope = -dt * (one.byDrift(dt) + kappa * one.byDriftAndMeanReversion(dt));
      width = dt * (1 - 2 * kappa * two.byDrift(dt));
      widthSlope = -2 * dt * (two.byDrift(dt) + 2 * kappa * two.byDriftAndMeanReversion(dt));
    }
  }

  /** The m and n that suit κ, σ and h best, by generalised least squares; written into u. */
  void bestDrifts(double[] u) {
    double kappa = u[KAPPA];
    double sigma = u[SIGMA];
    double noise = u[H] * u[H];
    loadings(kappa);
    // The same filter run on the yields and on the two regressors.
    double r = 0;
    double r1 = 1 / kappa;
    double r2 = 0;
    double p = sigma * sigma / (2 * kappa);
    double s11 = 0;
    double s12 = 0;
    double s22 = 0;
    double t1 = 0;
    double t2 = 0;
    Step step = new Step();
    for (int i = 0; i < panel.size(); i++) {
      if (i > 0) {
        step.over(panel.time(i) - panel.time(i - 1), kappa);
        r *= step.decay;
        r1 = step.decay * r1 + step.reach;
        r2 *= step.decay;
        p = step.decay * step.decay * p + sigma * sigma * step.width;
      }
      for (int j = 0; j < columns; j++) {
        double y = panel.cell(i, j);
        if (Double.isNaN(y)) {
          continue;
        }
        double b = loading[j];
        double f = b * b * p + noise;
        double v = y - 0.5 * sigma * sigma * convexity[j] - b * r;
        double v1 = b * r1;
        double v2 = byN[j] + b * r2;
        s11 += v1 * v1 / f;
        s12 += v1 * v2 / f;
        s22 += v2 * v2 / f;
        t1 += v1 * v / f;
        t2 += v2 * v / f;
        double gain = b * p / f;
        r += gain * v;
        r1 -= gain * v1;
        r2 -= gain * v2;
        p *= noise / f;
      }
    }
    double det = s11 * s22 - s12 * s12;
    u[M] = (t1 * s22 - t2 * s12) / det;
    u[N] = (t2 * s11 - t1 * s12) / det;
  }

  /** Log-likelihood with its constants, and its gradient in the coordinates. */
  void evaluate(double[] u) {
    double kappa = u[KAPPA];
    double m = u[M];
    double sigma = u[SIGMA];
    double n = u[N];
    double noise = u[H] * u[H];
    double noiseSlope = 2 * u[H];
    loadings(kappa);
    double r = m / kappa;
    double p = sigma * sigma / (2 * kappa);
    double[] dr = {-r / kappa, 1 / kappa, 0, 0, 0};
    double[] dp = {-p / kappa, 0, 2 * p / sigma, 0, 0};
    double[] da = new double[5];
    double[] g = gradient;
    Arrays.fill(g, 0);
    double sum = 0;
    double logs = 0;
    double product = 1;
    Step step = new Step();
    for (int i = 0; i < panel.size(); i++) {
      if (i > 0) {
        step.over(panel.time(i) - panel.time(i - 1), kappa);
        predict(step, m, sigma, r, p, dr, dp);
        r = step.decay * r + m * step.reach;
        p = step.decay * step.decay * p + sigma * sigma * step.width;
      }
      for (int j = 0; j < columns; j++) {
        double y = panel.cell(i, j);
        if (Double.isNaN(y)) {
          continue;
        }
        double b = loading[j];
        double v = y - n * byN[j] - 0.5 * sigma * sigma * convexity[j] - b * r;
        double f = b * b * p + noise;
        double inverse = 1 / f;
        double gain = b * p * inverse;
        double kept = noise * inverse;
        da[KAPPA] = n * byNSlope[j] + 0.5 * sigma * sigma * convexitySlope[j] + loadingSlope[j] * r;
        da[SIGMA] = sigma * convexity[j];
        da[N] = byN[j];
        double w = v * inverse;
        for (int k = 0; k < 5; k++) {
          double db = k == KAPPA ? loadingSlope[j] : 0;
          double dNoise = k == H ? noiseSlope : 0;
          double dv = -da[k] - b * dr[k];
          double df = 2 * b * db * p + b * b * dp[k] + dNoise;
          g[k] -= 0.5 * (df * inverse + w * (2 * dv - w * df));
          double dGain = (db * p + b * dp[k] - gain * df) * inverse;
          dr[k] += dGain * v + gain * dv;
          dp[k] = dp[k] * kept + p * (dNoise - kept * df) * inverse;
        }
        r += gain * v;
        p *= kept;
        sum += v * w;
        product *= f;
        if (product < 1e-200 || product > 1e200) {
          logs += Math.log(product);
          product = 1;
        }
      }
    }
    logs += Math.log(product);
    logLikelihood = -0.5 * (panel.cells() * LOG_2_PI + logs + sum);
  }

  private static void predict(
      Step step, double m, double sigma, double r, double p, double[] dr, double[] dp) {
    double decay = step.decay;
    for (int k = 0; k < 5; k++) {
      dr[k] *= decay;
      dp[k] *= decay * decay;
    }
    dr[KAPPA] += m * step.reachSlope - step.years * decay * r;
    dr[M] += step.reach;
    dp[KAPPA] += sigma * sigma * step.widthSlope - 2 * step.years * decay * decay * p;
    dp[SIGMA] += 2 * sigma * step.width;
  }

  /**
   * The filtered rates and their standard deviations, and the root mean squared error of each
   * maturity at the filtered rate.
   */
  FilteredRates filtered(double[] u) {
    double kappa = u[KAPPA];
    double sigma = u[SIGMA];
    double noise = u[H] * u[H];
    loadings(kappa);
    double[] rates = new double[panel.size()];
    double[] sds = new double[panel.size()];
    double[] squares = new double[columns];
    int[] counts = new int[columns];
    double r = u[M] / kappa;
    double p = sigma * sigma / (2 * kappa);
    Step step = new Step();
    for (int i = 0; i < panel.size(); i++) {
      if (i > 0) {
        step.over(panel.time(i) - panel.time(i - 1), kappa);
        r = step.decay * r + u[M] * step.reach;
        p = step.decay * step.decay * p + sigma * sigma * step.width;
      }
      for (int j = 0; j < columns; j++) {
        double y = panel.cell(i, j);
        if (!Double.isNaN(y)) {
          double b = loading[j];
          double f = b * b * p + noise;
          r += b * p / f * (y - u[N] * byN[j] - 0.5 * sigma * sigma * convexity[j] - b * r);
          p *= noise / f;
        }
      }
      rates[i] = r;
      sds[i] = Math.sqrt(p);
      for (int j = 0; j < columns; j++) {
        double y = panel.cell(i, j);
        if (!Double.isNaN(y)) {
          double miss = y - u[N] * byN[j] - 0.5 * sigma * sigma * convexity[j] - loading[j] * r;
          squares[j] += miss * miss;
          counts[j]++;
        }
      }
    }
    double[] rmse = new double[columns];
    for (int j = 0; j < columns; j++) {
      rmse[j] = counts[j] == 0 ? 0 : Math.sqrt(squares[j] / counts[j]);
    }
    return new FilteredRates(rates, sds, rmse);
  }
}
