package ebbline.pricing;

/**
 * A smooth function on one side of a boundary and zero on the other, known at equal steps from the
 * boundary, ready to be smoothed by a normal law.
 *
 * <p>Immutable; the step must be small against the deviation of the normal law (half of it at
 * most).
 */
final class HalfLine {
  /*
   * ∫₀^∞ f = h (f₀/2 + f₁ + f₂ + …) + h Σ_{j=1..8} wⱼ (fⱼ − f₋ⱼ): Euler and Maclaurin's formula with the odd derivatives
   * at the end taken from central differences, exact for polynomials of degree 16. The weights solve
   * 2 Σ wⱼ j^p = B_{p+1}/(p+1) for p = 1, 3, …, 15. The function goes on smoothly for GHOSTS steps beyond its boundary.
   */
  static final int GHOSTS = 8;

  private static final double[] END_WEIGHTS = {
    0.07836226334784643,
    -0.029658915402555077,
    0.011001664606348528,
    -0.0034647633453806104,
    0.0008560837610996297,
    -0.00015319364039426608,
    1.753039202853559e-05,
    -9.595026156320693e-07
  };

  private static final double DENSITY_AT_0 = 0.3989422804014327;

  private final double anchor;
  private final int side;
  private final double spacing;
  private final int last;
  private final double[] weighted;

  /**
   * @param anchor the boundary
   * @param side 1 if the function lives above the boundary, −1 below
   * @param spacing positive
   * @param values at {@code anchor + side spacing (k − GHOSTS)} in {@code values[k]}; kept and
   *     changed
   */
  HalfLine(double anchor, int side, double spacing, double[] values) {
    this.anchor = anchor;
    this.side = side;
    this.spacing = spacing;
    this.last = values.length - 1 - GHOSTS;
    values[GHOSTS] *= 0.5;
    for (int j = 1; j <= GHOSTS; j++) {
      values[GHOSTS + j] *= 1 + END_WEIGHTS[j - 1];
      values[GHOSTS - j] *= -END_WEIGHTS[j - 1];
    }
    this.weighted = values;
  }

  double spacing() {
    return spacing;
  }

  /** The expectation of the function under normal laws of one deviation. */
  final class Smoothed {
    private final double decay;
    private final double ratio;
    private final int reach;
    private final double[] bell;

    /**
     * @param decay the law's mean is {@code decay} times the point at which it is asked for
     * @param range deviations beyond which the density is dropped
     */
    Smoothed(double decay, double deviation, double range) {
      this.decay = decay;
      this.ratio = spacing / deviation;
      this.reach = (int) (range / ratio) + 1;
      this.bell = new double[reach + 1];
      for (int l = 0; l <= reach; l++) {
        bell[l] = Math.exp(-0.5 * (ratio * l) * (ratio * l));
      }
    }

    double at(double u) {
      // With j the node next to the mean and d its distance, exp(−g²(l + d)²/2) is a bell in l,
      // times the
      // l-th power of exp(−g²d): two polynomials, no exponential inside.
      double t = (decay * u - anchor) * side / spacing;
      if (!(t > -GHOSTS - reach - 1 && t < last + reach + 1)) {
        return 0;
      }
      int j = (int) Math.rint(t);
      double d = j - t;
      int low = Math.max(-reach, -GHOSTS - j);
      int high = Math.min(reach, last - j);
      int at = j + GHOSTS;
      double slope = -ratio * ratio * d;
      double up = 0;
      int first = Math.max(0, low);
      double q = Math.exp(slope);
      for (int l = high; l >= first; l--) {
        up = Math.fma(up, q, weighted[at + l] * bell[l]);
      }
      if (first > 0) {
        up *= Math.exp(slope * first);
      }
      double down = 0;
      double r = 1 / q;
      int end = Math.min(-1, high);
      for (int l = low; l <= end; l++) {
        down = Math.fma(down, r, weighted[at + l] * bell[-l]);
      }
      down *= end == -1 ? r : Math.exp(slope * end);
      return ratio * DENSITY_AT_0 * Math.exp(0.5 * slope * d) * (up + down);
    }

    /** Adds the values at {@code from + k step} to {@code out[k]}. */
    void addTo(double[] out, int count, double from, double step) {
      double shift = decay * step * side / spacing;
      if (Math.abs(shift - 1) < 1e-13) {
        convolve(out, count, (decay * from - anchor) * side / spacing);
        return;
      }
      for (int k = 0; k < count; k++) {
        out[k] += at(from + k * step);
      }
    }

    /** Targets that fall with the nodes' own spacing: one set of weights for all of them. */
    private void convolve(double[] out, int count, double start) {
      if (!(start < last + reach + 1 && start + count > -GHOSTS - reach - 1)) {
        return;
      }
      int j = (int) Math.rint(start);
      double d = j - start;
      int taps = (2 * reach + 1 + 3) / 4 * 4;
      double[] tap = new double[taps];
      for (int l = -reach; l <= reach; l++) {
        double x = ratio * (l + d);
        tap[l + reach] = ratio * DENSITY_AT_0 * Math.exp(-0.5 * x * x);
      }
      double[] padded = new double[count + taps];
      int shift = j - reach + GHOSTS;
      int begin = Math.max(0, -shift);
      int length = Math.min(padded.length, weighted.length - shift) - begin;
      if (length <= 0) {
        return;
      }
      System.arraycopy(weighted, begin + shift, padded, begin, length);
      int stop = begin + length;
      for (int l = 0; l < taps; l += 4) {
        int lowest = Math.max(0, begin - l - 3);
        int highest = Math.min(count, stop - l);
        addFour(out, padded, lowest, highest, l, tap[l], tap[l + 1], tap[l + 2], tap[l + 3]);
      }
    }
  }

  private static void addFour(
      double[] out,
      double[] in,
      int from,
      int to,
      int shift,
      double a,
      double b,
      double c,
      double d) {
    for (int k = from; k < to; k++) {
      out[k] +=
          a * in[k + shift]
              + b * in[k + shift + 1]
              + (c * in[k + shift + 2] + d * in[k + shift + 3]);
    }
  }
}
