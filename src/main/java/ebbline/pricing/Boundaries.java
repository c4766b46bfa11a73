package ebbline.pricing;

import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;

/** Where two choices are worth the same: the roots of their difference in an interval. */
final class Boundaries {
  private static final int SCAN = 40;
  private static final int MOST_STEPS = 100;
  private static final int NEAR_MISS_STEPS = 40;

  /*
   * Beside the boundary the difference is linear, so a boundary off by ε costs only about half its slope times ε²: 1e-7
   * of a deviation is as good as none.
   */
  private static final double NEAR = 1e-8;
  private static final double LAST_MOVE = 3e-5;

  /** A chord this short counts as a tangent. */
  private static final double LOCAL = 0.1;

  private static final int FREE_STEPS = 20;
  private static final double FIRST_MOVE = 0.25;

  private Boundaries() {}

  /**
   * All roots: changes of sign between the points of a scan, and where the function nearly touches
   * 0 between.
   *
   * @param values at equal steps from {@code low} to {@code high}
   */
  static double[] all(DoubleUnaryOperator gap, double[] values, double low, double high) {
    int n = values.length - 1;
    double by = (high - low) / n;
    double[] found = new double[0];
    for (int k = 0; k < n; k++) {
      double a = low + k * by;
      if (values[k] > 0 != values[k + 1] > 0) {
        found = joined(found, root(gap, a, values[k], a + by, values[k + 1]));
      } else if (k + 2 <= n
          && values[k + 1] > 0 == values[k + 2] > 0
          && Math.abs(values[k + 1]) < Math.abs(values[k])
          && Math.abs(values[k + 1]) <= Math.abs(values[k + 2])) {
        found = joined(found, between(gap, a, a + 2 * by, values[k], values[k + 2]));
      }
    }
    return found;
  }

  /** Points of the scan that {@link #all} takes. */
  static int scanned() {
    return SCAN + 1;
  }

  static double[] joined(double[] a, double... b) {
    double[] all = Arrays.copyOf(a, a.length + b.length);
    System.arraycopy(b, 0, all, a.length, b.length);
    return all;
  }

  /**
   * The root of a function that has one at most, by tangents from a guess; NaN if they lead out of
   * the interval or nowhere, which leaves it to {@link #all}.
   *
   * @param sign of the function left of its root
   * @param slope of the function at the guess, or 0 if unknown
   * @param known whether guess and slope are this function's own but for a little, so that one
   *     tangent may do
   */
  static double near(
      DoubleUnaryOperator gap,
      double low,
      double high,
      int sign,
      double guess,
      double slope,
      boolean known) {
    double a = low;
    double b = high;
    double x = Math.max(low, Math.min(high, guess));
    double tangent = sign * slope < 0 ? slope : 0;
    double before = Double.NaN;
    double valueBefore = Double.NaN;
    for (int i = 0; i < FREE_STEPS; i++) {
      double value = gap.applyAsDouble(x);
      if (value == 0) {
        return Double.NaN;
      }
      boolean isLeft = value > 0 == sign > 0;
      if (isLeft) {
        a = x;
      } else {
        b = x;
      }
      boolean local = known && i == 0;
      if (i > 0) {
        // Far from its root the function need not be monotone; then only its sign leads on.
        boolean falls = (value - valueBefore) * sign * (x - before) < 0;
        tangent = falls ? (value - valueBefore) / (x - before) : 0;
        local = falls && Math.abs(x - before) < LOCAL;
      }
      double next = tangent == 0 ? x + (isLeft ? FIRST_MOVE : -FIRST_MOVE) : x - value / tangent;
      if (!(next > low && next < high)) {
        return Double.NaN;
      } else if (local && Math.abs(next - x) < LAST_MOVE) {
        return next;
      }
      before = x;
      valueBefore = value;
      x = next > a && next < b ? next : 0.5 * (a + b);
    }
    return Double.NaN;
  }

  /** Two roots between points of one sign, if the least magnitude between them changes it. */
  private static double[] between(
      DoubleUnaryOperator gap, double from, double to, double first, double last) {
    double golden = 0.5 * (3 - Math.sqrt(5));
    double sign = Math.signum(first);
    double a = from;
    double b = to;
    double x = a + golden * (b - a);
    double y = b - golden * (b - a);
    double fx = sign * gap.applyAsDouble(x);
    double fy = sign * gap.applyAsDouble(y);
    for (int i = 0; i < NEAR_MISS_STEPS; i++) {
      if (Math.min(fx, fy) < 0) {
        double inside = fx < fy ? x : y;
        double value = sign * Math.min(fx, fy);
        return new double[] {
          root(gap, from, first, inside, value), root(gap, inside, value, to, last)
        };
      }
      if (fx < fy) {
        b = y;
        y = x;
        fy = fx;
        x = a + golden * (b - a);
        fx = sign * gap.applyAsDouble(x);
      } else {
        a = x;
        x = y;
        fx = fy;
        y = b - golden * (b - a);
        fy = sign * gap.applyAsDouble(y);
      }
    }
    return new double[0];
  }

  /** Regula falsi with halved weights (Illinois), kept in the bracket. */
  private static double root(
      DoubleUnaryOperator gap, double from, double first, double to, double last) {
    double a = from;
    double fa = first;
    double b = to;
    double fb = last;
    double x = a;
    for (int i = 0; i < MOST_STEPS && Math.abs(b - a) > 0.1 * NEAR; i++) {
      double next = b - fb * (b - a) / (fb - fa);
      if (!(next > Math.min(a, b) && next < Math.max(a, b))) {
        next = 0.5 * (a + b);
      }
      double moved = Math.abs(next - x);
      x = next;
      double fx = gap.applyAsDouble(x);
      if (fx == 0 || moved < NEAR) {
        return x;
      }
      if (fx > 0 != fb > 0) {
        a = b;
        fa = fb;
      } else {
        fa *= 0.5;
      }
      b = x;
      fb = fx;
    }
    return 0.5 * (a + b);
  }
}
