package ebbline.instrument;

import ebbline.time.CouponPeriod;
import ebbline.time.Frequency;
import ebbline.time.Moment;
import ebbline.time.Schedule;
import ebbline.time.ScheduleTerms;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;

/** Lays the coupon periods that are not over yet on an axis, from dates or from bare times. */
final class LegPeriods {
  private static final int LONGEST_YEARS = 200;

  private LegPeriods() {}

  static List<LegPeriod> of(BondTerms terms, TimeAxis axis) {
    double end = axis.years(terms.maturity());
    Terms.requireAfter("maturity", terms.maturity(), end, 0, "today");
    if (end > LONGEST_YEARS) {
      throw new IllegalArgumentException(
          "maturity must lie within " + LONGEST_YEARS + " years, found " + terms.maturity());
    }
    return axis.isDated(terms.maturity()) ? dated(terms, axis) : timed(terms, axis);
  }

  private static List<LegPeriod> dated(BondTerms terms, TimeAxis axis) {
    Conventions conventions = terms.conventions();
    ScheduleTerms schedule =
        new ScheduleTerms(
            axis.date(terms.maturity()),
            Frequency.of(terms.frequency()),
            conventions.endOfMonth(),
            date("issue", terms.ends().issue(), axis),
            date("first_coupon", terms.ends().firstCoupon(), axis),
            date("last_coupon", terms.ends().lastCoupon(), axis),
            conventions.calendar(),
            conventions.roll(),
            conventions.accrual());
    List<LegPeriod> periods = new ArrayList<>();
    for (CouponPeriod period : Schedule.of(schedule).paidAfter(axis.asOf().orElseThrow())) {
      periods.add(
          new LegPeriod(
              axis.years(period.start()),
              axis.years(period.end()),
              axis.years(period.payment()),
              conventions.dayCount().periodYears(period),
              period.isRegular(),
              Optional.of(period)));
    }
    if (periods.isEmpty()) {
      throw new IllegalArgumentException(
          "the last payment must lie after today, found " + terms.maturity());
    }
    return periods;
  }

  private static Optional<LocalDate> date(String name, Optional<Moment> moment, TimeAxis axis) {
    if (moment.isPresent() && !axis.isDated(moment.get())) {
      throw new IllegalArgumentException(
          name + " must be a date where maturity is one, found " + moment.get());
    }
    return moment.map(axis::date);
  }

  private static List<LegPeriod> timed(BondTerms terms, TimeAxis axis) {
    if (terms.ends().firstCoupon().isPresent() || terms.ends().lastCoupon().isPresent()) {
      throw new IllegalArgumentException(
          "first_coupon and last_coupon need dates; maturity "
              + terms.maturity()
              + " is a number of years");
    }
    double maturity = axis.years(terms.maturity());
    double issue = terms.ends().issue().map(axis::years).orElse(Double.NEGATIVE_INFINITY);
    if (!(issue < maturity - TimeAxis.SAME_MOMENT)) {
      throw new IllegalArgumentException(
          "issue must lie before maturity " + terms.maturity() + ", found " + issue);
    }
    List<LegPeriod> periods = new ArrayList<>();
    double end = maturity;
    double floor = Math.max(0, issue) + TimeAxis.SAME_MOMENT;
    for (int k = 1; end > floor; k++) {
      double whole = maturity - (double) k / terms.frequency();
      boolean regular = whole > issue - TimeAxis.SAME_MOMENT;
      double start = regular ? whole : issue;
      double years = regular ? 1.0 / terms.frequency() : end - start;
      periods.add(new LegPeriod(start, end, end, years, regular, Optional.empty()));
      end = start;
    }
    Collections.reverse(periods);
    return periods;
  }
}
