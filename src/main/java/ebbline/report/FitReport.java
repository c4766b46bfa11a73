package ebbline.report;

import ebbline.fitting.Fit;
import ebbline.fitting.FitPoint;
import ebbline.fitting.FittedQuote;
import ebbline.fitting.Parameter;
import ebbline.fitting.Uncertainty;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** A fit of a model as one result with its quotes. */
public final class FitReport {
  private FitReport() {}

  /**
   * Vasicek fitted to the zero rates of a curve.
   *
   * @param labels of the quotes, as the curve names its maturities
   */
  public static ResultRow vasicek(Fit fit, List<String> labels) {
    FitPoint best = fit.best();
    ResultRow.Builder row = ResultRow.builder().text("model", "vasicek");
    for (Map.Entry<Parameter, Double> entry : best.parameters().entrySet()) {
      row.put(entry.getKey().label(), cell(entry.getKey(), entry.getValue()));
      OptionalDouble error = best.uncertainty().standardError(entry.getKey());
      if (error.isPresent()) {
        row.put(entry.getKey().label() + "_se", cell(entry.getKey(), error.getAsDouble()));
      }
    }
    row.put("rmse", new Cell.Rate(best.rmse()));
    row.put("largest_error", new Cell.Rate(best.largestError()));
    row.count("iterations", best.iterations());
    row.flag("converged", fit.isConverged());
    if (fit instanceof Fit.Stopped stopped) {
      row.text("stopped_because", stopped.reason());
    }
    if (!best.uncertainty().free().isEmpty()) {
      row.number("condition_number", best.uncertainty().conditionNumber(), 1);
      row.rows("correlation", correlation(best.uncertainty()));
    }
    List<ResultRow> quotes = new ArrayList<>();
    for (int i = 0; i < best.quotes().size(); i++) {
      FittedQuote quote = best.quotes().get(i);
      quotes.add(quote(new FittedQuote(labels.get(i), quote.quote(), quote.fitted())));
    }
    row.rows("quotes", quotes);
    return row.build();
  }

  /** One point of a curve, as quoted and as fitted, both zero rates. */
  public static ResultRow quote(FittedQuote quote) {
    return ResultRow.builder()
        .text("id", quote.id())
        .rate("quote", quote.quote())
        .rate("fitted", quote.fitted())
        .rate("error", quote.error())
        .build();
  }

  private static List<ResultRow> correlation(Uncertainty uncertainty) {
    List<ResultRow> rows = new ArrayList<>();
    List<Parameter> identified = uncertainty.identified();
    for (int i = 0; i < identified.size(); i++) {
      for (int j = 0; j < i; j++) {
        Parameter one = identified.get(j);
        Parameter other = identified.get(i);
        uncertainty
            .correlation(one, other)
            .ifPresent(
                value ->
                    rows.add(
                        ResultRow.builder()
                            .text("parameter", one.label())
                            .text("other", other.label())
                            .number("correlation", value, 4)
                            .build()));
      }
    }
    return rows;
  }

  private static Cell cell(Parameter parameter, double value) {
    return parameter == Parameter.MEAN_REVERSION ? new Cell.Amount(value, 6) : new Cell.Rate(value);
  }
}
