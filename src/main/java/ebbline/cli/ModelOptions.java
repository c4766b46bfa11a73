package ebbline.cli;

import ebbline.data.CurveInput;
import ebbline.data.ModelFile;
import ebbline.data.ModelInput;
import ebbline.data.NumberText;
import ebbline.data.RateText;
import ebbline.model.HullWhite;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Function;
import picocli.CommandLine.Option;

/** The short-rate model: a file, or a name with its parameters. */
final class ModelOptions {
  @Option(
      names = "--model",
      paramLabel = "FILE|vasicek|hull-white",
      description = "a model file of calibrate or estimate, or a name with its parameters below")
  private String model;

  @Option(
      names = "--short-rate",
      paramLabel = "RATE",
      description = "Vasicek: the short rate today, 5%%")
  private String shortRate;

  @Option(
      names = "--long-run-mean",
      paramLabel = "RATE",
      description = "Vasicek: the mean to which the short rate reverts, 8%%")
  private String longRunMean;

  @Option(
      names = "--mean-reversion",
      paramLabel = "NUMBER",
      description = "speed of reversion per year, 0.1; 0 is no reversion")
  private String meanReversion;

  @Option(
      names = "--volatility",
      paramLabel = "RATE",
      description = "volatility of the short rate per year, 1.5%%")
  private String volatility;

  boolean isNamed(String name) {
    return model != null && model.toLowerCase(Locale.ROOT).equals(name);
  }

  boolean isGiven() {
    return model != null;
  }

  String text() {
    return model;
  }

  /** The parameters that are on the command line, by option. */
  List<String> parametersGiven() {
    List<String> given = new ArrayList<>();
    addIf(given, "--short-rate", shortRate);
    addIf(given, "--long-run-mean", longRunMean);
    addIf(given, "--mean-reversion", meanReversion);
    addIf(given, "--volatility", volatility);
    return given;
  }

  private static void addIf(List<String> given, String option, String text) {
    if (text != null) {
      given.add(option);
    }
  }

  /** The model of a command that needs one and takes it under either measure. */
  ModelInput anyMeasure(MarketOptions market) {
    if (isNamed("vasicek") || isNamed("hull-white")) {
      return model(market).orElseThrow();
    }
    return read(market);
  }

  /** The model, read or put together; empty where none is named. */
  Optional<ModelInput> model(MarketOptions market) {
    if (model == null) {
      if (!parametersGiven().isEmpty()) {
        throw new UsageProblem(
            parametersGiven().get(0) + " needs --model vasicek or --model hull-white");
      }
      return Optional.empty();
    }
    if (isNamed("vasicek")) {
      return Optional.of(vasicek(market));
    } else if (isNamed("hull-white")) {
      return Optional.of(hullWhite(market));
    }
    return Optional.of(file(market));
  }

  private ModelInput vasicek(MarketOptions market) {
    if (market.hasCurve()) {
      throw new UsageProblem(
          "--curve: Vasicek's parameters make a curve of their own; leave --curve out, or lay"
              + " --model hull-white over it");
    }
    Vasicek parameters =
        new Vasicek(
            rate("--short-rate", shortRate),
            rate("--long-run-mean", longRunMean),
            number("--mean-reversion", meanReversion),
            volatility());
    TimeAxis axis = market.asOf().map(TimeAxis::from).orElse(TimeAxis.undated());
    return ModelInput.of(parameters, axis, Optional.empty());
  }

  private ModelInput hullWhite(MarketOptions market) {
    for (String option : parametersGiven()) {
      if (option.equals("--short-rate") || option.equals("--long-run-mean")) {
        throw new UsageProblem(
            option + ": a Hull-White model takes both from its curve; leave it out");
      }
    }
    HullWhite parameters = hullWhiteParameters();
    if (!market.hasCurve()) {
      throw new UsageProblem("--model hull-white needs --curve FILE, the curve it is laid over");
    }
    CurveInput curve = market.curve();
    return new ModelInput(
        ModelInput.Measure.RISK_NEUTRAL,
        curve.axis(),
        Optional.empty(),
        Optional.of(parameters),
        Optional.of(curve.curve()),
        java.util.OptionalDouble.empty(),
        Optional.empty(),
        curve.file());
  }

  HullWhite hullWhiteParameters() {
    return new HullWhite(
        number("--mean-reversion", meanReversion), VolatilitySteps.constant(volatility()));
  }

  private ModelInput file(MarketOptions market) {
    ModelInput read = read(market);
    if (read.measure() == ModelInput.Measure.HISTORICAL) {
      throw InputProblems.of(
          new InputProblem(
              model,
              0,
              "",
              "historical",
              "a model under the historical measure gives no prices; use one of calibrate, or of"
                  + " estimate with --curve"));
    }
    return read;
  }

  private ModelInput read(MarketOptions market) {
    if (!parametersGiven().isEmpty()) {
      throw new UsageProblem(
          parametersGiven().get(0) + ": the model file holds its parameters already; leave it out");
    }
    if (market.hasCurve()) {
      throw new UsageProblem("--curve: the model file holds its curve already; leave it out");
    }
    ModelInput read = ModelFile.read(model);
    if (market.asOf().isPresent() && !market.asOf().equals(read.axis().asOf())) {
      if (read.axis().asOf().isPresent()) {
        throw new UsageProblem(
            "--as-of: the model file is as of "
                + read.axis().asOf().get()
                + "; calibrate it anew for another day");
      }
      return new ModelInput(
          read.measure(),
          TimeAxis.from(market.asOf().get(), read.axis().basis()),
          read.vasicek(),
          read.hullWhite(),
          read.curve(),
          read.marketPriceOfRisk(),
          read.fit(),
          read.file());
    }
    return read;
  }

  private double volatility() {
    double value = rate("--volatility", volatility);
    if (value >= 0) {
      return value;
    }
    throw UsageProblem.of("--volatility", volatility, "a volatility is at least 0");
  }

  private double rate(String option, String text) {
    return required(option, text, RateText::parse);
  }

  private double number(String option, String text) {
    return required(option, text, NumberText::parse);
  }

  private double required(String option, String text, Function<String, Double> reader) {
    return MarketOptions.read(option, text, reader)
        .orElseThrow(() -> new UsageProblem("--model " + model + " needs " + option));
  }
}
