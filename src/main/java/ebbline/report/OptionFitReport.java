package ebbline.report;

import ebbline.fitting.options.OptionFit;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** A calibration to options as one result with its quotes, its covariance and its profile. */
public final class OptionFitReport {
  private OptionFitReport() {}

  /**
   * @param model name of the model
   * @param objective what was made small, in words
   */
  public static ResultRow result(String model, String objective, OptionFit fit) {
    ResultRow.Builder row = ResultRow.builder().text("model", model);
    for (String name : fit.names()) {
      row.put(name, cell(name, fit.value(name)));
      OptionalDouble error = fit.standardError(name);
      if (error.isPresent()) {
        row.put(name + "_se", cell(name, error.getAsDouble()));
      }
    }
    row.text("objective", objective);
    row.magnitude("rmse", fit.rmse());
    largest(fit)
        .ifPresent(
            q -> {
              row.put("largest_error", figure(q.unit(), Math.abs(q.error().orElseThrow())));
              row.text("largest_error_quote", q.id());
            });
    row.count("iterations", fit.iterations());
    row.count("evaluations", fit.evaluations());
    row.flag("converged", fit.isConverged());
    if (!fit.isConverged()) {
      row.text("stopped_because", fit.stopped());
    }
    if (fit.uncertainty().isIdentified() && !fit.free().isEmpty()) {
      row.number("condition_number", fit.uncertainty().conditionNumber(), 1);
    }
    row.rows("covariance", covariance(fit));
    row.rows("quotes", fit.quotes().stream().map(OptionFitReport::quote).toList());
    if (!fit.profile().isEmpty()) {
      row.rows("profile", fit.profile().stream().map(OptionFitReport::point).toList());
    }
    return row.build();
  }

  private static Optional<OptionFit.Quote> largest(OptionFit fit) {
    OptionFit.Quote worst = null;
    for (OptionFit.Quote quote : fit.quotes()) {
      boolean worse =
          quote.error().isPresent()
              && (worst == null
                  || Math.abs(quote.error().getAsDouble()) > Math.abs(worst.error().orElseThrow()));
      worst = worse ? quote : worst;
    }
    return Optional.ofNullable(worst);
  }

  private static List<ResultRow> covariance(OptionFit fit) {
    List<ResultRow> rows = new ArrayList<>();
    for (int i = 0; i < fit.free().size(); i++) {
      for (int j = 0; j <= i; j++) {
        OptionalDouble value = fit.uncertainty().covariance(i, j);
        if (value.isEmpty()) {
          return List.of();
        }
        ResultRow.Builder row =
            ResultRow.builder()
                .text("parameter", fit.free().get(i))
                .text("other", fit.free().get(j))
                .magnitude("covariance", value.getAsDouble());
        OptionalDouble correlation = fit.uncertainty().correlation(i, j);
        if (correlation.isPresent()) {
          row.number("correlation", correlation.getAsDouble(), 4);
        }
        rows.add(row.build());
      }
    }
    return rows;
  }

  private static ResultRow quote(OptionFit.Quote quote) {
    ResultRow.Builder row =
        ResultRow.builder()
            .text("id", quote.id())
            .text("quote_kind", quote.unit())
            .put("quote", figure(quote.unit(), quote.quoted()));
    if (quote.error().isPresent()) {
      row.put("fitted", figure(quote.unit(), quote.fitted().orElseThrow()));
      row.put("error", figure(quote.unit(), quote.error().getAsDouble()));
    } else {
      row.text("message", "the model's premium has no volatility");
    }
    return row.build();
  }

  private static ResultRow point(OptionFit.ProfilePoint point) {
    return ResultRow.builder()
        .number("mean_reversion", point.meanReversion(), 6)
        .rate("volatility", point.volatility())
        .magnitude("rmse", point.rmse())
        .build();
  }

  private static Cell figure(String unit, double value) {
    return unit.equals("premium") ? new Cell.Amount(value, 6) : new Cell.Rate(value);
  }

  private static Cell cell(String name, double value) {
    return name.equals("mean_reversion") ? new Cell.Amount(value, 6) : new Cell.Rate(value);
  }
}
