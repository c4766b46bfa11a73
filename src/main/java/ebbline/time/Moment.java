package ebbline.time;

import java.time.LocalDate;

/**
 * A point in time as the user writes it: a calendar date, a tenor from today, or a bare number of
 * years from today.
 *
 * <p>Moments become years once, when they meet a {@link TimeAxis}.
 */
public sealed interface Moment {

  /** A calendar date, {@code 2031-11-15}. */
  record OnDate(LocalDate date) implements Moment {
    @Override
    public String toString() {
      return date.toString();
    }
  }

  /** A length from the as-of date, {@code 18M}; calendar months where there is an as-of date. */
  record After(Tenor tenor) implements Moment {
    @Override
    public String toString() {
      return tenor.toString();
    }
  }

  /** A number of years from today, {@code 0.25}; may be negative (in the past). */
  record InYears(double years) implements Moment {
    public InYears {
      if (!Double.isFinite(years)) {
        throw new IllegalArgumentException("years must be finite, found " + years);
      }
    }

    @Override
    public String toString() {
      return Double.toString(years);
    }
  }

  static Moment of(LocalDate date) {
    return new OnDate(date);
  }

  static Moment of(Tenor tenor) {
    return new After(tenor);
  }

  static Moment ofYears(double years) {
    return new InYears(years);
  }

  /**
   * Reads a date {@code 2031-11-15}, a tenor {@code 1Y6M} or a bare number of years {@code 0.25}.
   *
   * @throws IllegalArgumentException if the text is none of them, or a bare number beyond ±1000, or
   *     no day in the calendar; the message says what was expected and does not repeat the text
   */
  static Moment parse(String text) {
    return MomentText.parse(text);
  }
}
