package ebbline.check;

import ebbline.bond.FirstFraction;
import ebbline.bond.PeriodYield;
import ebbline.instrument.PeriodFlows;
import ebbline.time.CouponPeriod;
import ebbline.time.DayCount;
import ebbline.time.Frequency;
import ebbline.time.Schedule;
import ebbline.time.ScheduleTerms;
import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;

/**
 * A bond as the spreadsheets' functions see it [ECMA-376 part 1, sec. 18.17.7]: periods of 360 or
 * 365 days over the frequency where the basis says so, coupons of rate over frequency always.
 */
final class SheetBond {
  private final int basis;
  private final int frequency;
  private final LocalDate settlement;
  private final List<CouponPeriod> periods;

  private SheetBond(int basis, int frequency, LocalDate settlement, List<CouponPeriod> periods) {
    this.basis = basis;
    this.frequency = frequency;
    this.settlement = settlement;
    this.periods = periods;
  }

  static SheetBond of(LocalDate settlement, LocalDate maturity, int frequency, int basis) {
    ScheduleTerms terms =
        ScheduleTerms.regular(maturity, Frequency.of(frequency)).withEndOfMonth(true);
    return new SheetBond(basis, frequency, settlement, Schedule.of(terms).endingAfter(settlement));
  }

  CouponPeriod current() {
    return periods.get(0);
  }

  int count() {
    return periods.size();
  }

  /** Days of the coupon period that settlement lies in. */
  double days() {
    return switch (basis) {
      case 1 -> days(current().start(), current().end(), 1);
      case 3 -> 365.0 / frequency;
      default -> 360.0 / frequency;
    };
  }

  double daysAccrued() {
    return days(current().start(), settlement, basis);
  }

  double daysToNext() {
    return basis == 0 || basis == 4 ? days() - daysAccrued() : days(settlement, current().end(), 1);
  }

  private PeriodYield flows(double rate, double redemption) {
    double[] amounts = new double[count()];
    Arrays.fill(amounts, 100 * rate / frequency);
    amounts[count() - 1] += redemption;
    return new PeriodYield(
        new PeriodFlows(frequency, daysToNext() / days(), amounts), FirstFraction.STREET);
  }

  private double accrued(double rate) {
    return 100 * rate / frequency * daysAccrued() / days();
  }

  double price(double rate, double yield, double redemption) {
    return flows(rate, redemption).price(yield) - accrued(rate);
  }

  double yieldOf(double rate, double price, double redemption) {
    return flows(rate, redemption).yieldOf(price + accrued(rate));
  }

  double duration(double rate, double yield) {
    return flows(rate, 100).macaulayDuration(yield);
  }

  double modifiedDuration(double rate, double yield) {
    return flows(rate, 100).modifiedDuration(yield);
  }

  /** Days by a spreadsheet's basis 0 to 4. */
  static double days(LocalDate from, LocalDate to, int basis) {
    return switch (basis) {
      case 0 -> Math.rint(DayCount.THIRTY_U_360.years(from, to) * 360);
      case 4 -> Math.rint(DayCount.THIRTY_E_360.years(from, to) * 360);
      default -> (double) (to.toEpochDay() - from.toEpochDay());
    };
  }

  /** Years by a spreadsheet's basis 0 to 4. */
  static double years(LocalDate from, LocalDate to, int basis) {
    return switch (basis) {
      case 0 -> DayCount.THIRTY_U_360.years(from, to);
      case 1 -> days(from, to, 1) / averageYear(from, to);
      case 2 -> DayCount.ACT_360.years(from, to);
      case 3 -> DayCount.ACT_365F.years(from, to);
      default -> DayCount.THIRTY_E_360.years(from, to);
    };
  }

  /** Basis 1: the average of the calendar years touched, or the one year that the dates span. */
  private static double averageYear(LocalDate from, LocalDate to) {
    if (to.isAfter(from.plusYears(1))) {
      double days =
          days(LocalDate.of(from.getYear(), 1, 1), LocalDate.of(to.getYear() + 1, 1, 1), 1);
      return days / (to.getYear() - from.getYear() + 1);
    }
    boolean leaps =
        from.datesUntil(to.plusDays(1))
            .anyMatch(day -> day.getMonthValue() == 2 && day.getDayOfMonth() == 29);
    boolean withinLeapYear = from.getYear() == to.getYear() && from.isLeapYear();
    return leaps || withinLeapYear ? 366 : 365;
  }

  /** Days that a year of a basis has where it does not depend on the dates. */
  static double yearDays(int basis) {
    return switch (basis) {
      case 0, 2, 4 -> 360;
      case 3 -> 365;
      default -> throw new IllegalArgumentException("basis must be 0, 2, 3 or 4, found " + basis);
    };
  }
}
