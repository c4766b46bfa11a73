package ebbline.pricing;

/**
 * Options on a lognormal quantity, E[max(0, ±(F e^(vz − v²/2) − K))], undiscounted. Black 1976, J.
 * Fin. Econ. 3.
 *
 * <p>Discount by multiplying, or give forward and strike already as present values: an option on a
 * zero bond has F = P(0,T) and K = strike × P(0,S).
 */
public final class BlackFormula {
  private BlackFormula() {}

  /**
   * @param forward F, positive
   * @param strike K; at or below 0 the call is certain to be exercised
   * @param deviation v, the total standard deviation of the log, at least 0
   */
  public static double call(double forward, double strike, double deviation) {
    check(forward, deviation);
    if (!(strike > 0)) {
      return forward - strike;
    }
    return value(forward, strike, deviation, 1);
  }

  /** As {@link #call}, the right to sell. */
  public static double put(double forward, double strike, double deviation) {
    check(forward, deviation);
    if (!(strike > 0)) {
      return 0;
    }
    return value(forward, strike, deviation, -1);
  }

  private static double value(double forward, double strike, double deviation, int side) {
    if (deviation == 0) {
      return Math.max(0, side * (forward - strike));
    }
    return Math.max(0, side * (forward - strike))
        + OutOfTheMoney.lognormal(forward, strike, deviation);
  }

  private static void check(double forward, double deviation) {
    if (!(forward > 0 && deviation >= 0)) {
      throw new IllegalArgumentException(
          "a lognormal forward is positive and its deviation at least 0, found "
              + forward
              + " and "
              + deviation);
    }
  }
}
