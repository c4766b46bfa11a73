package ebbline.fitting;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * How sure the fitted parameters of a least-squares fit are: s² (JᵀJ)⁻¹ with s² = SSR/(n − p),
 * taken on the parameters that the observations identify.
 *
 * <p>Where a direction of the parameters moves no quote, the parameters in it have no standard
 * error, and the covariance of the others is conditional on them.
 */
public final class Uncertainty {
  /*
   * Columns of J are scaled to unit length first, so the singular values compare directions and not
   * units. A direction is lost below NULL_DIRECTION times the largest one: with n points its
   * size is then rounding noise of the quotes' model values (about 1e-16 √n).
   */
  private static final double NULL_DIRECTION = 1e-13;
  private static final double TAKES_PART = 1e-3;

  private final List<Parameter> free;
  private final List<Parameter> identified;
  private final double[][] covariance;
  private final double condition;
  private final boolean residualsLeft;

  private Uncertainty(
      List<Parameter> free,
      List<Parameter> identified,
      double[][] covariance,
      double condition,
      boolean residualsLeft) {
    this.free = List.copyOf(free);
    this.identified = List.copyOf(identified);
    this.covariance = covariance;
    this.condition = condition;
    this.residualsLeft = residualsLeft;
  }

  /**
   * From the Jacobian at the fitted point.
   *
   * @param free fitted parameters, in the order of the columns
   * @param jacobian a row a quote, a column a parameter
   * @param squares sum of squared residuals
   */
  static Uncertainty of(List<Parameter> free, double[][] jacobian, double squares) {
    List<Parameter> identified = new ArrayList<>(free);
    List<Integer> columns = new ArrayList<>();
    for (int j = 0; j < free.size(); j++) {
      columns.add(j);
    }
    double[] scale = columnLengths(jacobian, free.size());
    double longest = 0;
    for (double s : scale) {
      longest = Math.max(longest, s);
    }
    for (int j = free.size() - 1; j >= 0; j--) {
      if (!(scale[j] > 1e-14 * longest)) {
        identified.remove(j);
        columns.remove(j);
      }
    }
    double condition = 1;
    while (!columns.isEmpty()) {
      SingularValueDecomposition svd = decompose(jacobian, columns, scale);
      double[] values = svd.getSingularValues();
      int last = columns.size() - 1;
      condition = values[0] / values[last];
      if (jacobian.length >= columns.size() && values[last] > NULL_DIRECTION * values[0]) {
        double s2 = jacobian.length > free.size() ? squares / (jacobian.length - free.size()) : 0;
        boolean left = jacobian.length > free.size();
        return new Uncertainty(free, identified, invert(svd, columns, scale, s2), condition, left);
      }
      RealMatrix v = svd.getV();
      for (int j = last; j >= 0; j--) {
        if (Math.abs(v.getEntry(j, last)) > TAKES_PART) {
          identified.remove(j);
          columns.remove(j);
        }
      }
    }
    return new Uncertainty(
        free, List.of(), new double[0][0], condition, jacobian.length > free.size());
  }

  private static double[] columnLengths(double[][] jacobian, int count) {
    double[] lengths = new double[count];
    for (int j = 0; j < count; j++) {
      double sum = 0;
      for (double[] row : jacobian) {
        sum += row[j] * row[j];
      }
      lengths[j] = Math.sqrt(sum);
    }
    return lengths;
  }

  private static SingularValueDecomposition decompose(
      double[][] jacobian, List<Integer> columns, double[] scale) {
    // Padded to at least as many rows as columns, so that every direction has a singular value.
    int rows = Math.max(jacobian.length, columns.size());
    RealMatrix scaled = new Array2DRowRealMatrix(rows, columns.size());
    for (int j = 0; j < columns.size(); j++) {
      for (int i = 0; i < jacobian.length; i++) {
        scaled.setEntry(i, j, jacobian[i][columns.get(j)] / scale[columns.get(j)]);
      }
    }
    return new SingularValueDecomposition(scaled);
  }

  private static double[][] invert(
      SingularValueDecomposition svd, List<Integer> columns, double[] scale, double s2) {
    int n = columns.size();
    double[][] result = new double[n][n];
    RealMatrix v = svd.getV();
    double[] values = svd.getSingularValues();
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double sum = 0;
        for (int k = 0; k < n; k++) {
          sum += v.getEntry(i, k) * v.getEntry(j, k) / (values[k] * values[k]);
        }
        result[i][j] = s2 * sum / (scale[columns.get(i)] * scale[columns.get(j)]);
      }
    }
    return result;
  }

  /** The parameters that were fitted. */
  public List<Parameter> free() {
    return free;
  }

  /** The fitted parameters that the observations determine. */
  public List<Parameter> identified() {
    return identified;
  }

  /** Condition number of the Jacobian with columns of unit length, over the identified ones. */
  public double conditionNumber() {
    return condition;
  }

  /** Absent where there is no quote to spare, or the parameter was held or is not identified. */
  public OptionalDouble standardError(Parameter parameter) {
    OptionalDouble variance = covariance(parameter, parameter);
    return variance.isPresent()
        ? OptionalDouble.of(Math.sqrt(variance.getAsDouble()))
        : OptionalDouble.empty();
  }

  /** Absent as for {@link #standardError}. */
  public OptionalDouble covariance(Parameter one, Parameter other) {
    int i = identified.indexOf(one);
    int j = identified.indexOf(other);
    return residualsLeft && i >= 0 && j >= 0
        ? OptionalDouble.of(covariance[i][j])
        : OptionalDouble.empty();
  }

  /** Between −1 and 1; absent as for {@link #standardError}, and where nothing is uncertain. */
  public OptionalDouble correlation(Parameter one, Parameter other) {
    OptionalDouble both = covariance(one, other);
    if (both.isEmpty()) {
      return both;
    }
    double product = standardError(one).orElseThrow() * standardError(other).orElseThrow();
    return product > 0
        ? OptionalDouble.of(Math.max(-1, Math.min(1, both.getAsDouble() / product)))
        : OptionalDouble.empty();
  }
}
