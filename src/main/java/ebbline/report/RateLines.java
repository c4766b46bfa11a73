package ebbline.report;

import ebbline.curve.DiscountCurve;
import java.util.ArrayList;
import java.util.List;

/** The zero and forward rates of a curve as lines to draw; a forward that jumps is several. */
final class RateLines {
  private static final int POINTS = 240;

  /** Rates this close on both sides of a time meet there. */
  private static final double NO_JUMP = 1e-9;

  private final DiscountCurve curve;
  private final double horizon;

  /**
   * @param horizon years, above 0
   */
  RateLines(DiscountCurve curve, double horizon) {
    if (!(horizon > 0 && Double.isFinite(horizon))) {
      throw new IllegalArgumentException("a drawing needs years above 0, found " + horizon);
    }
    this.curve = curve;
    this.horizon = horizon;
  }

  double horizon() {
    return horizon;
  }

  /** A point of a line: years and a rate. */
  record Point(double time, double rate) {}

  List<Point> zeros() {
    List<Point> line = new ArrayList<>();
    for (double[] piece : pieces()) {
      add(line, piece, false);
    }
    return line;
  }

  /** Lines that are each continuous. */
  List<List<Point>> forwards() {
    List<List<Point>> lines = new ArrayList<>();
    List<Point> line = new ArrayList<>();
    for (double[] piece : pieces()) {
      if (!line.isEmpty()
          && Math.abs(line.get(line.size() - 1).rate() - curve.forward(piece[0])) > NO_JUMP) {
        lines.add(line);
        line = new ArrayList<>();
      }
      add(line, piece, true);
    }
    lines.add(line);
    return lines;
  }

  /** Smooth stretches of the curve up to the horizon, from and to. */
  private List<double[]> pieces() {
    List<double[]> pieces = new ArrayList<>();
    double[] breaks = curve.breaks();
    for (int i = 0; i < breaks.length && breaks[i] < horizon; i++) {
      double to = i + 1 < breaks.length ? Math.min(breaks[i + 1], horizon) : horizon;
      pieces.add(new double[] {breaks[i], to});
    }
    return pieces;
  }

  private void add(List<Point> line, double[] piece, boolean forward) {
    int count = Math.max(2, (int) Math.ceil(POINTS * (piece[1] - piece[0]) / horizon));
    for (int k = 0; k <= count; k++) {
      // The end of a piece is seen from its left: the forward may jump there.
      double t =
          k == count ? Math.nextDown(piece[1]) : piece[0] + (piece[1] - piece[0]) * k / count;
      line.add(new Point(t, forward ? curve.forward(t) : curve.zero(t)));
    }
  }

  /** Lowest and highest rate of all lines; never the same. */
  double[] range() {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    List<List<Point>> lines = forwards();
    lines.add(zeros());
    for (List<Point> line : lines) {
      for (Point point : line) {
        low = Math.min(low, point.rate());
        high = Math.max(high, point.rate());
      }
    }
    double room = Math.max(0.05 * (high - low), 1e-4); // a flat curve is a line, not an empty range
    return new double[] {low - room, high + room};
  }

  /** A step of 1, 2 or 5 times a power of ten that cuts a range into about so many parts. */
  static double step(double range, int parts) {
    double rough = range / parts;
    double power = Math.pow(10, Math.floor(Math.log10(rough)));
    double lead = rough / power;
    return (lead < 1.5 ? 1 : lead < 3.5 ? 2 : lead < 7.5 ? 5 : 10) * power;
  }

  /** The multiples of a step within a range. */
  static List<Double> ticks(double low, double high, double step) {
    List<Double> ticks = new ArrayList<>();
    for (long k = (long) Math.ceil(low / step - 1e-9); k * step <= high + 1e-9 * step; k++) {
      ticks.add(k * step);
    }
    return ticks;
  }

  /** How many decimals show the multiples of a step. */
  static int decimals(double step) {
    return Math.max(0, (int) -Math.floor(Math.log10(step) + 1e-9));
  }
}
