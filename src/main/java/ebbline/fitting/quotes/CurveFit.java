package ebbline.fitting.quotes;

import ebbline.curve.DiscountCurve;
import ebbline.fitting.FittedQuote;
import java.util.List;
import java.util.function.DoubleFunction;

/**
 * A curve made from quotes, what it makes of each of them, and how far to trust it.
 *
 * <p>Not meeting the quotes is a value and not an exception: {@link #problem} says why, and the
 * best curve found is there.
 */
public final class CurveFit {
  private final DiscountCurve curve;
  private final List<FittedQuote> quotes;
  private final List<String> unmet;
  private final List<String> outliers;
  private final String problem;
  private final int steps;
  private final double condition;
  private final DoubleFunction<double[]> byQuote;
  private final List<String> warnings;

  CurveFit(
      DiscountCurve curve,
      List<FittedQuote> quotes,
      List<String> unmet,
      List<String> outliers,
      String problem,
      int steps,
      double condition,
      DoubleFunction<double[]> byQuote,
      List<String> warnings) {
    this.curve = curve;
    this.quotes = List.copyOf(quotes);
    this.unmet = List.copyOf(unmet);
    this.outliers = List.copyOf(outliers);
    this.problem = problem;
    this.steps = steps;
    this.condition = condition;
    this.byQuote = byQuote;
    this.warnings = List.copyOf(warnings);
  }

  public DiscountCurve curve() {
    return curve;
  }

  /** Every quote beside the curve's own, in the order given. */
  public List<FittedQuote> quotes() {
    return quotes;
  }

  /**
   * Labels of the quotes that the curve misses by more than 1e-12 (of a price: 1e-12 of it). Where
   * there are more quotes than nodes that is the rule, and no fault.
   */
  public List<String> unmet() {
    return unmet;
  }

  /** Labels of the quotes that lie too far from the others to belong to them. */
  public List<String> outliers() {
    return outliers;
  }

  /** Whether the search reached its goal. */
  public boolean isConverged() {
    return problem.isEmpty();
  }

  /** What kept the search from its goal, in words; empty where it converged. */
  public String problem() {
    return problem;
  }

  public int steps() {
    return steps;
  }

  /**
   * Condition number of the system, quotes against zero rates at the nodes, in the norm of largest
   * row sums: by how much an error of the quotes may grow in the zero rates.
   */
  public double condition() {
    return condition;
  }

  public List<String> warnings() {
    return warnings;
  }

  /**
   * ∂P(0,t)/∂quote for every quote, in the order given. With more quotes than nodes the curvature
   * of the residuals is left out (Gauss–Newton), so that it is exact only as far as the quotes are
   * met; robust weights count as fixed.
   *
   * @param t years
   */
  public double[] discountByQuote(double t) {
    return byQuote.apply(t);
  }
}
