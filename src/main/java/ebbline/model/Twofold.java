package ebbline.model;

/**
 * An unevaluated sum of two doubles, about 106 bits: for the few exponents whose last bit would be
 * seen in a price.
 */
record Twofold(double high, double low) {
  /*
   * Error-free sums and products after Knuth and Dekker; the product uses the fused multiply-add. Each
   * operation is good to a few units of 2^-104, so sums of alternating terms that lose six digits still
   * leave twenty-five.
   */
  static final Twofold ONE = new Twofold(1, 0);

  static Twofold of(double value) {
    return new Twofold(value, 0);
  }

  /** The exact product. */
  static Twofold product(double a, double b) {
    double p = a * b;
    return new Twofold(p, Math.fma(a, b, -p));
  }

  Twofold plus(Twofold other) {
    double s = high + other.high;
    double v = s - high;
    double e = (high - (s - v)) + (other.high - v);
    return normal(s, e + (low + other.low));
  }

  Twofold minus(Twofold other) {
    return plus(other.times(-1));
  }

  Twofold times(Twofold other) {
    double p = high * other.high;
    double e = Math.fma(high, other.high, -p) + (high * other.low + low * other.high);
    return normal(p, e);
  }

  Twofold times(double factor) {
    double p = high * factor;
    return normal(p, Math.fma(high, factor, -p) + low * factor);
  }

  Twofold dividedBy(double divisor) {
    double q = high / divisor;
    double rest = Math.fma(-q, divisor, high) + low;
    return normal(q, rest / divisor);
  }

  Twofold dividedBy(Twofold divisor) {
    double q = high / divisor.high;
    Twofold rest = minus(divisor.times(q));
    return normal(q, rest.high / divisor.high);
  }

  double value() {
    return high + low;
  }

  /** e to this power, to 1 ulp. */
  double exp() {
    double e = Math.exp(high);
    return low == 0 ? e : Math.fma(e, low, e);
  }

  private static Twofold normal(double s, double e) {
    double h = s + e;
    return new Twofold(h, e - (h - s));
  }
}
