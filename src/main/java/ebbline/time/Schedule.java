package ebbline.time;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/**
 * The coupon periods of a bond, counted back from maturity (or from the last coupon before an odd
 * last period).
 *
 * <p>Without an issue date regular periods go back without end. With one and no {@code
 * first_coupon}, an issue between two regular dates makes a short first period.
 */
public final class Schedule {
  /** Longest bond, in years. */
  public static final int LONGEST_YEARS = 200;

  private final ScheduleTerms terms;
  private final MonthCycle cycle;

  /** Number of the first period, counted back from the last, which is 0. */
  private final int first;

  private Schedule(ScheduleTerms terms, MonthCycle cycle) {
    this.terms = terms;
    this.cycle = cycle;
    this.first = terms.issue().isPresent() ? firstPeriod() : Integer.MAX_VALUE;
  }

  /**
   * @throws IllegalArgumentException if the dates are not in order, an odd first period has no
   *     issue date, or the first coupon is not a whole number of periods before the date that the
   *     others are counted from
   */
  public static Schedule of(ScheduleTerms terms) {
    requireOrder("issue", terms.issue().orElse(null), "maturity", terms.maturity());
    requireOrder("last_coupon", terms.lastCoupon().orElse(null), "maturity", terms.maturity());
    LocalDate anchor = terms.lastCoupon().orElse(terms.maturity());
    requireOrder("issue", terms.issue().orElse(null), "last_coupon", anchor);
    if (terms.firstCoupon().isPresent()) {
      LocalDate issue =
          terms
              .issue()
              .orElseThrow(
                  () ->
                      new IllegalArgumentException(
                          "first_coupon needs an issue date to accrue from, found none"));
      requireOrder("issue", issue, "first_coupon", terms.firstCoupon().get());
      if (terms.firstCoupon().get().isAfter(anchor)) {
        throw new IllegalArgumentException(
            "first_coupon must not lie after "
                + (terms.lastCoupon().isPresent() ? "last_coupon" : "maturity")
                + ", found "
                + terms.firstCoupon().get());
      }
    }
    return new Schedule(terms, cycle(terms, anchor));
  }

  /** The cycle's day is the first coupon's where the anchor's month is too short to show it. */
  private static MonthCycle cycle(ScheduleTerms terms, LocalDate anchor) {
    MonthCycle cycle = MonthCycle.of(anchor, terms.endOfMonth());
    int seen = terms.firstCoupon().map(LocalDate::getDayOfMonth).orElse(0);
    return MonthCycle.isMonthEnd(anchor) && seen > cycle.day() ? cycle.onDay(seen) : cycle;
  }

  private static void requireOrder(String name, LocalDate date, String laterName, LocalDate later) {
    if (date != null && !date.isBefore(later)) {
      throw new IllegalArgumentException(
          name + " must lie before " + laterName + " " + later + ", found " + date);
    }
  }

  private int firstPeriod() {
    LocalDate issue = terms.issue().orElseThrow();
    requireLength(issue);
    if (terms.firstCoupon().isEmpty()) {
      int k = 0;
      while (boundary(k + 1).isAfter(issue)) {
        k++;
      }
      return k;
    }
    LocalDate wanted = terms.firstCoupon().get();
    int k = oddLast();
    while (boundary(k).isAfter(wanted)) {
      k++;
    }
    if (boundary(k).equals(wanted)) {
      return k;
    }
    throw new IllegalArgumentException(
        "first_coupon must be a whole number of periods before "
            + (oddLast() == 1 ? "last_coupon" : "maturity (or give last_coupon)")
            + ", such as "
            + boundary(k)
            + ", found "
            + wanted);
  }

  private void requireLength(LocalDate date) {
    if (date.plusYears(LONGEST_YEARS).isBefore(terms.maturity())) {
      throw new IllegalArgumentException(
          "maturity must lie within "
              + LONGEST_YEARS
              + " years of "
              + date
              + ", found "
              + terms.maturity());
    }
  }

  private int oddLast() {
    return terms.lastCoupon().isPresent() ? 1 : 0;
  }

  /** The regular date that ends period k; maturity ends period 0. */
  private LocalDate boundary(int k) {
    return k == 0
        ? terms.maturity()
        : cycle.date(-(long) (k - oddLast()) * terms.frequency().months());
  }

