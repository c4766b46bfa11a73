package ebbline.cli;

import ebbline.curve.DiscountCurve;
import ebbline.data.AtomicFile;
import ebbline.report.Cell;
import ebbline.report.CurvePlot;
import ebbline.report.CurveSvg;
import ebbline.report.OutputFormat;
import ebbline.report.ResultRow;
import ebbline.time.TimeAxis;
import java.nio.file.Path;
import java.util.List;
import picocli.CommandLine.Option;

/** A curve's rates as a drawing. */
final class DrawingOptions {
  @Option(
      names = "--plot",
      description = "draw zero and forward rates in plain characters below the table")
  private boolean plot;

  @Option(
      names = "--svg",
      paramLabel = "FILE",
      description = "draw zero and forward rates as a picture for a paper")
  private Path svg;

  void check(OutputFormat format) {
    if (plot && format != OutputFormat.TABLE) {
      throw new UsageProblem(
          "--plot draws below a table; leave --format out, or write a picture with --svg FILE");
    }
  }

  /**
   * Writes the picture, if one is wanted.
   *
   * @param marks times at which the zero rate is marked
   */
  void picture(
      DiscountCurve curve,
      TimeAxis axis,
      List<ResultRow> rows,
      List<Double> marks,
      OutputOptions output) {
    if (svg != null) {
      String title = axis.asOf().map(day -> "Rates of " + day).orElse("Rates");
      String picture = CurveSvg.draw(curve, horizon(rows, marks), marks, title);
      AtomicFile.write(svg, file -> file.write(picture));
      output.note("picture written to " + svg);
    }
  }

  void plot(DiscountCurve curve, List<ResultRow> rows, List<Double> marks, OutputOptions output) {
    if (plot) {
      output.show("\n" + CurvePlot.draw(curve, horizon(rows, marks)));
    }
  }

  /** As far as the results go, or the nodes; a year where neither goes beyond today. */
  private static double horizon(List<ResultRow> rows, List<Double> marks) {
    double last = marks.stream().mapToDouble(t -> t).max().orElse(0);
    for (ResultRow row : rows) {
      if (row.cells().get("time") instanceof Cell.Amount time) {
        last = Math.max(last, time.value());
      }
    }
    return last > 0 ? last : 1;
  }
}
