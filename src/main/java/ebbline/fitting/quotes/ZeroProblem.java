package ebbline.fitting.quotes;

/** Zero rates: the betas come from one linear least-squares system. */
final class ZeroProblem implements TauProblem {
  private final ParametricForm form;
  private final double[] times;
  private final double[] zeros;
  private final double[] roots;

  /**
   * @param weights on the squared errors
   */
  ZeroProblem(ParametricForm form, double[] times, double[] zeros, double[] weights) {
    this.form = form;
    this.times = times;
    this.zeros = zeros;
    roots = new double[weights.length];
    for (int i = 0; i < roots.length; i++) {
      roots[i] = Math.sqrt(weights[i]);
    }
  }

  @Override
  public int taus() {
    return form.taus();
  }

  @Override
  public Point at(double[] logTaus, double[] guess) {
    double[] taus = new double[logTaus.length];
    for (int k = 0; k < taus.length; k++) {
      taus[k] = Math.exp(logTaus[k]);
    }
    int n = times.length;
    double[][] matrix = new double[n][form.betas()];
    double[] side = new double[n];
    for (int i = 0; i < n; i++) {
      LoadingCurve.fillLoadings(times[i], taus, matrix[i]);
      side[i] = roots[i] * zeros[i];
      for (int k = 0; k < form.betas(); k++) {
        matrix[i][k] *= roots[i];
      }
    }
    double[] betas = new OrthogonalFactors(matrix, form.betas()).solve(side);
    double squares = 0;
    double[] gradient = new double[taus.length];
    for (int i = 0; i < n; i++) {
      double residual = -side[i];
      for (int k = 0; k < betas.length; k++) {
        residual += matrix[i][k] * betas[k];
      }
      squares += residual * residual;
      for (int k = 0; k < taus.length; k++) {
        gradient[k] += 2 * residual * roots[i] * LoadingCurve.byLogTau(times[i], betas, taus, k);
      }
    }
    return new Point(logTaus.clone(), betas, squares, gradient);
  }
}
