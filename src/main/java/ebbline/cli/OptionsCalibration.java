package ebbline.cli;

import ebbline.data.AtomicFile;
import ebbline.data.CurveInput;
import ebbline.data.FitSummary;
import ebbline.data.ModelInput;
import ebbline.data.ModelWriter;
import ebbline.data.OptionQuotesInput;
import ebbline.fitting.Parameter;
import ebbline.fitting.options.CalibrationTerms;
import ebbline.fitting.options.HullWhiteCalibration;
import ebbline.fitting.options.Objective;
import ebbline.fitting.options.OptionFit;
import ebbline.fitting.options.VasicekJointFit;
import ebbline.pricing.Market;
import ebbline.report.OptionFitReport;
import ebbline.report.ProfileSvg;
import ebbline.time.CalendarRegistry;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Fits a model to quotes of options, and says how well. */
final class OptionsCalibration {
  private final CurveInput curve;
  private final OptionFitOptions options;
  private final OptionQuotesInput quotes;
  private final Optional<Path> save;
  private final OutputOptions output;

  OptionsCalibration(
      CurveInput curve,
      OptionFitOptions options,
      CalendarRegistry calendars,
      Optional<Path> save,
      OutputOptions output) {
    this.curve = curve;
    this.options = options;
    this.quotes = options.read(Market.of(curve.axis(), curve.curve()), calendars);
    this.save = save;
    this.output = output;
  }

  int hullWhite(OptionalDouble meanReversion) {
    CalibrationTerms standard = CalibrationTerms.standard(options.objective(quotes.quotes()));
    if (options.bootstrap() && (meanReversion.isEmpty() || !options.hasSteps())) {
      throw new UsageProblem(
          "--bootstrap needs --volatility-steps and --fix mean-reversion=VALUE: one step after the"
              + " other says nothing about mean reversion");
    }
    CalibrationTerms terms;
    OptionFit fit;
    try {
      terms =
          new CalibrationTerms(
              standard.objective(),
              meanReversion,
              options.stepEnds(curve.axis(), quotes.quotes()),
              options.bootstrap(),
              standard.lowestMeanReversion(),
              standard.highestMeanReversion(),
              options.iterations());
      fit = HullWhiteCalibration.of(quotes.quotes(), curve.curve(), terms).fit();
    } catch (IllegalArgumentException e) {
      throw problem(e);
    }
    if (options.svg().isPresent()) {
      picture(options.svg().get(), fit);
    }
    if (save.isPresent()) {
      save(
          ModelInput.of(
              HullWhiteCalibration.model(fit, terms),
              curve.curve(),
              curve.axis(),
              Optional.of(summary(fit, terms.objective().words()))));
    }
    return shown("hull-white", terms.objective(), fit);
  }

  int vasicek(Map<Parameter, Double> held) {
    if (options.hasSteps() || options.bootstrap() || options.svg().isPresent()) {
      throw new UsageProblem(
          "--volatility-steps, --bootstrap and --svg belong to --model hull-white");
    }
    FitGrid grid = FitGrid.of(curve);
    Objective objective = options.objective(quotes.quotes());
    OptionFit fit;
    try {
      fit =
          VasicekJointFit.fit(
              grid.times(),
              grid.zeros(),
              grid.labels(),
              quotes.quotes(),
              held,
              objective,
              options.iterations());
    } catch (IllegalArgumentException e) {
      throw problem(e);
    }
    if (save.isPresent()) {
      save(
          ModelInput.of(
              VasicekJointFit.model(fit),
              curve.axis(),
              Optional.of(summary(fit, "zero rates and " + objective.words()))));
    }
    return shown("vasicek", objective, fit);
  }

  /** What is wrong with the quotes is said with their file, the rest with the options. */
  private RuntimeException problem(IllegalArgumentException e) {
    String message = e.getMessage();
    if (message.contains("volatility step")) {
      return new UsageProblem("--volatility-steps: " + message);
    }
    if (message.contains("no unit in common")) {
      return new UsageProblem("--objective: " + message);
    }
    String column = message.startsWith("expiry") ? "expiry" : "";
    return InputProblems.of(new InputProblem(options.path(), 0, column, "", message));
  }

  private int shown(String model, Objective objective, OptionFit fit) {
    fit.warnings().forEach(output::warn);
    if (!fit.isConverged()) {
      output.warn("the fit stopped: " + fit.stopped() + "; the best point found is shown");
    }
    output.write(
        Inputs.envelope(
            "calibrate",
            curve.axis(),
            List.of(curve.file(), Optional.of(quotes.file())),
            List.of()),
        List.of(OptionFitReport.result(model, objective.words(), fit)));
    return (fit.isConverged() ? ExitStatus.DONE : ExitStatus.CHECK_FAILED).code();
  }

  private void save(ModelInput model) {
    ModelWriter.write(save.orElseThrow(), model);
    output.note("model written to " + save.get());
  }

  private void picture(Path svg, OptionFit fit) {
    if (fit.profile().size() < 2) {
      throw new UsageProblem(
          "--svg draws the profile over mean reversion, which is held here; leave --svg out");
    }
    String text = ProfileSvg.draw(fit.profile(), fit.value("mean_reversion"));
    AtomicFile.write(svg, writer -> writer.write(text));
    output.note("picture written to " + svg);
  }

  private static FitSummary summary(OptionFit fit, String objective) {
    Map<String, Double> errors = new LinkedHashMap<>();
    List<List<Double>> covariance = new ArrayList<>();
    int n = fit.free().size();
    if (n > 0 && fit.uncertainty().covariance(0, 0).isPresent()) {
      for (int i = 0; i < n; i++) {
        errors.put(fit.free().get(i), fit.uncertainty().standardError(i).orElseThrow());
        List<Double> row = new ArrayList<>();
        for (int j = 0; j < n; j++) {
          row.add(fit.uncertainty().covariance(i, j).orElseThrow());
        }
        covariance.add(row);
      }
    }
    List<FitSummary.Quote> quotes = new ArrayList<>();
    for (OptionFit.Quote quote : fit.quotes()) {
      if (quote.error().isPresent()) {
        quotes.add(
            new FitSummary.Quote(
                quote.id(),
                quote.quoted(),
                quote.fitted().orElseThrow(),
                quote.error().getAsDouble()));
      }
    }
    return new FitSummary(
        objective, fit.rmse(), fit.iterations(), fit.isConverged(), errors, covariance, quotes);
  }
}
