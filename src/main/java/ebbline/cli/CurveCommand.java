package ebbline.cli;

import ebbline.curve.DiscountCurve;
import ebbline.data.CurveInput;
import ebbline.report.ResultRow;
import ebbline.time.Moment;
import java.util.ArrayList;
import java.util.List;
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
    description =
        "Reads a discount curve and shows discount factors, zero rates (continuous) and instantaneous"
            + " forward rates, at its nodes or at the maturities given.",
    footer = {
      "",
      "A calculation aid, not advice.",
      "",
      "Examples (from the project's root):",
      "  java -jar target/ebbline.jar curve --curve curves/saltmere.csv",
      "  java -jar target/ebbline.jar curve --curve curves/saltmere-svensson.csv \\",
      "    --at 1Y,5Y,10Y,2036-11-30 --format csv"
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

  @Mixin private OutputOptions output;

  @Override
  public Integer call() {
    CurveInput input = market.curve();
    List<ResultRow> rows = new ArrayList<>();
    if (at.isEmpty() && !input.labels().isEmpty()) {
      double[] nodes = input.curve().nodes();
      for (int i = 0; i < nodes.length; i++) {
        rows.add(row(input.labels().get(i), nodes[i], input.curve()));
      }
    } else {
      for (String maturity : at.isEmpty() ? GRID : at) {
        rows.add(row(maturity.strip(), time(maturity, input), input.curve()));
      }
    }
    output.write(Inputs.envelope("curve", input.axis(), List.of(input.file()), List.of()), rows);
    return ExitStatus.DONE.code();
  }

  private static double time(String maturity, CurveInput input) {
    double time =
        MarketOptions.read("--at", maturity, text -> input.axis().years(Moment.parse(text)))
            .orElseThrow();
    if (!(time >= 0)) {
      throw UsageProblem.of("--at", maturity, "a maturity must not lie before the as-of date");
    }
    if (Double.isFinite(input.curve().discount(time))) {
      return time;
    }
    throw UsageProblem.of(
        "--at", maturity, "the curve's discount factor there is larger than can be counted");
  }

  private static ResultRow row(String maturity, double time, DiscountCurve curve) {
    return ResultRow.builder()
        .text("maturity", maturity)
        .number("time", time, 6)
        .number("discount", curve.discount(time), 8)
        .rate("zero", curve.zero(time))
        .rate("forward", curve.forward(time))
        .build();
  }
}
