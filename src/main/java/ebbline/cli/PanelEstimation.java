package ebbline.cli;

import ebbline.data.AtomicFile;
import ebbline.data.PanelInput;
import ebbline.fitting.panel.FilteredRates;
import ebbline.fitting.panel.PanelErrors;
import ebbline.fitting.panel.PanelEstimate;
import ebbline.fitting.panel.PanelEstimator;
import ebbline.fitting.panel.PanelParameters;
import ebbline.report.OutputFormat;
import ebbline.report.PanelReport;
import ebbline.report.ResultRow;
import ebbline.report.ResultWriter;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.io.Writer;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** A panel of yields, from the estimate to all that is said about it. */
final class PanelEstimation {
  private final EstimateOptions options;
  private final OutputOptions output;
  private final PanelInput input;
  private final SavedModel saved;
  private boolean determined;

  PanelEstimation(
      EstimateOptions options, OutputOptions output, PanelInput input, SavedModel saved) {
    this.options = options;
    this.output = output;
    this.input = input;
    this.saved = saved;
  }

  /** Whether the search ended at a maximum; known after {@link #run}. */
  boolean isDetermined() {
    return determined;
  }

  ResultRow run() {
    PanelEstimate estimate;
    try {
      estimate = PanelEstimator.estimate(input.panel());
    } catch (IllegalArgumentException e) {
      throw InputProblems.of(new InputProblem(input.file().path(), 0, "", "", e.getMessage()));
    }
    PanelEstimate.Best best = estimate.best();
    best.warnings().forEach(output::warn);
    determined = estimate instanceof PanelEstimate.Converged;
    ResultRow.Builder row =
        PanelReport.of(input.panel(), input.labels(), estimate, options.confidence());
    FilteredRates rates = best.rates();
    options.filtered().ifPresent(file -> write(file, rates));
    if (estimate instanceof PanelEstimate.Stopped stopped) {
      output.warn(stopped.reason());
      saved.nothing();
    } else {
      PanelParameters found = best.parameters();
      saved.finish(
          row,
          found.historical(rates.rate(rates.size() - 1)),
          OptionalDouble.of(found.marketPriceOfRisk()),
          summary(best));
    }
    return row.build();
  }

  private static SavedModel.Found summary(PanelEstimate.Best best) {
    PanelErrors known = best.errors();
    Map<String, Double> errors = new LinkedHashMap<>();
    known.meanReversion().ifPresent(e -> errors.put("mean_reversion", e));
    known.longRunMean().ifPresent(e -> errors.put("long_run_mean", e));
    known.volatility().ifPresent(e -> errors.put("volatility", e));
    known.marketPriceOfRisk().ifPresent(e -> errors.put("market_price_of_risk", e));
    known.measurementSd().ifPresent(e -> errors.put("measurement_sd", e));
    List<List<Double>> covariance =
        Arrays.stream(known.covariance())
            .map(line -> Arrays.stream(line).boxed().toList())
            .toList();
    return new SavedModel.Found(
        "highest likelihood of a panel of yields",
        best.parameters().measurementSd(),
        best.iterations(),
        true,
        errors,
        covariance);
  }

  private void write(Path file, FilteredRates rates) {
    AtomicFile.write(file, writer -> write(writer, rates));
    output.note("filtered short rate written to " + file);
  }

  private void write(Writer writer, FilteredRates rates) throws IOException {
    ResultWriter rows = ResultWriter.of(OutputFormat.CSV, writer);
    rows.begin(Inputs.envelope("estimate", saved.axis(), List.of(), List.of()));
    for (int i = 0; i < rates.size(); i++) {
      ResultRow.Builder row = ResultRow.builder();
      if (input.dates().isEmpty()) {
        row.number("time", input.panel().time(i), 6);
      } else {
        row.text("date", input.dates().get(i).toString());
      }
      rows.row(row.rate("rate", rates.rate(i)).rate("sd", rates.sd(i)).build());
    }
    rows.end(List.of());
  }
}
