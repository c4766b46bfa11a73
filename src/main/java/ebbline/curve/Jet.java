package ebbline.curve;

/**
 * A number with its derivative in one direction, so that the formulae of an interpolation give
 * their node sensitivities without being written twice.
 *
 * @param value the number
 * @param slope its derivative
 */
record Jet(double value, double slope) {
  static final Jet ZERO = new Jet(0, 0);

  static Jet of(double value) {
    return new Jet(value, 0);
  }

  Jet plus(Jet other) {
    return new Jet(value + other.value, slope + other.slope);
  }

  Jet minus(Jet other) {
    return new Jet(value - other.value, slope - other.slope);
  }

  Jet times(Jet other) {
    return new Jet(value * other.value, slope * other.value + value * other.slope);
  }

  Jet times(double factor) {
    return new Jet(value * factor, slope * factor);
  }

  Jet over(Jet other) {
    double q = value / other.value;
    return new Jet(q, (slope - q * other.slope) / other.value);
  }

  Jet over(double divisor) {
    return new Jet(value / divisor, slope / divisor);
  }

  Jet negate() {
    return new Jet(-value, -slope);
  }

  /** The smaller and its derivative; at a tie the first. */
  Jet min(Jet other) {
    return other.value < value ? other : this;
  }

  /** The larger and its derivative; at a tie the first. */
  Jet max(Jet other) {
    return other.value > value ? other : this;
  }
}
