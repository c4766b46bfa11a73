package ebbline.data;

import ebbline.time.BusinessCalendar;
import ebbline.time.CouponPeriod;
import ebbline.time.DayCount;
import ebbline.time.Frequency;
import ebbline.time.Moment;
import ebbline.time.Roll;
import ebbline.time.Schedule;
import ebbline.time.ScheduleTerms;
import ebbline.time.ScheduleTerms.AccrualDates;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;

/** From when to when a quote speaks, on dates or in bare years, and the periods between. */
final class QuoteSpan {
  private static final double LONGEST_YEARS = Schedule.LONGEST_YEARS;

  /** The periods of a leg, in years; each starts where the last one ended. */
  static final class Leg {
    final double[] ends;
    final double[] payments;
    final double[] accruals;

    private Leg(int count) {
      ends = new double[count];
      payments = new double[count];
      accruals = new double[count];
    }

    double end() {
      return ends[ends.length - 1];
    }
  }

  final double start;
  final double end;
  private final TimeAxis axis;
  private final BusinessCalendar calendar;
  private final Roll roll;
  private final Optional<LocalDate> from;
  private final Optional<LocalDate> to;

  private QuoteSpan(
      double start,
      double end,
      TimeAxis axis,
      BusinessCalendar calendar,
      Roll roll,
      Optional<LocalDate> from,
      Optional<LocalDate> to) {
    this.start = start;
    this.end = end;
    this.axis = axis;
    this.calendar = calendar;
    this.roll = roll;
    this.from = from;
    this.to = to;
  }

  /** Reads {@code start} and {@code maturity}; empty where the row has problems. */
  static Optional<QuoteSpan> read(CsvRow row, SheetTerms terms, boolean needsStart) {
    Optional<Moment> maturity = row.required("maturity", row.moment("maturity"));
    Optional<Moment> start =
        needsStart ? row.required("start", row.moment("start")) : row.moment("start");
    BusinessCalendar calendar = terms.calendar(row);
    Roll roll = row.value("roll", Roll::of).orElse(Roll.NONE);
    int settleDays = row.value("settle_days", SheetTerms::days).orElse(0);
    if (maturity.isEmpty() || !row.problems().isEmpty()) {
      return Optional.empty();
    }
    String column = "maturity";
    try {
      TimeAxis axis = terms.axis;
      axis.years(maturity.get()); // a date on an axis without one is said in its own words
      if (!axis.isDated(maturity.get())) {
        double end = axis.years(maturity.get());
        column = "start";
        double begin = start.map(axis::years).orElse(0.0);
        return checked(
            row,
            new QuoteSpan(begin, end, axis, calendar, roll, Optional.empty(), Optional.empty()));
      }
      LocalDate today = axis.asOf().orElseThrow();
      LocalDate settlement = calendar.plusBusinessDays(today, settleDays);
      LocalDate base = terms.tenorsFrom == SheetTerms.TenorsFrom.AS_OF ? today : settlement;
      LocalDate to = roll.apply(date(maturity.get(), base), calendar);
      requireKnown(to, calendar);
      column = "start";
      LocalDate from =
          start.isPresent() ? roll.apply(date(start.get(), base), calendar) : settlement;
      return checked(
          row,
          new QuoteSpan(
              axis.years(from),
              axis.years(to),
              axis,
              calendar,
              roll,
              Optional.of(from),
              Optional.of(to)));
    } catch (IllegalArgumentException e) {
      row.problem(column, row.text(column).orElse(""), e.getMessage());
      return Optional.empty();
    }
  }

  private static LocalDate date(Moment moment, LocalDate base) {
    if (moment instanceof Moment.OnDate on) {
      return on.date();
    } else if (moment instanceof Moment.After after) {
      return after.tenor().after(base);
    }
    throw new IllegalArgumentException("expected a date or a tenor, as the maturity is one");
  }

  /** A calendar that ends before the quote does cannot place its dates, rolled or not. */
  static void requireKnown(LocalDate date, BusinessCalendar calendar) {
    if (date.getYear() > calendar.lastYear()) {
      throw new IllegalArgumentException(
          "the calendar "
              + calendar.name()
              + " knows no holidays after "
              + calendar.lastYear()
              + ", and this quote runs to "
              + date);
    }
  }

  private static Optional<QuoteSpan> checked(CsvRow row, QuoteSpan span) {
    String maturity = row.text("maturity").orElse("");
    if (!(span.start >= 0)) {
      row.problem("start", row.text("start").orElse(""), "a quote starts today at the earliest");
    } else if (!(span.end - span.start > TimeAxis.SAME_MOMENT)) {
      row.problem(
          "maturity",
          maturity,
          span.start > 0 ? "maturity must lie after the start" : "maturity must lie after today");
    } else if (!(span.end <= LONGEST_YEARS)) {
      row.problem(
          "maturity", maturity, "maturity must lie within " + (int) LONGEST_YEARS + " years");
    } else {
      return Optional.of(span);
    }
    return Optional.empty();
  }

  /**
   * Years of the whole span by a day count; the difference of the times where there are no dates.
   */
  double accrual(DayCount dayCount) {
    if (from.isEmpty()) {
      return end - start;
    }
    return dayCount == DayCount.BUS_252
        ? calendar.businessDays(from.get(), to.orElseThrow()) / 252.0
        : dayCount.years(from.get(), to.orElseThrow());
  }

  /**
   * The periods of a leg back from maturity, a short one first where they do not go up.
   *
   * @param lag business days from a period's end to its payment; dates only
   */
  Leg leg(int frequency, DayCount dayCount, boolean endOfMonth, int lag) {
    return from.isEmpty()
        ? timed(frequency)
        : dated(Frequency.of(frequency), dayCount, endOfMonth, lag);
  }

  private Leg dated(Frequency frequency, DayCount dayCount, boolean endOfMonth, int lag) {
    ScheduleTerms terms =
        ScheduleTerms.regular(to.orElseThrow(), frequency)
            .withEndOfMonth(endOfMonth)
            .withIssue(from.orElseThrow())
            .withRoll(calendar, roll, AccrualDates.ADJUSTED);
    List<CouponPeriod> periods = Schedule.of(terms).all();
    Leg leg = new Leg(periods.size());
    for (int i = 0; i < periods.size(); i++) {
      CouponPeriod period = periods.get(i);
      leg.ends[i] = axis.years(period.end());
      leg.payments[i] = axis.years(calendar.plusBusinessDays(period.payment(), lag));
      leg.accruals[i] = dayCount.periodYears(period);
    }
    return leg;
  }

  private Leg timed(int frequency) {
    List<Double> ends = new ArrayList<>();
    double at = end;
    for (int k = 1; at > start + TimeAxis.SAME_MOMENT; k++) {
      ends.add(at);
      at = end - (double) k / frequency;
    }
    Collections.reverse(ends);
    Leg leg = new Leg(ends.size());
    for (int i = 0; i < ends.size(); i++) {
      leg.ends[i] = ends.get(i);
      leg.payments[i] = ends.get(i);
      boolean stub = i == 0 && start - at > TimeAxis.SAME_MOMENT;
      leg.accruals[i] = stub ? ends.get(0) - start : 1.0 / frequency;
    }
    return leg;
  }
}
