package ebbline.fitting.quotes;

/** A matrix with at least as many rows as columns as QR, by Householder reflections. */
final class OrthogonalFactors {
  private final int rows;
  private final int columns;
  // Column after column, so that each reflection runs along memory; R above the diagonal.
  private final double[][] columnOf;
  private final double[] diagonal;

  /**
   * @param matrix its rows; left untouched
   */
  OrthogonalFactors(double[][] matrix, int columns) {
    rows = matrix.length;
    this.columns = columns;
    columnOf = new double[columns][rows];
    diagonal = new double[columns];
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns; j++) {
        columnOf[j][i] = matrix[i][j];
      }
    }
    for (int j = 0; j < columns; j++) {
      double[] reflector = columnOf[j];
      double square = 0;
      for (int i = j; i < rows; i++) {
        square += reflector[i] * reflector[i];
      }
      double norm = reflector[j] > 0 ? -Math.sqrt(square) : Math.sqrt(square);
      diagonal[j] = norm;
      if (norm == 0) {
        continue;
      }
      reflector[j] -= norm;
      for (int k = j + 1; k < columns; k++) {
        reflect(j, columnOf[k]);
      }
    }
  }

  /** Applies reflection j. */
  private void reflect(int j, double[] vector) {
    double[] reflector = columnOf[j];
    double scale = diagonal[j] * reflector[j];
    if (scale == 0) {
      return;
    }
    double sum = 0;
    for (int i = j; i < rows; i++) {
      sum += reflector[i] * vector[i];
    }
    double factor = sum / scale;
    for (int i = j; i < rows; i++) {
      vector[i] += factor * reflector[i];
    }
  }

  /** The smallest of |R's diagonal| over the largest: 0 where a column depends on the others. */
  double independence() {
    double least = Double.POSITIVE_INFINITY;
    double most = 0;
    for (double entry : diagonal) {
      least = Math.min(least, Math.abs(entry));
      most = Math.max(most, Math.abs(entry));
    }
    return most > 0 ? least / most : 0;
  }

  /** The x that makes |matrix x − side| least. */
  double[] solve(double[] side) {
    double[] work = side.clone();
    for (int j = 0; j < columns; j++) {
      reflect(j, work);
    }
    double[] x = new double[columns];
    for (int j = columns - 1; j >= 0; j--) {
      double sum = work[j];
      for (int k = j + 1; k < columns; k++) {
        sum -= columnOf[k][j] * x[k];
      }
      x[j] = sum / diagonal[j];
    }
    return x;
  }

  /** The pseudo-inverse: a row a column of the matrix. */
  double[][] inverse() {
    double[][] inverse = new double[columns][rows];
    double[] side = new double[rows];
    for (int i = 0; i < rows; i++) {
      side[i] = 1;
      double[] x = solve(side);
      side[i] = 0;
      for (int j = 0; j < columns; j++) {
        inverse[j][i] = x[j];
      }
    }
    return inverse;
  }
}
