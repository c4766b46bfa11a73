package ebbline.cli;

import ebbline.data.RateText;
import ebbline.data.Step;
import ebbline.fitting.history.BiasCorrection;
import ebbline.fitting.history.HistoryMethod;
import ebbline.fitting.history.Resampling;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** How a history is read and estimated. */
final class EstimateOptions {
  static final String PANEL = "panel";

  /** Simulated rates in all, at which the default number of replications begins to fall. */
  private static final double BUDGET = 1e8;

  @Parameters(
      arity = "0..1",
      paramLabel = "FILE",
      description = "the history of a rate, or the panel of yields")
  private String file;

  @Option(names = "--history", paramLabel = "FILE", description = "the same as FILE")
  private String history;

  @Option(
      names = "--method",
      paramLabel = "NAME",
      defaultValue = "ols",
      description = "ols (default), exact, stationary or yule-walker for one rate; panel")
  private String method;

  @Option(
      names = "--step",
      paramLabel = "STEP",
      description =
          "from one row to the next: 1M, 1/250, 0.25; overrides the file's; without it the dates"
              + " count, act/365f")
  private String step;

  @Option(
      names = "--column",
      paramLabel = "NAME",
      description = "which of several columns of rates")
  private String column;

  @Option(
      names = "--confidence",
      paramLabel = "SHARE",
      defaultValue = "95%",
      description = "of the intervals (default: 95%%)")
  private String confidence;

  @Option(
      names = "--bias",
      paramLabel = "NAME",
      description = "bootstrap (default), analytic or jackknife: correction shown beside kappa")
  private String bias;

  @Option(
      names = "--replications",
      paramLabel = "N",
      description = "simulated histories (default: 1999; fewer, at least 99, on long histories)")
  private Integer replications;

  @Option(
      names = "--horizons",
      paramLabel = "TIME",
      split = ",",
      description = "law of the rate at these horizons: tenors or years, joined by commas")
  private List<String> horizons = List.of();

  @Option(
      names = "--window",
      paramLabel = "N",
      description = "estimate in rolling windows of N rates too")
  private Integer window;

  @Option(
      names = "--window-step",
      paramLabel = "N",
      description = "rates from one window to the next (default: a quarter of a window)")
  private Integer windowStep;

  @Option(
      names = "--filtered",
      paramLabel = "FILE",
      description = "panel: write the filtered short rate to FILE, CSV")
  private Path filtered;

  @Option(
      names = "--save",
      paramLabel = "FILE",
      description =
          "write the model to FILE: historical, or with --curve risk-neutral with the market price"
              + " of risk")
  private Path save;

  @Option(
      names = "--measure",
      paramLabel = "NAME",
      description = "of the saved model: historical, or risk-neutral (--curve, or a panel)")
  private String measure;

  String file() {
    if (file != null && history != null) {
      throw new UsageProblem("--history: the file is named twice");
    }
    if (file == null && history == null) {
      throw new UsageProblem("--history FILE is missing: the history to estimate from");
    }
    return file == null ? history : file;
  }

  boolean isPanel() {
    return method.toLowerCase(Locale.ROOT).equals(PANEL);
  }

  HistoryMethod method() {
    for (HistoryMethod each : HistoryMethod.values()) {
      if (each.label().equals(method.toLowerCase(Locale.ROOT))) {
        return each;
      }
    }
    throw UsageProblem.of(
        "--method",
        method,
        "expected one of "
            + Arrays.stream(HistoryMethod.values())
                .map(HistoryMethod::label)
                .collect(Collectors.joining(", "))
            + ", panel");
  }

  Optional<Step> step() {
    return MarketOptions.read("--step", step, Step::parse);
  }

  Optional<String> column() {
    return Optional.ofNullable(column);
  }

  double confidence() {
    double share = MarketOptions.read("--confidence", confidence, RateText::parse).orElseThrow();
    if (share >= 0.5 && share <= 0.999) {
      return share;
    }
    throw UsageProblem.of("--confidence", confidence, "expected a share from 50% to 99.9%");
  }

  BiasCorrection.Kind bias() {
    if (bias == null) {
      return BiasCorrection.Kind.BOOTSTRAP;
    }
    for (BiasCorrection.Kind kind : BiasCorrection.Kind.values()) {
      if (kind.label().equals(bias.toLowerCase(Locale.ROOT))) {
        return kind;
      }
    }
    throw UsageProblem.of("--bias", bias, "expected bootstrap, analytic or jackknife");
  }

  /**
   * How much to simulate: the number asked for, or one that keeps the work bounded.
   *
   * @param cost of simulating and estimating one history, in simulated rates
   */
  Resampling resampling(double cost, long seed) {
    if (replications == null) {
      return new Resampling((int) Math.max(99, Math.min(1999, BUDGET / cost)), seed);
    }
    try {
      return new Resampling(replications, seed);
    } catch (IllegalArgumentException e) {
      throw UsageProblem.of("--replications", replications.toString(), e.getMessage());
    }
  }

  List<String> horizonLabels() {
    return horizons;
  }

  List<Double> horizons() {
    List<Double> years = new ArrayList<>();
    for (String text : horizons) {
      years.add(MarketOptions.read("--horizons", text, EstimateOptions::horizon).orElseThrow());
    }
    return years;
  }

  private static double horizon(String text) {
    if (Moment.parse(text) instanceof Moment.OnDate) {
      throw new IllegalArgumentException("expected a tenor such as 1Y or a number of years");
    }
    double years = TimeAxis.undated().years(Moment.parse(text));
    if (years >= 0) {
      return years;
    }
    throw new IllegalArgumentException("a horizon is not before today");
  }

  /** Rates in a rolling window; empty where none are asked for. */
  Optional<Integer> window() {
    if (window == null && windowStep != null) {
      throw new UsageProblem("--window-step needs --window, the length of a window");
    }
    return Optional.ofNullable(window);
  }

  int windowStep() {
    return windowStep == null ? Math.max(1, window / 4) : windowStep;
  }

  Optional<Path> filtered() {
    return Optional.ofNullable(filtered);
  }

  Optional<Path> save() {
    return Optional.ofNullable(save);
  }

  /**
   * Whether the saved model is risk-neutral.
   *
   * @param usual what is saved if nobody says otherwise
   */
  boolean savesRiskNeutral(boolean usual) {
    if (measure == null) {
      return usual;
    }
    if (save == null) {
      throw new UsageProblem("--measure needs --save FILE, the model it is about");
    }
    return switch (measure.toLowerCase(Locale.ROOT)) {
      case "historical" -> false;
      case "risk-neutral" -> true;
      default -> throw UsageProblem.of("--measure", measure, "expected historical or risk-neutral");
    };
  }

  /** Options that only a single rate takes, where a panel is estimated. */
  void refuseForPanel() {
    refuse("--column", column);
    refuse("--bias", bias);
    refuse("--replications", replications);
    refuse("--window", window);
    refuse("--window-step", windowStep);
    refuse("--horizons", horizons.isEmpty() ? null : horizons);
  }

  private static void refuse(String option, Object given) {
    if (given != null) {
      throw new UsageProblem(option + ": it belongs to the history of one rate, not to a panel");
    }
  }
}
