package ebbline.fitting.panel;

import java.util.Arrays;

/**
 * Zero yields of several maturities at increasing times; cells may be missing. Immutable.
 *
 * <p>Yields are continuously compounded decimals; par yields and money-market rates are near but
 * not the same.
 */
public final class YieldPanel {
  private final double[] times;
  private final double[] maturities;
  private final double[][] yields;
  private final int cells;

  private YieldPanel(double[] times, double[] maturities, double[][] yields, int cells) {
    this.times = times;
    this.maturities = maturities;
    this.yields = yields;
    this.cells = cells;
  }

  /**
   * @param times years, strictly increasing; the origin does not matter
   * @param maturities years, positive, all different
   * @param yields one row a time, one column a maturity; NaN stands for a missing cell
   * @throws IllegalArgumentException if a rule above is broken
   */
  public static YieldPanel of(double[] times, double[] maturities, double[][] yields) {
    if (times.length != yields.length) {
      throw new IllegalArgumentException(
          "a panel has a row for each time, found " + yields.length + " and " + times.length);
    }
    for (int j = 0; j < maturities.length; j++) {
      if (!(maturities[j] > 0 && maturities[j] <= 200)) {
        throw new IllegalArgumentException(
            "maturities of a panel must be above 0 and at most 200 years, found " + maturities[j]);
      }
      for (int k = 0; k < j; k++) {
        if (maturities[k] == maturities[j]) {
          throw new IllegalArgumentException(
              "maturities of a panel must differ, found " + maturities[j] + " twice");
        }
      }
    }
    int cells = 0;
    double[][] rows = new double[yields.length][];
    for (int i = 0; i < times.length; i++) {
      if (!(Double.isFinite(times[i]) && (i == 0 || times[i] > times[i - 1]))) {
        throw new IllegalArgumentException(
            "times of a panel must increase, found " + times[i] + " in row " + (i + 1));
      }
      if (yields[i].length != maturities.length) {
        throw new IllegalArgumentException(
            "row "
                + (i + 1)
                + " of a panel has "
                + yields[i].length
                + " cells, expected "
                + maturities.length);
      }
      for (double y : yields[i]) {
        if (!(Double.isNaN(y) || Math.abs(y) < 10)) {
          throw new IllegalArgumentException(
              "yields must lie within 1000 % either side of 0, found " + y);
        }
        cells += Double.isNaN(y) ? 0 : 1;
      }
      rows[i] = yields[i].clone();
    }
    return new YieldPanel(times.clone(), maturities.clone(), rows, cells);
  }

  /** Rows. */
  public int size() {
    return times.length;
  }

  /** Cells that are there. */
  public int cells() {
    return cells;
  }

  public double time(int row) {
    return times[row];
  }

  public double[] maturities() {
    return maturities.clone();
  }

  int columns() {
    return maturities.length;
  }

  double maturity(int column) {
    return maturities[column];
  }

  /** A yield; NaN where the cell is missing. */
  public double cell(int row, int column) {
    return yields[row][column];
  }

  /** Years from the first to the last row. */
  public double span() {
    return times.length < 2 ? 0 : times[times.length - 1] - times[0];
  }

  /** Mean over all cells that are there. */
  double mean() {
    double sum = 0;
    for (double[] row : yields) {
      sum += Arrays.stream(row).filter(y -> !Double.isNaN(y)).sum();
    }
    return cells == 0 ? 0 : sum / cells;
  }
}
