package ebbline.report;

import ebbline.fitting.history.BiasCorrection;
import ebbline.fitting.history.Bootstrap;
import ebbline.fitting.history.HistoryEstimate;
import ebbline.fitting.history.HistoryEstimate.RandomWalk;
import ebbline.fitting.history.HistoryEstimate.Regression;
import ebbline.fitting.history.HistoryEstimate.Reverting;
import ebbline.fitting.history.HistoryEstimate.Sample;
import ebbline.fitting.history.HistoryEstimate.Undetermined;
import ebbline.fitting.history.HistoryIntervals;
import ebbline.fitting.history.Interval;
import ebbline.fitting.history.Precision;
import ebbline.fitting.history.RateLaw;
import ebbline.fitting.history.RollingWindow;
import ebbline.model.NormalLaw;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.DoubleFunction;

/** An estimate from one rate's history as one result. */
public final class EstimateReport {
  /** Figures beyond tell nobody anything and are left out. */
  private static final double LARGEST = 1e12;

  private EstimateReport() {}

  /**
   * What is known about an estimate besides itself.
   *
   * @param intervals offered first
   * @param bootstrap that the percentiles come from
   * @param correction of the bias; absent where it cannot be made
   */
  public record Surroundings(
      HistoryIntervals intervals, Bootstrap bootstrap, Optional<BiasCorrection> correction) {}

  /** An estimate with mean reversion; the caller adds diagnostics and lists of his own. */
  public static ResultRow.Builder reverting(Reverting found, Surroundings around) {
    HistoryIntervals intervals = around.intervals();
    RateLaw law = found.law();
    Precision precision = found.precision();
    ResultRow.Builder row = sample(found);
    row.number("mean_reversion", law.meanReversion(), 6);
    row.number("mean_reversion_se", precision.meanReversionError(), 6);
    ends(row, "mean_reversion", intervals.meanReversion(), EstimateReport::plain);
    around
        .correction()
        .ifPresent(
            correction ->
                row.text("bias_correction", correction.kind().label())
                    .number("mean_reversion_bias", correction.bias(), 6)
                    .number("mean_reversion_corrected", correction.corrected(), 6));
    row.rate("long_run_mean", law.longRunMean());
    row.rate("long_run_mean_se", precision.longRunMeanError());
    ends(row, "long_run_mean", intervals.longRunMean(), Cell.Rate::new);
    row.rate("volatility", law.volatility());
    row.rate("volatility_se", precision.volatilityError());
    ends(row, "volatility", intervals.volatility(), Cell.Rate::new);
    row.number("half_life", law.halfLife(), 4);
    row.number("half_life_se", precision.halfLifeError(law.meanReversion()), 4);
    ends(row, "half_life", intervals.halfLife(), value -> new Cell.Amount(value, 4));
    row.rate("stationary_sd", law.stationary().standardDeviation());
    row.rate("stationary_sd_se", precision.stationaryDeviationError(law));
    Regression line = found.regression();
    row.number("ar1_intercept", line.intercept(), 10);
    row.number("ar1_intercept_se", line.interceptError(), 10);
    row.number("ar1_slope", line.slope(), 8);
    row.number("ar1_slope_se", line.slopeError(), 8);
    row.rate("residual_sd", line.residualSd());
    row.number("log_likelihood", found.logLikelihood(), 6);
    row.rate("last_rate", found.sample().last());
    row.rows("intervals", intervals(found, around));
    return row;
  }

  private static Cell plain(double value) {
    return new Cell.Amount(value, 6);
  }

  /** Turns a figure into a cell. */
  private interface Shape {
    Cell of(double value);
  }

  private static void ends(ResultRow.Builder row, String name, Interval interval, Shape shape) {
    interval.low().ifPresent(low -> add(row, name + "_low", low, shape));
    interval.high().ifPresent(high -> add(row, name + "_high", high, shape));
  }

  private static void add(ResultRow.Builder row, String name, double value, Shape shape) {
    if (Math.abs(value) < LARGEST) {
      row.put(name, shape.of(value));
    }
  }

