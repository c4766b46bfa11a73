package ebbline.bond;

/**
 * P = h(y) Σ cₖ g(y)^(−pₖ): compound growth g = 1 + y/f over pₖ periods, or e^(y/f) where it is
 * continuous, and simple growth 1/h = 1 + w y/f over the w periods before.
 */
final class CompoundFormula implements YieldFormula {
  private final double[] amounts;
  private final double[] periods;
  private final double frequency;
  private final double simplePeriods;
  private final boolean continuous;

  /**
   * The arrays are kept.
   *
   * @param amounts c, none negative
   * @param periods p, after the simple ones
   * @param simplePeriods w, 0 for none
   */
  CompoundFormula(
      double[] amounts,
      double[] periods,
      double frequency,
      double simplePeriods,
      boolean continuous) {
    this.amounts = amounts;
    this.periods = periods;
    this.frequency = frequency;
    this.simplePeriods = simplePeriods;
    this.continuous = continuous;
  }

  @Override
  public YieldPoint at(double yield) {
    double rate = yield / frequency;
    double growth = continuous ? 1 : 1 + rate; // of the derivative
    double log = continuous ? rate : Math.log1p(rate);
    double sum = 0;
    double slope = 0;
    double bend = 0;
    for (int k = 0; k < amounts.length; k++) {
      double p = periods[k];
      double value = amounts[k] * Math.exp(-p * log);
      sum += value;
      slope -= p * value;
      bend += p * (continuous ? p : p + 1) * value;
    }
    double meanTime = (simplePeriods - slope / sum) / frequency;
    slope /= growth * frequency;
    bend /= growth * growth * frequency * frequency;
    if (simplePeriods == 0) {
      return new YieldPoint(sum, slope, bend, meanTime);
    }
    double h = 1 / (1 + simplePeriods * rate);
    double first = -(simplePeriods / frequency) * h * h;
    double second = -2 * (simplePeriods / frequency) * first * h;
    return new YieldPoint(
        h * sum, first * sum + h * slope, second * sum + 2 * first * slope + h * bend, meanTime);
  }

  @Override
  public double lowest() {
    boolean compounds = false;
    for (double p : periods) {
      compounds |= p > 0;
    }
    double ofCompound = continuous || !compounds ? Double.NEGATIVE_INFINITY : -frequency;
    double ofSimple = simplePeriods > 0 ? -frequency / simplePeriods : Double.NEGATIVE_INFINITY;
    return Math.max(ofCompound, ofSimple);
  }
}