  public ScheduleTerms terms() {
    return terms;
  }

  /**
   * The periods whose accrual ends after a date, in order; all of them for a date before the issue.
   *
   * @throws IllegalArgumentException if maturity is over {@value #LONGEST_YEARS} years away
   */
  public List<CouponPeriod> endingAfter(LocalDate date) {
    requireLength(date);
    List<CouponPeriod> found = new ArrayList<>();
    for (int k = 0; k <= first; k++) {
      // Rolling moves a date by days only, so a boundary a month before ends the search.
      if (boundary(k).plusMonths(1).isBefore(date)) {
        break;
      }
      CouponPeriod period = period(k);
      if (!period.end().isAfter(date)) {
        break;
      }
      found.add(period);
    }
    Collections.reverse(found);
    return found;
  }

  /**
   * The periods whose coupon is paid after a date, in order; one paid on it belongs to the past.
   *
   * @throws IllegalArgumentException if maturity is over {@value #LONGEST_YEARS} years away
   */
  public List<CouponPeriod> paidAfter(LocalDate date) {
    requireLength(date);
    List<CouponPeriod> found = new ArrayList<>();
    for (int k = 0; k <= first && !boundary(k).plusMonths(1).isBefore(date); k++) {
      CouponPeriod period = period(k);
      if (!period.payment().isAfter(date)) {
        break;
      }
      found.add(period);
    }
    Collections.reverse(found);
    return found;
  }

  /**
   * All periods.
   *
   * @throws IllegalArgumentException if there is no issue date to start from
   */
  public List<CouponPeriod> all() {
    if (terms.issue().isEmpty()) {
      throw new IllegalArgumentException(
          "all periods need an issue date to start from, found none");
    }
    return endingAfter(terms.issue().get());
  }

  /**
   * The period in which a date lies, its start included and its end not.
   *
   * @throws IllegalArgumentException if the date lies before the issue or not before the last end
   */
  public CouponPeriod at(LocalDate date) {
    List<CouponPeriod> rest = endingAfter(date);
    if (rest.isEmpty()) {
      throw new IllegalArgumentException(
          "interest accrues before maturity " + terms.maturity() + " only, found " + date);
    }
    if (rest.get(0).start().isAfter(date)) {
      throw new IllegalArgumentException(
          "interest accrues from the issue " + rest.get(0).start() + " on, found " + date);
    }
    return rest.get(0);
  }

  private CouponPeriod period(int k) {
    LocalDate end = boundary(k);
    List<LocalDate> reference = new ArrayList<>();
    if (k == 0 && oddLast() == 1) {
      // Quasi-periods go on from the last coupon until they cover the maturity.
      for (int j = 0; reference.isEmpty() || last(reference).isBefore(end); j++) {
        reference.add(cycle.date((long) j * terms.frequency().months()));
      }
    } else {
      LocalDate from = k == first ? terms.issue().orElseThrow() : boundary(k + 1);
      reference.add(end);
      for (int j = 1; last(reference).isAfter(from); j++) {
        reference.add(boundary(k + j));
      }
      Collections.reverse(reference);
    }
    LocalDate start = k == first ? terms.issue().orElseThrow() : accrual(boundary(k + 1));
    return new CouponPeriod(
        start,
        accrual(end),
        terms.roll().apply(end, terms.calendar()),
        terms.frequency(),
        covering(reference, start),
        accrual(terms.maturity()),
        terms.calendar());
  }

  private static LocalDate last(List<LocalDate> dates) {
    return dates.get(dates.size() - 1);
  }

  /** Rolled with the period's own ends; an issue that a roll would pass stays covered. */
  private List<LocalDate> covering(List<LocalDate> reference, LocalDate start) {
    List<LocalDate> rolled = new ArrayList<>(reference.stream().map(this::accrual).toList());
    if (rolled.get(0).isAfter(start)) {
      rolled.set(0, reference.get(0));
    }
    return rolled;
  }

  private LocalDate accrual(LocalDate date) {
    return terms.accrual() == ScheduleTerms.AccrualDates.ADJUSTED
        ? terms.roll().apply(date, terms.calendar())
        : date;
  }
}
