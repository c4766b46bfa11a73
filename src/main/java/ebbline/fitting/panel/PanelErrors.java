package ebbline.fitting.panel;

import java.util.Arrays;
import java.util.OptionalDouble;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;

/**
 * Standard errors of a panel estimate by the inverse of the observed information; absent where that
 * is not positive definite, so that some direction is not identified.
 */
public final class PanelErrors {
  private final double[][] covariance;

  private PanelErrors(double[][] covariance) {
    this.covariance = covariance;
  }

  /**
   * @param information minus the second derivatives in (κ, θ, σ, λ, h)
   */
  static PanelErrors invert(double[][] information) {
    int n = information.length;
    double[] scale = new double[n];
    for (int i = 0; i < n; i++) {
      if (!(information[i][i] > 0)) {
        return new PanelErrors(new double[0][0]);
      }
      scale[i] = 1 / Math.sqrt(information[i][i]);
    }
    double[][] scaled = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        scaled[i][j] = information[i][j] * scale[i] * scale[j];
      }
    }
    try {
      double[][] inverse =
          new CholeskyDecomposition(new Array2DRowRealMatrix(scaled), 1e-8, 1e-12)
              .getSolver()
              .getInverse()
              .getData();
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          inverse[i][j] *= scale[i] * scale[j];
        }
      }
      return new PanelErrors(inverse);
    } catch (NonPositiveDefiniteMatrixException e) {
      return new PanelErrors(new double[0][0]);
    }
  }

  private OptionalDouble error(int i) {
    return covariance.length == 0
        ? OptionalDouble.empty()
        : OptionalDouble.of(Math.sqrt(covariance[i][i]));
  }

  public OptionalDouble meanReversion() {
    return error(0);
  }

  public OptionalDouble longRunMean() {
    return error(1);
  }

  public OptionalDouble volatility() {
    return error(2);
  }

  public OptionalDouble marketPriceOfRisk() {
    return error(3);
  }

  public OptionalDouble measurementSd() {
    return error(4);
  }

  /** Covariance of (κ, θ, σ, λ, measurement sd); a fresh array, empty where there is none. */
  public double[][] covariance() {
    return Arrays.stream(covariance).map(double[]::clone).toArray(double[][]::new);
  }
}
