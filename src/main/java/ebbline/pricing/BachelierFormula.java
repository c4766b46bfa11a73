package ebbline.pricing;

/**
 * Options on a normal quantity, E[max(0, ±(F + sz − K))], undiscounted; any signs. Bachelier 1900.
 */
public final class BachelierFormula {
  private BachelierFormula() {}

  /**
   * @param deviation s, the total standard deviation, at least 0
   */
  public static double call(double forward, double strike, double deviation) {
    return value(forward - strike, deviation);
  }

  /** As {@link #call}, the right to sell. */
  public static double put(double forward, double strike, double deviation) {
    return value(strike - forward, deviation);
  }

  private static double value(double gain, double deviation) {
    if (!(deviation >= 0)) {
      throw new IllegalArgumentException("a deviation is at least 0, found " + deviation);
    }
    if (deviation == 0) {
      return Math.max(0, gain);
    }
    return Math.max(0, gain) + OutOfTheMoney.normal(Math.abs(gain), deviation);
  }
}
