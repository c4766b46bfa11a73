package ebbline.fitting.quotes;

import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.fitting.FittedQuote;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Objects;

/**
 * Makes an interpolated curve from quotes: one node at the end of every quote, or given nodes and
 * least squares over the quotes' own errors. Immutable.
 */
public final class CurveBuilder {
  private static final int MOST_ROUNDS = 100;

  /** Half a minute in years: moments as close as this are one. */
  static final double SAME_TIME = 1e-6;

  private final Interpolation interpolation;
  private final double[] nodes;
  private final boolean robust;

  private CurveBuilder(Interpolation interpolation, double[] nodes, boolean robust) {
    this.interpolation = interpolation;
    this.nodes = nodes;
    this.robust = robust;
  }

  /**
   * @param interpolation all but {@code smith-wilson}, for which see {@link SmithWilsonBuilder}
   */
  public static CurveBuilder of(Interpolation interpolation) {
    Objects.requireNonNull(interpolation, "interpolation");
    if (interpolation == Interpolation.SMITH_WILSON) {
      throw new IllegalArgumentException(
          "smith-wilson needs an ultimate forward rate and a convergence point");
    }
    return new CurveBuilder(interpolation, new double[0], false);
  }

  /**
   * With nodes of its own instead of one a quote.
   *
   * @param times years, positive, strictly increasing, no more than there are quotes
   */
  public CurveBuilder withNodes(double... times) {
    return new CurveBuilder(interpolation, times.clone(), robust);
  }

  /** With weights that fall for quotes far from the curve, so that a wrong one cannot bend it. */
  public CurveBuilder withRobustWeights() {
    return new CurveBuilder(interpolation, nodes, true);
  }

  /**
   * The curve.
   *
   * @param quotes in any order
   * @throws IllegalArgumentException if the quotes cannot make a curve whatever their values: none,
   *     two that end at the same time without nodes being given, fewer than nodes
   */
  public CurveFit build(List<QuoteEquation> quotes) {
    double[] times = nodes.length == 0 ? endTimes(quotes) : nodes.clone();
    if (quotes.size() < times.length) {
      throw new IllegalArgumentException(
          "a curve needs as many quotes as nodes, found "
              + quotes.size()
              + " quotes and "
              + times.length
              + " nodes");
    }
    double[] given = quotes.stream().mapToDouble(QuoteEquation::weight).toArray();
    NodeSolver solver = new NodeSolver(interpolation, times, quotes, given);
    NodeSolver.Outcome outcome = solver.solve(solver.start());
    double[] weights = given;
    if (robust && quotes.size() > times.length) {
      for (int round = 0; round < MOST_ROUNDS; round++) {
        double[] next = reweighted(outcome.curve, quotes, given);
        double change = 0;
        for (int i = 0; i < next.length; i++) {
          change = Math.max(change, Math.abs(next[i] - weights[i]) / given[i]);
        }
        weights = next;
        outcome =
            new NodeSolver(interpolation, times, quotes, weights)
                .solve(outcome.curve.nodeLogDiscounts());
        if (!(change > 1e-9) || !outcome.reason.isEmpty()) {
          break;
        }
      }
    }
    return fit(outcome, quotes, given, weights);
  }

  /** The end of every quote, increasing. */
  private static double[] endTimes(List<QuoteEquation> quotes) {
    if (quotes.isEmpty()) {
      throw new IllegalArgumentException("a curve needs at least one quote, found none");
    }
    List<QuoteEquation> sorted = new ArrayList<>(quotes);
    sorted.sort(Comparator.comparingDouble(QuoteEquation::lastTime));
    for (int i = 1; i < sorted.size(); i++) {
      QuoteEquation one = sorted.get(i - 1);
      QuoteEquation other = sorted.get(i);
      if (!(other.lastTime() - one.lastTime() > SAME_TIME)) {
        throw new IllegalArgumentException(
            "two quotes must not end at the same time unless nodes are given, found "
                + one.id()
                + " and "
                + other.id()
                + " at "
                + one.lastTime()
                + " years");
      }
    }
    return sorted.stream().mapToDouble(QuoteEquation::lastTime).toArray();
  }

