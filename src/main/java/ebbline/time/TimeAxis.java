package ebbline.time;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.Objects;
import java.util.Optional;

/**
 * The line on which moments become years: an as-of date with a time basis, or no date at all.
 *
 * <p>Dates become years by act/365f from the as-of date unless the curve names another basis.
 * Without an as-of date, tenors have their exact length and dates cannot be placed.
 */
public final class TimeAxis {
  /** Two times closer than this many years are one moment (about 0.03 seconds). */
  public static final double SAME_MOMENT = 1e-9;

  private static final TimeAxis UNDATED = new TimeAxis(null, TimeBasis.ACT_365F);

  private final LocalDate asOf;
  private final TimeBasis basis;

  private TimeAxis(LocalDate asOf, TimeBasis basis) {
    this.asOf = asOf;
    this.basis = basis;
  }

  /** The axis of textbook cases: today is 0, and there are no dates. */
  public static TimeAxis undated() {
    return UNDATED;
  }

  public static TimeAxis from(LocalDate asOf) {
    return from(asOf, TimeBasis.ACT_365F);
  }

  public static TimeAxis from(LocalDate asOf, TimeBasis basis) {
    return new TimeAxis(Objects.requireNonNull(asOf, "asOf"), Objects.requireNonNull(basis));
  }

  public Optional<LocalDate> asOf() {
    return Optional.ofNullable(asOf);
  }

  public TimeBasis basis() {
    return basis;
  }

  /**
   * Years from today; negative before it.
   *
   * @throws IllegalArgumentException for a date where there is no as-of date
   */
  public double years(Moment moment) {
    if (moment instanceof Moment.InYears time) {
      return time.years();
    }
    if (moment instanceof Moment.After after && asOf == null) {
      return after.tenor().years();
    }
    return years(date(moment));
  }

  /** Years from the as-of date to {@code date}, by this axis's basis. */
  public double years(LocalDate date) {
    if (asOf == null) {
      throw new IllegalArgumentException(
          "a date needs an as-of date to count from: give --as-of DATE or '# as-of: DATE' in the"
              + " curve file");
    }
    return basis.years(asOf, date);
  }

  /**
   * The calendar date of a date or a tenor.
   *
   * @throws IllegalArgumentException for bare years, or where there is no as-of date
   */
  public LocalDate date(Moment moment) {
    if (moment instanceof Moment.OnDate on) {
      return on.date();
    }
    if (moment instanceof Moment.After after && asOf != null) {
      return after.tenor().after(asOf);
    }
    throw new IllegalArgumentException(
        "expected a date, or a tenor with an as-of date to count from");
  }

  /**
   * Whether the moment is a calendar date on this axis (a date, or a tenor from the as-of date).
   */
  public boolean isDated(Moment moment) {
    return moment instanceof Moment.OnDate || (moment instanceof Moment.After && asOf != null);
  }

  /** How a year is counted along the axis. */
  public enum TimeBasis {
    /** Calendar days over 365. */
    ACT_365F("act/365f", 365.0),
    /** Calendar days over 360. */
    ACT_360("act/360", 360.0),
    /** Calendar days over 365.25 (common practice for long horizons). */
    ACT_36525("act/365.25", 365.25);

    private final String label;
    private final double daysPerYear;

    TimeBasis(String label, double daysPerYear) {
      this.label = label;
      this.daysPerYear = daysPerYear;
    }

    public String label() {
      return label;
    }

    public double years(LocalDate from, LocalDate to) {
      return ChronoUnit.DAYS.between(from, to) / daysPerYear;
    }
  }
}
