package ebbline.bond;

/** A price as a function of a yield that falls as the yield rises. */
sealed interface YieldFormula permits CompoundFormula, SimpleFormula, DiscountFormula {

  /** Price and derivatives; the yield lies within the bounds. */
  YieldPoint at(double yield);

  /** Yields lie above this. */
  double lowest();

  /** Yields lie below this. */
  default double highest() {
    return Double.POSITIVE_INFINITY;
  }
}
