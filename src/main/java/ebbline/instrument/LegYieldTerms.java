package ebbline.instrument;

import ebbline.time.CouponPeriod;
import ebbline.time.DayCount;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** How far away, in coupon periods and in years, the payments of a leg lie at settlement. */
final class LegYieldTerms {
  private final PlacedLeg leg;
  private final double settlement;

  LegYieldTerms(PlacedLeg leg, double settlement) {
    this.leg = leg;
    this.settlement = settlement;
  }

  YieldTerms terms() {
    LegPeriod last = leg.periods().get(leg.periods().size() - 1);
    Collected all = collect(Double.POSITIVE_INFINITY, 0);
    return all.terms(leg.redemptionAfter(settlement))
        .life(life(last, DayCount.ACT_365F), life(last, leg.dayCount()))
        .build();
  }

  /** The terms if {@code amount} ends them early; days to that end count as actual ones. */
  YieldTerms termsTo(double end, double amount) {
    double years =
        leg.isDated()
            ? ChronoUnit.DAYS.between(date(settlement), date(end)) / 365.0
            : end - settlement;
    return collect(end, amount).terms(OptionalDouble.of(amount)).life(years, years).build();
  }

  private LocalDate date(double time) {
    return leg.dateAt(time);
  }

  /** Payments up to an end, and how far away they are. */
  private final class Collected {
    private final List<double[]> payments = new ArrayList<>();
    private int periodsLeft;

    void add(double amount, double periods, double paidPeriods, double years) {
      payments.add(new double[] {amount, periods, paidPeriods, years});
    }

    YieldTerms.Builder terms(OptionalDouble redemption) {
      return YieldTerms.builder(leg.terms().frequency(), column(0))
          .at(column(1), column(2), column(3))
          .periodsLeft(periodsLeft)
          .interest(leg.accrued(settlement), leg.annualCoupon(settlement))
          .redemption(redemption);
    }

    private double[] column(int j) {
      return payments.stream().mapToDouble(each -> each[j]).toArray();
    }
  }

  private Collected collect(double end, double amount) {
    Collected found = new Collected();
    List<Integer> left = leg.owedAfter(settlement);
    double soFar = 0;
    int next = 0;
    for (int i = 0; i < leg.periods().size(); i++) {
      LegPeriod period = leg.periods().get(i);
      double before = soFar;
      if (period.end() > settlement + TimeAxis.SAME_MOMENT) {
        soFar += parts(period);
        found.periodsLeft++;
      }
      if (period.end() > end + TimeAxis.SAME_MOMENT) {
        double within =
            1 - (period.end() - end) / (period.end() - Math.max(period.start(), settlement));
        double at = before + within * (soFar - before);
        found.add(amount, at, at, at / leg.terms().frequency());
        return found;
      }
      boolean owed = next < left.size() && left.get(next) == i;
      next += owed ? 1 : 0;
      if (owed || Math.abs(period.end() - end) <= TimeAxis.SAME_MOMENT) {
        boolean last = period.end() >= end - TimeAxis.SAME_MOMENT;
        double paid = leg.amount(i, settlement) + (last ? amount : 0);
        found.add(paid, soFar, soFar + delay(period), years(period, soFar));
        if (last) {
          return found;
        }
      }
    }
    return found;
  }

  /** Periods from settlement or the period's start, whichever is later, to its end. */
  private double parts(LegPeriod period) {
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
        sum += part(on, left, right, first, end);
      }
    }
    return sum;
  }

  /** The part of a reference period between two dates in it. */
  private double part(
      CouponPeriod on, LocalDate left, LocalDate right, LocalDate first, LocalDate end) {
    CouponPeriod whole =
        new CouponPeriod(
            left, right, right, on.frequency(), List.of(left, right), on.maturity(), on.calendar());
    DayCount dayCount = leg.dayCount();
    long days = dayCount.periodDays(whole);
    // From the start, not to the end: the two differ where thirty-day months are counted.
    long before = dayCount.days(left, first, whole);
    long upTo = end.equals(right) ? days : dayCount.days(left, end, whole);
    return (upTo - before) / (double) days;
  }

  /** How much later than its coupon date a payment is made, in periods of actual days. */
  private static double delay(LegPeriod period) {
    if (period.dated().isEmpty()) {
      return 0;
    }
    CouponPeriod on = period.dated().get();
    LocalDate start = on.reference().get(on.reference().size() - 2);
    LocalDate end = on.reference().get(on.reference().size() - 1);
    return ChronoUnit.DAYS.between(on.end(), on.payment())
        / (double) ChronoUnit.DAYS.between(start, end);
  }

  private double years(LegPeriod period, double periods) {
    if (leg.dayCount() == DayCount.BUS_252 && period.dated().isPresent()) {
      CouponPeriod on = period.dated().get();
      return on.calendar().businessDays(leg.dateAt(settlement), on.end()) / 252.0;
    }
    return periods / leg.terms().frequency();
  }

  private double life(LegPeriod last, DayCount dayCount) {
    if (last.dated().isEmpty()) {
      return last.end() - settlement;
    }
    LocalDate settles = leg.dateAt(settlement);
    LocalDate end = last.dated().get().payment();
    if (dayCount == DayCount.BUS_252) {
      return last.dated().get().calendar().businessDays(settles, end) / 252.0;
    }
    return (dayCount.needsPeriod() ? DayCount.ACT_365F : dayCount).years(settles, end);
  }
}
