package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.time.LocalDate;

/**
 * How long before a call or put date it is announced: a tenor, or a number of years. On dates a
 * tenor is calendar months and days back from the date.
 */
public record Notice(Moment length) {
  public static final Notice NONE = new Notice(Moment.ofYears(0));

  public Notice {
    boolean forward =
        length instanceof Moment.After
            || (length instanceof Moment.InYears years && years.years() >= 0);
    if (!forward) {
      throw new IllegalArgumentException(
          "notice must be a tenor such as 30D or a number of years, found " + length);
    }
  }

  /** The moment of decision for an exercise at {@code at} years from today. */
  double decision(double at, PlacedLeg leg, TimeAxis axis) {
    if (length instanceof Moment.After after && leg.isDated()) {
      LocalDate date = leg.dateAt(at);
      return axis.years(date.minusMonths(after.tenor().months()).minusDays(after.tenor().days()));
    } else if (length instanceof Moment.After after) {
      return at - after.tenor().years();
    }
    return at - ((Moment.InYears) length).years();
  }
}
