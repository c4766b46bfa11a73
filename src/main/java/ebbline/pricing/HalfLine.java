package ebbline.pricing;

import java.util.Arrays;

/**
 * A smooth function on one side of a boundary and zero on the other, known at equal steps from the
 * boundary, ready to be smoothed by a normal law.
 *
 * <p>Immutable; the step must be small against the deviation of the normal law (half of it at
 * most).
 */
final class HalfLine {
  /*
   * ∫₀^∞ f = h (f₀/2 + f₁ + f₂ + …) + h Σ_{j=1..10} wⱼ (fⱼ − f₋ⱼ): Euler and Maclaurin's formula with the odd derivatives
   * at the end taken from central differences, exact for polynomials of degree 20. The weights solve
   * 2 Σ wⱼ j^p = B_{p+1}/(p+1) for p = 1, 3, …, 19. The function goes on smoothly for GHOSTS steps beyond its boundary.
   */
  static final int GHOSTS = 10;

  private static final double[] END_WEIGHTS = {
    0.08036566134581083,
    -0.032613978070275405,
    0.013652438870049957,
    -0.005160102022805384,
    0.0016575675651416164,
    -0.00043258169685274426,
    8.73576956723557e-05,
    -1.275061020655204e-05,
    1.1937472380896442e-06,
    -5.3741531018487756e-08
  };

  private static final double DENSITY_AT_0 = 0.3989422804014327;

  private final double anchor;
  private final int side;
  private final double spacing;
  private final int last;
  private final double[] weighted;
  private final double slope;

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
    this.slope = side * (values[GHOSTS + 1] - values[GHOSTS - 1]) / (2 * spacing);
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

  /** Slope of the function at its boundary, in units of the state. */
  double slope() {
    return slope;
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
      // exp(−g²l²/2) by its ratios, which fall by one factor: a few units of rounding near the top.
      double square = Math.exp(-ratio * ratio);
      double fall = Math.exp(-0.5 * ratio * ratio);
      double value = ratio * DENSITY_AT_0;
      for (int l = 0; l <= reach; l++) {
        bell[l] = value;
        value *= fall;
        fall *= square;
      }
    }

    double at(double u) {
      // With j the node next to the mean and d its distance, exp(−g²(l + d)²/2) is a bell in l,
      // times the l-th power of
      // exp(−g²d): polynomials, no exponential inside; even and odd powers apart, so that four
      // chains run at once.
      double t = (decay * u - anchor) * side / spacing;
      if (!(t > -GHOSTS - reach - 1 && t < last + reach + 1)) {
        return 0;
      }
      int j = (int) Math.rint(t);
      double d = j - t;
      int low = Math.max(-reach, -GHOSTS - j);
      int high = Math.min(reach, last - j);
      double slope = -ratio * ratio * d;
      double q = Math.exp(slope);
      double sum = 0;
      if (high >= 0) {
        sum = upward(j + GHOSTS, Math.max(0, low), high, q, slope);
      }
      if (low < 0) {
        sum += downward(j + GHOSTS, low, Math.min(-1, high), 1 / q, slope);
      }
      return Math.exp(0.5 * slope * d) * sum;
    }

    private double upward(int at, int first, int high, double q, double slope) {
      double q2 = q * q;
      double even = 0;
      double odd = 0;
      int l = high;
      if (((high - first) & 1) == 0) {
        even = weighted[at + l] * bell[l];
        l--;
      }
      for (; l > first; l -= 2) {
        odd = Math.fma(odd, q2, weighted[at + l] * bell[l]);
        even = Math.fma(even, q2, weighted[at + l - 1] * bell[l - 1]);
      }
      double sum = Math.fma(odd, q, even);
      return first == 0 ? sum : sum * Math.exp(slope * first);
    }

    private double downward(int at, int low, int end, double r, double slope) {
      double r2 = r * r;
      double even = 0;
      double odd = 0;
      int l = low;
      if (((end - low) & 1) == 0) {
        even = weighted[at + l] * bell[-l];
        l++;
      }
      for (; l < end; l += 2) {
        odd = Math.fma(odd, r2, weighted[at + l] * bell[-l]);
        even = Math.fma(even, r2, weighted[at + l + 1] * bell[-l - 1]);
      }
      double sum = Math.fma(odd, r, even);
      return sum * (end == -1 ? r : Math.exp(slope * end));
    }

    /** Adds the values at {@code from + k step} to {@code out[k]}. */
    void addTo(double[] out, int count, double from, double step) {
      double shift = decay * step * side / spacing;
      double start = (decay * from - anchor) * side / spacing;
      int phases = (int) Math.rint(1 / shift);
      if (phases >= 1 && Math.abs(shift * phases - 1) < 1e-12) {
        if (phases == 1) {
          convolve(out, count, start);
          return;
        }
        double[] part = new double[(count + phases - 1) / phases];
        for (int p = 0; p < phases; p++) {
          int size = (count - p + phases - 1) / phases;
          Arrays.fill(part, 0);
          convolve(part, size, start + (double) p / phases);
          for (int k = 0; k < size; k++) {
            out[k * phases + p] += part[k];
          }
        }
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
      double[] tap = taps(taps, d);
      double[] padded = new double[count + taps];
      int shift = j - reach + GHOSTS;
      int begin = Math.max(0, -shift);
      int length = Math.min(padded.length, weighted.length - shift) - begin;
      if (length <= 0) {
        return;
      }
      System.arraycopy(weighted, begin + shift, padded, begin, length);
      int stop = begin + length;
      int l = 0;
      for (; l + 8 <= taps; l += 8) {
        addEight(out, padded, Math.max(0, begin - l - 7), Math.min(count, stop - l), l, tap);
      }
      if (l < taps) {
        addFour(out, padded, Math.max(0, begin - l - 3), Math.min(count, stop - l), l, tap);
      }
    }

    private double[] taps(int taps, double d) {
      double[] tap = new double[taps];
      double slope = -ratio * ratio * d;
      double up = Math.exp(slope);
      double down = 1 / up;
      double value = Math.exp(0.5 * slope * d);
      double other = value;
      tap[reach] = bell[0] * value;
      for (int l = 1; l <= reach; l++) {
        value *= up;
        other *= down;
        tap[reach + l] = bell[l] * value;
        tap[reach - l] = bell[l] * other;
      }
      return tap;
    }
  }

  private static void addEight(
      double[] out, double[] in, int from, int to, int shift, double[] tap) {
    double a = tap[shift];
    double b = tap[shift + 1];
    double c = tap[shift + 2];
    double d = tap[shift + 3];
    double e = tap[shift + 4];
    double f = tap[shift + 5];
    double g = tap[shift + 6];
    double h = tap[shift + 7];
    for (int k = from; k < to; k++) {
      out[k] +=
          a * in[k + shift]
              + b * in[k + shift + 1]
              + (c * in[k + shift + 2] + d * in[k + shift + 3])
              + (e * in[k + shift + 4]
                  + f * in[k + shift + 5]
                  + (g * in[k + shift + 6] + h * in[k + shift + 7]));
    }
  }

  private static void addFour(
      double[] out, double[] in, int from, int to, int shift, double[] tap) {
    double a = tap[shift];
    double b = tap[shift + 1];
    double c = tap[shift + 2];
    double d = tap[shift + 3];
    for (int k = from; k < to; k++) {
      out[k] +=
          a * in[k + shift]
              + b * in[k + shift + 1]
              + (c * in[k + shift + 2] + d * in[k + shift + 3]);
    }
  }
}
