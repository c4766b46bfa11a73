package ebbline.model;

/**
 * G(τ) = (1 − e^(−aτ))/a and the integrals of G and G² from 0 to τ, for any a through 0.
 *
 * <p>τ at least 0.
 */
final class Reversion {
  /*
   * With x = aτ: ∫G = τ² j(x) and ∫G² = τ³ i(x), where
   *   j(x) = (x − 1 + e^(−x))/x²                        = Σ_{k≥2} (−1)^k x^(k−2)/k!
   *   i(x) = (x − 3/2 + 2e^(−x) − e^(−2x)/2)/x³          = Σ_{k≥3} (−1)^(k+1) (2^(k−1) − 2) x^(k−3)/k!
   * The quotients subtract numbers that agree in ever more digits as x falls. Up to |x| = 5 the series are
   * summed in twofold arithmetic, where the largest term is at most 3e3 times the sum and so nothing is lost
   * that a double could show; above it the quotients are safe, e^(−5) being small beside x − 3/2.
   */
  private static final double SERIES_UP_TO = 5;

  private Reversion() {}

  /** G(τ), within 2 ulp for aτ of at least −2.5. */
  static double g(double a, double tau) {
    double x = a * tau;
    return x == 0 ? tau : -Math.expm1(-x) / x * tau;
  }

  /** ∫₀^τ G. */
  static double integralOfG(double a, double tau) {
    return first(Twofold.product(a, tau)).value() * tau * tau;
  }

  /** ∫₀^τ G². */
  static double integralOfSquare(double a, double tau) {
    return second(Twofold.product(a, tau)).value() * tau * tau * tau;
  }

  /** j(x) of the note above. */
  static Twofold first(Twofold x) {
    if (Math.abs(x.high()) > SERIES_UP_TO) {
      return x.minus(Twofold.ONE).plus(expOfMinus(x, 1)).dividedBy(x).dividedBy(x);
    }
    Twofold minusX = x.times(-1);
    Twofold term = Twofold.of(0.5);
    Twofold sum = term;
    for (int k = 3; counts(term, sum); k++) {
      term = term.times(minusX).dividedBy(k);
      sum = sum.plus(term);
    }
    return sum;
  }

  /** i(x) of the note above. */
  static Twofold second(Twofold x) {
    if (Math.abs(x.high()) > SERIES_UP_TO) {
      return x.minus(Twofold.of(1.5))
          .plus(expOfMinus(x, 1).times(2))
          .minus(expOfMinus(x, 2).times(0.5))
          .dividedBy(x)
          .dividedBy(x)
          .dividedBy(x);
    }
    Twofold minusX = x.times(-1);
    Twofold power = Twofold.ONE.dividedBy(6);
    double two = 4;
    Twofold term = power.times(two - 2);
    Twofold sum = term;
    for (int k = 4; counts(term, sum); k++) {
      power = power.times(minusX).dividedBy(k);
      two *= 2;
      term = power.times(two - 2);
      sum = sum.plus(term);
    }
    return sum;
  }

  /** e^(−nx) with a double's accuracy. */
  private static Twofold expOfMinus(Twofold x, int n) {
    return Twofold.of(x.times(-n).exp());
  }

  private static boolean counts(Twofold term, Twofold sum) {
    return Math.abs(term.high()) > 0x1p-80 * Math.abs(sum.high());
  }

  /*
   * Slopes in a. ∂G/∂a = −τ² m(x), m(x) = (1 − e^(−x)(1 + x))/x² = Σ_{n≥0} (−x)ⁿ/(n! (n+2)); those of the integrals
   * are τ³ j′(x) and τ⁴ i′(x), with j′ = −((e^(−x) − g)/x + j)/x, i′ = (g² − 3i)/x, g = (1 − e^(−x))/x. Within
   * |x| < 1 all are summed, 24 terms.
   */
  private static final int SLOPE_TERMS = 24;

  /** ∂G(τ)/∂a. */
  static double slopeOfG(double a, double tau) {
    double x = a * tau;
    double m;
    if (Math.abs(x) < 1) {
      m = 0;
      double term = 1;
      for (int n = 0; n < SLOPE_TERMS; n++) {
        m += term / (n + 2);
        term *= -x / (n + 1);
      }
    } else {
      m = (1 - Math.exp(-x) * (1 + x)) / (x * x);
    }
    return -m * tau * tau;
  }

  /** ∂/∂a of ∫₀^τ G. */
  static double slopeOfIntegral(double a, double tau) {
    double x = a * tau;
    double slope;
    if (Math.abs(x) < 1) {
      slope = 0;
      double term = -1.0 / 6;
      for (int k = 3; k < SLOPE_TERMS + 3; k++) {
        slope += (k - 2) * term;
        term *= -x / (k + 1);
      }
    } else {
      double g = -Math.expm1(-x) / x;
      slope = -((Math.exp(-x) - g) / x + (1 - g) / x) / x;
    }
    return slope * tau * tau * tau;
  }

  /** ∂/∂a of ∫₀^τ G². */
  static double slopeOfSquare(double a, double tau) {
    double x = a * tau;
    double slope;
    if (Math.abs(x) < 1) {
      slope = 0;
      double term = -1.0 / 24;
      double two = 8;
      for (int k = 4; k < SLOPE_TERMS + 4; k++) {
        slope += (k - 3) * (two - 2) * term;
        term *= -x / (k + 1);
        two *= 2;
      }
    } else {
      double g = -Math.expm1(-x) / x;
      slope = (g * g - 3 * second(Twofold.product(a, tau)).value()) / x;
    }
    return slope * Math.pow(tau, 4);
  }
}
