package ebbline.report;

import ebbline.pricing.PriceFigure;
import ebbline.pricing.PricedRow;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** Priced rows as results. */
public final class PriceReport {
  private PriceReport() {}

  /**
   * All columns that a priced row can have.
   *
   * @param carried headings of the book's own columns that are carried through
   */
  public static List<String> columns(Collection<String> carried) {
    List<String> columns = new ArrayList<>(List.of("id", "instrument", "method"));
    for (PriceFigure figure : PriceFigure.values()) {
      columns.add(figure.label());
    }
    columns.add("status");
    columns.add("message");
    columns.addAll(carried);
    return columns;
  }

  public static ResultRow.Builder result(PricedRow row, Map<String, String> carried) {
    ResultRow.Builder result = ResultRow.builder();
    result.text("id", row.id()).text("instrument", row.instrument());
    row.method().ifPresent(method -> result.text("method", method.label()));
    for (PriceFigure figure : PriceFigure.values()) {
      OptionalDouble value = row.figure(figure);
      if (value.isPresent()) {
        result.put(figure.label(), cell(figure, value.getAsDouble()));
      }
    }
    result.text("status", row.hasFailed() ? "error" : "ok");
    if (!row.message().isEmpty()) {
      result.text("message", row.message());
    }
    carried.forEach(result::text);
    return result;
  }

  private static Cell cell(PriceFigure figure, double value) {
    return switch (figure.unit()) {
      case MONEY -> new Cell.Amount(value, Math.abs(value) < 1000 ? 6 : 2);
      case PRICE -> new Cell.Amount(value, 6);
      case YEARS -> new Cell.Amount(value, 4);
      case RATE -> new Cell.Rate(value);
      case ERROR -> new Cell.Magnitude(value);
    };
  }
}
