package ebbline.pricing;

/**
 * Yields and their measures for many bonds with level coupons at once: the street's formula in
 * closed form, in blocks, for speed. The same figures as {@link ebbline.bond.BondYield}: yields to
 * 1e-12, durations and convexities to 1e-10 relative, dv01 to 1e-9 relative.
 */
public final class LevelBonds {
  /*
   * With u = y/f, n payments of c, w periods to the first and R at the last,
   *   P = g (c a + R V),  V = (1 + u)^−n,  a = (1 − V)/u,  g = (1 + u)^(1 − w).
   * Newton on ln P is nearly linear: a block needs three or four rounds. Near u = 0 the annuity loses digits, so
   * those bonds, and any that leave the reach of the series, are summed flow by flow afterwards.
   */
  private static final int BLOCK = 256;
  private static final int ROUNDS = 12;
  private static final double DONE = 2e-14;
  private static final double SMALL = 2e-3;
  private static final double BASIS_POINT = 1e-4;

  /** Bonds as arrays of one length, per 100 face. */
  public static final class Bonds {
    final int frequency;
    final double[] coupon;
    final double[] redemption;
    final double[] payments;
    final double[] toFirst;
    final double[] dirty;

    /**
     * The arrays are kept and must not change.
     *
     * @param frequency f, coupons a year
     * @param coupon c, of one period
     * @param redemption R, paid with the last coupon
     * @param payments n, at least 2: with one left the street's interest is simple
     * @param toFirst w, periods to the first payment, above 0 and at most 1
     * @param dirty P, above 0
     */
    public Bonds(
        int frequency,
        double[] coupon,
        double[] redemption,
        double[] payments,
        double[] toFirst,
        double[] dirty) {
      this.frequency = frequency;
      this.coupon = coupon;
      this.redemption = redemption;
      this.payments = payments;
      this.toFirst = toFirst;
      this.dirty = dirty;
    }

    int size() {
      return coupon.length;
    }
  }

  /** Receives the figures, one a bond. */
  public static final class Figures {
    public final double[] yield;
    public final double[] modifiedDuration;
    public final double[] convexity;
    public final double[] dv01;

    public Figures(int size) {
      yield = new double[size];
      modifiedDuration = new double[size];
      convexity = new double[size];
      dv01 = new double[size];
    }
  }

  private final double[] u = new double[BLOCK];
  private final double[] log = new double[BLOCK];
  private final double[] work = new double[BLOCK];
  private final double[] value = new double[BLOCK];
  private final double[] growth = new double[BLOCK];
  private final double[] price = new double[BLOCK];
  private final double[] slope = new double[BLOCK];
  private final double[] bend = new double[BLOCK];
  private final double[] ratio = new double[BLOCK];

  /** Yields, durations, convexities and dv01 of all bonds; not for several threads at once. */
  public void measure(Bonds bonds, Figures out) {
    for (int from = 0; from < bonds.size(); from += BLOCK) {
      block(bonds, out, from, Math.min(BLOCK, bonds.size() - from));
    }
  }

  private void block(Bonds bonds, Figures out, int from, int n) {
    start(bonds, from, n);
    for (int round = 0; round < ROUNDS; round++) {
      evaluate(bonds, from, n);
      for (int i = 0; i < n; i++) {
        ratio[i] = price[i] / bonds.dirty[from + i];
      }
      FastLog.log(ratio, work, n);
      if (step(n) <= DONE) {
        break;
      }
    }
    evaluate(bonds, from, n);
    figures(bonds, out, from, n);
    move(-BASIS_POINT / bonds.frequency, n);
    evaluate(bonds, from, n);
    for (int i = 0; i < n; i++) {
      ratio[i] = price[i];
    }
    move(2 * BASIS_POINT / bonds.frequency, n);
    evaluate(bonds, from, n);
    for (int i = 0; i < n; i++) {
      out.dv01[from + i] = 0.5 * (ratio[i] - price[i]);
    }
    for (int i = 0; i < n; i++) {
      double rate = out.yield[from + i] / bonds.frequency;
      if (!(Math.abs(rate) > SMALL && rate < 1)) {
        FlowByFlow.measure(bonds, out, from + i);
      }
    }
  }

  private void start(Bonds bonds, int from, int n) {
    for (int i = 0; i < n; i++) {
      double left = bonds.payments[from + i] - 1 + bonds.toFirst[from + i];
      double dirty = bonds.dirty[from + i];
      double redemption = bonds.redemption[from + i];
      // The textbook's approximate yield of a period, kept off the pole at 0.
      double guess =
          (bonds.coupon[from + i] + (redemption - dirty) / left) / (0.5 * (redemption + dirty));
      u[i] = Math.max(guess, 2 * SMALL);
    }
  }

  private double step(int n) {
    double largest = 0;
    for (int i = 0; i < n; i++) {
      double change = work[i] * price[i] / slope[i];
      double next = u[i] - change;
      // A bond whose yield lies near 0 stays at the edge and is done flow by flow.
      next = Math.max(next, 0.5 * SMALL);
      largest = Math.max(largest, Math.abs(next - u[i]));
      u[i] = next;
    }
    return largest;
  }

  private void move(double by, int n) {
    for (int i = 0; i < n; i++) {
      u[i] += by;
    }
  }

  /** Price and two derivatives in u. */
  private void evaluate(Bonds bonds, int from, int n) {
    for (int i = 0; i < n; i++) {
      work[i] = 1 + u[i];
    }
    FastLog.log(work, log, n);
    for (int i = 0; i < n; i++) {
      // What the rounding of 1 + u took away.
      log[i] += (u[i] - (work[i] - 1)) / work[i];
    }
    for (int i = 0; i < n; i++) {
      work[i] = -bonds.payments[from + i] * log[i];
    }
    FastExp.expm1(work, value, n);
    for (int i = 0; i < n; i++) {
      work[i] = (1 - bonds.toFirst[from + i]) * log[i];
    }
    FastExp.exp(work, growth, n);
    combine(bonds, from, n);
  }

  private void combine(Bonds bonds, int from, int n) {
    for (int i = 0; i < n; i++) {
      double m = bonds.payments[from + i];
      double w = bonds.toFirst[from + i];
      double c = bonds.coupon[from + i];
      double face = bonds.redemption[from + i];
      double q = 1 / (1 + u[i]);
      double r = 1 / u[i];
      double v = 1 + value[i];
      double v1 = -m * v * q;
      double v2 = -(m + 1) * v1 * q;
      double a = -value[i] * r;
      double a1 = (-v1 - a) * r;
      double a2 = (-v2 - 2 * a1) * r;
      double f0 = Math.fma(c, a, face * v);
      double f1 = Math.fma(c, a1, face * v1);
      double f2 = Math.fma(c, a2, face * v2);
      double g = growth[i];
      double g1 = (1 - w) * g * q;
      double g2 = -w * g1 * q;
      price[i] = g * f0;
      slope[i] = Math.fma(g1, f0, g * f1);
      bend[i] = Math.fma(g2, f0, Math.fma(2 * g1, f1, g * f2));
    }
  }

  private void figures(Bonds bonds, Figures out, int from, int n) {
    double f = bonds.frequency;
    for (int i = 0; i < n; i++) {
      out.yield[from + i] = f * u[i];
      out.modifiedDuration[from + i] = -slope[i] / (f * price[i]);
      out.convexity[from + i] = bend[i] / (f * f * price[i]);
    }
  }
}
