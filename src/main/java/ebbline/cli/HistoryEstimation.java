package ebbline.cli;

import ebbline.data.HistoryInput;
import ebbline.fitting.history.BiasCorrection;
import ebbline.fitting.history.Bootstrap;
import ebbline.fitting.history.Diagnostics;
import ebbline.fitting.history.HistoryEstimate;
import ebbline.fitting.history.HistoryEstimate.Reverting;
import ebbline.fitting.history.HistoryEstimate.Undetermined;
import ebbline.fitting.history.HistoryEstimator;
import ebbline.fitting.history.HistoryIntervals;
import ebbline.fitting.history.HistoryMethod;
import ebbline.fitting.history.RateHistory;
import ebbline.fitting.history.RateLaw;
import ebbline.fitting.history.Resampling;
import ebbline.fitting.history.RollingWindow;
import ebbline.report.Cell;
import ebbline.report.DiagnosticsReport;
import ebbline.report.EstimateReport;
import ebbline.report.ResultRow;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** One rate's history, from the estimate to all that is said about it. */
final class HistoryEstimation {
  /**
   * Work of a search over the likelihood for each length of step, in simulated rates, about: a
   * hundred evaluations.
   */
  private static final double SEARCH = 1000;

  private final EstimateOptions options;
  private final OutputOptions output;
  private final HistoryInput input;
  private final SavedModel saved;
  private boolean determined;

  HistoryEstimation(
      EstimateOptions options, OutputOptions output, HistoryInput input, SavedModel saved) {
    this.options = options;
    this.output = output;
    this.input = input;
    this.saved = saved;
  }

  /** Whether there is an estimate; known after {@link #run}. */
  boolean isDetermined() {
    return determined;
  }

  ResultRow run() {
    RateHistory history = input.history();
    HistoryMethod method = options.method();
    HistoryEstimate estimate;
    try {
      estimate = HistoryEstimator.estimate(history, method);
    } catch (IllegalArgumentException e) {
      throw new UsageProblem("--method " + e.getMessage());
    }
    Optional<List<ResultRow>> windows = options.window().map(length -> windows(method, length));
    Resampling resampling = resampling(history, method);
    determined = estimate instanceof Reverting;
    ResultRow.Builder row;
    if (estimate instanceof Reverting found) {
      row = reverting(found, resampling);
    } else {
      Undetermined none = (Undetermined) estimate;
      output.warn(none.explanation());
      saved.nothing();
      row = EstimateReport.undetermined(none);
    }
    if (history.size() > 1) {
      row.put(
          "diagnostics",
          new Cell.Group(DiagnosticsReport.of(Diagnostics.of(history, estimate, resampling))));
    }
    windows.ifPresent(path -> row.rows("windows", path));
    return row.build();
  }

  private Resampling resampling(RateHistory history, HistoryMethod method) {
    boolean line = method == HistoryMethod.OLS || method == HistoryMethod.EXACT;
    double search = history.isRegular() && line ? 0 : SEARCH * history.distinctSteps();
    double cost = Math.max(1, history.size()) + search;
    return options.resampling(cost, output.seed());
  }

  private ResultRow.Builder reverting(Reverting found, Resampling resampling) {
    found.warnings().forEach(output::warn);
    RateHistory history = input.history();
    Bootstrap draws = Bootstrap.of(history, found, resampling);
    HistoryIntervals intervals =
        HistoryIntervals.of(history, found, draws, options.confidence(), resampling);
    if (!intervals.remark().isEmpty()) {
      output.warn(intervals.remark());
    }
    Optional<BiasCorrection> correction = correction(found, draws);
    if (correction.isPresent() && !(correction.get().corrected() > 0)) {
      output.warn("with its bias taken off no mean reversion is left");
    }
    ResultRow.Builder row =
        EstimateReport.reverting(
            found, new EstimateReport.Surroundings(intervals, draws, correction));
    row.count("replications", resampling.replications());
    List<Double> horizons = options.horizons();
    if (!horizons.isEmpty()) {
      row.rows("conditional", EstimateReport.conditional(found, options.horizonLabels(), horizons));
    }
    RateLaw law = found.law();
    saved.finish(row, law.from(found.sample().last()), OptionalDouble.empty(), summary(found));
    return row;
  }

  private Optional<BiasCorrection> correction(Reverting found, Bootstrap draws) {
    try {
      return Optional.of(
          switch (options.bias()) {
            case ANALYTIC -> BiasCorrection.analytic(found);
            case JACKKNIFE -> BiasCorrection.jackknife(input.history(), found);
            case BOOTSTRAP -> BiasCorrection.bootstrap(found, draws);
          });
    } catch (IllegalArgumentException e) {
      output.warn("no bias correction: " + e.getMessage());
      return Optional.empty();
    }
  }

  private static SavedModel.Found summary(Reverting found) {
    Map<String, Double> errors = new LinkedHashMap<>();
    errors.put("mean_reversion", found.precision().meanReversionError());
    errors.put("long_run_mean", found.precision().longRunMeanError());
    errors.put("volatility", found.precision().volatilityError());
    List<List<Double>> covariance =
        Arrays.stream(found.precision().covariance())
            .map(line -> Arrays.stream(line).boxed().toList())
            .toList();
    return new SavedModel.Found(
        "estimate from a history by " + found.method().label(),
        found.regression().residualSd(),
        0,
        true,
        errors,
        covariance);
  }

  private List<ResultRow> windows(HistoryMethod method, int length) {
    List<RollingWindow> path;
    try {
      path = RollingWindow.over(input.history(), method, length, options.windowStep());
    } catch (IllegalArgumentException e) {
      throw new UsageProblem("--window: " + e.getMessage());
    }
    return EstimateReport.windows(path, this::when);
  }

  private Cell when(double time) {
    return input
        .dateAt(time)
        .<Cell>map(date -> new Cell.Text(date.toString()))
        .orElseGet(() -> new Cell.Amount(time, 4));
  }
}
