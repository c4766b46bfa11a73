package ebbline.bond;

/**
 * Bank discount: P = R (1 − d T).
 *
 * @param redemption R, the single payment
 * @param years T, to it, by the paper's day count
 */
record DiscountFormula(double redemption, double years) implements YieldFormula {

  @Override
  public YieldPoint at(double yield) {
    return new YieldPoint(redemption * (1 - yield * years), -redemption * years, 0, years);
  }

  @Override
  public double lowest() {
    return Double.NEGATIVE_INFINITY;
  }

  @Override
  public double highest() {
    return 1 / years;
  }
}
