package ebbline.cli;

import ebbline.data.KernelSettings;
import ebbline.data.NumberText;
import ebbline.data.RateText;
import ebbline.time.Moment;
import java.util.OptionalDouble;
import java.util.function.Function;
import picocli.CommandLine.Option;

/** What Smith and Wilson's curve needs; each goes before the file's own setting. */
final class KernelOptions {
  @Option(
      names = "--ultimate-forward",
      paramLabel = "RATE",
      description = "smith-wilson: the forward rate at the far end, annual, 3.45%%")
  private String ultimateForward;

  @Option(
      names = "--convergence",
      paramLabel = "YEARS",
      description =
          "smith-wilson: where the forward is to have come near it, 60Y; the speed is"
              + " searched for it")
  private String convergence;

  @Option(
      names = "--speed",
      paramLabel = "NUMBER",
      description = "smith-wilson: speed of the approach per year, not searched then")
  private String speed;

  @Option(
      names = "--tolerance",
      paramLabel = "RATE",
      description = "smith-wilson: how near the forward has to come (default: 1bp)")
  private String tolerance;

  KernelSettings settings() {
    return new KernelSettings(
        number("--ultimate-forward", ultimateForward, RateText::parse),
        number("--convergence", convergence, KernelOptions::years),
        number("--speed", speed, NumberText::parse),
        number("--tolerance", tolerance, RateText::parse));
  }

  private static OptionalDouble number(
      String option, String text, Function<String, Double> reader) {
    return MarketOptions.read(option, text, reader)
        .map(OptionalDouble::of)
        .orElse(OptionalDouble.empty());
  }

  private static double years(String text) {
    Moment moment = Moment.parse(text);
    if (moment instanceof Moment.InYears number) {
      return number.years();
    } else if (moment instanceof Moment.After after) {
      return after.tenor().years();
    }
    throw new IllegalArgumentException("expected a length of time, 60Y or 60");
  }
}
