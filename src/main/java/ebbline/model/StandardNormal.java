package ebbline.model;

import org.apache.commons.numbers.gamma.Erfcx;

/** The standard normal law. */
public final class StandardNormal {
  /*
   * A library's Φ(x) = erfc(−x/√2)/2 rounds x/√2 before squaring it: at x = −30 that costs 1e-13. Here
   * Φ(−z) = e^(−z²/2) erfcx(z/√2)/2 with z = h + (z − h), h a multiple of 2^-16: h² is exact, and what is left,
   * d = (z − h)(z + h)/2, is below 3e-4, where five terms of e^(−d) suffice. erfcx itself is insensitive to the
   * rounding of its argument.
   */
  private static final double ROOT_HALF = 0.7071067811865476;

  private static final double DENSITY_AT_0 = 0.3989422804014327;

  private StandardNormal() {}

  /** The density e^(−x²/2)/√(2π); within 3 ulp. */
  public static double density(double x) {
    return DENSITY_AT_0 * halfSquareExp(Math.abs(x));
  }

  /**
   * The probability of a value up to {@code x}; within 3 ulp on [−38, 8], 0 below −38.6 and 1 above
   * 8.3, where a double can hold nothing else.
   */
  public static double cdf(double x) {
    if (x > 0) {
      return 1 - tail(x);
    }
    return tail(-x);
  }

  /** The probability of a value above {@code x}, 1 − Φ(x) without the subtraction. */
  public static double upper(double x) {
    return cdf(-x);
  }

  /**
   * The probability of a value between {@code from} and {@code to}, from the side that is small.
   */
  public static double between(double from, double to) {
    return from > 0 ? cdf(-from) - cdf(-to) : cdf(to) - cdf(from);
  }

  /** ln Φ(x), finite for every finite x of magnitude below 1e150. */
  public static double logCdf(double x) {
    if (x > 0) {
      return Math.log1p(-tail(x));
    }
    return x > -1 ? Math.log(tail(-x)) : Math.log(0.5 * Erfcx.value(-x * ROOT_HALF)) - 0.5 * x * x;
  }

  private static double tail(double z) {
    double e = halfSquareExp(z);
    return e == 0 ? 0 : 0.5 * e * Erfcx.value(z * ROOT_HALF);
  }

  /** e^(−z²/2), z at least 0. */
  private static double halfSquareExp(double z) {
    if (z > 39) {
      return 0;
    }
    double h = Math.rint(z * 0x1p16) * 0x1p-16;
    double d = 0.5 * (z - h) * (z + h);
    double e = Math.exp(-0.5 * h * h);
    return e - e * d * (1 - d * (0.5 - d * (1.0 / 6 - d / 24)));
  }
}
