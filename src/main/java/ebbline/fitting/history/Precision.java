package ebbline.fitting.history;

import java.util.Arrays;

/**
 * Covariance of (κ, θ, σ) by large-sample theory, carried through the map from the regression by
 * the delta method, or from the observed information of the likelihood.
 */
public final class Precision {
  private final double[][] covariance;

  private Precision(double[][] covariance) {
    this.covariance = covariance;
  }

  /**
   * @param covariance of (κ, θ, σ), 3 × 3, with variances at least 0
   */
  static Precision of(double[][] covariance) {
    for (int i = 0; i < 3; i++) {
      if (!(covariance[i][i] >= 0 && Double.isFinite(covariance[i][i]))) {
        throw new IllegalArgumentException(
            "a variance must be finite and at least 0, found " + covariance[i][i]);
      }
    }
    return new Precision(covariance);
  }

  public double meanReversionError() {
    return Math.sqrt(covariance[0][0]);
  }

  public double longRunMeanError() {
    return Math.sqrt(covariance[1][1]);
  }

  public double volatilityError() {
    return Math.sqrt(covariance[2][2]);
  }

  /** Standard error of the half-life, ln 2/κ² times that of κ. */
  public double halfLifeError(double meanReversion) {
    return Math.log(2) / (meanReversion * meanReversion) * meanReversionError();
  }

  /** Standard error of the stationary deviation σ/√(2κ). */
  public double stationaryDeviationError(RateLaw law) {
    double deviation = law.stationary().standardDeviation();
    double byKappa = -0.5 * deviation / law.meanReversion();
    double bySigma = law.volatility() > 0 ? deviation / law.volatility() : 0;
    double variance =
        byKappa * byKappa * covariance[0][0]
            + 2 * byKappa * bySigma * covariance[0][2]
            + bySigma * bySigma * covariance[2][2];
    return Math.sqrt(Math.max(0, variance));
  }

  /** The covariance of (κ, θ, σ) in this order; a fresh array. */
  public double[][] covariance() {
    return Arrays.stream(covariance).map(double[]::clone).toArray(double[][]::new);
  }

  /** κ and θ grow by {@code factor}, σ by its square: what n − 2 in place of n does. */
  Precision inflated(double factor) {
    double[] f = {factor, factor, factor * factor};
    double[][] grown = covariance();
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        grown[i][j] *= f[i] * f[j];
      }
    }
    return new Precision(grown);
  }

  /** The inverse of an information matrix; null where it is not positive definite. */
  static Precision invert(double[][] information) {
    // Scaled to a unit diagonal first: κ, θ and σ differ by orders of magnitude.
    double[] s = new double[3];
    for (int i = 0; i < 3; i++) {
      if (!(information[i][i] > 0)) {
        return null;
      }
      s[i] = 1 / Math.sqrt(information[i][i]);
    }
    double a = information[0][1] * s[0] * s[1];
    double b = information[0][2] * s[0] * s[2];
    double c = information[1][2] * s[1] * s[2];
    double det = 1 + 2 * a * b * c - a * a - b * b - c * c;
    if (!(det > 1e-15 && 1 - a * a > 0)) {
      return null;
    }
    double[][] inverse = {
      {1 - c * c, b * c - a, a * c - b},
      {b * c - a, 1 - b * b, a * b - c},
      {a * c - b, a * b - c, 1 - a * a}
    };
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        inverse[i][j] *= s[i] * s[j] / det;
      }
    }
    return new Precision(inverse);
  }
}
