package ebbline.instrument;

import ebbline.time.BusinessCalendar;
import ebbline.time.CouponPeriod;
import ebbline.time.DayCount;
import ebbline.time.Frequency;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.List;
import java.util.Objects;

/**
 * A bond with a fixed coupon and one redemption at maturity.
 *
 * <p>With a dated maturity the coupons fall on dates and accrue by the day count; with a bare
 * number of years they fall every 1/frequency years back from maturity and accrue by exactly that.
 *
 * @param maturity last coupon and redemption
 * @param coupon annual rate, a decimal
 * @param frequency coupons a year: 1, 2, 4 or 12
 * @param dayCount how coupons accrue on dates
 * @param redemption per 100 face; above 0
 * @param settleDays business days (weekends only) from the as-of date to settlement; dates only
 */
public record Bond(
    Moment maturity,
    double coupon,
    int frequency,
    DayCount dayCount,
    double redemption,
    int settleDays)
    implements Instrument {
  private static final int LONGEST_YEARS = 200;

  public Bond {
    Objects.requireNonNull(maturity, "maturity");
    Objects.requireNonNull(dayCount, "dayCount");
    Terms.requireRedemption(redemption);
    if (!Double.isFinite(coupon)) {
      throw new IllegalArgumentException("coupon must be finite, found " + coupon);
    }
    Frequency.of(frequency);
    if (settleDays < 0) {
      throw new IllegalArgumentException("settle_days must be at least 0, found " + settleDays);
    }
  }

  @Override
  public String kind() {
    return "bond";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    axis.years(maturity); // a date on an axis without one is said before anything is counted
    if (!axis.isDated(maturity)) {
      return new Claim(flowsAfter(0, axis), List.of(), 0, accrued(0, axis));
    }
    LocalDate settlement = settlement(axis);
    double time = axis.years(settlement);
    return new Claim(flowsAfter(time, axis), List.of(), time, accrued(time, axis));
  }

  private LocalDate settlement(TimeAxis axis) {
    return BusinessCalendar.WEEKENDS.plusBusinessDays(axis.asOf().orElseThrow(), settleDays);
  }

  /** Coupons and redemption after a time. */
  CashFlows flowsAfter(double time, TimeAxis axis) {
    double end = axis.years(maturity);
    Terms.requireAfter(
        "maturity", maturity, end, time, time == 0 ? "today" : "settlement or expiry");
    if (end > LONGEST_YEARS) {
      throw new IllegalArgumentException(
          "maturity must lie within " + LONGEST_YEARS + " years, found " + maturity);
    }
    int n = countAfter(time, axis);
    double[] times = new double[n];
    double[] amounts = new double[n];
    for (int i = 0; i < n; i++) {
      int back = n - 1 - i;
      times[i] = couponTime(back, axis);
      amounts[i] = coupon(back, axis);
    }
    amounts[n - 1] += redemption;
    return CashFlows.of(times, amounts);
  }

  /** How many coupons fall after a time; one on it belongs to the past. */
  private int countAfter(double time, TimeAxis axis) {
    int n = 0;
    while (couponTime(n, axis) > time + TimeAxis.SAME_MOMENT) {
      n++;
    }
    return n;
  }

  private double couponTime(int back, TimeAxis axis) {
    return axis.isDated(maturity)
        ? axis.years(dates(axis).before(back))
        : axis.years(maturity) - (double) back / frequency;
  }

  private CouponDates dates(TimeAxis axis) {
    return new CouponDates(axis.date(maturity), 12 / frequency);
  }

  /** The coupon paid {@code back} periods before maturity, per 100 face. */
  private double coupon(int back, TimeAxis axis) {
    if (!axis.isDated(maturity) || dayCount == DayCount.ACT_ACT_ICMA) {
      return 100 * coupon / frequency;
    }
    CouponPeriod period = period(back, axis);
    return 100 * coupon * dayCount.periodYears(period);
  }

  /** Accrued interest at a time, per 100 face. */
  double accrued(double time, TimeAxis axis) {
    int n = countAfter(time, axis);
    if (axis.isDated(maturity) && dayCount != DayCount.ACT_ACT_ICMA) {
      CouponPeriod period = period(n - 1, axis);
      return 100 * coupon * dayCount.years(period.start(), dateAt(time, axis), period);
    }
    return 100 * coupon / frequency * (1 - toNext(time, n, axis));
  }

  /** Fraction of a period from a time to the first of {@code n} coupons after it. */
  private double toNext(double time, int n, TimeAxis axis) {
    if (!axis.isDated(maturity)) {
      double periods = (couponTime(n - 1, axis) - time) * frequency;
      // A coupon just now belongs to the past, so a whole period is left, to the last bit.
      return Math.abs(periods - 1) <= frequency * TimeAxis.SAME_MOMENT ? 1 : periods;
    }
    CouponPeriod period = period(n - 1, axis);
    long whole = dayCount.periodDays(period);
    return (whole - dayCount.days(period.start(), dateAt(time, axis), period)) / (double) whole;
  }

  /** The regular period that ends {@code back} periods before maturity. */
  private CouponPeriod period(int back, TimeAxis axis) {
    CouponDates dates = dates(axis);
    return CouponPeriod.regular(
        dates.before(back + 1), dates.before(back), Frequency.of(frequency), dates.maturity());
  }

  private static LocalDate dateAt(double time, TimeAxis axis) {
    return axis.asOf()
        .orElseThrow()
        .plusDays(Math.round(time / axis.years(axis.asOf().orElseThrow().plusDays(1))));
  }

  /** The flows after settlement in coupon periods, for price and yield. */
  public PeriodFlows periodFlows(TimeAxis axis) {
    Claim claim = claim(axis);
    int n = claim.flows().size();
    return new PeriodFlows(frequency, toNext(claim.settlement(), n, axis), claim.flows().amounts());
  }
}
