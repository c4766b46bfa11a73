package ebbline.data;

import ebbline.fitting.history.RateHistory;
import java.time.LocalDate;
import java.util.Collections;
import java.util.List;
import java.util.Optional;

/**
 * A history of one rate.
 *
 * @param history the rates, in decimals, and when they were observed
 * @param column the heading they stand under
 * @param dates of all rows, those without a rate too; empty where the file has none
 * @param times of the same rows, years from the first; empty where the file has no dates
 * @param file where they came from
 */
public record HistoryInput(
    RateHistory history,
    String column,
    List<LocalDate> dates,
    List<Double> times,
    SourceFile file) {

  public HistoryInput {
    dates = List.copyOf(dates);
    times = List.copyOf(times);
  }

  /** The date of a row by its time; empty where the file has no dates. */
  public Optional<LocalDate> dateAt(double time) {
    int row = dates.isEmpty() ? -1 : Collections.binarySearch(times, time);
    return row < 0 ? Optional.empty() : Optional.of(dates.get(row));
  }
}
