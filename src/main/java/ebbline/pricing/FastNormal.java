package ebbline.pricing;

/**
 * The two factors of the normal tail Φ(−x) = e^(−x²/2) R(x), x at least 0, one at a time and in
 * blocks: 1e-15 relative for R.
 *
 * <p>Apart because one density serves all terms of an option: at the exercise boundary they all
 * agree.
 */
final class FastNormal {
  /*
   * With q = (x − k)/(x + k), k = 4.5, the function (x + k) e^(x²/2) Φ(−x) is smooth on −1 ≤ q ≤ 1, that is on
   * 0 ≤ x < ∞: its Chebyshev series falls below 1e-17 after 23 terms. The coefficients below are that series
   * in powers of q (mpmath, 60 digits). The block forms have neither branch nor call in their loops, so that the
   * compiler uses vector instructions: e^(x²/2) is 1 + m with m = expm1(x²/8192) doubled twelve times by
   * m ← m (m + 2), which loses 12 units at most, and no more than x²/2 units where that is larger.
   */
  private static final double K = 4.5;

  /** Beyond it e^(x²/2) overflows. */
  private static final double REACH = 37.5;

  private static final double R0 = 0.7632305289702032;
  private static final double R1 = -0.6402577602526165;
  private static final double R2 = 0.4464525170556733;
  private static final double R3 = -0.2531417999510249;
  private static final double R4 = 0.11138259657043223;
  private static final double R5 = -0.033871326175605156;
  private static final double R6 = 0.004223613376799493;
  private static final double R7 = 0.0017488305479398012;
  private static final double R8 = -9.177464773392233E-4;
  private static final double R9 = 6.381295655218961E-6;
  private static final double R10 = 1.1204260719214357E-4;
  private static final double R11 = -1.59337294151542E-5;
  private static final double R12 = -1.423571236638514E-5;
  private static final double R13 = 3.192063301118266E-6;
  private static final double R14 = 2.1426759805083802E-6;
  private static final double R15 = -5.037449540432435E-7;
  private static final double R16 = -3.7926071995466557E-7;
  private static final double R17 = 6.605207817943098E-8;
  private static final double R18 = 7.060212865222912E-8;
  private static final double R19 = -6.170870319722238E-9;
  private static final double R20 = -1.1251292724707997E-8;
  private static final double R21 = 2.662280765855698E-10;
  private static final double R22 = 1.0440252036819998E-9;

  private FastNormal() {}

  /** R(|x|). */
  static double ratio(double x) {
    double r = 1 / (Math.abs(x) + K);
    double q = Math.fma(-2 * K, r, 1);
    double q2 = q * q;
    double q4 = q2 * q2;
    // Four short chains instead of one long one: half the latency.
    double s0 =
        Math.fma(
            Math.fma(Math.fma(Math.fma(Math.fma(R20, q4, R16), q4, R12), q4, R8), q4, R4), q4, R0);
    double s1 =
        Math.fma(
            Math.fma(Math.fma(Math.fma(Math.fma(R21, q4, R17), q4, R13), q4, R9), q4, R5), q4, R1);
    double s2 =
        Math.fma(
            Math.fma(Math.fma(Math.fma(Math.fma(R22, q4, R18), q4, R14), q4, R10), q4, R6), q4, R2);
    double s3 = Math.fma(Math.fma(Math.fma(Math.fma(R19, q4, R15), q4, R11), q4, R7), q4, R3);
    return r * Math.fma(Math.fma(s3, q, s2), q2, Math.fma(s1, q, s0));
  }

  /**
   * out[i] = e^(−x²/2), x up to 37.5 in magnitude; what is beyond is taken as 37.5, below 1e-305.
   */
  static void halfSquareExp(double[] x, double[] out, int n) {
    halfSquare(x, out, n);
    doubleTwelveTimes(out, n);
  }

  /** expm1(x²/8192). */
  private static void halfSquare(double[] x, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      double a = Math.min(Math.abs(x[i]), REACH);
      double t = a * a * (0.5 / 4096);
      double m = 1.0 / 479001600;
      m = Math.fma(m, t, 1.0 / 39916800);
      m = Math.fma(m, t, 1.0 / 3628800);
      m = Math.fma(m, t, 1.0 / 362880);
      m = Math.fma(m, t, 1.0 / 40320);
      m = Math.fma(m, t, 1.0 / 5040);
      m = Math.fma(m, t, 1.0 / 720);
      m = Math.fma(m, t, 1.0 / 120);
      m = Math.fma(m, t, 1.0 / 24);
      m = Math.fma(m, t, 1.0 / 6);
      m = Math.fma(m, t, 0.5);
      m = Math.fma(m, t, 1) * t;
      out[i] = m;
    }
  }

  /**
   * 1 + m after twelve doublings; a loop of its own, since a longer one is not turned into vectors.
   */
  private static void doubleTwelveTimes(double[] growth, int n) {
    for (int i = 0; i < n; i++) {
      double m = growth[i];
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      growth[i] = 1 / (m + 1);
    }
  }

  /** out[i] = R(|x[i]|). */
  static void ratio(double[] x, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      double r = 1 / (Math.abs(x[i]) + K);
      double q = Math.fma(-2 * K, r, 1);
      double p = R22;
      p = Math.fma(p, q, R21);
      p = Math.fma(p, q, R20);
      p = Math.fma(p, q, R19);
      p = Math.fma(p, q, R18);
      p = Math.fma(p, q, R17);
      p = Math.fma(p, q, R16);
      p = Math.fma(p, q, R15);
      p = Math.fma(p, q, R14);
      p = Math.fma(p, q, R13);
      p = Math.fma(p, q, R12);
      p = Math.fma(p, q, R11);
      p = Math.fma(p, q, R10);
      p = Math.fma(p, q, R9);
      p = Math.fma(p, q, R8);
      p = Math.fma(p, q, R7);
      p = Math.fma(p, q, R6);
      p = Math.fma(p, q, R5);
      p = Math.fma(p, q, R4);
      p = Math.fma(p, q, R3);
      p = Math.fma(p, q, R2);
      p = Math.fma(p, q, R1);
      p = Math.fma(p, q, R0);
      out[i] = p * r;
    }
  }

  /**
   * sum[i] += sign × (tail[i] left of 0, whole[i] − tail[i] right of it): whole × Φ(x) where tail
   * is whole × Φ(−|x|); without a branch.
   */
  static void addSided(
      double sign, double[] x, double[] whole, double[] tail, double[] sum, int n) {
    for (int i = 0; i < n; i++) {
      double right = Math.min(1, Math.max(0, x[i] * 0x1p1000));
      sum[i] = Math.fma(sign, Math.fma(right, Math.fma(-2, tail[i], whole[i]), tail[i]), sum[i]);
    }
  }
}
