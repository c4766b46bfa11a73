package ebbline.cli;

import ebbline.data.ModelFile;
import ebbline.data.ModelInput;
import ebbline.data.NumberText;
import ebbline.data.RateText;
import ebbline.data.SourceFile;
import ebbline.model.VolatilitySteps;
import java.util.Optional;
import java.util.OptionalDouble;
import picocli.CommandLine.Option;

/** The short rate's movements, which part a future from a forward. */
final class ConvexityOptions {
  @Option(
      names = "--mean-reversion",
      paramLabel = "NUMBER",
      description = "for the convexity of futures: speed of reversion per year (default: 0)")
  private String meanReversion;

  @Option(
      names = "--volatility",
      paramLabel = "RATE",
      description = "for the convexity of futures: volatility of the short rate per year, 0.9%%")
  private String volatility;

  @Option(
      names = "--model",
      paramLabel = "FILE",
      description = "take both from a model file of calibrate")
  private String model;

  /** Mean reversion and volatility, as far as given, and the file they come from. */
  record Convexity(
      OptionalDouble meanReversion, OptionalDouble volatility, Optional<SourceFile> file) {}

  Convexity read() {
    if (model == null) {
      return new Convexity(
          MarketOptions.read("--mean-reversion", meanReversion, NumberText::parse)
              .map(OptionalDouble::of)
              .orElse(OptionalDouble.empty()),
          MarketOptions.read("--volatility", volatility, ConvexityOptions::volatility)
              .map(OptionalDouble::of)
              .orElse(OptionalDouble.empty()),
          Optional.empty());
    }
    if (meanReversion != null || volatility != null) {
      throw new UsageProblem(
          "--model: the model file holds mean reversion and volatility; leave the other options out");
    }
    ModelInput input = ModelFile.read(model);
    double reversion;
    double moves;
    if (input.vasicek().isPresent()) {
      reversion = input.vasicek().get().meanReversion();
      moves = input.vasicek().get().volatility();
    } else {
      VolatilitySteps steps = input.hullWhite().orElseThrow().volatility();
      if (!steps.isConstant()) {
        throw UsageProblem.of(
            "--model", model, "the convexity of futures needs a model with one volatility");
      }
      reversion = input.hullWhite().get().meanReversion();
      moves = steps.value(0);
    }
    return new Convexity(OptionalDouble.of(reversion), OptionalDouble.of(moves), input.file());
  }

  private static double volatility(String text) {
    double value = RateText.parse(text);
    if (value >= 0) {
      return value;
    }
    throw new IllegalArgumentException("a volatility is at least 0");
  }
}
