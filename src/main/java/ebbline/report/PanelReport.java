package ebbline.report;

import ebbline.fitting.history.Interval;
import ebbline.fitting.panel.FilteredRates;
import ebbline.fitting.panel.PanelErrors;
import ebbline.fitting.panel.PanelEstimate;
import ebbline.fitting.panel.PanelParameters;
import ebbline.fitting.panel.YieldPanel;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** An estimate from a panel of yields as one result. */
public final class PanelReport {
  private PanelReport() {}

  /**
   * The estimate with intervals by large-sample theory.
   *
   * @param labels of the maturities, as the file heads them
   */
  public static ResultRow.Builder of(
      YieldPanel panel, List<String> labels, PanelEstimate estimate, double confidence) {
    PanelEstimate.Best best = estimate.best();
    PanelParameters found = best.parameters();
    PanelErrors errors = best.errors();
    ResultRow.Builder row =
        ResultRow.builder()
            .text("method", "panel")
            .count("observations", panel.size())
            .count("cells", panel.cells())
            .number("span_years", panel.span(), 4);
    // A search that ended nowhere leaves means and price of risk where it happened to stop.
    boolean lost = estimate instanceof PanelEstimate.Stopped && errors.meanReversion().isEmpty();
    figure(row, "mean_reversion", found.meanReversion(), errors.meanReversion(), confidence, true);
    if (!lost) {
      figure(row, "long_run_mean", found.longRunMean(), errors.longRunMean(), confidence, false);
    }
    figure(row, "volatility", found.volatility(), errors.volatility(), confidence, false);
    if (!lost) {
      figure(
          row,
          "market_price_of_risk",
          found.marketPriceOfRisk(),
          errors.marketPriceOfRisk(),
          confidence,
          true);
    }
    figure(row, "measurement_sd", found.measurementSd(), errors.measurementSd(), confidence, false);
    double halfLife = Math.log(2) / found.meanReversion();
    if (!lost && halfLife < 1e12) {
      row.number("half_life", halfLife, 4);
      row.rate("stationary_sd", found.volatility() / Math.sqrt(2 * found.meanReversion()));
    }
    row.number("log_likelihood", best.logLikelihood(), 6);
    FilteredRates rates = best.rates();
    row.rate("last_rate", rates.rate(rates.size() - 1));
    row.rate("last_rate_sd", rates.sd(rates.size() - 1));
    if (!lost) {
      row.rate("risk_neutral_mean", found.pricingMean());
    }
    row.count("iterations", best.iterations());
    row.flag("converged", estimate instanceof PanelEstimate.Converged);
    if (estimate instanceof PanelEstimate.Stopped stopped) {
      row.text("status", "stopped")
          .text(
              "message",
              stopped.reason()
                  + (lost ? "; the means and the price of risk are not identified" : ""));
    }
    List<ResultRow> maturities = new ArrayList<>();
    double[] years = panel.maturities();
    for (int j = 0; j < years.length; j++) {
      maturities.add(
          ResultRow.builder()
              .text("maturity", labels.get(j))
              .number("time", years[j], 6)
              .rate("rmse", rates.rmse(j))
              .build());
    }
    row.rows("maturities", maturities);
    List<ResultRow> others = new ArrayList<>();
    for (double value : best.otherMaxima()) {
      others.add(ResultRow.builder().number("log_likelihood", value, 6).build());
    }
    row.put(
        "diagnostics",
        new Cell.Group(
            ResultRow.builder()
                .count("lower_maxima", others.size())
                .rows("other_maxima", others)
                .build()));
    return row;
  }

  private static void figure(
      ResultRow.Builder row,
      String name,
      double value,
      OptionalDouble error,
      double confidence,
      boolean plain) {
    row.put(name, cell(value, plain));
    if (error.isPresent()) {
      Interval interval = Interval.gaussian(value, error.getAsDouble(), confidence);
      row.put(name + "_se", cell(error.getAsDouble(), plain));
      row.put(name + "_low", cell(interval.low().orElseThrow(), plain));
      row.put(name + "_high", cell(interval.high().orElseThrow(), plain));
    }
  }

  private static Cell cell(double value, boolean plain) {
    return plain ? new Cell.Amount(value, 6) : new Cell.Rate(value);
  }
}
