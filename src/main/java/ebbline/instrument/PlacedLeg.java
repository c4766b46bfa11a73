package ebbline.instrument;

import ebbline.time.CouponPeriod;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/**
 * A fixed leg in years from today: what it pays, and what has accrued, at any moment from today on.
 * Amounts are per 100 of the first face. Immutable.
 */
public final class PlacedLeg {
  private final FixedLeg leg;
  private final TimeAxis axis;
  private final boolean dated;
  private final List<LegPeriod> periods;
  private final double[] rates;
  private final double[] outstanding;
  private final double[] repaid;

  PlacedLeg(FixedLeg leg, TimeAxis axis) {
    this.leg = leg;
    this.axis = axis;
    BondTerms terms = leg.terms();
    this.periods = LegPeriods.of(terms, axis);
    this.dated = axis.isDated(terms.maturity());
    if (!dated && terms.exDividend().days() > 0) {
      throw new IllegalArgumentException(
          "ex_days count days before a date; maturity "
              + terms.maturity()
              + " is a number of years");
    }
    int n = periods.size();
    this.rates = StepRates.of(leg, periods, axis);
    this.repaid = Repayments.of(leg, periods, axis);
    this.outstanding = new double[n];
    double left = 0;
    for (int i = n - 1; i >= 0; i--) {
      left += repaid[i];
      outstanding[i] = left;
    }
    // What maturity repays is worth the redemption, earlier repayments are at 100.
    repaid[n - 1] *= terms.redemption() / 100;
  }

  public BondTerms terms() {
    return leg.terms();
  }

  /** Whether the leg runs on dates. */
  public boolean isDated() {
    return dated;
  }

  /** The periods paid after today, in order. */
  public List<LegPeriod> periods() {
    return periods;
  }

  /** When a buyer of today settles, in years; not before the issue. */
  public double settlement() {
    if (!dated) {
      return Math.max(0, leg.terms().ends().issue().map(axis::years).orElse(0.0));
    }
    LocalDate today = axis.asOf().orElseThrow();
    LocalDate settles =
        leg.terms().conventions().calendar().plusBusinessDays(today, leg.terms().settleDays());
    return axis.years(firstAccrual(settles));
  }

  private LocalDate firstAccrual(LocalDate date) {
    LocalDate start = periods.get(0).dated().orElseThrow().start();
    boolean known = leg.terms().ends().issue().isPresent();
    return known && date.isBefore(start) ? start : date;
  }

  /**
   * What is paid after a moment to whoever holds the paper then: coupons that are not ex-dividend
   * yet, and repayments.
   *
   * @throws IllegalArgumentException if nothing is left to pay
   */
  public CashFlows flowsAfter(double time) {
    List<Integer> left = owedAfter(time);
    double[] times = new double[left.size()];
    double[] amounts = new double[left.size()];
    for (int j = 0; j < times.length; j++) {
      times[j] = periods.get(left.get(j)).payment();
      amounts[j] = amount(left.get(j), time);
    }
    return CashFlows.of(times, amounts);
  }

  /** Indices of the periods that still pay something to the holder at a moment. */
  List<Integer> owedAfter(double time) {
    LegPeriod last = periods.get(periods.size() - 1);
    Terms.requireAfter(
        "maturity",
        leg.terms().maturity(),
        last.payment(),
        time,
        time == 0 ? "today" : "settlement or expiry");
    List<Integer> left = new ArrayList<>();
    for (int i = 0; i < periods.size(); i++) {
      if (periods.get(i).payment() > time + TimeAxis.SAME_MOMENT && amount(i, time) != 0) {
        left.add(i);
      }
    }
    return left;
  }

  /** What period i pays to the holder at a moment, per 100. */
  double amount(int i, double time) {
    return (isEx(i, time) ? 0 : coupon(i)) + repaid[i];
  }

  /** Whether the coupon of period i goes to the holder at a moment. */
  boolean isOwed(int i, double time) {
    return periods.get(i).payment() > time + TimeAxis.SAME_MOMENT && !isEx(i, time);
  }

  private boolean isEx(int i, double time) {
    return leg.terms().exDividend().days() > 0
        && leg.terms()
            .exDividend()
            .applies(dateAt(time), periods.get(i).dated().orElseThrow().end());
  }

  /** The whole coupon of period i, per 100. */
  double coupon(int i) {
    return rates[i] * outstanding[i] * periods.get(i).years();
  }

  /** Interest accrued at a moment, per 100; negative ex-dividend. */
  public double accrued(double time) {
    int i = periodAt(time);
    if (i < 0) {
      return 0;
    }
    double soFar = rates[i] * outstanding[i] * accruedYears(i, time);
    return isEx(i, time) ? soFar - coupon(i) : soFar;
  }

