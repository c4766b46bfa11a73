package ebbline.instrument;

/**
 * The flows of a bond still to come, counted in coupon periods from settlement: what price and
 * yield are made of. One flow a period, per 100 face.
 */
public final class PeriodFlows {
  private static final double LONGEST_FIRST = 2;

  private final int frequency;
  private final double toFirst;
  private final double[] amounts;

  /**
   * Takes what a bond still pays.
   *
   * @param frequency periods a year
   * @param toFirst periods from settlement to the first flow, above 0; over 1 only by the
   *     conventions that count actual days against a period of 180
   * @param amounts one a period; not empty
   */
  public PeriodFlows(int frequency, double toFirst, double[] amounts) {
    if (!(toFirst > 0 && toFirst <= LONGEST_FIRST) || amounts.length == 0) {
      throw new IllegalArgumentException(
          "a bond's next flow lies within two periods after settlement, found "
              + toFirst
              + " periods and "
              + amounts.length
              + " flows");
    }
    this.frequency = frequency;
    this.toFirst = toFirst;
    this.amounts = amounts.clone();
  }

  public int frequency() {
    return frequency;
  }

  public double toFirst() {
    return toFirst;
  }

  public int size() {
    return amounts.length;
  }

  public double amount(int i) {
    return amounts[i];
  }
}
