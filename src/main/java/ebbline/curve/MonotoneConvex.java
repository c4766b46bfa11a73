package ebbline.curve;

/**
 * Hagan and West's monotone convex interpolation of forwards [Applied Math. Finance 13(2), 2006].
 *
 * <p>Forwards at the nodes lie on the line through the neighbouring intervals' average forwards; in
 * each interval the forward is made of parabolas that keep the interval's average and bring no
 * turning point that the averages do not ask for. Where both neighbouring averages are
 * non-negative, the node's forward is kept between 0 and twice the smaller one, which keeps the
 * whole curve non-negative; a negative average is ordinary input and is left alone.
 */
final class MonotoneConvex {
  private MonotoneConvex() {}

  static Pieces pieces(double[] times, Jet[] logs) {
    int n = times.length;
    Jet[] average = new Jet[n];
    for (int i = 0; i < n; i++) {
      double from = i == 0 ? 0 : times[i - 1];
      Jet log = i == 0 ? Jet.ZERO : logs[i - 1];
      average[i] = log.minus(logs[i]).over(times[i] - from);
    }
    Jet[] forward = forwards(times, average);
    Pieces pieces = new Pieces();
    for (int i = 0; i < n; i++) {
      double from = i == 0 ? 0 : times[i - 1];
      Jet log = i == 0 ? Jet.ZERO : logs[i - 1];
      Span span = new Span(pieces, from, times[i], log, logs[i]);
      interval(span, average[i], forward[i].minus(average[i]), forward[i + 1].minus(average[i]));
    }
    pieces.add(Jet.of(times[n - 1]), logs[n - 1], forward[n].negate(), Jet.ZERO, Jet.ZERO);
    return pieces;
  }

  /** Forwards at 0 and at the nodes. */
  private static Jet[] forwards(double[] times, Jet[] average) {
    int n = average.length;
    Jet[] forward = new Jet[n + 1];
    for (int i = 1; i < n; i++) {
      double before = i == 1 ? times[0] : times[i - 1] - times[i - 2];
      double after = times[i] - times[i - 1];
      Jet line = average[i].times(before).plus(average[i - 1].times(after)).over(before + after);
      forward[i] = within(line, average[i - 1], average[i]);
    }
    if (n == 1) {
      forward[0] = average[0];
      forward[1] = average[0];
      return forward;
    }
    forward[0] = outer(average[0], forward[1]);
    forward[n] = outer(average[n - 1], forward[n - 1]);
    return forward;
  }

  /** At an end the forward leaves the average half as far as the inner one, the other way. */
  private static Jet outer(Jet average, Jet inner) {
    Jet line = average.minus(inner.minus(average).times(0.5));
    return within(line, average, average);
  }

  private static Jet within(Jet forward, Jet left, Jet right) {
    if (left.value() >= 0 && right.value() >= 0) {
      return forward.max(Jet.ZERO).min(left.min(right).times(2));
    }
    return forward;
  }

  /*
   * g(x) = f − average over x in [0, 1], with g(0) = g0, g(1) = g1 and ∫g = 0. The four shapes are the
   * paper's; the turning point η splits the interval, and its parts are hung up at the interval's
   * two ends, so that a very narrow part loses nothing.
   */
  private static void interval(Span span, Jet average, Jet g0, Jet g1) {
    double a = g0.value();
    double b = g1.value();
    if (a == 0 && b == 0) {
      span.flatFromLeft(average);
    } else if ((a < 0 && -0.5 * a <= b && b <= -2 * a) || (a > 0 && -0.5 * a >= b && b >= -2 * a)) {
      // one parabola: g0 (1 − 4x + 3x²) + g1 (−2x + 3x²)
      span.whole(average.plus(g0), g0.times(-4).minus(g1.times(2)), g0.plus(g1).times(3));
    } else if ((a < 0 && b > -2 * a) || (a > 0 && b < -2 * a)) {
      Jet level = average.plus(g0);
      span.flatFromLeft(level);
      span.parabolaToRight(level, g1.minus(g0), g0.times(-3).over(g1.minus(g0)));
    } else if ((a > 0 && b < 0) || (a < 0 && b > 0)) {
      Jet level = average.plus(g1);
      Jet rest = g0.plus(g1.times(2)).over(g0.minus(g1));
      span.parabolaFromLeft(level, g0.minus(g1), g1.times(3).over(g1.minus(g0)));
      span.flatToRight(level, rest);
    } else {
      Jet sum = g0.plus(g1);
      Jet dip = g0.times(g1).over(sum).negate();
      Jet level = average.plus(dip);
      if (b != 0) {
        span.parabolaFromLeft(level, g0.minus(dip), g1.over(sum));
      }
      if (a != 0) {
        span.parabolaToRight(level, g1.minus(dip), g0.over(sum));
      }
    }
  }

  /** One interval between nodes, and the parts of it that go into the pieces. */
  private record Span(Pieces pieces, double from, double to, Jet logFrom, Jet logTo) {

    void flatFromLeft(Jet level) {
      pieces.add(Jet.of(from), logFrom, level.negate(), Jet.ZERO, Jet.ZERO);
    }

    /** forward = value + linear x + square x² over the whole interval. */
    void whole(Jet value, Jet linear, Jet square) {
      double h = to - from;
      pieces.add(
          Jet.of(from), logFrom, value.negate(), linear.over(-2 * h), square.over(-3 * h * h));
    }

    /** forward = level + rise ((η − x)/η)², from the left end to x = η. */
    void parabolaFromLeft(Jet level, Jet rise, Jet eta) {
      Jet width = eta.times(to - from);
      pieces.add(
          Jet.of(from),
          logFrom,
          level.plus(rise).negate(),
          rise.over(width),
          rise.over(width.times(width).times(-3)));
    }

    /** forward = level + rise ((x − η)/(1 − η))², from x = η to the right end. */
    void parabolaToRight(Jet level, Jet rise, Jet rest) {
      Jet width = widthToRight(rest);
      Jet log = logTo.plus(width.times(level.plus(rise.over(3))));
      pieces.add(
          Jet.of(to).minus(width),
          log,
          level.negate(),
          Jet.ZERO,
          rise.over(width.times(width).times(-3)));
    }

    void flatToRight(Jet level, Jet rest) {
      Jet width = widthToRight(rest);
      pieces.add(
          Jet.of(to).minus(width),
          logTo.plus(width.times(level)),
          level.negate(),
          Jet.ZERO,
          Jet.ZERO);
    }

    /** The width as the start's rounding leaves it, so that the piece ends exactly at the node. */
    private Jet widthToRight(Jet rest) {
      double start = to - rest.value() * (to - from);
      return new Jet(to - start, rest.slope() * (to - from));
    }
  }
}