  private static double[] residuals(
      InterpolatedCurve curve, List<QuoteEquation> quotes, double[] weights) {
    double[] residuals = new double[quotes.size()];
    for (int i = 0; i < residuals.length; i++) {
      QuoteEquation quote = quotes.get(i);
      residuals[i] = Math.sqrt(weights[i]) * (quote.fittedQuote(curve) - quote.quote());
    }
    return residuals;
  }

  private static double[] reweighted(
      InterpolatedCurve curve, List<QuoteEquation> quotes, double[] given) {
    double[] residuals = residuals(curve, quotes, given);
    double spread = RobustWeights.spread(residuals);
    double[] weights = given.clone();
    if (spread > 0) {
      for (int i = 0; i < weights.length; i++) {
        weights[i] *= RobustWeights.weight(residuals[i], spread);
      }
    }
    return weights;
  }

  private CurveFit fit(
      NodeSolver.Outcome outcome, List<QuoteEquation> quotes, double[] given, double[] weights) {
    InterpolatedCurve curve = outcome.curve;
    double[] times = curve.nodes();
    boolean exact = times.length == quotes.size();
    List<FittedQuote> fitted = Repricing.reprice(curve, quotes);
    List<String> unmet = Repricing.unmet(fitted);
    List<String> outliers = new ArrayList<>();
    if (!exact) {
      double[] residuals = residuals(curve, quotes, given);
      double spread = RobustWeights.spread(residuals);
      for (int i = 0; i < residuals.length; i++) {
        if (spread > 0 && RobustWeights.isOutlier(residuals[i], spread)) {
          outliers.add(quotes.get(i).id());
        }
      }
    }
    String problem = outcome.reason;
    if (exact && !unmet.isEmpty()) {
      problem = Repricing.describe(fitted) + (problem.isEmpty() ? "" : "; " + problem);
    }
    double[][] inverse = outcome.factors.inverse();
    double condition = condition(outcome.jacobian, inverse, times);
    for (double[] row : inverse) {
      for (int k = 0; k < weights.length; k++) {
        row[k] *= Math.sqrt(weights[k]);
      }
    }
    List<String> warnings = CurveWarnings.of(curve, quotes, fitted, exact);
    return new CurveFit(
        curve,
        fitted,
        unmet,
        outliers,
        problem,
        outcome.steps,
        condition,
        t -> discountByQuote(curve, inverse, t),
        warnings);
  }

  /** ∂P(t)/∂quote from ∂ ln P(node)/∂quote. */
  private static double[] discountByQuote(
      InterpolatedCurve curve, double[][] nodeByQuote, double t) {
    double[] gradient = new double[nodeByQuote.length];
    curve.addLogDiscountGradient(t, curve.discount(t), gradient);
    double[] byQuote = new double[nodeByQuote[0].length];
    for (int i = 0; i < gradient.length; i++) {
      for (int k = 0; k < byQuote.length; k++) {
        byQuote[k] += gradient[i] * nodeByQuote[i][k];
      }
    }
    return byQuote;
  }

  /** Of the Jacobian with ln P(t) replaced by the zero rate, ln P = −t z. */
  private static double condition(double[][] jacobian, double[][] inverse, double[] times) {
    double forth = 0;
    for (double[] row : jacobian) {
      double sum = 0;
      for (int j = 0; j < times.length; j++) {
        sum += Math.abs(row[j]) * times[j];
      }
      forth = Math.max(forth, sum);
    }
    double back = 0;
    for (int j = 0; j < times.length; j++) {
      back = Math.max(back, Arrays.stream(inverse[j]).map(Math::abs).sum() / times[j]);
    }
    return forth * back;
  }
}
