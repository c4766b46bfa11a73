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
   * Four running sums of each kind: one alone waits 4 cycles for itself at every value. Vector
   * instructions are out of reach on Java 17, whose compiler refuses loops over two overlapping
   * stretches of one array.
   */

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
    double a0 = 0;
    double a1 = 0;
    double a2 = 0;
    double a3 = 0;
    double b0 = 0;
    double b1 = 0;
    double b2 = 0;
    double b3 = 0;
    double c0 = 0;
    double c1 = 0;
    double c2 = 0;
    double c3 = 0;
    double d0 = 0;
    int i = 0;
    for (; i + 4 <= n; i += 4) {
      double d1 = x[i + 1] - origin;
      double d2 = x[i + 2] - origin;
      double d3 = x[i + 3] - origin;
      double d4 = x[i + 4] - origin;
      double e0 = d1 - d0;
      double e1 = d2 - d1;
      double e2 = d3 - d2;
      double e3 = d4 - d3;
      a0 += d0;
      a1 += d1;
      a2 += d2;
      a3 += d3;
      b0 = Math.fma(d0, d0, b0);
      b1 = Math.fma(d1, d1, b1);
      b2 = Math.fma(d2, d2, b2);
      b3 = Math.fma(d3, d3, b3);
      c0 = Math.fma(e0, e0, c0);
      c1 = Math.fma(e1, e1, c1);
      c2 = Math.fma(e2, e2, c2);
      c3 = Math.fma(e3, e3, c3);
      d0 = d4;
    }
    double sum = a0 + a1 + (a2 + a3);
    double squares = b0 + b1 + (b2 + b3);
    double changes = c0 + c1 + (c2 + c3);
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

  /** Mean of all values, the last too. */
  double meanOfAll() {
    return origin + (mean * n + meanChange * n) / (n + 1);
  }

  /** Root of the mean squared deviation of all values from their mean. */
  double deviationOfAll() {
    double last = meanChange * n - mean;
    return Math.sqrt(Math.max(0, square + last * last * n / (n + 1.0)) / (n + 1));
  }

  /** Sum of squared changes. */
  double squaredChanges() {
    return changes + n * meanChange * meanChange;
  }
}
