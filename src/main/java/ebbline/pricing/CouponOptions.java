package ebbline.pricing;

import ebbline.model.GaussianRates;

/**
 * Calls and puts on coupon bonds, one at a time or in blocks, for speed: Jamshidian's decomposition
 * with all legs sharing one boundary, good to 1e-13 of the face. Immutable.
 *
 * <p>All flows positive and after expiry; other options belong to {@link ClosedForm}. A payer
 * swaption is a put, a receiver a call, on the fixed leg with its notional.
 */
public final class CouponOptions {
  /*
   * The bond at expiry is Σ wⱼ exp(−bⱼ z), z standard normal, and the boundary solves Σ wⱼ exp(−bⱼ z) = K. The log of the
   * bond price is nearly straight in z, so Newton on it takes three or four steps from 0. A step is small in bⱼ, so
   * the terms are carried by wⱼ ← wⱼ e^(−bⱼ δ) with a short series instead of fresh exponentials. The error of the root
   * enters the value squared, and after a step δ it is at most ½ max(b) δ²: once max(b) δ² is below 1e-8 nothing
   * is left to gain. At the root each term times the density of z is the flow's own
   * worth times the density of z + bⱼ, so the sum of normal tails takes one exponential, not n + 1.
   */
  /**
   * Items of one block pass: below 256 the ends of the vector loops cost more than the cache saves.
   */
  static final int BLOCK = 256;

  /** A state that moves less than this is certain. */
  static final double CALM = 1e-100;

  /** Of max(b) δ², see the note above. */
  static final double STOP = 1e-8;

  private static final int MOST_STEPS = 60;

  private final FastRates rates;

  private CouponOptions(FastRates rates) {
    this.rates = rates;
  }

  public static CouponOptions under(GaussianRates rates) {
    return new CouponOptions(new FastRates(rates));
  }

  /** Room for one calculation, to be reused; one thread's only. */
  public static final class Work {
    private final double[] shift;
    private final double[] worth;
    private final double[] term;
    private double largest;

    /**
     * @param flows the largest number of flows
     */
    public Work(int flows) {
      shift = new double[flows];
      worth = new double[flows];
      term = new double[flows];
    }
  }

  /**
   * The call that pays max(0, bond − strike) at expiry.
   *
   * @param expiry years, at least 0
   * @param strike money; at or below 0 exercise is certain
   * @param times of the flows, years, after expiry
   * @param amounts positive
   * @param flows how many of them
   */
  public double call(
      double expiry, double strike, double[] times, double[] amounts, int flows, Work work) {
    return value(expiry, strike, times, amounts, flows, work, 1);
  }

  /** The put, from the other side of the same boundary. */
  public double put(
      double expiry, double strike, double[] times, double[] amounts, int flows, Work work) {
    return value(expiry, strike, times, amounts, flows, work, -1);
  }

  private double value(
      double expiry,
      double strike,
      double[] times,
      double[] amounts,
      int flows,
      Work work,
      int side) {
    double s = rates.deviation(expiry);
    double p0 = Math.exp(rates.curve.logDiscount(expiry));
    prepare(expiry, s, p0, times, amounts, flows, work);
    if (!(s > CALM && strike > 0)) {
      double bond = 0;
      for (int j = 0; j < flows; j++) {
        bond += work.worth[j];
      }
      return Math.max(0, side * (bond - strike * p0));
    }
    double z = boundary(strike, flows, work);
    double density = p0 * Math.exp(-0.5 * z * z);
    double value = 0;
    for (int j = 0; j < flows; j++) {
      double x = z + work.shift[j];
      value +=
          ZeroOptions.sided(side * x, work.worth[j], density * work.term[j] * FastNormal.ratio(x));
    }
    value -= ZeroOptions.sided(side * z, strike * p0, density * strike * FastNormal.ratio(z));
    return Math.max(0, side * value);
  }

  private void prepare(
      double expiry, double s, double p0, double[] times, double[] amounts, int flows, Work work) {
    double growth = 1 / p0;
    double largest = 0;
    for (int j = 0; j < flows; j++) {
      double b = s * rates.g(times[j] - expiry);
      double worth = amounts[j] * FastExp.exp(rates.curve.logDiscount(times[j]));
      work.shift[j] = b;
      largest = b > largest ? b : largest;
      work.worth[j] = worth;
      work.term[j] = worth * growth * FastExp.exp(-0.5 * b * b);
    }
    work.largest = largest;
  }

  private static double boundary(double strike, int flows, Work work) {
    double[] shift = work.shift;
    double[] term = work.term;
    double logStrike = Math.log(strike);
    double z = 0;
    for (int step = 0; step < MOST_STEPS; step++) {
      double f = 0;
      double g = 0;
      for (int j = 0; j < flows; j++) {
        f += term[j];
        g = Math.fma(shift[j], term[j], g);
      }
      double move = (Math.log(f) - logStrike) * f / g;
      z += move;
      for (int j = 0; j < flows; j++) {
        term[j] *= FastExp.exp(-shift[j] * move);
      }
      if (work.largest * move * move < STOP) {
        break;
      }
    }
    return z;
  }

  /**
   * {@link #call} for many options with the same number of flows.
   *
   * @param times of flow j of option i at {@code [j][i]}
   * @param amounts likewise
   * @param values receives the results
   */
  public void calls(
      double[] expiry, double[] strike, double[][] times, double[][] amounts, double[] values) {
    CouponBlock block = new CouponBlock(rates, times.length, Math.min(BLOCK, values.length));
    for (int from = 0; from < values.length; from += BLOCK) {
      int n = Math.min(BLOCK, values.length - from);
      block.calls(expiry, strike, times, amounts, values, from, n);
    }
  }
}
