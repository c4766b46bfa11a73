package ebbline.curve;

import java.util.Objects;

/**
 * A curve through nodes. Between them it runs as its interpolation says; beyond the last one the
 * instantaneous forward there goes on ({@code linear-zero}: the last zero rate).
 *
 * <p>All interpolations start from discount 1 at time 0; {@code linear-zero} holds the first zero
 * rate down to there.
 */
public final class InterpolatedCurve implements DiscountCurve {
  private static final int CELLS_PER_PIECE = 4;
  private static final int MOST_CELLS = 4096;

  private final Interpolation interpolation;
  private final double[] times;
  private final double[] logs;
  private final double[] starts;
  private final double[] c0;
  private final double[] c1;
  private final double[] c2;
  private final double[] c3;
  private final double cellsPerYear;
  private final int[] firstPiece;

  /** Pieces in the direction of each node, made when sensitivities are first asked for. */
  private volatile Pieces[] directions;

  private InterpolatedCurve(Interpolation interpolation, double[] times, double[] logs) {
    this.interpolation = interpolation;
    this.times = times;
    this.logs = logs;
    Pieces pieces = PieceBuilder.of(interpolation, times, jets(logs, -1));
    int n = pieces.count();
    starts = new double[n];
    c0 = new double[n];
    c1 = new double[n];
    c2 = new double[n];
    c3 = new double[n];
    for (int i = 0; i < n; i++) {
      starts[i] = pieces.start(i);
      c0[i] = pieces.value(i, 0);
      c1[i] = pieces.value(i, 1);
      c2[i] = pieces.value(i, 2);
      c3[i] = pieces.value(i, 3);
    }
    int cells = Math.min(MOST_CELLS, CELLS_PER_PIECE * n);
    cellsPerYear = cells / times[times.length - 1];
    firstPiece = new int[cells + 1];
    for (int cell = 0, i = 0; cell <= cells; cell++) {
      while (i + 1 < n && starts[i + 1] <= cell / cellsPerYear) {
        i++;
      }
      firstPiece[cell] = Math.max(0, i - 1); // one early, so that rounding of the cell cannot skip
    }
  }

  /**
   * @param times years, positive, strictly increasing, at least one
   * @param logDiscounts ln P at the times, finite
   * @throws IllegalArgumentException if a rule above is broken
   */
  public static InterpolatedCurve of(
      Interpolation interpolation, double[] times, double[] logDiscounts) {
    Objects.requireNonNull(interpolation, "interpolation");
    if (times.length == 0 || times.length != logDiscounts.length) {
      throw new IllegalArgumentException(
          "a curve needs as many log discounts as times and at least one, found "
              + logDiscounts.length
              + " and "
              + times.length);
    }
    double previous = 0;
    for (int i = 0; i < times.length; i++) {
      if (!(times[i] > previous && Double.isFinite(times[i]))) {
        throw new IllegalArgumentException(
            "node times must be positive and increase, found " + times[i] + " after " + previous);
      }
      if (!Double.isFinite(logDiscounts[i])) {
        throw new IllegalArgumentException(
            "log discounts must be finite, found " + logDiscounts[i] + " at " + times[i]);
      }
      previous = times[i];
    }
    return new InterpolatedCurve(interpolation, times.clone(), logDiscounts.clone());
  }

  private static Jet[] jets(double[] logs, int direction) {
    Jet[] jets = new Jet[logs.length];
    for (int i = 0; i < logs.length; i++) {
      jets[i] = new Jet(logs[i], i == direction ? 1 : 0);
    }
    return jets;
  }

  public Interpolation interpolation() {
    return interpolation;
  }

  private int piece(double t) {
    int cell = (int) Math.min(t * cellsPerYear, firstPiece.length - 1.0);
    int i = firstPiece[cell];
    while (i + 1 < starts.length && starts[i + 1] <= t) {
      i++;
    }
    return i;
  }

  @Override
  public double logDiscount(double t) {
    int i = piece(t);
    double d = t - starts[i];
    return c0[i] + d * (c1[i] + d * (c2[i] + d * c3[i]));
  }

  @Override
  public double forward(double t) {
    int i = piece(t);
    double d = t - starts[i];
    return -(c1[i] + d * (2 * c2[i] + 3 * d * c3[i]));
  }

  @Override
  public double forwardSlope(double t) {
    int i = piece(t);
    return -(2 * c2[i] + 6 * (t - starts[i]) * c3[i]);
  }

  @Override
  public double[] nodes() {
    return times.clone();
  }

  /** ln P at the nodes, as given. A fresh array. */
  public double[] nodeLogDiscounts() {
    return logs.clone();
  }

  @Override
  public void addLogDiscountGradient(double t, double weight, double[] gradient) {
    Pieces[] all = directions;
    if (all == null) {
      all = new Pieces[times.length];
      for (int j = 0; j < all.length; j++) {
        all[j] = PieceBuilder.of(interpolation, times, jets(logs, j));
      }
      directions = all; // two threads may both build it: the same figures
    }
    int i = piece(t);
    double d = t - starts[i];
    for (int j = 0; j < all.length; j++) {
      gradient[j] += weight * all[j].slope(i, d);
    }
  }

  @Override
  public double[] breaks() {
    return starts.clone();
  }

  @Override
  public boolean hasContinuousForward() {
    return interpolation == Interpolation.CUBIC
        || interpolation == Interpolation.MONOTONE_CONVEX
        || times.length == 1;
  }
}
