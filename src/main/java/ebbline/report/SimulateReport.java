package ebbline.report;

import ebbline.risk.Distribution;
import ebbline.risk.HorizonLaw;
import ebbline.risk.SampleLaw;

/** Laws of the short rate at horizons as results. */
public final class SimulateReport {
  private SimulateReport() {}

  /** The exact law. */
  public static ResultRow exact(HorizonLaw law) {
    ResultRow.Builder row = ResultRow.builder().number("time", law.time(), 6);
    Distribution exact = law.distribution();
    row.rate("mean", exact.mean());
    return figures(row, exact).build();
  }

  /** What paths say of it, with the standard error of their mean and the distance from it. */
  public static ResultRow simulated(HorizonLaw law, SampleLaw sample) {
    ResultRow.Builder row = ResultRow.builder().number("time", law.time(), 6);
    row.rate("mean", sample.distribution().mean());
    row.rate("mean_se", sample.meanError());
    return figures(row, sample.distribution()).number("distance", sample.distance(), 6).build();
  }

  private static ResultRow.Builder figures(ResultRow.Builder row, Distribution law) {
    return row.rate("sd", law.sd())
        .rate("p01", law.p01())
        .rate("p05", law.p05())
        .rate("p50", law.p50())
        .rate("p95", law.p95())
        .rate("p99", law.p99())
        .number("probability_below_zero", law.probabilityBelowZero(), 6);
  }
}
