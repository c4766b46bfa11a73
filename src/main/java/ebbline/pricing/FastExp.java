package ebbline.pricing;

/** e^x and e^x − 1 over blocks, for moderate x; vector instructions where the machine has them. */
final class FastExp {
  /*
   * e^x − 1 = m after six doublings m ← m (m + 2) of m = expm1(x/64), |x/64| < 0.157, where eleven terms of the series
   * leave 3e-17. No bit is cast and no branch taken. The error is 6 units of the larger of 1 and e^x: for negative x it
   * is absolute, which is what a present value needs.
   */
  /** Larger magnitudes take the library's road. */
  static final double REACH = 10;

  /** Up to here ten terms of the series do without doubling. */
  static final double SHORT = 0.125;

  private FastExp() {}

  /** out[i] = e^x[i] − 1; relative error 2e-15 for |x| up to 1. */
  static void expm1(double[] x, double[] out, int n) {
    kernel(x, out, n);
    if (outside(x, n) > 0) {
      for (int i = 0; i < n; i++) {
        out[i] = Math.expm1(x[i]);
      }
    }
  }

  /** out[i] = e^x[i]. */
  static void exp(double[] x, double[] out, int n) {
    if (outside(x, n) == 0) {
      kernel(x, out, n);
      for (int i = 0; i < n; i++) {
        out[i] += 1;
      }
    } else {
      for (int i = 0; i < n; i++) {
        out[i] = Math.exp(x[i]);
      }
    }
  }

  /** factor[i] ×= e^(−a[i] b[i]) for |a b| up to {@link #SHORT}; 2 units. */
  static void decay(double[] factor, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      double x = -a[i] * b[i];
      double m = 1.0 / 3628800;
      m = Math.fma(m, x, 1.0 / 362880);
      m = Math.fma(m, x, 1.0 / 40320);
      m = Math.fma(m, x, 1.0 / 5040);
      m = Math.fma(m, x, 1.0 / 720);
      m = Math.fma(m, x, 1.0 / 120);
      m = Math.fma(m, x, 1.0 / 24);
      m = Math.fma(m, x, 1.0 / 6);
      m = Math.fma(m, x, 0.5);
      m = Math.fma(m * x, x, x);
      factor[i] = Math.fma(m, factor[i], factor[i]);
    }
  }

  /** e^x, 4 units of the larger of 1 and e^x; quickest for |x| up to {@link #SHORT}. */
  static double exp(double x) {
    if (Math.abs(x) <= SHORT) {
      double x2 = x * x;
      double x4 = x2 * x2;
      double a = Math.fma(Math.fma(1.0 / 6, x, 0.5), x2, x);
      double b = Math.fma(Math.fma(1.0 / 5040, x, 1.0 / 720), x2, Math.fma(1.0 / 120, x, 1.0 / 24));
      double c = Math.fma(1.0 / 3628800, x2, Math.fma(1.0 / 362880, x, 1.0 / 40320));
      return 1 + Math.fma(Math.fma(c, x4, b), x4, a);
    }
    return Math.abs(x) <= 2 ? 1 + expm1(x) : Math.exp(x);
  }

  /** e^x − 1 of one number; 2e-15 relative. */
  static double expm1(double x) {
    if (Math.abs(x) <= 2) {
      // Three doublings of x/8, whose series is summed in short chains: time to the result is what
      // counts here.
      double t = 0.125 * x;
      double t2 = t * t;
      double t4 = t2 * t2;
      double a = Math.fma(Math.fma(1.0 / 24, t, 1.0 / 6), t2, Math.fma(0.5, t, 1));
      double b =
          Math.fma(Math.fma(1.0 / 40320, t, 1.0 / 5040), t2, Math.fma(1.0 / 720, t, 1.0 / 120));
      double c = Math.fma(1.0 / 39916800, t2, Math.fma(1.0 / 3628800, t, 1.0 / 362880));
      double m = t * Math.fma(Math.fma(c, t4, b), t4, a);
      m = m * (m + 2);
      m = m * (m + 2);
      return m * (m + 2);
    }
    return Math.exp(x) - 1;
  }

  private static void kernel(double[] x, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      double t = x[i] * (1.0 / 64);
      double m = 1.0 / 39916800;
      m = Math.fma(m, t, 1.0 / 3628800);
      m = Math.fma(m, t, 1.0 / 362880);
      m = Math.fma(m, t, 1.0 / 40320);
      m = Math.fma(m, t, 1.0 / 5040);
      m = Math.fma(m, t, 1.0 / 720);
      m = Math.fma(m, t, 1.0 / 120);
      m = Math.fma(m, t, 1.0 / 24);
      m = Math.fma(m, t, 1.0 / 6);
      m = Math.fma(m, t, 0.5);
      m = Math.fma(m * t, t, t);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      m = m * (m + 2);
      out[i] = m;
    }
  }

  /** How many are beyond the reach; counting is what the compiler turns into vectors. */
  private static int outside(double[] x, int n) {
    int count = 0;
    for (int i = 0; i < n; i++) {
      count += Math.abs(x[i]) <= REACH ? 0 : 1;
    }
    return count;
  }
}
