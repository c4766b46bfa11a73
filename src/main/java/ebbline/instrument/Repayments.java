package ebbline.instrument;

import ebbline.time.TimeAxis;
import java.util.List;

/** What each period repays, per 100 of the first face, the rest at maturity. */
final class Repayments {
  private Repayments() {}

  static double[] of(FixedLeg leg, List<LegPeriod> periods, TimeAxis axis) {
    int last = periods.size() - 1;
    double[] repaid = new double[periods.size()];
    double left = 100;
    double before = Double.NEGATIVE_INFINITY;
    for (FixedLeg.Sinking each : leg.sinking()) {
      double at = axis.years(each.at());
      if (!(at > before)) {
        throw new IllegalArgumentException("repayments must ascend, found " + each.at());
      }
      before = at;
      left -= each.amount();
      if (at <= periods.get(0).start() + TimeAxis.SAME_MOMENT) {
        continue; // repaid before the period that runs today
      }
      int found = -1;
      for (int i = 0; i <= last; i++) {
        if (Math.abs(periods.get(i).end() - at) <= TimeAxis.SAME_MOMENT) {
          found = i;
        }
      }
      if (found < 0) {
        throw new IllegalArgumentException(
            "a repayment " + PlacedLeg.near(periods, at, each.at(), false));
      }
      repaid[found] += each.amount();
    }
    // Amounts that add up to the face but for rounding leave nothing.
    repaid[last] += Math.abs(left) <= 1e-10 ? 0 : left;
    return repaid;
  }
}
