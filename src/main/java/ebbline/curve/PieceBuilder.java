package ebbline.curve;

/** The pieces of the two local interpolations and of the natural spline. */
final class PieceBuilder {
  private PieceBuilder() {}

  /**
   * @param times nodes, positive and increasing
   * @param logs ln P at the nodes
   */
  static Pieces of(Interpolation interpolation, double[] times, Jet[] logs) {
    return switch (interpolation) {
      case LOG_LINEAR -> logLinear(times, logs);
      case LINEAR_ZERO -> linearZero(times, logs);
      case CUBIC -> cubic(times, logs);
      case MONOTONE_CONVEX -> MonotoneConvex.pieces(times, logs);
    };
  }

  private static Pieces logLinear(double[] times, Jet[] logs) {
    Pieces pieces = new Pieces();
    Jet log = Jet.ZERO;
    double start = 0;
    Jet slope = Jet.ZERO;
    for (int i = 0; i < times.length; i++) {
      slope = logs[i].minus(log).over(times[i] - start);
      pieces.add(Jet.of(start), log, slope, Jet.ZERO, Jet.ZERO);
      start = times[i];
      log = logs[i];
    }
    pieces.add(Jet.of(start), log, slope, Jet.ZERO, Jet.ZERO);
    return pieces;
  }

  private static Pieces linearZero(double[] times, Jet[] logs) {
    Pieces pieces = new Pieces();
    int n = times.length;
    Jet[] zeros = new Jet[n];
    for (int i = 0; i < n; i++) {
      zeros[i] = logs[i].over(-times[i]);
    }
    pieces.add(Jet.ZERO, Jet.ZERO, zeros[0].negate(), Jet.ZERO, Jet.ZERO);
    for (int i = 0; i + 1 < n; i++) {
      Jet slope = zeros[i + 1].minus(zeros[i]).over(times[i + 1] - times[i]);
      // −(s + d)(z + m d) = ln P(s) − (z + m s) d − m d²
      Jet c1 = zeros[i].plus(slope.times(times[i])).negate();
      pieces.add(Jet.of(times[i]), logs[i], c1, slope.negate(), Jet.ZERO);
    }
    pieces.add(Jet.of(times[n - 1]), logs[n - 1], zeros[n - 1].negate(), Jet.ZERO, Jet.ZERO);
    return pieces;
  }

  /** Second derivatives by the tridiagonal system of the spline, zero at both ends. */
  private static Pieces cubic(double[] times, Jet[] logs) {
    int n = times.length;
    double[] t = new double[n + 1];
    Jet[] y = new Jet[n + 1];
    y[0] = Jet.ZERO;
    for (int i = 0; i < n; i++) {
      t[i + 1] = times[i];
      y[i + 1] = logs[i];
    }
    Jet[] second = new Jet[n + 1];
    double[] upper = new double[n + 1];
    second[0] = Jet.ZERO;
    second[n] = Jet.ZERO;
    for (int i = 1; i < n; i++) {
      double left = t[i] - t[i - 1];
      double right = t[i + 1] - t[i];
      Jet bend = y[i + 1].minus(y[i]).over(right).minus(y[i].minus(y[i - 1]).over(left)).times(6);
      double pivot = 2 * (left + right) - left * upper[i - 1];
      upper[i] = right / pivot;
      second[i] = bend.minus(second[i - 1].times(left)).over(pivot);
    }
    for (int i = n - 2; i > 0; i--) {
      second[i] = second[i].minus(second[i + 1].times(upper[i]));
    }
    Pieces pieces = new Pieces();
    Jet last = Jet.ZERO;
    for (int i = 0; i < n; i++) {
      double h = t[i + 1] - t[i];
      Jet chord = y[i + 1].minus(y[i]).over(h);
      Jet c1 = chord.minus(second[i].times(2).plus(second[i + 1]).times(h / 6));
      Jet c3 = second[i + 1].minus(second[i]).over(6 * h);
      pieces.add(Jet.of(t[i]), y[i], c1, second[i].times(0.5), c3);
      last = chord.plus(second[i].plus(second[i + 1].times(2)).times(h / 6));
    }
    pieces.add(Jet.of(t[n]), y[n], last, Jet.ZERO, Jet.ZERO);
    return pieces;
  }
}
