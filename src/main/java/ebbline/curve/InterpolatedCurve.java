package ebbline.curve;

import java.util.Arrays;
import java.util.Objects;

/**
 * A curve through nodes, which it meets exactly. Between them it runs as its interpolation says;
 * beyond the last one the instantaneous forward there goes on ({@code linear-zero}: the last zero
 * rate).
 *
 * <p>All interpolations start from discount 1 at time 0, a knot of theirs; {@code linear-zero}
 * holds the first zero rate down to there.
 */
public final class InterpolatedCurve implements DiscountCurve {
  private static final int CELLS_PER_PIECE = 4;
  private static final int MOST_CELLS = 4096;
  private static final int WIDTH = Pieces.WIDTH;

  private final Interpolation interpolation;
  private final double[] times;
  private final double[] logs;
  private final Scheme scheme;
  private final double[] pieces;
  private final boolean straight;
  private final double cellsPerYear;
  private final int[] firstPiece;

  private InterpolatedCurve(Interpolation interpolation, double[] times, double[] logs) {
    this.interpolation = interpolation;
    this.times = times;
    this.logs = logs;
    scheme = Scheme.of(interpolation, times, logs);
    double[] numbers = scheme.pieces().numbers();
    pieces = Arrays.copyOf(numbers, numbers.length + 1);
    pieces[numbers.length] = Double.POSITIVE_INFINITY; // no piece begins there: the search stops
    straight = interpolation == Interpolation.LOG_LINEAR;
    // A table of equal cells leads to the piece in a step or two, however many pieces there are.
    int count = numbers.length / WIDTH;
    int cells = Math.min(MOST_CELLS, CELLS_PER_PIECE * count);
    cellsPerYear = cells / times[times.length - 1];
    firstPiece = new int[cells + 1];
    int at = 0;
    for (int cell = 0; cell <= cells; cell++) {
      while (pieces[at + WIDTH] <= cell / cellsPerYear) {
        at += WIDTH;
      }
      firstPiece[cell] = Math.max(0, at - WIDTH); // one early: rounding of the cell cannot skip
    }
    for (double number : numbers) {
      if (!Double.isFinite(number)) {
        throw new IllegalArgumentException(
            "nodes must leave finite forwards; they lie too close together or too far from 1");
      }
    }
  }

  /**
   * @param interpolation all but {@code smith-wilson}, which needs more than nodes
   * @param times years, positive, strictly increasing, at least one
   * @param logDiscounts ln P at the times, finite
   * @throws IllegalArgumentException if a rule above is broken
   */
  public static InterpolatedCurve of(
      Interpolation interpolation, double[] times, double[] logDiscounts) {
    Objects.requireNonNull(interpolation, "interpolation");
    NodeRules.check(times, logDiscounts);
    return new InterpolatedCurve(interpolation, times.clone(), logDiscounts.clone());
  }

  /**
   * As {@link #of}, from discount factors.
   *
   * @param discounts P at the times, positive
   */
  public static InterpolatedCurve ofDiscounts(
      Interpolation interpolation, double[] times, double[] discounts) {
    return of(interpolation, times, NodeRules.logs(discounts));
  }

  public Interpolation interpolation() {
    return interpolation;
  }

  /** Where the piece that holds t begins in the array. */
  private int piece(double t) {
    int at = firstPiece[Math.min((int) (t * cellsPerYear), firstPiece.length - 1)];
    // Two steps without a branch to guess wrong; more only where pieces are shorter than a cell.
    at += pieces[at + WIDTH] <= t ? WIDTH : 0;
    at += pieces[at + WIDTH] <= t ? WIDTH : 0;
    while (pieces[at + WIDTH] <= t) {
      at += WIDTH;
    }
    return at;
  }

  @Override
  public double logDiscount(double t) {
    int i = piece(t);
    double d = t - pieces[i];
    if (straight) {
      return pieces[i + 1] + d * pieces[i + 2];
    }
    return pieces[i + 1] + d * (pieces[i + 2] + d * (pieces[i + 3] + d * pieces[i + 4]));
  }

  @Override
  public double forward(double t) {
    int i = piece(t);
    double d = t - pieces[i];
    return -(pieces[i + 2] + d * (2 * pieces[i + 3] + 3 * d * pieces[i + 4]));
  }

  @Override
  public double forwardSlope(double t) {
    int i = piece(t);
    return -(2 * pieces[i + 3] + 6 * (t - pieces[i]) * pieces[i + 4]);
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
    scheme.addGradient(t, weight, gradient);
  }

  @Override
  public double[] breaks() {
    double[] breaks = new double[pieces.length / WIDTH];
    for (int i = 0; i < breaks.length; i++) {
      breaks[i] = pieces[i * WIDTH];
    }
    return breaks;
  }

  @Override
  public boolean hasContinuousForward() {
    return scheme.hasContinuousForward();
  }
}
