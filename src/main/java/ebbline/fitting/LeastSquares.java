package ebbline.fitting;

import org.apache.commons.math3.exception.ConvergenceException;
import org.apache.commons.math3.exception.MathIllegalStateException;
import org.apache.commons.math3.exception.TooManyEvaluationsException;
import org.apache.commons.math3.exception.TooManyIterationsException;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresBuilder;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresOptimizer;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresProblem;
import org.apache.commons.math3.fitting.leastsquares.LevenbergMarquardtOptimizer;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;
import org.apache.commons.math3.util.Pair;

/** Levenberg-Marquardt without bounds; the best point seen survives whatever stops the search. */
final class LeastSquares {
  /** Stands for a residual that has no finite value, so that the step there is refused. */
  private static final double OUT_OF_REACH = 1e6;

  private LeastSquares() {}

  /** Residuals and their derivatives at a point. */
  interface Residuals {
    /**
     * @param residual filled, one entry an observation
     * @param jacobian filled, ∂residual/∂point, a row an observation
     */
    void at(double[] point, double[] residual, double[][] jacobian);
  }

  /**
   * Where a search ended.
   *
   * @param squares sum of squared residuals at the point
   * @param reason empty where it converged
   */
  @SuppressWarnings("ArrayRecordComponent")
  record Outcome(double[] point, double squares, int iterations, String reason) {
    boolean converged() {
      return reason.isEmpty();
    }
  }

  static Outcome minimise(Residuals residuals, int observations, double[] start, int iterations) {
    Search search = new Search(residuals, observations, start.length);
    LeastSquaresProblem problem =
        new LeastSquaresBuilder()
            .start(start)
            .target(new double[observations])
            .model(search::value)
            .lazyEvaluation(false)
            .maxIterations(iterations)
            .maxEvaluations(5 * iterations)
            .build();
    try {
      LeastSquaresOptimizer.Optimum optimum =
          new LevenbergMarquardtOptimizer()
              .withCostRelativeTolerance(1e-15)
              .withParameterRelativeTolerance(1e-14)
              .withOrthoTolerance(1e-15)
              .optimize(problem);
      return new Outcome(search.best, search.bestSquares, optimum.getIterations(), "");
    } catch (TooManyIterationsException | TooManyEvaluationsException e) {
      return new Outcome(
          search.best,
          search.bestSquares,
          iterations,
          "the errors still fell after " + iterations + " iterations");
    } catch (ConvergenceException e) {
      // Thrown where the tolerances are finer than rounding lets them be met: no step is left.
      return new Outcome(search.best, search.bestSquares, search.evaluations, "");
    } catch (MathIllegalStateException e) {
      return new Outcome(
          search.best,
          search.bestSquares,
          search.evaluations,
          "the search broke down: " + e.getMessage());
    }
  }

  private static final class Search {
    private final Residuals residuals;
    private final int observations;
    private final int parameters;
    private double[] best = {};
    private double bestSquares = Double.POSITIVE_INFINITY;
    private int evaluations;

    Search(Residuals residuals, int observations, int parameters) {
      this.residuals = residuals;
      this.observations = observations;
      this.parameters = parameters;
    }

    Pair<RealVector, RealMatrix> value(RealVector at) {
      double[] point = at.toArray();
      double[] residual = new double[observations];
      double[][] jacobian = new double[observations][parameters];
      residuals.at(point, residual, jacobian);
      evaluations++;
      double squares = 0;
      for (int i = 0; i < observations; i++) {
        boolean finite = Double.isFinite(residual[i]);
        for (int j = 0; j < parameters; j++) {
          finite &= Double.isFinite(jacobian[i][j]);
        }
        if (!finite) {
          residual[i] = OUT_OF_REACH;
          jacobian[i] = new double[parameters];
        }
        squares += residual[i] * residual[i];
      }
      if (squares < bestSquares) {
        bestSquares = squares;
        best = point.clone();
      }
      return new Pair<>(
          new ArrayRealVector(residual, false), new Array2DRowRealMatrix(jacobian, false));
    }
  }
}
