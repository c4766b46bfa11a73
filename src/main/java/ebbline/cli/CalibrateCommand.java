package ebbline.cli;

import ebbline.curve.DiscountCurve;
import ebbline.data.CurveInput;
import ebbline.data.FitSummary;
import ebbline.data.ModelInput;
import ebbline.data.ModelWriter;
import ebbline.data.NumberText;
import ebbline.data.RateText;
import ebbline.fitting.Fit;
import ebbline.fitting.FitPoint;
import ebbline.fitting.Parameter;
import ebbline.fitting.VasicekCurveFit;
import ebbline.model.HullWhite;
import ebbline.model.Vasicek;
import ebbline.report.FitReport;
import ebbline.report.ResultRow;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Fits a model to today's curve. */
@Command(
    name = "calibrate",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Fits a short-rate model to today's curve (pricing measure) and writes it to a model file.",
      "vasicek: least squares on the curve's zero rates; any parameter can be held with --fix.",
      "hull-white: with --options FILE mean reversion and volatility are fitted to option quotes;"
          + " without, --mean-reversion and --volatility are given, the drift is matched to the curve"
          + " and the curve repriced through it as a check.",
      "vasicek with --options FILE: curve and option quotes together."
    },
    footer = {
      "",
      "A calculation aid, not advice.",
      "",
      "Examples (from the project's root):",
      "  java -jar target/ebbline.jar calibrate --model vasicek \\",
      "    --curve curves/saltmere.csv --fix volatility=0.9%%",
      "  java -jar target/ebbline.jar calibrate --model hull-white \\",
      "    --curve curves/saltmere.csv --options examples/option-quotes.csv"
    })
final class CalibrateCommand implements Callable<Integer> {
  @Mixin private MarketOptions market;
  @Mixin private ModelOptions model;

  @Option(
      names = "--fix",
      paramLabel = "NAME=VALUE",
      description =
          "hold a parameter (vasicek: short-rate, long-run-mean, mean-reversion, volatility;"
              + " hull-white with --options: mean-reversion); repeatable")
  private List<String> fixed = List.of();

  @Option(
      names = "--save",
      paramLabel = "FILE",
      description = "write the model to FILE, whole or not at all")
  private Path save;

  @Mixin private OptionFitOptions options;
  @Mixin private HolidayOptions holidays;
  @Mixin private OutputOptions output;

  @Override
  public Integer call() {
    if (!model.isGiven()) {
      throw new UsageProblem("--model is missing: vasicek or hull-white");
    }
    if (!options.isGiven()) {
      options.refuseWithoutQuotes();
    }
    if (model.isNamed("vasicek")) {
      return vasicek();
    } else if (model.isNamed("hull-white")) {
      return hullWhite();
    }
    throw UsageProblem.of("--model", model.text(), "expected vasicek or hull-white");
  }

  private int vasicek() {
    if (!model.parametersGiven().isEmpty()) {
      String option = model.parametersGiven().get(0);
      throw new UsageProblem(
          option + ": a fit finds it; hold it with --fix " + option.substring(2) + "=VALUE");
    }
    Map<Parameter, Double> held = held();
    CurveInput input = market.curve();
    if (options.isGiven()) {
      return calibration(input).vasicek(held);
    }
    FitGrid grid = FitGrid.of(input);
    Fit fit;
    try {
      fit =
          VasicekCurveFit.fit(
              grid.times(), grid.zeros(), held, VasicekCurveFit.Settings.standard());
    } catch (IllegalArgumentException e) {
      throw new UsageProblem(e.getMessage());
    }
    FitPoint best = fit.best();
    best.warnings().forEach(output::warn);
    if (fit instanceof Fit.Stopped stopped) {
      output.warn("the fit stopped: " + stopped.reason() + "; the best point found is shown");
    }
    Vasicek found =
        new Vasicek(
            best.value(Parameter.SHORT_RATE),
            best.value(Parameter.LONG_RUN_MEAN),
            best.value(Parameter.MEAN_REVERSION),
            best.value(Parameter.VOLATILITY));
    if (save != null) {
      ModelWriter.write(save, ModelInput.of(found, input.axis(), Optional.of(summary(fit, grid))));
      output.note("model written to " + save);
    }
    output.write(
        Inputs.envelope("calibrate", input.axis(), List.of(input.file()), List.of()),
        List.of(FitReport.vasicek(fit, grid.labels())));
    return (fit.isConverged() ? ExitStatus.DONE : ExitStatus.CHECK_FAILED).code();
  }

