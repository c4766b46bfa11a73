package ebbline.pricing;

import ebbline.model.GaussianRates;

/**
 * Calls and puts on zero bonds per unit of face, one at a time or in blocks, for speed: the same
 * formula as {@link ClosedForm}, good to 1e-13 of the face. Immutable.
 */
public final class ZeroOptions {
  /*
   * With d and d − v the usual arguments, strike P(0,S) e^(−(d−v)²/2) = P(0,T) e^(−d²/2): both terms of the formula
   * share one density. Only the ratios R differ.
   */
  /** Items of one pass; a block's arrays stay in the first cache. */
  static final int BLOCK = 256;

  private static final double TINY = 1e-300;

  private final FastRates rates;

  private ZeroOptions(FastRates rates) {
    this.rates = rates;
  }

  public static ZeroOptions under(GaussianRates rates) {
    return new ZeroOptions(new FastRates(rates));
  }

  /**
   * The call that pays max(0, P(expiry, maturity) − strike) at expiry.
   *
   * @param expiry years, at least 0
   * @param maturity years, at least expiry
   * @param strike price per unit of face; at or below 0 exercise is certain
   */
  public double call(double expiry, double maturity, double strike) {
    return value(expiry, maturity, strike, 1);
  }

  /** The put, by the same formula from the other side. */
  public double put(double expiry, double maturity, double strike) {
    return value(expiry, maturity, strike, -1);
  }

  private double value(double expiry, double maturity, double strike, double side) {
    double l0 = rates.curve.logDiscount(expiry);
    double l1 = rates.curve.logDiscount(maturity);
    double v = rates.g(maturity - expiry) * rates.deviation(expiry);
    double d = (l1 - l0 - log(strike)) / (v > TINY ? v : TINY) + 0.5 * v;
    double p1 = FastExp.exp(l1);
    double density = p1 * Math.exp(-0.5 * d * d);
    double taken = sided(side * d, p1, density * FastNormal.ratio(d));
    double paid =
        sided(side * (d - v), strike * FastExp.exp(l0), density * FastNormal.ratio(d - v));
    double value = side * (taken - paid);
    return value > 0 ? value : 0;
  }

  private static double log(double strike) {
    return strike > 0 ? Math.log(strike) : Double.NEGATIVE_INFINITY;
  }

  /** The tail left of 0, the rest of the whole right of it; which side is a guess, so no branch. */
  static double sided(double x, double whole, double tail) {
    double half = Math.copySign(0.5, x);
    return Math.fma(0.5 + half, whole, -2 * half * tail);
  }

  /**
   * {@link #call} for whole arrays of one length.
   *
   * @param values receives the results
   */
  public void calls(double[] expiry, double[] maturity, double[] strike, double[] values) {
    double[][] w = new double[9][BLOCK];
    for (int from = 0; from < values.length; from += BLOCK) {
      block(expiry, maturity, strike, values, from, Math.min(BLOCK, values.length - from), w);
    }
  }

  private void block(
      double[] expiry,
      double[] maturity,
      double[] strike,
      double[] values,
      int from,
      int n,
      double[][] w) {
    double[] start = w[0];
    double[] tenor = w[1];
    double[] log0 = w[2];
    double[] log1 = w[3];
    double[] ratio = w[4];
    double[] work = w[5];
    double[] v = w[6];
    double[] s = w[7];
    double[] d = w[8];
    for (int i = 0; i < n; i++) {
      start[i] = expiry[from + i];
      tenor[i] = maturity[from + i] - start[i];
    }
    for (int i = 0; i < n; i++) {
      log0[i] = rates.curve.logDiscount(start[i]);
    }
    for (int i = 0; i < n; i++) {
      log1[i] = rates.curve.logDiscount(maturity[from + i]);
    }
    for (int i = 0; i < n; i++) {
      work[i] = log0[i] - log1[i];
    }
    FastExp.exp(work, d, n);
    for (int i = 0; i < n; i++) {
      ratio[i] = strike[from + i] * d[i]; // strike against forward
      work[i] = Math.max(0, ratio[i]);
    }
    FastLog.log(work, log0, n);
    rates.g(tenor, work, v, n);
    rates.deviation(start, work, s, n);
    arguments(log0, v, s, d, n);
    FastNormal.ratio(d, start, n);
    FastNormal.ratio(s, tenor, n);
    FastNormal.halfSquareExp(d, v, n);
    FastExp.exp(log1, log0, n);
    for (int i = 0; i < n; i++) {
      double density = log0[i] * v[i];
      start[i] *= density;
      tenor[i] *= density;
      ratio[i] *= log0[i];
      work[i] = 0;
    }
    FastNormal.addSided(1, d, log0, start, work, n);
    FastNormal.addSided(-1, s, ratio, tenor, work, n);
    for (int i = 0; i < n; i++) {
      values[from + i] = Math.max(0, work[i]);
    }
  }

  /** d into {@code d}, d − v into {@code s}, from G in {@code v} and the deviation in {@code s}. */
  private static void arguments(double[] logRatio, double[] v, double[] s, double[] d, int n) {
    for (int i = 0; i < n; i++) {
      double total = v[i] * s[i];
      double z = -logRatio[i] / Math.max(TINY, total) + 0.5 * total;
      d[i] = z;
      s[i] = z - total;
    }
  }
}