  /** The period in which a moment lies, its start included; −1 before the first. */
  int periodAt(double time) {
    for (int i = 0; i < periods.size(); i++) {
      if (periods.get(i).end() > time + TimeAxis.SAME_MOMENT) {
        return periods.get(i).start() <= time + TimeAxis.SAME_MOMENT ? i : -1;
      }
    }
    return -1;
  }

  /** Years by the day count from the start of period i to a moment in it. */
  double accruedYears(int i, double time) {
    LegPeriod period = periods.get(i);
    if (dated) {
      CouponPeriod on = period.dated().orElseThrow();
      return leg.terms().conventions().dayCount().years(on.start(), dateAt(time), on);
    }
    return Math.abs(time - period.start()) <= TimeAxis.SAME_MOMENT ? 0 : time - period.start();
  }

  /** Face still owed at a moment, per 100 of the first face. */
  public double outstanding(double time) {
    double left = 0;
    for (int i = 0; i < periods.size(); i++) {
      if (periods.get(i).payment() > time + TimeAxis.SAME_MOMENT) {
        left = Math.max(left, outstanding[i]);
      }
    }
    return left;
  }

  /** Ends of the periods after a moment, in years: the coupon dates of the terms. */
  public double[] couponTimesAfter(double time) {
    return periods.stream()
        .mapToDouble(LegPeriod::end)
        .filter(end -> end > time + TimeAxis.SAME_MOMENT)
        .toArray();
  }

  /** When the periods after a moment pay, in years. */
  public double[] paymentsAfter(double time) {
    return periods.stream()
        .mapToDouble(LegPeriod::payment)
        .filter(payment -> payment > time + TimeAxis.SAME_MOMENT)
        .toArray();
  }

  /** When money due at a moment is paid: there, or where the roll moves it. */
  double payment(double time) {
    if (!dated) {
      return time;
    }
    Conventions how = leg.terms().conventions();
    return axis.years(how.roll().apply(dateAt(time), how.calendar()));
  }

  /** The last payment, in years. */
  public double lastPayment() {
    return periods.get(periods.size() - 1).payment();
  }

  /** Flows after settlement, settlement and accrued interest; no rights. */
  public Claim claim() {
    double settlement = settlement();
    return new Claim(flowsAfter(settlement), List.of(), settlement, accrued(settlement));
  }

  /** What price and yield are made of, at settlement. */
  public YieldTerms yieldTerms() {
    return new LegYieldTerms(this, settlement()).terms();
  }

  /**
   * What price and yield are made of, at settlement, if the paper is repaid early.
   *
   * @param end of interest, after settlement, years
   * @param price clean, per 100 of what is still owed then
   */
  public YieldTerms yieldTermsTo(double end, double price) {
    double amount = price * outstanding(end) / 100 + accrued(end);
    return new LegYieldTerms(this, settlement()).termsTo(end, amount);
  }

  /** What the coupon that runs at a moment, or the first one after it, pays a year, per 100. */
  double annualCoupon(double time) {
    for (int i = 0; i < periods.size(); i++) {
      if (periods.get(i).end() > time + TimeAxis.SAME_MOMENT) {
        return rates[i] * outstanding[i];
      }
    }
    return 0;
  }

  /** What maturity repays; empty where parts of the face are repaid between a moment and it. */
  OptionalDouble redemptionAfter(double time) {
    for (int i = 0; i < periods.size() - 1; i++) {
      if (repaid[i] != 0 && periods.get(i).payment() > time + TimeAxis.SAME_MOMENT) {
        return OptionalDouble.empty();
      }
    }
    return OptionalDouble.of(repaid[periods.size() - 1]);
  }

  DayCount dayCount() {
    return leg.terms().conventions().dayCount();
  }

  /** The day on which a moment falls; for legs on dates. */
  LocalDate dateAt(double time) {
    LocalDate today = axis.asOf().orElseThrow();
    return today.plusDays(Math.round(time / axis.years(today.plusDays(1))));
  }

  static String near(List<LegPeriod> periods, double time, Moment found, boolean starts) {
    LegPeriod best = periods.get(0);
    for (LegPeriod each : periods) {
      double at = starts ? each.start() : each.end();
      double so = starts ? best.start() : best.end();
      best = Math.abs(at - time) < Math.abs(so - time) ? each : best;
    }
    LegPeriod closest = best;
    String such =
        closest
            .dated()
            .map(on -> (starts ? on.start() : on.end()).toString())
            .orElseGet(() -> Double.toString(starts ? closest.start() : closest.end()));
    return "must be a coupon date, such as " + such + ", found " + found;
  }
}
