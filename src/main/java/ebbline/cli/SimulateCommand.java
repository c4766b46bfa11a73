package ebbline.cli;

import ebbline.data.AtomicFile;
import ebbline.data.ModelInput;
import ebbline.data.Step;
import ebbline.report.ResultRow;
import ebbline.report.SimulateReport;
import ebbline.risk.HorizonLaw;
import ebbline.risk.ShortRatePaths;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.io.IOException;
import java.io.Writer;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.NavigableSet;
import java.util.TreeSet;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Shows the law of the short rate at horizons, and draws its paths. */
@Command(
    name = "simulate",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Shows the distribution of the short rate at horizons: the exact law, and beside it what"
          + " simulated paths say. Steps are drawn from their exact law, so their length does not"
          + " matter. The law holds under the model file's own measure, historical or risk-neutral."
    },
    footer = {
      "",
      "A calculation aid, not advice.",
      "",
      "Examples (from the project's root):",
      "  java -jar target/ebbline.jar simulate --model vasicek --short-rate 4%% \\",
      "    --long-run-mean 3%% --mean-reversion 0.2 --volatility 0.9%% --horizons 1Y,5Y",
      "  java -jar target/ebbline.jar simulate --model hull-white --curve \\",
      "    curves/saltmere.csv --mean-reversion 0.05 --volatility 0.9%% --horizons 5Y \\",
      "    --paths 100 --path-step 6M --paths-out target/saltmere-paths.csv"
    })
final class SimulateCommand implements Callable<Integer> {
  @Mixin private MarketOptions market;
  @Mixin private ModelOptions model;

  @Option(
      names = "--horizons",
      paramLabel = "MOMENT",
      split = ",",
      defaultValue = "1Y,2Y,5Y,10Y",
      description = "dates, tenors or years, joined by commas (default: 1Y,2Y,5Y,10Y)")
  private List<String> horizons;

  @Option(
      names = "--paths",
      paramLabel = "N",
      defaultValue = "10000",
      description = "paths to draw (default: 10000); 0: the exact law alone")
  private int paths;

  @Option(
      names = "--paths-out",
      paramLabel = "FILE",
      description = "write the paths to FILE, CSV: path, time, rate")
  private Path pathsOut;

  @Option(
      names = "--path-step",
      paramLabel = "STEP",
      description = "points of the paths between today and the last horizon: 1M, 1/250, 0.5")
  private String pathStep;

  @Mixin private OutputOptions output;

  @Override
  public Integer call() {
    if (!model.isGiven()) {
      throw new UsageProblem(
          "--model is missing: a model file of estimate or calibrate, vasicek or hull-white");
    }
    requirePaths();
    ModelInput input = model.anyMeasure(market);
    NavigableSet<Double> wanted = horizons(input.axis());
    NavigableSet<Double> times = new TreeSet<>(wanted);
    MarketOptions.read("--path-step", pathStep, Step::parse)
        .ifPresent(step -> addSteps(times, step.years(), wanted.last()));
    List<ResultRow> exact = new ArrayList<>();
    List<ResultRow> simulated = new ArrayList<>();
    try {
      HorizonLaw.of(input.rates(), array(wanted)).forEach(l -> exact.add(SimulateReport.exact(l)));
      if (paths > 0) {
        ShortRatePaths drawn =
            ShortRatePaths.draw(
                input.rates(), array(times), paths, output.seed(), output.threads());
        for (int k = 0; k < drawn.laws().size(); k++) {
          if (wanted.contains(drawn.laws().get(k).time())) {
            simulated.add(SimulateReport.simulated(drawn.laws().get(k), drawn.sample(k)));
          }
        }
        write(drawn);
      }
    } catch (IllegalArgumentException e) {
      throw new UsageProblem(e.getMessage());
    }
    output.note("law under the " + input.measure().label() + " measure");
    ResultRow.Builder beside = ResultRow.builder().text("measure", input.measure().label());
    if (paths > 0) {
      beside.count("paths", paths).count("seed", output.seed()).rows("simulation", simulated);
    }
    output.write(
        Inputs.envelope("simulate", input.axis(), List.of(input.file()), List.of()),
        exact,
        beside.build());
    return ExitStatus.DONE.code();
  }

  private void requirePaths() {
    if (!(paths == 0 || paths >= 100)) {
      throw UsageProblem.of("--paths", Integer.toString(paths), "expected 0 or at least 100");
    }
    if (paths == 0 && pathsOut != null) {
      throw new UsageProblem("--paths-out: --paths 0 draws none");
    }
    if (pathStep != null && pathsOut == null) {
      throw new UsageProblem("--path-step needs --paths-out, the file that shows the paths");
    }
  }

  private NavigableSet<Double> horizons(TimeAxis axis) {
    NavigableSet<Double> times = new TreeSet<>();
    for (String text : horizons) {
      times.add(MarketOptions.read("--horizons", text, t -> horizon(t, axis)).orElseThrow());
    }
    return times;
  }

  private static double horizon(String text, TimeAxis axis) {
    double years = axis.years(Moment.parse(text));
    if (years >= 0) {
      return years;
    }
    throw new IllegalArgumentException("a horizon is not before today");
  }

  private static void addSteps(NavigableSet<Double> times, double step, double last) {
    if (!(last / step <= ShortRatePaths.MOST_FIGURES)) {
      throw new UsageProblem("--path-step: too many points until the last horizon");
    }
    for (int i = 0; i * step < last; i++) {
      Double near = times.ceiling(i * step - TimeAxis.SAME_MOMENT);
      if (near == null || near > i * step + TimeAxis.SAME_MOMENT) {
        times.add(i * step);
      }
    }
  }

  private static double[] array(NavigableSet<Double> times) {
    return times.stream().mapToDouble(Double::doubleValue).toArray();
  }

  private void write(ShortRatePaths drawn) {
    if (pathsOut == null) {
      return;
    }
    AtomicFile.write(pathsOut, writer -> write(writer, drawn));
    output.note(paths + " paths written to " + pathsOut);
  }

  private static void write(Writer writer, ShortRatePaths drawn) throws IOException {
    writer.write("path,time,rate\n");
    for (int i = 0; i < drawn.count(); i++) {
      for (int k = 0; k < drawn.laws().size(); k++) {
        writer.write((i + 1) + "," + drawn.laws().get(k).time() + "," + drawn.rate(i, k) + "\n");
      }
    }
  }
}
