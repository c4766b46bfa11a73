package ebbline.instrument;

import ebbline.time.CouponPeriod;
import ebbline.time.DayCount;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.List;

/** How far away, in coupon periods, the payments of a leg lie. */
final class LegYieldTerms {
  private LegYieldTerms() {}

  static PeriodFlows periodFlows(PlacedLeg leg, double settlement) {
    List<Integer> left = leg.owedAfter(settlement);
    double[] amounts = new double[left.size()];
    for (int j = 0; j < amounts.length; j++) {
      amounts[j] = leg.amount(left.get(j), settlement);
    }
    return new PeriodFlows(
        leg.terms().frequency(), periodsTo(leg, left.get(0), settlement), amounts);
  }

  /** Periods from settlement to the end of period i, odd ones as the parts they are made of. */
  static double periodsTo(PlacedLeg leg, int i, double settlement) {
    double sum = 0;
    for (int k = 0; k <= i; k++) {
      LegPeriod period = leg.periods().get(k);
      if (period.end() > settlement + TimeAxis.SAME_MOMENT) {
        sum += parts(leg, period, settlement);
      }
    }
    return sum;
  }

  private static double parts(PlacedLeg leg, LegPeriod period, double settlement) {
    if (period.start() >= settlement - TimeAxis.SAME_MOMENT && period.regular()) {
      return 1;
    }
    int frequency = leg.terms().frequency();
    if (period.dated().isEmpty()) {
      double from = Math.max(period.start(), settlement);
      double periods = (period.end() - from) * frequency;
      // A coupon just now belongs to the past, so a whole period is left, to the last bit.
      return Math.abs(periods - 1) <= frequency * TimeAxis.SAME_MOMENT ? 1 : periods;
    }
    CouponPeriod on = period.dated().get();
    LocalDate settles = leg.dateAt(settlement);
    LocalDate from = settles.isAfter(on.start()) ? settles : on.start();
    double sum = 0;
    for (int j = 1; j < on.reference().size(); j++) {
      LocalDate left = on.reference().get(j - 1);
      LocalDate right = on.reference().get(j);
      LocalDate first = from.isAfter(left) ? from : left;
      LocalDate end = on.end().isBefore(right) ? on.end() : right;
      if (first.isBefore(end)) {
        sum += part(leg.dayCount(), on, left, right, first, end);
      }
    }
    return sum;
  }

  /** The part of a reference period between two dates in it. */
  private static double part(
      DayCount dayCount,
      CouponPeriod on,
      LocalDate left,
      LocalDate right,
      LocalDate first,
      LocalDate end) {
    CouponPeriod whole =
        new CouponPeriod(
            left, right, right, on.frequency(), List.of(left, right), on.maturity(), on.calendar());
    long days = dayCount.periodDays(whole);
    // From the start, not to the end: the two differ where thirty-day months are counted.
    long before = dayCount.days(left, first, whole);
    long upTo = end.equals(right) ? days : dayCount.days(left, end, whole);
    return (upTo - before) / (double) days;
  }
}
