package ebbline.pricing;

import ebbline.model.StandardNormal;
import java.util.Arrays;

/**
 * A polynomial with powers added right of knots, whose expectation under a normal law is in closed
 * form: Σ aₙ uⁿ + Σ c_j (u − κ)₊^j.
 *
 * <p>Immutable.
 */
final class KinkedPolynomial {
  /** Powers right of a knot: 1 to this. */
  static final int KINK_POWERS = 5;

  static final KinkedPolynomial ZERO =
      new KinkedPolynomial(new double[] {0}, new double[0], new double[0][]);

  private final double[] powers;
  private final double[] knots;
  private final double[][] kinks;

  /**
   * @param powers coefficients of 1, u, u², …
   * @param knots κ
   * @param kinks coefficients of (u − κ)₊, (u − κ)₊², … for each knot
   */
  KinkedPolynomial(double[] powers, double[] knots, double[][] kinks) {
    this.powers = powers.clone();
    this.knots = knots.clone();
    this.kinks = kinks.clone();
  }

  /** out[i] = the value at u[i]. */
  void at(double[] u, double[] out, int n) {
    polynomial(powers, u, out, n);
    for (int k = 0; k < knots.length; k++) {
      double[] c = kinks[k];
      double knot = knots[k];
      for (int i = 0; i < n; i++) {
        double d = Math.max(0, u[i] - knot);
        double sum = 0;
        for (int j = c.length - 1; j >= 0; j--) {
          sum = Math.fma(sum, d, c[j]);
        }
        out[i] = Math.fma(sum, d, out[i]);
      }
    }
  }

  /** u ↦ E[this(ρu + sξ)], ξ standard normal. */
  final class Smoothed {
    private final double[] moved;
    private final double decay;
    private final double deviation;

    /**
     * @param decay ρ
     * @param deviation s, at least 0
     */
    Smoothed(double decay, double deviation) {
      this.decay = decay;
      this.deviation = deviation;
      moved = moved(powers, decay, deviation);
    }

    void at(double[] u, double[] out, int n) {
      polynomial(moved, u, out, n);
      for (int k = 0; k < knots.length; k++) {
        for (int i = 0; i < n; i++) {
          out[i] += beyond(kinks[k], decay * u[i] - knots[k], deviation);
        }
      }
    }
  }

  /** E[Σ c_j (m + sξ)₊^j] by the recursion of the normal law's partial moments. */
  private static double beyond(double[] c, double m, double s) {
    double before;
    double now;
    if (s == 0) {
      before = m > 0 ? 1 : 0;
      now = Math.max(0, m);
    } else {
      double d = m / s;
      before = StandardNormal.cdf(d);
      now = s * StandardNormal.density(d) + m * before;
    }
    double sum = c[0] * now;
    double variance = s * s;
    for (int j = 1; j < c.length; j++) {
      double next = m * now + j * variance * before;
      before = now;
      now = next;
      sum = Math.fma(c[j], now, sum);
    }
    return sum;
  }

  /** Coefficients of u ↦ E[Σ aₙ (ρu + sξ)ⁿ]. */
  private static double[] moved(double[] a, double decay, double s) {
    // Horner's rule for operators: E p(ρu + sξ) = Σ aₙ Mₙ, Mₙ₊₁ = ρu Mₙ + n s² Mₙ₋₁.
    double[] sum = new double[a.length];
    double[] before = new double[a.length];
    double[] now = new double[a.length];
    now[0] = 1;
    for (int n = 0; n < a.length; n++) {
      double[] next = new double[a.length];
      for (int k = 0; k <= n; k++) {
        sum[k] += a[n] * now[k];
        if (k + 1 < a.length) {
          next[k + 1] += decay * now[k];
        }
        next[k] += n * s * s * before[k];
      }
      before = now;
      now = next;
    }
    return sum;
  }

  private static void polynomial(double[] a, double[] u, double[] out, int n) {
    Arrays.fill(out, 0, n, a[a.length - 1]);
    for (int k = a.length - 2; k >= 0; k--) {
      double c = a[k];
      for (int i = 0; i < n; i++) {
        out[i] = Math.fma(out[i], u[i], c);
      }
    }
  }
}
