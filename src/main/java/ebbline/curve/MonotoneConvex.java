package ebbline.curve;

/**
 * Hagan and West's monotone convex interpolation of forwards [Applied Math. Finance 13(2), 2006]:
 * every interval keeps its average forward exactly, and no turning point appears that the averages
 * do not ask for. On averages that are not negative the whole forward curve is not negative.
 */
final class MonotoneConvex implements Scheme {
  /*
   * The forward at a node lies on the line through the averages of its two intervals, and is kept within [0, 2m], m
   * the smaller of them, as the paper has it where m ≥ 0. A negative average is ordinary input, and lifting the node
   * to 0 would bend the curve for nothing: where m < 0 only the upper bound stays, as 2|m|. The bound meets the
   * paper's at m = 0, so that the curve moves continuously with its nodes when an average changes sign, and far
   * below 0 it does nothing.
   */
  private final double[] times;
  private final double[] logs;
  private final double[] average;
  private final double[] forward;
  private final ForwardShape[] shapes;
  // Derivatives of the node forwards by the averages to their left and right, of the first and last
  // by their neighbour.
  private final double[] byLeft;
  private final double[] byRight;
  private double firstByInner;
  private double lastByInner;

  MonotoneConvex(double[] times, double[] logs) {
    this.times = times;
    this.logs = logs;
    int n = times.length;
    average = new double[n];
    for (int i = 0; i < n; i++) {
      average[i] = ((i == 0 ? 0 : logs[i - 1]) - logs[i]) / width(i);
    }
    forward = new double[n + 1];
    byLeft = new double[n + 1];
    byRight = new double[n + 1];
    for (int i = 1; i < n; i++) {
      double share = width(i - 1) / (width(i - 1) + width(i));
      double line = average[i - 1] + share * (average[i] - average[i - 1]);
      bound(i, line, 1 - share, share, average[i - 1], average[i]);
    }
    if (n == 1) {
      forward[0] = average[0];
      forward[1] = average[0];
      byRight[0] = 1;
      byLeft[1] = 1;
    } else {
      double first = average[0];
      double last = average[n - 1];
      firstByInner = bound(0, 1.5 * first - 0.5 * forward[1], 0, 1.5, first, first) ? -0.5 : 0;
      lastByInner = bound(n, 1.5 * last - 0.5 * forward[n - 1], 1.5, 0, last, last) ? -0.5 : 0;
    }
    shapes = new ForwardShape[n];
    for (int i = 0; i < n; i++) {
      shapes[i] = new ForwardShape(forward[i] - average[i], forward[i + 1] - average[i]);
    }
  }

  private double width(int i) {
    return i == 0 ? times[0] : times[i] - times[i - 1];
  }

  /** Sets a node's forward from the line, within its bounds; whether the line itself is taken. */
  private boolean bound(
      int i, double line, double left, double right, double before, double after) {
    double least = Math.min(before, after);
    double most = 2 * Math.abs(least);
    if (line > most) {
      double slope = least < 0 ? -2 : 2;
      boolean leftIsLeast = i > 0 && (before <= after || i == average.length);
      forward[i] = most;
      byLeft[i] = leftIsLeast ? slope : 0;
      byRight[i] = leftIsLeast ? 0 : slope;
      return false;
    }
    if (line < 0 && least >= 0) {
      forward[i] = 0;
      return false;
    }
    forward[i] = line;
    byLeft[i] = left;
    byRight[i] = right;
    return true;
  }

  @Override
  public Pieces pieces() {
    int n = times.length;
    Pieces pieces = new Pieces(2 * n + 1);
    for (int i = 0; i < n; i++) {
      double from = i == 0 ? 0 : times[i - 1];
      shapes[i].addPieces(pieces, from, times[i], i == 0 ? 0 : logs[i - 1], average[i]);
    }
    pieces.add(times[n - 1], logs[n - 1], -forward[n], 0, 0);
    return pieces;
  }

  @Override
  public void addGradient(double t, double weight, double[] gradient) {
    int n = times.length;
    int i = Scheme.interval(times, t);
    if (i == n) {
      gradient[n - 1] += weight;
      addForward(n, -weight * (t - times[n - 1]), gradient);
      return;
    }
    // ln P = ln P(from) − h (x average + ∫₀ˣ g), and the average itself is the difference of two
    // nodes.
    double h = width(i);
    double x = (t - (i == 0 ? 0 : times[i - 1])) / h;
    double by0 = shapes[i].integralBy0(x);
    double by1 = shapes[i].integralBy1(x);
    if (i > 0) {
      gradient[i - 1] += weight;
    }
    addAverage(i, -weight * h * (x - by0 - by1), gradient);
    addForward(i, -weight * h * by0, gradient);
    addForward(i + 1, -weight * h * by1, gradient);
  }

  private void addForward(int i, double weight, double[] gradient) {
    int n = times.length;
    if (i > 0) {
      addAverage(i - 1, weight * byLeft[i], gradient);
    }
    if (i < n) {
      addAverage(i, weight * byRight[i], gradient);
    }
    if (i == 0 && firstByInner != 0) {
      addForward(1, weight * firstByInner, gradient);
    } else if (i == n && lastByInner != 0) {
      addForward(n - 1, weight * lastByInner, gradient);
    }
  }

  private void addAverage(int i, double weight, double[] gradient) {
    double slope = weight / width(i);
    gradient[i] -= slope;
    if (i > 0) {
      gradient[i - 1] += slope;
    }
  }

  @Override
  public boolean hasContinuousForward() {
    for (ForwardShape shape : shapes) {
      if (!shape.isContinuous()) {
        return false;
      }
    }
    return true;
  }
}
