package ebbline.model;

import java.util.Arrays;

/**
 * A short-rate volatility that is constant between steps: {@code value(i)} until {@code until(i)},
 * the last one for ever.
 */
public final class VolatilitySteps {
  private final double[] ends;
  private final double[] values;

  private VolatilitySteps(double[] ends, double[] values) {
    this.ends = ends;
    this.values = values;
  }

  public static VolatilitySteps constant(double value) {
    return of(new double[0], new double[] {value});
  }

  /**
   * @param ends ends of all steps but the last, years, strictly increasing and positive
   * @param values volatilities per year^(3/2) as decimals (0.01 is 1 %), at least 0; one more than
   *     ends
   * @throws IllegalArgumentException if a rule above is broken
   */
  public static VolatilitySteps of(double[] ends, double[] values) {
    if (values.length != ends.length + 1) {
      throw new IllegalArgumentException(
          "one more volatility than step ends, found " + values.length + " and " + ends.length);
    }
    for (int i = 0; i < ends.length; i++) {
      if (!(ends[i] > (i == 0 ? 0 : ends[i - 1]) && Double.isFinite(ends[i]))) {
        throw new IllegalArgumentException(
            "step ends must be positive and increase, found " + ends[i]);
      }
    }
    for (double value : values) {
      if (!(value >= 0 && Double.isFinite(value))) {
        throw new IllegalArgumentException("volatility must be at least 0, found " + value);
      }
    }
    return new VolatilitySteps(ends.clone(), values.clone());
  }

  public int count() {
    return values.length;
  }

  public boolean isConstant() {
    return values.length == 1;
  }

  public double value(int step) {
    return values[step];
  }

  /** Where the step ends; infinite for the last. */
  public double until(int step) {
    return step < ends.length ? ends[step] : Double.POSITIVE_INFINITY;
  }

  /** Where the step starts; 0 for the first. */
  public double from(int step) {
    return step == 0 ? 0 : ends[step - 1];
  }

  /** The volatility at {@code t}; the right-hand one at a step's end. */
  public double at(double t) {
    int i = 0;
    while (i < ends.length && t >= ends[i]) {
      i++;
    }
    return values[i];
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof VolatilitySteps that
        && Arrays.equals(ends, that.ends)
        && Arrays.equals(values, that.values);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(ends) + Arrays.hashCode(values);
  }

  @Override
  public String toString() {
    return "VolatilitySteps[ends="
        + Arrays.toString(ends)
        + ", values="
        + Arrays.toString(values)
        + ']';
  }
}
