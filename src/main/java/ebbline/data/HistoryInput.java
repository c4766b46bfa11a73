package ebbline.data;

import ebbline.fitting.history.RateHistory;
import java.time.LocalDate;
import java.util.List;

/**
 * A history of one rate.
 *
 * @param history the rates, in decimals, and when they were observed
 * @param column the heading they stand under
 * @param dates of all rows, those without a rate too; empty where the file has none
 * @param file where they came from
 */
public record HistoryInput(
    RateHistory history, String column, List<LocalDate> dates, SourceFile file) {

  public HistoryInput {
    dates = List.copyOf(dates);
  }
}
