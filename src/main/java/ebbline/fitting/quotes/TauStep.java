package ebbline.fitting.quotes;

/** One step downhill in one or two ln τ within bounds. */
final class TauStep {
  private TauStep() {}

  /** Newton's step where the curvature is positive, else one along the falling gradient. */
  static double[] newton(
      TauProblem problem, TauProblem.Point point, double low, double high, double difference) {
    int n = point.logTaus.length;
    boolean[] free = new boolean[n];
    for (int k = 0; k < n; k++) {
      boolean atLow = point.logTaus[k] <= low && point.gradient[k] > 0;
      boolean atHigh = point.logTaus[k] >= high && point.gradient[k] < 0;
      free[k] = !atLow && !atHigh;
    }
    double[][] bend = new double[n][n];
    for (int k = 0; k < n; k++) {
      double[] up = point.logTaus.clone();
      double[] down = point.logTaus.clone();
      up[k] += difference;
      down[k] -= difference;
      double[] above = problem.at(up, point.betas).gradient;
      double[] below = problem.at(down, point.betas).gradient;
      for (int j = 0; j < n; j++) {
        bend[k][j] = (above[j] - below[j]) / (2 * difference);
      }
    }
    double[] move = new double[n];
    if (n == 2 && free[0] && free[1]) {
      double cross = 0.5 * (bend[0][1] + bend[1][0]);
      double determinant = bend[0][0] * bend[1][1] - cross * cross;
      if (determinant > 0 && bend[0][0] > 0) {
        move[0] = (cross * point.gradient[1] - bend[1][1] * point.gradient[0]) / determinant;
        move[1] = (cross * point.gradient[0] - bend[0][0] * point.gradient[1]) / determinant;
        return move;
      }
    }
    for (int k = 0; k < n; k++) {
      if (free[k] && point.gradient[k] != 0) {
        double curvature = Math.abs(bend[k][k]);
        double step =
            -point.gradient[k] / (curvature > 0 ? curvature : Math.abs(point.gradient[k]));
        move[k] = n == 1 ? step : 0.5 * step;
      }
    }
    return move;
  }
}
