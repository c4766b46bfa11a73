package ebbline.cli;

import ebbline.curve.DiscountCurve;
import ebbline.data.CurveInput;
import ebbline.data.CurveWriter;
import ebbline.report.Cell;
import ebbline.report.QuoteReport;
import ebbline.report.ResultRow;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Shows a discount curve. */
@Command(
    name = "curve",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Reads a discount curve, or builds one from market quotes, and shows discount factors, zero rates"
          + " (continuous) and instantaneous forward rates, at its nodes or at the maturities given.",
      "With quotes it also shows every quote beside the curve's own; a quote that is not met to 1e-12"
          + " and a fit whose parameters mean nothing are named (exit status 1)."
    },
    footer = {
      "",
      "A calculation aid, not advice.",
      "",
      "Examples (from the project's root):",
      "  java -jar target/ebbline.jar curve --curve curves/saltmere-svensson.csv \\",
      "    --at 1Y,5Y,10Y,2036-11-30 --format csv",
      "  java -jar target/ebbline.jar curve --quotes curves/saltmere-quotes.csv \\",
      "    --interpolation cubic --save target/saltmere-built.csv"
    })
final class CurveCommand implements Callable<Integer> {
  /** Where a curve from a formula is shown if nobody says otherwise, years. */
  private static final List<String> GRID =
      List.of("0.25", "0.5", "1", "2", "3", "5", "7", "10", "15", "20", "30");

  @Mixin private MarketOptions market;

  @Option(
      names = "--at",
      paramLabel = "MATURITY",
      split = ",",
      description = "maturities to show, dates, tenors or years, joined by commas (default: nodes)")
  private List<String> at = List.of();

  @Mixin private QuoteOptions quotes;

  @Option(
      names = "--save",
      paramLabel = "FILE",
      description = "write the curve to FILE, whole or not at all; it reads back to the same bits")
  private Path save;

  @Mixin private DrawingOptions drawing;
  @Mixin private OutputOptions output;

  @Override
  public Integer call() {
    drawing.check(output.format());
    Optional<BuiltCurve> built = quotes.build(market);
    return built.isPresent() ? built(built.get()) : read(market.curve(quotes.kernel()));
  }

  private int read(CurveInput input) {
    List<ResultRow> rows = new ArrayList<>();
    List<Double> marks = Arrays.stream(input.curve().nodes()).boxed().toList();
    if (at.isEmpty() && !input.labels().isEmpty()) {
      double[] nodes = input.curve().nodes();
      for (int i = 0; i < nodes.length; i++) {
        rows.add(QuoteReport.point(input.labels().get(i), nodes[i], input.curve()));
      }
    } else {
      rows.addAll(rows(at.isEmpty() ? GRID : at, input.curve(), input.axis()));
    }
    save(input.curve(), input.axis());
    drawing.picture(input.curve(), input.axis(), rows, marks, output);
    output.write(Inputs.envelope("curve", input.axis(), List.of(input.file()), List.of()), rows);
    drawing.plot(input.curve(), rows, marks, output);
    return ExitStatus.DONE.code();
  }

  private int built(BuiltCurve built) {
    List<ResultRow> rows = new ArrayList<>();
    if (at.isEmpty()) {
      for (double time : built.shown()) {
        rows.add(QuoteReport.point(CurveWriter.maturity(time, built.axis()), time, built.curve()));
      }
    } else {
      rows.addAll(rows(at, built.curve(), built.axis()));
    }
    built.warnings().forEach(output::warn);
    if (!built.problem().isEmpty()) {
      output.warn(built.problem());
    }
    save(built.curve(), built.axis());
    drawing.picture(built.curve(), built.axis(), rows, built.shown(), output);
    output.write(
        Inputs.envelope(
            "curve", built.axis(), built.files().stream().map(Optional::of).toList(), List.of()),
        rows,
        ResultRow.builder()
            .rows("quotes", built.quotes())
            .put("fit", new Cell.Group(built.fit()))
            .build());
    drawing.plot(built.curve(), rows, built.shown(), output);
    return (built.problem().isEmpty() ? ExitStatus.DONE : ExitStatus.CHECK_FAILED).code();
  }

  private void save(DiscountCurve curve, TimeAxis axis) {
    if (save == null) {
      return;
    }
    try {
      CurveWriter.write(save, curve, axis);
    } catch (IllegalArgumentException e) {
      throw UsageProblem.of("--save", save.toString(), e.getMessage());
    }
    output.note("curve written to " + save);
  }

  private static List<ResultRow> rows(List<String> maturities, DiscountCurve curve, TimeAxis axis) {
    return maturities.stream()
        .map(m -> QuoteReport.point(m.strip(), time(m, curve, axis), curve))
        .toList();
  }

  private static double time(String maturity, DiscountCurve curve, TimeAxis axis) {
    double time =
        MarketOptions.read("--at", maturity, text -> axis.years(Moment.parse(text))).orElseThrow();
    if (!(time >= 0)) {
      throw UsageProblem.of("--at", maturity, "a maturity must not lie before the as-of date");
    }
    if (Double.isFinite(curve.discount(time))) {
      return time;
    }
    throw UsageProblem.of(
        "--at", maturity, "the curve's discount factor there is larger than can be counted");
  }
}
