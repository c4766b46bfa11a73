package ebbline.bond;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;

/** The continuous spread over a curve's zero rates at which flows are worth a price. */
public final class ZSpread {
  private static final int MOST_STEPS = 200;

  private ZSpread() {}

  /**
   * The spread z with dirty = Σ cᵢ P(tᵢ)/P(s) e^(−z (tᵢ − s)), to 1e-14.
   *
   * @param flows after settlement, none negative
   * @param settlement s, years from today
   * @param dirty price at settlement, per 100, above 0
   * @throws IllegalArgumentException if no spread or more than one may give the price
   */
  public static double of(CashFlows flows, DiscountCurve curve, double settlement, double dirty) {
    for (int i = 0; i < flows.size(); i++) {
      if (!(flows.amount(i) >= 0)) {
        throw new IllegalArgumentException(
            "flows of both signs may have several spreads; none is given");
      }
    }
    if (!(dirty > 0 && Double.isFinite(dirty)) || flows.isEmpty()) {
      throw new IllegalArgumentException(
          "no spread gives a dirty price that is not above 0, found " + dirty);
    }
    // ln of the price is convex and falls in z, so Newton on it comes in from one side.
    double log = Math.log(dirty) + curve.logDiscount(settlement);
    double z = 0;
    for (int step = 0; step < MOST_STEPS; step++) {
      double sum = 0;
      double weighted = 0;
      for (int i = 0; i < flows.size(); i++) {
        double t = flows.time(i);
        double value = flows.amount(i) * Math.exp(curve.logDiscount(t) - z * (t - settlement));
        sum += value;
        weighted += (t - settlement) * value;
      }
      double change = (Math.log(sum) - log) * sum / weighted;
      z += change;
      if (Math.abs(change) <= 1e-15 * Math.max(1, Math.abs(z))) {
        break;
      }
    }
    if (Double.isFinite(z)) {
      return z;
    }
    throw new IllegalArgumentException("no spread gives the dirty price " + dirty);
  }
}
