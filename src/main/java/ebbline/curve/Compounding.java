package ebbline.curve;

import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/** How a rate turns into a discount factor. */
public enum Compounding {
  CONTINUOUS("continuous", 0),
  ANNUAL("annual", 1),
  SEMI_ANNUAL("semi-annual", 2),
  QUARTERLY("quarterly", 4),
  MONTHLY("monthly", 12),
  /** Interest without interest on it: P = 1/(1 + r t). */
  SIMPLE("simple", -1);

  private final String label;
  private final int periods;

  Compounding(String label, int periods) {
    this.label = label;
    this.periods = periods;
  }

  public String label() {
    return label;
  }

  /**
   * The compounding of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static Compounding of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (Compounding compounding : values()) {
      if (compounding.label.equals(wanted)) {
        return compounding;
      }
    }
    throw new IllegalArgumentException(
        "expected a compounding, one of "
            + Arrays.stream(values()).map(Compounding::label).collect(Collectors.joining(", ")));
  }

  /**
   * ln P(0,t) of a rate.
   *
   * @param rate decimal per year
   * @param t years, at least 0
   * @throws IllegalArgumentException if no discount factor has this rate (1 + r/m ≤ 0, for simple
   *     interest 1 + r t ≤ 0)
   */
  public double logDiscount(double rate, double t) {
    if (!Double.isFinite(rate)) {
      throw new IllegalArgumentException("a rate must be finite, found " + rate);
    }
    if (periods == 0) {
      return -rate * t;
    }
    double growth = periods < 0 ? rate * t : rate / periods;
    if (growth > -1) {
      return periods < 0 ? -Math.log1p(growth) : -periods * t * Math.log1p(growth);
    }
    throw new IllegalArgumentException(
        "a rate must leave something to discount with "
            + label
            + " compounding, found "
            + rate
            + " over "
            + t
            + " years");
  }

  /** P(0,t) of a rate; see {@link #logDiscount}. */
  public double discount(double rate, double t) {
    return Math.exp(logDiscount(rate, t));
  }

  /** ∂P/∂rate at a rate; see {@link #logDiscount}. */
  public double discountSlope(double rate, double t) {
    double discount = discount(rate, t);
    if (periods == 0) {
      return -t * discount;
    }
    return -t * discount / (1 + (periods < 0 ? rate * t : rate / periods));
  }

  /**
   * The rate of ln P(0,t), decimal per year.
   *
   * @param t years, above 0
   */
  public double rate(double logDiscount, double t) {
    if (!(t > 0)) {
      throw new IllegalArgumentException("a rate needs a time above 0, found " + t);
    }
    if (periods == 0) {
      return -logDiscount / t;
    }
    return periods < 0
        ? Math.expm1(-logDiscount) / t
        : periods * Math.expm1(-logDiscount / (periods * t));
  }
}
