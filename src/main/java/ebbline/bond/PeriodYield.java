package ebbline.bond;

import ebbline.instrument.PeriodFlows;
import java.util.Objects;

/**
 * Price and yield of flows one period apart: P = h(y) Σ cₖ vᵏ, v = 1/(1 + y/f), where h discounts
 * over the w periods to the first flow: (1 + y/f)^(−w) or 1/(1 + w y/f) as {@link FirstFraction}
 * says. Prices are dirty, per 100; yields decimals per year, compounded f times a year.
 */
public final class PeriodYield {
  private static final int MOST_STEPS = 200;

  private final PeriodFlows flows;
  private final boolean simple;

  public PeriodYield(PeriodFlows flows, FirstFraction convention) {
    this.flows = Objects.requireNonNull(flows, "flows");
    this.simple = convention.isSimple(flows.size());
  }

  /** Price with its first two derivatives in the yield, and the mean time of the flows. */
  private record Point(double price, double slope, double bend, double meanTime) {}

  private Point at(double yield) {
    double f = flows.frequency();
    double w = flows.toFirst();
    double v = 1 / (1 + yield / f);
    double sum = 0;
    double slope = 0;
    double bend = 0;
    double power = 1;
    for (int k = 0; k < flows.size(); k++) {
      double value = flows.amount(k) * power;
      sum += value;
      slope -= k * value;
      bend += k * (k + 1.0) * value;
      power *= v;
    }
    double meanTime = (w - slope / sum) / f;
    slope *= v / f;
    bend *= v * v / (f * f);
    double h = simple ? 1 / (1 + w * yield / f) : Math.pow(v, w);
    double first = simple ? -(w / f) * h * h : -(w / f) * h * v;
    double second = simple ? -2 * (w / f) * first * h : -first * (w + 1) / f * v;
    return new Point(
        h * sum, first * sum + h * slope, second * sum + 2 * first * slope + h * bend, meanTime);
  }

  /**
   * Dirty price at a yield.
   *
   * @throws IllegalArgumentException if growth over a period is not positive
   */
  public double price(double yield) {
    return checked(yield).price();
  }

  private Point checked(double yield) {
    if (!(yield > lowest() && Double.isFinite(yield))) {
      throw new IllegalArgumentException(
          "a yield must be above " + lowest() + " at this frequency, found " + yield);
    }
    return at(yield);
  }

  /** The yield at which growth over a period, or over the simple fraction of one, is nothing. */
  private double lowest() {
    double f = flows.frequency();
    double ofFraction = simple ? -f / flows.toFirst() : -f;
    return simple && flows.size() == 1 ? ofFraction : Math.max(-f, ofFraction);
  }

  /**
   * The yield of a dirty price, to 1e-14.
   *
   * @throws IllegalArgumentException if no yield gives it, or flows change sign so that there may
   *     be several
   */
  public double yieldOf(double price) {
    for (int k = 0; k < flows.size(); k++) {
      if (!(flows.amount(k) >= 0)) {
        throw new IllegalArgumentException(
            "flows of both signs may have several yields; none is given");
      }
    }
    if (!(price > 0 && Double.isFinite(price))) {
      throw new IllegalArgumentException(
          "no yield gives a dirty price that is not above 0, found " + price);
    }
    // Newton on ln P is close to linear; the bracket keeps it safe.
    double low = lowest();
    double high = Double.POSITIVE_INFINITY;
    double yield = 0.05;
    for (int i = 0; i < MOST_STEPS; i++) {
      Point point = at(yield);
      if (point.price() > price) {
        low = yield;
      } else {
        high = yield;
      }
      double next = yield - Math.log(point.price() / price) * point.price() / point.slope();
      if (!(next > low && next < high)) {
        next = Double.isInfinite(high) ? 2 * Math.abs(yield) + 1 : 0.5 * (low + high);
      }
      if (Math.abs(next - yield) <= 1e-15 * Math.max(1, Math.abs(yield)) || high - low < 1e-16) {
        yield = next;
        break;
      }
      yield = next;
    }
    if (yield > lowest()
        && Double.isFinite(yield)
        && Math.abs(at(yield).price() / price - 1) <= 1e-9) {
      return yield;
    }
    throw new IllegalArgumentException("no yield gives the dirty price " + price);
  }

  /** −P′/P, years. */
  public double modifiedDuration(double yield) {
    Point point = checked(yield);
    return -point.slope() / point.price();
  }

  /** Mean time of the flows weighted by their present values, years. */
  public double macaulayDuration(double yield) {
    return checked(yield).meanTime();
  }

  /** P″/P, years². */
  public double convexity(double yield) {
    Point point = checked(yield);
    return point.bend() / point.price();
  }

  /** Price gained when the yield falls by one basis point, two-sided, per 100. */
  public double dv01(double yield) {
    return (price(yield - 1e-4) - price(yield + 1e-4)) / 2;
  }
}
