package ebbline.fitting.panel;

/** The short rate as the filter sees it at each time, from the yields up to then. */
public final class FilteredRates {
  private final double[] rates;
  private final double[] sds;
  private final double[] rmse;

  FilteredRates(double[] rates, double[] sds, double[] rmse) {
    this.rates = rates;
    this.sds = sds;
    this.rmse = rmse;
  }

  public int size() {
    return rates.length;
  }

  /** Expected short rate at a row of the panel, decimal per year. */
  public double rate(int row) {
    return rates[row];
  }

  /** Standard deviation of the short rate about it. */
  public double sd(int row) {
    return sds[row];
  }

  /** Root mean squared error of a maturity's yields at the filtered rate, decimal. */
  public double rmse(int column) {
    return rmse[column];
  }
}
