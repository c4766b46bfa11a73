package ebbline.fitting.quotes;

import ebbline.curve.SvenssonCurve;
import ebbline.fitting.FittedQuote;
import java.util.List;

/**
 * A parametric curve fitted by weighted least squares, and whether to believe its parameters.
 *
 * @param form its form
 * @param curve the curve; for a Nelson–Siegel fit its last beta is 0
 * @param squares the weighted sum of squared errors
 * @param quotes every point or quote beside the curve's own, in the order given
 * @param problem in words, why the parameters mean nothing though the curve may fit: taus that
 *     merge, a tau at the edge of its range, a loading without effect; empty for a sound fit
 * @param minima all the minima found, the lowest first
 */
public record ParametricFit(
    ParametricForm form,
    SvenssonCurve curve,
    double squares,
    List<FittedQuote> quotes,
    String problem,
    List<Minimum> minima) {

  /**
   * One minimum of the squares over the taus.
   *
   * @param tau1 years
   * @param tau2 years; equal to tau1 for a Nelson–Siegel fit
   * @param squares the weighted sum of squared errors there
   */
  public record Minimum(double tau1, double tau2, double squares) {}

  public ParametricFit {
    quotes = List.copyOf(quotes);
    minima = List.copyOf(minima);
  }

  /** Whether the parameters are determined by the data. */
  public boolean isSound() {
    return problem.isEmpty();
  }

  /** Root of the mean squared error, unweighted, in the unit of the quotes. */
  public double rootMeanSquare() {
    double sum = 0;
    for (FittedQuote quote : quotes) {
      sum += quote.error() * quote.error();
    }
    return Math.sqrt(sum / quotes.size());
  }
}
