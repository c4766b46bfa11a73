package ebbline.fitting.history;

/** g(x) = (1 − e^(−x))/x with two derivatives, to rounding accuracy through x = 0. */
final class Decay {
  /*
   * g = Σ (−x)ⁿ/(n+1)!; within |x| < 1 all three are summed from it (20 terms leave 1e-19), outside
   * g' = (e^(−x) − g)/x and g'' = (−e^(−x) − 2g')/x cancel little.
   */
  private static final int TERMS = 20;

  final double g;
  final double slope;
  final double bend;

  private Decay(double g, double slope, double bend) {
    this.g = g;
    this.slope = slope;
    this.bend = bend;
  }

  static Decay at(double x) {
    if (Math.abs(x) >= 1) {
      double decay = Math.exp(-x);
      double g = -Math.expm1(-x) / x;
      double slope = (decay - g) / x;
      return new Decay(g, slope, (-decay - 2 * slope) / x);
    }
    double g = 0;
    double slope = 0;
    double bend = 0;
    double power = 1;
    double lower = 0;
    double lowest = 0;
    double factorial = 1;
    for (int n = 0; n < TERMS; n++) {
      double term = 1 / factorial;
      g += term * power;
      slope -= n * term * lower;
      bend += n * (n - 1) * term * lowest;
      lowest = lower;
      lower = power;
      power *= -x;
      factorial *= n + 2;
    }
    return new Decay(g, slope, bend);
  }
}
