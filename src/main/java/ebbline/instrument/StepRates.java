package ebbline.instrument;

import ebbline.time.TimeAxis;
import java.util.List;

/** Which coupon each period pays. */
final class StepRates {
  private StepRates() {}

  static double[] of(FixedLeg leg, List<LegPeriod> periods, TimeAxis axis) {
    double[] rates = new double[periods.size()];
    java.util.Arrays.fill(rates, leg.coupon());
    double before = Double.NEGATIVE_INFINITY;
    for (FixedLeg.Step step : leg.steps()) {
      double from = axis.years(step.from());
      if (!(from > before)) {
        throw new IllegalArgumentException("steps must ascend, found " + step.from());
      }
      before = from;
      boolean met = from < periods.get(0).start();
      for (int i = 0; i < rates.length; i++) {
        double start = periods.get(i).start();
        met |= Math.abs(start - from) <= TimeAxis.SAME_MOMENT;
        if (start >= from - TimeAxis.SAME_MOMENT) {
          rates[i] = step.rate();
        }
      }
      if (!met) {
        throw new IllegalArgumentException(
            "a step " + PlacedLeg.near(periods, from, step.from(), true));
      }
    }
    return rates;
  }
}
