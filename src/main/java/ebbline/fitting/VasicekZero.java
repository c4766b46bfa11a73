package ebbline.fitting;

/**
 * A zero rate of Vasicek's model and its slopes, smooth through mean reversion 0.
 *
 * <p>z(τ) = r₀ + b τ k(x) − ½σ²τ² h(x) with x = κτ and b = κ(θ − r₀), the drift of the rate today:
 * in (κ, b, σ, r₀) nothing is singular at κ = 0.
 */
public final class VasicekZero {
  /*
   * k(x) = (x − 1 + e^(−x))/x² and h(x) = x^(−3) ∫₀ˣ (1 − e^(−u))² du lose digits near 0, and so do
   * their derivatives. Within |x| < SERIES_BELOW all four are summed from
   *   k = Σ_{n≥0} (−x)ⁿ/(n+2)!,   h = Σ_{n≥0} (−x)ⁿ (2^(n+2) − 2)/(n+3)!,
   * 24 terms: the first one left out is below 2^26/27! ≈ 6e-21. Outside, the closed forms cancel at
   * most one digit.
   */
  private static final double SERIES_BELOW = 1;
  private static final int TERMS = 24;

  final double k;
  final double kSlope;
  final double h;
  final double hSlope;

  private VasicekZero(double k, double kSlope, double h, double hSlope) {
    this.k = k;
    this.kSlope = kSlope;
    this.h = h;
    this.hSlope = hSlope;
  }

  /** The functions at x = κτ. */
  public static VasicekZero at(double x) {
    return Math.abs(x) < SERIES_BELOW ? series(x) : closed(x);
  }

  private static VasicekZero series(double x) {
    double k = 0;
    double kSlope = 0;
    double h = 0;
    double hSlope = 0;
    double power = 1;
    double lowerPower = 0;
    double factorial = 2;
    double two = 4;
    for (int n = 0; n < TERMS; n++) {
      double kTerm = 1 / factorial;
      double hTerm = (two - 2) / (factorial * (n + 3));
      k += kTerm * power;
      h += hTerm * power;
      kSlope -= n * kTerm * lowerPower;
      hSlope -= n * hTerm * lowerPower;
      lowerPower = power;
      power *= -x;
      factorial *= n + 3;
      two *= 2;
    }
    return new VasicekZero(k, kSlope, h, hSlope);
  }

  private static VasicekZero closed(double x) {
    double decay = Math.exp(-x);
    double oneLess = -Math.expm1(-x);
    double g = oneLess / x;
    double k = (1 - g) / x;
    // g' = (e^(−x) − g)/x and k' = −(g' + k)/x.
    double kSlope = -((decay - g) / x + k) / x;
    // ∫ (1 − e^(−u))² = x − oneLess − oneLess²/2.
    double h = (x - oneLess - 0.5 * oneLess * oneLess) / (x * x * x);
    double hSlope = (g * g - 3 * h) / x;
    return new VasicekZero(k, kSlope, h, hSlope);
  }

  /** z(τ); the functions must be those at κτ. */
  public double rate(double tau, double drift, double volatility, double shortRate) {
    return shortRate + drift * tau * k - 0.5 * volatility * volatility * tau * tau * h;
  }

  /** ∂z/∂κ with b held. */
  public double byMeanReversion(double tau, double drift, double volatility) {
    return tau * tau * (drift * kSlope - 0.5 * volatility * volatility * tau * hSlope);
  }

  /** ∂z/∂b. */
  public double byDrift(double tau) {
    return tau * k;
  }

  /** ∂z/∂σ. */
  public double byVolatility(double tau, double volatility) {
    return -volatility * tau * tau * h;
  }

  /** ∂²z/∂b∂κ, the slope of {@link #byDrift} in κ. */
  public double byDriftAndMeanReversion(double tau) {
    return tau * tau * kSlope;
  }
}
