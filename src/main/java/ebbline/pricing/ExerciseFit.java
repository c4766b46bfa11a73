package ebbline.pricing;

import java.util.Arrays;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.BlockRealMatrix;
import org.apache.commons.math3.linear.QRDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularMatrixException;

/** Least squares for the value at one decision as a function of its standard normal state. */
final class ExerciseFit {
  /*
   * The fit may be poor and the bounds still hold; a good one brings them together. States lie on a grid out to seven
   * deviations, weighed by the root of a normal density of deviation √2, so that the tails are kept in check too.
   */
  static final int POINTS = 281;
  private static final double REACH = 7;
  private static final int DEGREE = 10;
  private static final int MOST_KNOTS = 2;

  /** A knot farther out would leave too few states beyond it. */
  private static final double FARTHEST_KNOT = 6;

  private static final double[] GRID = new double[POINTS];
  private static final double[] WEIGHT = new double[POINTS];

  static {
    for (int i = 0; i < POINTS; i++) {
      GRID[i] = -REACH + 2 * REACH * i / (POINTS - 1);
      WEIGHT[i] = Math.exp(-0.25 * GRID[i] * GRID[i]);
    }
  }

  private ExerciseFit() {}

  static double[] states() {
    return GRID.clone();
  }

  /**
   * @param values at the states
   * @param gain what exercise adds to the value of waiting there; its changes of sign are kinks
   */
  static KinkedPolynomial of(double[] values, double[] gain) {
    double[] knots = knots(gain);
    try {
      return fitted(values, knots);
    } catch (SingularMatrixException e) {
      return fitted(values, new double[0]);
    }
  }

  private static KinkedPolynomial fitted(double[] values, double[] knots) {
    int width = DEGREE + 1 + knots.length * KinkedPolynomial.KINK_POWERS;
    double[][] rows = new double[POINTS][width];
    double[] right = new double[POINTS];
    double[] scale = new double[width];
    for (int i = 0; i < POINTS; i++) {
      int c = 0;
      double power = WEIGHT[i];
      for (int k = 0; k <= DEGREE; k++, power *= GRID[i]) {
        rows[i][c++] = power;
      }
      for (double knot : knots) {
        double beyond = Math.max(0, GRID[i] - knot);
        double term = WEIGHT[i] * beyond;
        for (int k = 0; k < KinkedPolynomial.KINK_POWERS; k++, term *= beyond) {
          rows[i][c++] = term;
        }
      }
      for (int k = 0; k < width; k++) {
        scale[k] = Math.max(scale[k], Math.abs(rows[i][k]));
      }
      right[i] = WEIGHT[i] * values[i];
    }
    for (double[] row : rows) {
      for (int k = 0; k < width; k++) {
        row[k] /= scale[k];
      }
    }
    RealMatrix design = new BlockRealMatrix(rows);
    double[] found =
        new QRDecomposition(design, 1e-13).getSolver().solve(new ArrayRealVector(right)).toArray();
    for (int k = 0; k < width; k++) {
      found[k] /= scale[k];
    }
    double[][] kinks = new double[knots.length][];
    for (int k = 0; k < knots.length; k++) {
      int from = DEGREE + 1 + k * KinkedPolynomial.KINK_POWERS;
      kinks[k] = Arrays.copyOfRange(found, from, from + KinkedPolynomial.KINK_POWERS);
    }
    return new KinkedPolynomial(Arrays.copyOf(found, DEGREE + 1), knots, kinks);
  }

  /** Changes of sign, the innermost ones. */
  private static double[] knots(double[] gain) {
    double[] found = new double[MOST_KNOTS];
    int count = 0;
    int middle = POINTS / 2;
    for (int off = 0; off < POINTS - 1 && count < MOST_KNOTS; off++) {
      int i = middle + (off % 2 == 0 ? off / 2 : -(off + 1) / 2);
      if (i < 0 || i + 1 >= POINTS) {
        continue;
      }
      double a = gain[i];
      double b = gain[i + 1];
      if (a > 0 != b > 0) {
        double knot = GRID[i] + (GRID[i + 1] - GRID[i]) * (a / (a - b));
        if (Math.abs(knot) <= FARTHEST_KNOT) {
          found[count++] = knot;
        }
      }
    }
    return Arrays.copyOf(found, count);
  }
}
