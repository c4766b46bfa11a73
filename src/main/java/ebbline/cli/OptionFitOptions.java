package ebbline.cli;

import ebbline.data.OptionQuotesFile;
import ebbline.data.OptionQuotesInput;
import ebbline.fitting.options.Objective;
import ebbline.fitting.options.OptionQuote;
import ebbline.pricing.Market;
import ebbline.time.CalendarRegistry;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import picocli.CommandLine.Option;

/** Quotes of options to calibrate to, and how. */
final class OptionFitOptions {
  private static final int ITERATIONS = 200;

  @Option(
      names = "--options",
      paramLabel = "FILE",
      description = "quotes of caps, swaptions and bond options to fit the model to")
  private String options;

  @Option(
      names = "--objective",
      paramLabel = "NAME",
      description =
          "unit in which errors are squared: normal (default), black or premium; premium where"
              + " options on bonds are among the quotes")
  private String objective;

  @Option(
      names = "--volatility-steps",
      paramLabel = "LIST",
      description =
          "hull-white: volatility constant between these moments, 1Y,2Y,5Y, or expiries for one"
              + " step an expiry")
  private String steps;

  @Option(
      names = "--bootstrap",
      description =
          "find the volatility steps one after the other, not together; needs --fix"
              + " mean-reversion=VALUE")
  private boolean bootstrap;

  @Option(
      names = "--max-iterations",
      paramLabel = "N",
      description = "stop a search after N steps (default: 200)")
  private Integer iterations;

  @Option(
      names = "--svg",
      paramLabel = "FILE",
      description = "hull-white: draw the profile of the errors over mean reversion")
  private Path svg;

  boolean isGiven() {
    return options != null;
  }

  /** Says which option makes no sense without quotes. */
  void refuseWithoutQuotes() {
    String[] names = {
      "--objective", "--volatility-steps", "--bootstrap", "--max-iterations", "--svg"
    };
    boolean[] given = {
      objective != null, steps != null, bootstrap, iterations != null, svg != null
    };
    for (int i = 0; i < names.length; i++) {
      if (given[i]) {
        throw new UsageProblem(names[i] + " needs --options FILE, the quotes to fit to");
      }
    }
  }

  String path() {
    return options;
  }

  Optional<Path> svg() {
    return Optional.ofNullable(svg);
  }

  boolean bootstrap() {
    return bootstrap;
  }

  boolean hasSteps() {
    return steps != null;
  }

  int iterations() {
    if (iterations == null) {
      return ITERATIONS;
    }
    if (iterations >= 1) {
      return iterations;
    }
    throw UsageProblem.of(
        "--max-iterations", iterations.toString(), "expected a number of at least 1");
  }

  OptionQuotesInput read(Market market, CalendarRegistry calendars) {
    return OptionQuotesFile.read(options, market, calendars);
  }

  /** The unit named, or the one that suits the quotes: bonds' volatilities are no rates. */
  Objective objective(List<OptionQuote> quotes) {
    Supplier<Objective> suited =
        () ->
            quotes.stream().allMatch(q -> q.terms().isOnRates())
                ? Objective.NORMAL
                : Objective.PREMIUM;
    return MarketOptions.read("--objective", objective, Objective::of).orElseGet(suited);
  }

  /** Ends of all steps but the last, years. */
  double[] stepEnds(TimeAxis axis, List<OptionQuote> quotes) {
    if (steps == null) {
      return new double[0];
    }
    if (steps.strip().equals("expiries")) {
      double[] expiries =
          quotes.stream()
              .filter(q -> q.weight() > 0)
              .mapToDouble(q -> q.terms().lastExpiry())
              .sorted()
              .distinct()
              .toArray();
      return java.util.Arrays.copyOf(expiries, Math.max(0, expiries.length - 1));
    }
    List<Double> ends = new ArrayList<>();
    for (String each : steps.split(",", -1)) {
      double end =
          MarketOptions.read(
                  "--volatility-steps", each, text -> axis.years(Moment.parse(text.strip())))
              .orElseThrow();
      double before = ends.isEmpty() ? 0 : ends.get(ends.size() - 1);
      if (!(end > before)) {
        throw UsageProblem.of(
            "--volatility-steps", steps, "the ends of steps lie after today and increase");
      }
      ends.add(end);
    }
    return ends.stream().mapToDouble(Double::doubleValue).toArray();
  }
}
