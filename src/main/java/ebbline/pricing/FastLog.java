package ebbline.pricing;

/** Natural logarithms of numbers near 1, over blocks. */
final class FastLog {
  /*
   * ln y = 2 artanh s, s = (y − 1)/(y + 1): for y from ½ to 2, s² is at most 1/9 and seventeen terms leave 1e-17.
   * Prices relative to a strike are there; what is not is done again by the library.
   */
  private static final double FROM = 0.5;
  private static final double TO = 2;

  private FastLog() {}

  /**
   * out[i] = ln y[i], y at least 0, absolute error 3e-16 or 1 unit; {@code out} is not {@code y}.
   */
  static void log(double[] y, double[] out, int n) {
    series(y, out, n);
    for (int i = 0; i < n; i++) {
      if (!(y[i] >= FROM && y[i] <= TO)) {
        out[i] = Math.log(y[i]);
      }
    }
  }

  private static void series(double[] y, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      double s = (y[i] - 1) / (y[i] + 1);
      double q = s * s;
      double p = 2.0 / 35;
      p = Math.fma(p, q, 2.0 / 33);
      p = Math.fma(p, q, 2.0 / 31);
      p = Math.fma(p, q, 2.0 / 29);
      p = Math.fma(p, q, 2.0 / 27);
      p = Math.fma(p, q, 2.0 / 25);
      p = Math.fma(p, q, 2.0 / 23);
      p = Math.fma(p, q, 2.0 / 21);
      p = Math.fma(p, q, 2.0 / 19);
      p = Math.fma(p, q, 2.0 / 17);
      p = Math.fma(p, q, 2.0 / 15);
      p = Math.fma(p, q, 2.0 / 13);
      p = Math.fma(p, q, 2.0 / 11);
      p = Math.fma(p, q, 2.0 / 9);
      p = Math.fma(p, q, 2.0 / 7);
      p = Math.fma(p, q, 2.0 / 5);
      p = Math.fma(p, q, 2.0 / 3);
      out[i] = s * Math.fma(p, q, 2);
    }
  }
}
