package ebbline.fitting.quotes;

/** Weighted squares as a function of the taus alone, the betas being solved for at each. */
interface TauProblem {

  int taus();

  /**
   * The best betas at given taus.
   *
   * @param logTaus ln τ, one or two
   * @param guess betas to start from; not used where they solve in one step
   */
  Point at(double[] logTaus, double[] guess);

  /** What the best betas at some taus come to. */
  final class Point {
    final double[] logTaus;
    final double[] betas;
    final double squares;

    /** ∂squares/∂ln τ: the betas are at their best, so only the direct dependence counts. */
    final double[] gradient;

    Point(double[] logTaus, double[] betas, double squares, double[] gradient) {
      this.logTaus = logTaus;
      this.betas = betas;
      this.squares = squares;
      this.gradient = gradient;
    }
  }
}