  /** Every kind of interval beside the one offered first. */
  private static List<ResultRow> intervals(Reverting found, Surroundings around) {
    double confidence = around.intervals().meanReversion().confidence();
    RateLaw law = found.law();
    Precision precision = found.precision();
    Bootstrap draws = around.bootstrap();
    List<ResultRow> rows = new ArrayList<>();
    Shape rate = Cell.Rate::new;
    String first = "test inversion";
    rows.add(
        interval(
            "mean_reversion", first, around.intervals().meanReversion(), EstimateReport::plain));
    rows.add(
        interval(
            "mean_reversion",
            "gaussian",
            Interval.gaussian(law.meanReversion(), precision.meanReversionError(), confidence),
            EstimateReport::plain));
    rows.add(
        interval(
            "mean_reversion",
            "bootstrap percentile",
            draws.meanReversionPercentiles(confidence),
            EstimateReport::plain));
    rows.add(interval("long_run_mean", first, around.intervals().longRunMean(), rate));
    rows.add(
        interval(
            "long_run_mean",
            "gaussian",
            Interval.gaussian(law.longRunMean(), precision.longRunMeanError(), confidence),
            rate));
    rows.add(
        interval(
            "long_run_mean",
            "bootstrap percentile",
            draws.longRunMeanPercentiles(confidence),
            rate));
    rows.add(interval("volatility", "bootstrap ratio", around.intervals().volatility(), rate));
    rows.add(
        interval(
            "volatility",
            "gaussian",
            Interval.gaussian(law.volatility(), precision.volatilityError(), confidence),
            rate));
    rows.add(
        interval(
            "volatility", "bootstrap percentile", draws.volatilityPercentiles(confidence), rate));
    return rows;
  }

  private static ResultRow interval(String name, String kind, Interval interval, Shape shape) {
    ResultRow.Builder row = ResultRow.builder().text("parameter", name).text("kind", kind);
    interval.low().ifPresent(low -> add(row, "low", low, shape));
    interval.high().ifPresent(high -> add(row, "high", high, shape));
    return row.build();
  }

  /** Why there is no estimate, and what can still be said. */
  public static ResultRow.Builder undetermined(Undetermined none) {
    ResultRow.Builder row = sample(none);
    none.slope().ifPresent(slope -> row.number("ar1_slope", slope, 8));
    if (none.sample().observations() > 0) {
      row.rate("sample_mean", none.sample().mean());
      row.rate("sample_sd", none.sample().deviation());
      row.rate("last_rate", none.sample().last());
    }
    if (none.walk().isPresent()) {
      RandomWalk walk = none.walk().get();
      row.rate("random_walk_drift", walk.drift());
      row.rate("random_walk_drift_se", walk.driftError());
      row.rate("random_walk_volatility", walk.volatility());
      row.rate("random_walk_volatility_se", walk.volatilityError());
      row.number("random_walk_log_likelihood", walk.logLikelihood(), 6);
    }
    row.text("status", none.reason().name().toLowerCase(Locale.ROOT).replace('_', '-'));
    row.text("message", none.explanation());
    return row;
  }

  private static ResultRow.Builder sample(HistoryEstimate estimate) {
    Sample sample = estimate.sample();
    ResultRow.Builder row =
        ResultRow.builder()
            .text("method", estimate.method().label())
            .count("observations", sample.observations())
            .number("span_years", sample.spanYears(), 4);
    if (sample.missing() > 0) {
      row.count("missing", sample.missing());
    }
    return row.flag("even_steps", sample.regular()).number("step_years", sample.step(), 6);
  }

  /**
   * The law of the rate at horizons, from its last value.
   *
   * @param labels the horizons as the user wrote them
   */
  public static List<ResultRow> conditional(
      Reverting found, List<String> labels, List<Double> years) {
    List<ResultRow> rows = new ArrayList<>();
    for (int i = 0; i < labels.size(); i++) {
      NormalLaw ahead = found.law().conditional(found.sample().last(), years.get(i));
      rows.add(
          ResultRow.builder()
              .text("horizon", labels.get(i))
              .number("time", years.get(i), 6)
              .rate("mean", ahead.mean())
              .rate("sd", ahead.standardDeviation())
              .build());
    }
    return rows;
  }

  /**
   * The path of the parameters over windows.
   *
   * @param when names a moment of the history by its time, years from the first
   */
  public static List<ResultRow> windows(List<RollingWindow> path, DoubleFunction<Cell> when) {
    List<ResultRow> rows = new ArrayList<>();
    for (RollingWindow window : path) {
      ResultRow.Builder row =
          ResultRow.builder()
              .put("from", when.apply(window.firstTime()))
              .put("to", when.apply(window.lastTime()));
      if (window.estimate() instanceof Reverting found) {
        row.number("mean_reversion", found.law().meanReversion(), 6)
            .number("mean_reversion_se", found.precision().meanReversionError(), 6)
            .rate("long_run_mean", found.law().longRunMean())
            .rate("volatility", found.law().volatility())
            .number("ar1_slope", found.regression().slope(), 8);
      } else if (window.estimate() instanceof Undetermined none) {
        none.walk().ifPresent(walk -> row.rate("volatility", walk.volatility()));
        none.slope().ifPresent(slope -> row.number("ar1_slope", slope, 8));
        row.text("status", none.reason().name().toLowerCase(Locale.ROOT).replace('_', '-'));
      }
      rows.add(row.build());
    }
    return rows;
  }
}
