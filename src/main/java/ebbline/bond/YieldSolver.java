package ebbline.bond;

/** The yield of a price, by Newton on the logarithm of the price with a bracket around it. */
final class YieldSolver {
  private static final int MOST_STEPS = 400;
  private static final double ACCURACY = 1e-15;

  /** Rounding of a yield, as far as it moves the price of any real paper, stays below this. */
  private static final double REPRICED = 1e-9;

  private YieldSolver() {}

  /**
   * @throws IllegalArgumentException in words if no yield gives the price, or none is found
   */
  static double solve(YieldFormula formula, double price) {
    if (!(price > 0 && Double.isFinite(price))) {
      throw new IllegalArgumentException(
          "no yield gives a dirty price that is not above 0, found " + price);
    }
    double low = formula.lowest();
    double high = formula.highest();
    double yield = high > 0.05 ? 0.05 : 0.5 * Math.max(low, 0) + 0.5 * high;
    yield = yield > low ? yield : low + 0.5 * Math.min(1, high - low);
    for (int i = 0; i < MOST_STEPS; i++) {
      YieldPoint point = formula.at(yield);
      if (point.price() == price) {
        return yield;
      } else if (point.price() > price) {
        low = yield;
      } else {
        high = yield;
      }
      double next = yield - Math.log(point.price() / price) * point.price() / point.slope();
      if (!(next > low && next < high)) {
        next = between(low, high, yield);
      }
      double tolerance = ACCURACY * Math.max(1, Math.abs(yield));
      if (Math.abs(next - yield) <= tolerance || high - low <= tolerance) {
        return checked(formula, next, price);
      }
      yield = next;
    }
    throw new IllegalArgumentException(
        "no yield was found for the dirty price " + price + " after " + MOST_STEPS + " steps");
  }

  /** Where the formula is too steep or too flat for doubles the bracket closes on no solution. */
  private static double checked(YieldFormula formula, double yield, double price) {
    if (yield > formula.lowest() && yield < formula.highest()) {
      double found = formula.at(yield).price();
      if (Math.abs(found / price - 1) <= REPRICED) {
        return yield;
      }
    }
    throw new IllegalArgumentException("no yield gives the dirty price " + price);
  }

  private static double between(double low, double high, double yield) {
    if (Double.isInfinite(high)) {
      return 2 * Math.abs(yield) + 1;
    }
    return Double.isInfinite(low) ? -2 * Math.abs(yield) - 1 : 0.5 * (low + high);
  }
}
