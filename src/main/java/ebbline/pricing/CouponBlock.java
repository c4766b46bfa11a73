package ebbline.pricing;

/** Options on coupon bonds side by side: every loop runs over the options of one block. */
final class CouponBlock {
  private static final int MOST_STEPS = 60;

  private final FastRates rates;
  private final double[][] shift;
  private final double[][] worth;
  private final double[][] term;
  private final double[] deviation;
  private final double[] discount;
  private final double[] growth;
  private final double[] logStrike;
  private final double[] root;
  private final double[] move;
  private final double[] value;
  private final double[] slope;
  private final double[] top;
  private final double[] w1;
  private final double[] w2;

  CouponBlock(FastRates rates, int flows, int size) {
    this.rates = rates;
    shift = new double[flows][size];
    worth = new double[flows][size];
    term = new double[flows][size];
    deviation = new double[size];
    discount = new double[size];
    growth = new double[size];
    logStrike = new double[size];
    root = new double[size];
    move = new double[size];
    value = new double[size];
    slope = new double[size];
    top = new double[size];
    w1 = new double[size];
    w2 = new double[size];
  }

  void calls(
      double[] expiry,
      double[] strike,
      double[][] times,
      double[][] amounts,
      double[] values,
      int from,
      int n) {
    for (int i = 0; i < n; i++) {
      w1[i] = expiry[from + i];
      value[i] = rates.curve.logDiscount(w1[i]);
      top[i] = 0;
      logStrike[i] = strike[from + i] > 0 ? Math.log(strike[from + i]) : 0;
    }
    rates.deviation(w1, w2, deviation, n);
    FastExp.exp(value, discount, n);
    for (int i = 0; i < n; i++) {
      growth[i] = 1 / discount[i];
    }
    for (int j = 0; j < times.length; j++) {
      prepare(j, expiry, times[j], amounts[j], from, n);
    }
    boundary(n);
    FastNormal.halfSquareExp(root, move, n);
    FastNormal.ratio(root, w2, n);
    for (int i = 0; i < n; i++) {
      value[i] = 0;
      move[i] *= discount[i]; // the density, shared by all terms
      w1[i] = strike[from + i] * discount[i];
      w2[i] *= strike[from + i] * move[i];
    }
    FastNormal.addSided(-1, root, w1, w2, value, n);
    for (int j = 0; j < times.length; j++) {
      sum(root, shift[j], w1, n);
      FastNormal.ratio(w1, w2, n);
      multiply(w2, term[j], n);
      multiply(w2, move, n);
      FastNormal.addSided(1, w1, worth[j], w2, value, n);
    }
    for (int i = 0; i < n; i++) {
      values[from + i] = Math.max(0, value[i]);
      if (!(deviation[i] > CouponOptions.CALM && strike[from + i] > 0)) {
        values[from + i] = intrinsic(strike[from + i] * discount[i], i);
      }
    }
  }

  private double intrinsic(double strikeWorth, int i) {
    double sum = -strikeWorth;
    for (double[] flow : worth) {
      sum += flow[i];
    }
    return Math.max(0, sum);
  }

  private void prepare(int j, double[] expiry, double[] times, double[] amounts, int from, int n) {
    for (int i = 0; i < n; i++) {
      w1[i] = times[from + i] - expiry[from + i];
    }
    rates.g(w1, w2, shift[j], n);
    for (int i = 0; i < n; i++) {
      w1[i] = rates.curve.logDiscount(times[from + i]);
    }
    FastExp.exp(w1, worth[j], n);
    shifts(shift[j], deviation, w1, top, n);
    FastExp.exp(w1, term[j], n);
    weigh(worth[j], amounts, from, growth, term[j], n);
  }

  /** b from G, −b²/2, and the largest b so far. */
  private static void shifts(
      double[] shift, double[] deviation, double[] half, double[] top, int n) {
    for (int i = 0; i < n; i++) {
      double b = shift[i] * deviation[i];
      shift[i] = b;
      half[i] = -0.5 * b * b;
      top[i] = Math.max(top[i], b);
    }
  }

  /** Amounts into worth, and worth over today's factor of the expiry into the terms. */
  private static void weigh(
      double[] worth, double[] amounts, int from, double[] growth, double[] term, int n) {
    for (int i = 0; i < n; i++) {
      double w = worth[i] * amounts[from + i];
      worth[i] = w;
      term[i] = term[i] * w * growth[i];
    }
  }

  private static void sum(double[] a, double[] b, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = a[i] + b[i];
    }
  }

  private void boundary(int n) {
    for (int i = 0; i < n; i++) {
      root[i] = 0;
    }
    for (int step = 0; step < MOST_STEPS; step++) {
      for (int i = 0; i < n; i++) {
        value[i] = 0;
        slope[i] = 0;
      }
      for (int j = 0; j < term.length; j++) {
        addTerm(term[j], shift[j], value, slope, n);
      }
      double largest = 0;
      double reach = 0;
      for (int i = 0; i < n; i++) {
        double d =
            slope[i] > CouponOptions.CALM
                ? (Math.log(value[i]) - logStrike[i]) * value[i] / slope[i]
                : 0;
        move[i] = d;
        root[i] += d;
        largest = Math.max(largest, top[i] * d * d);
        reach = Math.max(reach, Math.abs(top[i] * d));
      }
      for (int j = 0; j < term.length; j++) {
        if (reach <= FastExp.SHORT) {
          FastExp.decay(term[j], shift[j], move, n);
        } else {
          minusProduct(shift[j], move, w1, n);
          FastExp.exp(w1, w2, n);
          multiply(term[j], w2, n);
        }
      }
      if (largest < CouponOptions.STOP) {
        return;
      }
    }
  }

  private static void addTerm(double[] term, double[] shift, double[] sum, double[] slope, int n) {
    for (int i = 0; i < n; i++) {
      sum[i] += term[i];
      slope[i] = Math.fma(shift[i], term[i], slope[i]);
    }
  }

  private static void minusProduct(double[] a, double[] b, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = -a[i] * b[i];
    }
  }

  private static void multiply(double[] a, double[] by, int n) {
    for (int i = 0; i < n; i++) {
      a[i] *= by[i];
    }
  }
}
