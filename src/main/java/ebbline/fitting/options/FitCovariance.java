package ebbline.fitting.options;

import java.util.OptionalDouble;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * How sure fitted parameters are: s² (JᵀJ)⁻¹ with s² = SSR/(n − p), from the singular values of J
 * with its columns at unit length. Immutable.
 */
public final class FitCovariance {
  /** Below this share of the largest a singular value is rounding. */
  private static final double NOTHING = 1e-12;

  private final double[][] covariance;
  private final double condition;
  private final int spare;

  private FitCovariance(double[][] covariance, double condition, int spare) {
    this.covariance = covariance;
    this.condition = condition;
    this.spare = spare;
  }

  /**
   * @param slopes a row a parameter, a column a residual
   * @param counted how many residuals carry a weight
   */
  static FitCovariance of(double[][] slopes, double squares, int counted) {
    int p = slopes.length;
    if (p == 0) {
      return new FitCovariance(new double[0][0], 1, counted);
    }
    double[] length = new double[p];
    int rows = Math.max(p, slopes[0].length);
    Array2DRowRealMatrix scaled = new Array2DRowRealMatrix(rows, p);
    for (int j = 0; j < p; j++) {
      length[j] = Math.sqrt(MarquardtSearch.squares(slopes[j]));
      for (int i = 0; i < slopes[j].length && length[j] > 0; i++) {
        scaled.setEntry(i, j, slopes[j][i] / length[j]);
      }
    }
    SingularValueDecomposition svd = new SingularValueDecomposition(scaled);
    double[] values = svd.getSingularValues();
    int spare = counted - p;
    if (!(values[p - 1] > NOTHING * values[0])) {
      return new FitCovariance(new double[0][0], Double.POSITIVE_INFINITY, spare);
    }
    double s2 = spare > 0 ? squares / spare : 0;
    double[][] covariance = new double[p][p];
    for (int i = 0; i < p; i++) {
      for (int j = 0; j < p; j++) {
        double sum = 0;
        for (int k = 0; k < p; k++) {
          sum += svd.getV().getEntry(i, k) * svd.getV().getEntry(j, k) / (values[k] * values[k]);
        }
        covariance[i][j] = s2 * sum / (length[i] * length[j]);
      }
    }
    return new FitCovariance(covariance, values[0] / values[p - 1], spare);
  }

  /** Whether every direction of the parameters moves some quote. */
  public boolean isIdentified() {
    return Double.isFinite(condition);
  }

  /** Condition number of the scaled Jacobian; infinite where a direction moves no quote. */
  public double conditionNumber() {
    return condition;
  }

  /** Quotes with a weight less fitted parameters. */
  public int degreesOfFreedom() {
    return spare;
  }

  /** Absent where no quote is to spare or the parameters are not identified. */
  public OptionalDouble covariance(int one, int other) {
    return spare > 0 && isIdentified()
        ? OptionalDouble.of(covariance[one][other])
        : OptionalDouble.empty();
  }

  public OptionalDouble standardError(int parameter) {
    OptionalDouble variance = covariance(parameter, parameter);
    return variance.isPresent() ? OptionalDouble.of(Math.sqrt(variance.getAsDouble())) : variance;
  }

  /** Between −1 and 1; there even where the fit is exact. */
  public OptionalDouble correlation(int one, int other) {
    if (!isIdentified() || spare <= 0) {
      return OptionalDouble.empty();
    }
    double product = Math.sqrt(covariance[one][one] * covariance[other][other]);
    return product > 0
        ? OptionalDouble.of(Math.max(-1, Math.min(1, covariance[one][other] / product)))
        : OptionalDouble.empty();
  }
}
