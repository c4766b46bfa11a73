package ebbline.data;

import ebbline.time.CalendarRegistry;
import java.time.LocalDate;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What a command line says about a quote sheet; it goes before the sheet's own settings.
 *
 * @param asOf today
 * @param meanReversion for the convexity of futures, per year
 * @param volatility of the short rate, for the same, decimal per year
 * @param calendars that rows may name
 */
public record QuoteOverrides(
    Optional<LocalDate> asOf,
    OptionalDouble meanReversion,
    OptionalDouble volatility,
    CalendarRegistry calendars) {

  /** Nothing said. */
  public static QuoteOverrides none() {
    return new QuoteOverrides(
        Optional.empty(),
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        CalendarRegistry.standard());
  }
}