  private Map<Parameter, Double> held() {
    Map<Parameter, Double> held = new EnumMap<>(Parameter.class);
    for (String each : fixed) {
      int equals = each.indexOf('=');
      if (equals < 0) {
        throw UsageProblem.of("--fix", each, "expected NAME=VALUE, volatility=0.9%");
      }
      Parameter parameter = parameter(each.substring(0, equals).strip());
      double value =
          MarketOptions.read(
                  "--fix",
                  each.substring(equals + 1),
                  parameter == Parameter.MEAN_REVERSION ? NumberText::parse : RateText::parse)
              .orElseThrow();
      if (held.put(parameter, value) != null) {
        throw UsageProblem.of("--fix", each, "the parameter is held twice");
      }
    }
    return held;
  }

  private static Parameter parameter(String name) {
    String wanted = name.toLowerCase(Locale.ROOT).replace('-', '_');
    for (Parameter parameter : Parameter.values()) {
      if (parameter.label().equals(wanted)) {
        return parameter;
      }
    }
    throw UsageProblem.of(
        "--fix",
        name,
        "expected one of "
            + Arrays.stream(Parameter.values())
                .map(p -> p.label().replace('_', '-'))
                .collect(Collectors.joining(", ")));
  }

  private static FitSummary summary(Fit fit, FitGrid grid) {
    FitPoint best = fit.best();
    Map<String, Double> errors = new LinkedHashMap<>();
    List<Parameter> known = new ArrayList<>();
    for (Parameter parameter : best.uncertainty().identified()) {
      OptionalDouble error = best.uncertainty().standardError(parameter);
      if (error.isPresent()) {
        errors.put(parameter.label(), error.getAsDouble());
        known.add(parameter);
      }
    }
    List<List<Double>> covariance =
        known.stream()
            .map(
                one ->
                    known.stream()
                        .map(two -> best.uncertainty().covariance(one, two).orElseThrow())
                        .toList())
            .toList();
    List<FitSummary.Quote> quotes = new ArrayList<>();
    for (int i = 0; i < best.quotes().size(); i++) {
      quotes.add(
          new FitSummary.Quote(
              grid.labels().get(i),
              best.quotes().get(i).quote(),
              best.quotes().get(i).fitted(),
              best.quotes().get(i).error()));
    }
    return new FitSummary(
        "least squares in zero rates",
        best.rmse(),
        best.iterations(),
        fit.isConverged(),
        errors,
        covariance,
        quotes);
  }

  private OptionsCalibration calibration(CurveInput input) {
    return new OptionsCalibration(
        input, options, holidays.calendars(), Optional.ofNullable(save), output);
  }

  private int hullWhiteToOptions() {
    if (!model.parametersGiven().isEmpty()) {
      String option = model.parametersGiven().get(0);
      throw new UsageProblem(
          option
              + ": the fit finds it; mean reversion can be held with --fix mean-reversion=VALUE");
    }
    Map<Parameter, Double> held = held();
    OptionalDouble reversion = OptionalDouble.empty();
    for (Map.Entry<Parameter, Double> entry : held.entrySet()) {
      if (entry.getKey() != Parameter.MEAN_REVERSION) {
        throw new UsageProblem(
            "--fix: a Hull-White fit holds mean-reversion only, found " + entry.getKey().label());
      }
      reversion = OptionalDouble.of(entry.getValue());
    }
    return calibration(market.curve()).hullWhite(reversion);
  }

  private int hullWhite() {
    if (options.isGiven()) {
      return hullWhiteToOptions();
    }
    if (!fixed.isEmpty()) {
      throw new UsageProblem(
          "--fix: a Hull-White model is given its parameters, --mean-reversion and --volatility, or"
              + " fitted to --options FILE");
    }
    ModelInput built = model.model(market).orElseThrow();
    HullWhite parameters = built.hullWhite().orElseThrow();
    DiscountCurve curve = built.curve().orElseThrow();
    CurveInput input = market.curve();
    if (parameters.meanReversion() < 0) {
      output.warn("the mean reversion is negative: rates run away from the curve");
    }
    DriftReport drift = DriftReport.of(built.rates(), input);
    if (save != null) {
      ModelWriter.write(save, ModelInput.of(parameters, curve, built.axis(), Optional.empty()));
      output.note("model written to " + save);
    }
    ResultRow row = drift.result(parameters);
    output.write(
        Inputs.envelope("calibrate", built.axis(), List.of(built.file()), List.of()), List.of(row));
    if (!drift.isMet()) {
      output.warn("the curve is not repriced through the drift to " + DriftReport.LIMIT);
    }
    return (drift.isMet() ? ExitStatus.DONE : ExitStatus.CHECK_FAILED).code();
  }
}
