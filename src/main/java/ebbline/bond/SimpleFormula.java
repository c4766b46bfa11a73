package ebbline.bond;

/**
 * The simple yield y = (C + (R − P)/T)/P on the clean price P, so that P = (C T + R)/(1 + y T).
 *
 * @param coupon C, a year
 * @param redemption R
 * @param years T, to maturity
 */
record SimpleFormula(double coupon, double redemption, double years, double accrued)
    implements YieldFormula {

  @Override
  public YieldPoint at(double yield) {
    double growth = 1 + yield * years;
    double clean = (coupon * years + redemption) / growth;
    double slope = -clean * years / growth;
    return new YieldPoint(clean + accrued, slope, -2 * slope * years / growth, years);
  }

  @Override
  public double lowest() {
    return -1 / years;
  }
}
