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
}
