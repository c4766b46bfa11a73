package ebbline.report;

import ebbline.curve.DiscountCurve;
import ebbline.curve.SmithWilsonCurve;
import ebbline.fitting.FittedQuote;
import ebbline.fitting.quotes.CurveFit;
import ebbline.fitting.quotes.ParametricFit;
import ebbline.fitting.quotes.SheetQuote;
import java.util.ArrayList;
import java.util.List;

/** How well a curve meets the quotes it was made from. */
public final class QuoteReport {
  private QuoteReport() {}

  /** One point of a curve. */
  public static ResultRow point(String maturity, double time, DiscountCurve curve) {
    return ResultRow.builder()
        .text("maturity", maturity)
        .number("time", time, 6)
        .number("discount", curve.discount(time), 8)
        .rate("zero", curve.zero(time))
        .rate("forward", curve.forward(time))
        .build();
  }

  /** Every quote beside the curve's own; prices per 100, rates as rates. */
  public static List<ResultRow> quotes(List<SheetQuote> sheet, List<FittedQuote> fitted) {
    List<ResultRow> rows = new ArrayList<>();
    for (int i = 0; i < fitted.size(); i++) {
      SheetQuote quote = sheet.get(i);
      FittedQuote fit = fitted.get(i);
      ResultRow.Builder row =
          ResultRow.builder().text("id", quote.id()).text("instrument", quote.kind().label());
      if (quote.priced()) {
        row.number("quote", fit.quote(), 6)
            .number("fitted", fit.fitted(), 6)
            .number("error", fit.error(), 6);
      } else {
        row.rate("quote", fit.quote()).rate("fitted", fit.fitted()).rate("error", fit.error());
      }
      rows.add(row.build());
    }
    return rows;
  }

  /** The points of a curve beside those of the formula fitted to it. */
  public static List<ResultRow> zeros(List<String> labels, List<FittedQuote> fitted) {
    List<ResultRow> rows = new ArrayList<>();
    for (int i = 0; i < fitted.size(); i++) {
      rows.add(
          ResultRow.builder()
              .text("id", labels.get(i))
              .text("instrument", "zero")
              .rate("quote", fitted.get(i).quote())
              .rate("fitted", fitted.get(i).fitted())
              .rate("error", fitted.get(i).error())
              .build());
    }
    return rows;
  }

  /**
   * What a curve through nodes or kernels came to.
   *
   * @param method as the results call it
   * @param interpolation the same
   */
  public static ResultRow fit(
      CurveFit fit, List<SheetQuote> sheet, String method, String interpolation) {
    ResultRow.Builder row =
        ResultRow.builder()
            .text("method", method)
            .text("interpolation", interpolation)
            .count("nodes", fit.curve().nodes().length);
    if (fit.curve() instanceof SmithWilsonCurve kernels) {
      row.rate("ultimate_forward", kernels.ultimateForward()).number("speed", kernels.speed(), 6);
    }
    double squares = 0;
    double largest = 0;
    for (int i = 0; i < sheet.size(); i++) {
      double error = fit.quotes().get(i).error();
      double weighted = sheet.get(i).equation().weight() * error * error;
      squares += weighted;
      largest = Math.max(largest, weighted);
    }
    row.magnitude("sum_of_squares", squares)
        .magnitude("largest_weighted_error", Math.sqrt(largest))
        .number("condition_number", fit.condition(), 1)
        .count("iterations", fit.steps())
        .flag("converged", fit.isConverged());
    if (!fit.outliers().isEmpty()) {
      row.text("outliers", String.join(", ", fit.outliers()));
    }
    if (!fit.isConverged()) {
      row.text("problem", fit.problem());
    }
    return row.build();
  }

  /** What a fit of a formula came to. */
  public static ResultRow fit(ParametricFit fit) {
    ResultRow.Builder row =
        ResultRow.builder().text("method", "least-squares").text("form", fit.form().label());
    for (int i = 0; i < fit.form().betas(); i++) {
      row.rate("beta" + i, fit.curve().betas()[i]);
    }
    for (int i = 0; i < fit.form().taus(); i++) {
      row.number("tau" + (i + 1), fit.curve().taus()[i], 6);
    }
    row.magnitude("sum_of_squares", fit.squares()).flag("converged", fit.isSound());
    if (!fit.isSound()) {
      return row.text("problem", fit.problem()).build();
    }
    return row.count("minima", fit.minima().size()).build();
  }
}
