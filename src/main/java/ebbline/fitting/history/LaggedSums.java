package ebbline.fitting.history;

/**
 * The sums that a regression of each value on the one before needs, in one pass.
 *
 * <p>With d = x − first value and δ the change of x, the pass adds up d, d² and δ²; Σ d δ follows
 * from d² telescoping: d₍ᵢ₊₁₎² − dᵢ² = 2dᵢδᵢ + δᵢ². Changes are summed as such, so the residual
 * variance of a nearly integrated series keeps its digits.
 */
final class LaggedSums {
  /*
   * Each of LANES accumulators takes every LANES-th value: a loop over them has no serial chain, so
   * the compiler turns it into vector instructions (a single running sum costs 4 cycles a value).
   */
  private static final int LANES = 256;

  /** Transitions. */
  final int n;

  /** Mean of the earlier values, less the origin. */
  final double mean;

  /** Σ (earlier − their mean)². */
  final double square;

  /** Σ (earlier − their mean) × change. */
  final double cross;

  /** Σ (change − mean change)². */
  final double changes;

  final double meanChange;
  final double origin;

  private LaggedSums(
      int n, double origin, double mean, double square, double cross, double changes, double move) {
    this.n = n;
    this.origin = origin;
    this.mean = mean;
    this.square = square;
    this.cross = cross;
    this.changes = changes;
    this.meanChange = move;
  }

  /** Sums over the transitions of {@code x}, at least one. */
  static LaggedSums of(double[] x) {
    int n = x.length - 1;
    double origin = x[0];
    double[] first = new double[LANES];
    double[] second = new double[LANES];
    double[] third = new double[LANES];
    int i = 0;
    for (; i + LANES <= n; i += LANES) {
      add(x, i, origin, first, second, third);
    }
    double sum = total(first);
    double squares = total(second);
    double changes = total(third);
    for (; i < n; i++) {
      double d = x[i] - origin;
      double delta = x[i + 1] - x[i];
      sum += d;
      squares += d * d;
      changes += delta * delta;
    }
    double move = x[n] - origin;
    double cross = 0.5 * (move * move - changes);
    double mean = sum / n;
    double meanChange = move / n;
    return new LaggedSums(
        n,
        origin,
        mean,
        squares - sum * mean,
        cross - sum * meanChange,
        changes - move * meanChange,
        meanChange);
  }

  private static void add(
      double[] x, int from, double origin, double[] first, double[] second, double[] third) {
    for (int j = 0; j < LANES; j++) {
      double d = x[from + j] - origin;
      double delta = x[from + j + 1] - x[from + j];
      first[j] += d;
      second[j] = Math.fma(d, d, second[j]);
      third[j] = Math.fma(delta, delta, third[j]);
    }
  }

  private static double total(double[] lanes) {
    double sum = 0;
    for (double lane : lanes) {
      sum += lane;
    }
    return sum;
  }

  /** Slope of the change on the earlier value: the lagged slope less 1. */
  double changeSlope() {
    return cross / square;
  }

  /** Intercept of the regression of the later on the earlier value. */
  double intercept() {
    return meanChange - changeSlope() * (origin + mean);
  }

  /** Sum of squared residuals. */
  double residuals() {
    return Math.max(0, changes - cross * cross / square);
  }
}
