package ebbline.fitting.quotes;

import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import java.util.Arrays;
import java.util.List;

/** Log discounts at the nodes that reprice the quotes, or come nearest in weighted squares. */
final class NodeSolver {
  /*
   * The residual of a quote is (curve's quote − quote) √weight, linearised as gap/(∂gap/∂quote): at the solution the
   * two are one. With as many nodes as quotes the Gauss–Newton step is Newton's, and with a local interpolation the
   * system is triangular, the usual bootstrap. Steps are halved while the squares would rise.
   */
  private static final int MOST_STEPS = 100;
  private static final int MOST_HALVINGS = 30;
  private static final double START_RATE = 0.02;

  /** In ln P: shorter steps are rounding. */
  private static final double LEAST_STEP = 1e-13;

  private static final double DEPENDENT = 1e-14;
  private static final double LONGEST_STEP =
      2; // in ln P times its time's scale: a guard for the first steps

  private final Interpolation interpolation;
  private final double[] times;
  private final List<QuoteEquation> quotes;
  private final double[] roots; // of the weights

  /** Where the search ended. */
  static final class Outcome {
    final InterpolatedCurve curve;
    final OrthogonalFactors factors;
    final double[][] jacobian;
    final int steps;
    final String reason;

    Outcome(
        InterpolatedCurve curve,
        OrthogonalFactors factors,
        double[][] jacobian,
        int steps,
        String reason) {
      this.curve = curve;
      this.factors = factors;
      this.jacobian = jacobian;
      this.steps = steps;
      this.reason = reason;
    }
  }

  /**
   * @param weights on the squared error of each quote
   */
  NodeSolver(
      Interpolation interpolation, double[] times, List<QuoteEquation> quotes, double[] weights) {
    this.interpolation = interpolation;
    this.times = times;
    this.quotes = quotes;
    roots = Arrays.stream(weights).map(Math::sqrt).toArray();
  }

  double[] start() {
    double[] logs = new double[times.length];
    for (int i = 0; i < logs.length; i++) {
      logs[i] = -START_RATE * times[i];
    }
    return logs;
  }

  Outcome solve(double[] start) {
    double[] logs = start.clone();
    InterpolatedCurve curve = InterpolatedCurve.of(interpolation, times, logs);
    QuoteEquation.Reading[] readings = read(curve);
    double[] residual = residuals(readings);
    double squares = squares(residual);
    double[][] jacobian = jacobian(readings);
    OrthogonalFactors factors = new OrthogonalFactors(jacobian, times.length);
    String reason = "the errors still fell after " + MOST_STEPS + " steps";
    int steps = 0;
    while (steps < MOST_STEPS) {
      if (!(factors.independence() > DEPENDENT)) {
        reason = "the quotes do not determine every node";
        break;
      }
      double[] step = factors.solve(residual);
      double largest = Arrays.stream(step).map(Math::abs).max().orElse(0);
      double scale = Math.min(1, LONGEST_STEP / largest);
      boolean lower = false;
      for (int halving = 0; halving < MOST_HALVINGS && !lower; halving++, scale *= 0.5) {
        double[] tried = new double[logs.length];
        for (int i = 0; i < tried.length; i++) {
          tried[i] = logs[i] - scale * step[i];
        }
        InterpolatedCurve triedCurve = InterpolatedCurve.of(interpolation, times, tried);
        QuoteEquation.Reading[] triedReadings = read(triedCurve);
        double[] triedResidual = residuals(triedReadings);
        double triedSquares = squares(triedResidual);
        lower = triedSquares < squares;
        if (lower) {
          logs = tried;
          curve = triedCurve;
          readings = triedReadings;
          residual = triedResidual;
          squares = triedSquares;
        } else if (scale * largest < LEAST_STEP) {
          break;
        }
      }
      steps++;
      if (!lower) {
        reason = ""; // no step lowers the errors: this is the minimum
        break;
      }
      jacobian = jacobian(readings);
      factors = new OrthogonalFactors(jacobian, times.length);
      if (squares == 0) {
        reason = "";
        break;
      }
    }
    return new Outcome(curve, factors, jacobian, steps, reason);
  }

  private QuoteEquation.Reading[] read(InterpolatedCurve curve) {
    QuoteEquation.Reading[] readings = new QuoteEquation.Reading[quotes.size()];
    for (int i = 0; i < readings.length; i++) {
      readings[i] = quotes.get(i).new Reading(curve);
    }
    return readings;
  }

  private double[] residuals(QuoteEquation.Reading[] readings) {
    double[] residual = new double[readings.length];
    for (int i = 0; i < residual.length; i++) {
      residual[i] = roots[i] * (readings[i].fitted - quotes.get(i).quote());
    }
    return residual;
  }

  /** ∂residual/∂ ln P(node), a row a quote. */
  private double[][] jacobian(QuoteEquation.Reading[] readings) {
    double[][] jacobian = new double[readings.length][times.length];
    for (int i = 0; i < jacobian.length; i++) {
      readings[i].addNodeGradient(roots[i], jacobian[i]);
    }
    return jacobian;
  }

  /** Not finite counts as too far. */
  private static double squares(double[] residual) {
    double sum = 0;
    for (double part : residual) {
      sum += part * part;
    }
    return sum < Double.MAX_VALUE ? sum : Double.MAX_VALUE;
  }
}
