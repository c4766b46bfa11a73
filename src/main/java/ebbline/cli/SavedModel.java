package ebbline.cli;

import ebbline.data.CurveInput;
import ebbline.data.FitSummary;
import ebbline.data.ModelInput;
import ebbline.data.ModelWriter;
import ebbline.data.SourceFile;
import ebbline.fitting.FittedQuote;
import ebbline.fitting.MarketPriceOfRisk;
import ebbline.model.Vasicek;
import ebbline.report.FitReport;
import ebbline.report.ResultRow;
import ebbline.time.TimeAxis;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** What an estimate becomes: a market price of risk on today's curve, and a model file. */
final class SavedModel {
  private final EstimateOptions options;
  private final OutputOptions output;
  private final Optional<CurveInput> curve;
  private final TimeAxis axis;

  private SavedModel(
      EstimateOptions options, OutputOptions output, Optional<CurveInput> curve, TimeAxis axis) {
    this.options = options;
    this.output = output;
    this.curve = curve;
    this.axis = axis;
  }

  /**
   * @param last date of the history, the model's as-of date where no other is given
   */
  static SavedModel of(
      EstimateOptions options,
      MarketOptions market,
      OutputOptions output,
      Optional<LocalDate> last) {
    Optional<CurveInput> curve = market.hasCurve() ? Optional.of(market.curve()) : Optional.empty();
    TimeAxis axis =
        curve
            .map(CurveInput::axis)
            .orElseGet(
                () -> market.asOf().or(() -> last).map(TimeAxis::from).orElse(TimeAxis.undated()));
    if (last.isPresent() && axis.asOf().isPresent() && !axis.asOf().equals(last)) {
      output.warn(
          "the history ends on "
              + last.get()
              + ", the as-of date is "
              + axis.asOf().get()
              + ": the last rate is taken for today's");
    }
    options.savesRiskNeutral(false);
    return new SavedModel(options, output, curve, axis);
  }

  TimeAxis axis() {
    return axis;
  }

  Optional<SourceFile> curveFile() {
    return curve.flatMap(CurveInput::file);
  }

  /** How the estimate was found, for the model file. */
  record Found(
      String objective,
      double residual,
      int iterations,
      boolean converged,
      Map<String, Double> errors,
      List<List<Double>> covariance) {
    FitSummary summary(double rmse, List<FitSummary.Quote> quotes) {
      return new FitSummary(
          objective, rmse, iterations, converged, errors, covariance, List.copyOf(quotes));
    }
  }

  /**
   * Adds the market price of risk where there is a curve, and writes the model where it is to be
   * saved.
   *
   * @param historical with the last rate as today's
   * @param price of risk that the estimate itself holds, a panel's
   */
  void finish(ResultRow.Builder row, Vasicek historical, OptionalDouble price, Found found) {
    Optional<MarketPriceOfRisk> fitted = curve.map(input -> price(row, historical, input));
    if (options.save().isEmpty()) {
      return;
    }
    Path save = options.save().get();
    boolean riskNeutral = options.savesRiskNeutral(fitted.isPresent());
    OptionalDouble lambda = fitted.isPresent() ? OptionalDouble.of(fitted.get().value()) : price;
    List<FitSummary.Quote> quotes = new ArrayList<>();
    if (fitted.isPresent()) {
      for (FittedQuote quote : labelled(fitted.get(), curve.orElseThrow())) {
        quotes.add(new FitSummary.Quote(quote.id(), quote.quote(), quote.fitted(), quote.error()));
      }
    }
    Vasicek model = riskNeutral ? historical.riskNeutral(lambda.orElseThrow()) : historical;
    double rmse = fitted.map(MarketPriceOfRisk::rmse).orElse(found.residual());
    ModelWriter.write(
        save,
        new ModelInput(
            riskNeutral ? ModelInput.Measure.RISK_NEUTRAL : ModelInput.Measure.HISTORICAL,
            axis,
            Optional.of(model),
            Optional.empty(),
            Optional.empty(),
            lambda,
            Optional.of(found.summary(rmse, quotes)),
            Optional.empty()));
    output.note((riskNeutral ? "risk-neutral" : "historical") + " model written to " + save);
  }

  /** Says that a model which was to be saved is none. */
  void nothing() {
    options.save().ifPresent(save -> output.warn("no model is written to " + save));
  }

  private MarketPriceOfRisk price(ResultRow.Builder row, Vasicek historical, CurveInput input) {
    FitGrid grid = FitGrid.of(input);
    MarketPriceOfRisk found;
    try {
      found = MarketPriceOfRisk.of(historical, grid.times(), grid.zeros());
    } catch (IllegalArgumentException e) {
      throw new UsageProblem("--curve: " + e.getMessage());
    }
    row.number("curve_market_price_of_risk", found.value(), 6);
    found.standardError().ifPresent(error -> row.number("curve_market_price_of_risk_se", error, 6));
    row.rate("curve_risk_neutral_mean", found.riskNeutral().longRunMean());
    row.rate("curve_rmse", found.rmse());
    row.rows("quotes", labelled(found, input).stream().map(FitReport::quote).toList());
    return found;
  }

  private static List<FittedQuote> labelled(MarketPriceOfRisk found, CurveInput input) {
    List<String> labels = FitGrid.of(input).labels();
    List<FittedQuote> quotes = new ArrayList<>();
    for (int i = 0; i < labels.size(); i++) {
      FittedQuote quote = found.quotes().get(i);
      quotes.add(new FittedQuote(labels.get(i), quote.quote(), quote.fitted()));
    }
    return quotes;
  }
}
