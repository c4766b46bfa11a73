package ebbline.bond;

import ebbline.instrument.PeriodFlows;

/**
 * Price and yield by the street convention: P = Σ cₖ v^(w + k), v = 1/(1 + y/f), w the fraction of
 * a period to the next coupon; in the last period simple interest, P = c/(1 + w y/f). Prices are
 * dirty, per 100; yields decimals per year, compounded f times a year.
 */
public final class StreetYield {
  private static final int MOST_STEPS = 200;

  private final PeriodFlows flows;

  public StreetYield(PeriodFlows flows) {
    this.flows = flows;
  }

  /** Price with its first two derivatives in the yield, and the present value weighted by time. */
  private record Point(double price, double slope, double bend) {}

  private boolean lastPeriod() {
    return flows.size() == 1;
  }

  private Point at(double yield) {
    double f = flows.frequency();
    double w = flows.toFirst();
    if (lastPeriod()) {
      double growth = 1 + w * yield / f;
      double price = flows.amount(0) / growth;
      double slope = -price * (w / f) / growth;
      return new Point(price, slope, -2 * slope * (w / f) / growth);
    }
    double v = 1 / (1 + yield / f);
    double price = 0;
    double slope = 0;
    double bend = 0;
    double power = Math.pow(v, w);
    for (int k = 0; k < flows.size(); k++) {
      double value = flows.amount(k) * power;
      double n = w + k;
      price += value;
      slope -= n * value;
      bend += n * (n + 1) * value;
      power *= v;
    }
    return new Point(price, slope * v / f, bend * v * v / (f * f));
  }

  /**
   * Dirty price at a yield.
   *
   * @throws IllegalArgumentException if a period's growth 1 + y/f is not positive
   */
  public double price(double yield) {
    if (!(yield > lowest())) {
      throw new IllegalArgumentException(
          "a yield must be above " + lowest() + " at this frequency, found " + yield);
    }
    return at(yield).price();
  }

  /** The yield at which growth over a period, or over what is left of the last one, is nothing. */
  private double lowest() {
    return lastPeriod() ? -flows.frequency() / flows.toFirst() : -flows.frequency();
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
    // Newton on ln P in ln growth is close to linear; the bracket keeps it safe.
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
      double step = Math.log(point.price() / price) * point.price() / point.slope();
      double next = yield - step;
      if (!(next > low && next < high)) {
        next = Double.isInfinite(high) ? 2 * Math.abs(yield) + 1 : 0.5 * (low + high);
      }
      if (Math.abs(next - yield) <= 1e-15 * Math.max(1, Math.abs(yield)) || high - low < 1e-16) {
        return next;
      }
      yield = next;
    }
    return yield;
  }

  /** −P′/P, years. */
  public double modifiedDuration(double yield) {
    Point point = at(yield);
    return -point.slope() / point.price();
  }

  /** Present-value weighted mean time of the flows, years: modified duration × (1 + y/f). */
  public double macaulayDuration(double yield) {
    double growth =
        lastPeriod()
            ? 1 + flows.toFirst() * yield / flows.frequency()
            : 1 + yield / flows.frequency();
    return modifiedDuration(yield) * growth;
  }

  /** P″/P, years². */
  public double convexity(double yield) {
    Point point = at(yield);
    return point.bend() / point.price();
  }

  /** Price gained when the yield falls by one basis point, two-sided, per 100. */
  public double dv01(double yield) {
    return (at(yield - 1e-4).price() - at(yield + 1e-4).price()) / 2;
  }
}
