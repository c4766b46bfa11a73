package ebbline.data;

import ebbline.instrument.BookRow;
import ebbline.instrument.Instrument;
import ebbline.instrument.LastPeriodRule;
import ebbline.instrument.PriceRounding;
import ebbline.instrument.QuoteTerms;
import ebbline.instrument.YieldKind;
import ebbline.time.CalendarRegistry;
import ebbline.time.InputProblem;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;

/** Turns the cells of a book's row into an instrument, with everything that is wrong with them. */
final class BookRows {
  private BookRows() {}

  /**
   * @param number of the row, its label where it has none
   */
  static BookEntry entry(CsvRow source, int number, CalendarRegistry calendars) {
    List<InputProblem> problems = new ArrayList<>();
    CsvRow row = source.collecting(problems);
    String id = row.text("id").orElse(Integer.toString(number));
    String kind = row.text("instrument").orElse("bond");
    Map<String, String> carried = carried(row);
    Optional<BookRow> read = Optional.empty();
    if (BookColumns.KINDS.containsKey(kind)) {
      foreignColumns(row, kind);
      read = read(row, id, kind, carried, calendars);
    } else {
      Set<String> known = new TreeSet<>(BookColumns.KINDS.keySet());
      row.problem(
          "instrument",
          kind,
          "no such instrument; did you mean '" + NearestName.of(kind, known) + "'?");
    }
    return read.isPresent() && problems.isEmpty()
        ? new BookEntry.Good(read.get())
        : bad(id, kind, problems, carried);
  }

  static BookEntry bad(
      String id, String kind, List<InputProblem> problems, Map<String, String> carried) {
    return new BookEntry.Bad(
        id,
        kind,
        problems.stream().map(InputProblem::message).collect(Collectors.joining("; ")),
        carried);
  }

  private static Map<String, String> carried(CsvRow row) {
    Map<String, String> carried = new LinkedHashMap<>();
    for (int i = 0; i < row.columns().size(); i++) {
      if (row.columns().get(i).carried()) {
        carried.put(row.columns().get(i).heading(), row.raw(i));
      }
    }
    return carried;
  }

  /** A filled cell that the kind does not use is a mistake, not something to pass over. */
  private static void foreignColumns(CsvRow row, String kind) {
    for (int i = 0; i < row.columns().size(); i++) {
      Column column = row.columns().get(i);
      Optional<String> cell = row.cell(i);
      if (!column.carried()
          && cell.isPresent()
          && !BookColumns.uses(kind, column.name())
          && !isNothing(column.name(), cell.get())) {
        row.problem(
            column.name(),
            cell.get(),
            "a " + kind + " has no such column; it uses " + BookColumns.list(kind));
      }
    }
  }

  /** Values that say nothing beyond the default of a column that this version does not need. */
  private static boolean isNothing(String column, String cell) {
    return switch (column) {
      case "roll" -> cell.equalsIgnoreCase("none");
      case "calendar" -> cell.equalsIgnoreCase("weekends");
      case "eom" -> cell.equalsIgnoreCase("no");
      case "ex_days", "notice" -> cell.equals("0");
      default -> false;
    };
  }

  private static Optional<BookRow> read(
      CsvRow row, String id, String kind, Map<String, String> carried, CalendarRegistry calendars) {
    double face = row.number("face").orElse(100);
    OptionalDouble price = row.number("price");
    OptionalDouble yield = row.rate("yield");
    if (row.has("price") && row.has("yield")) {
      row.problem("yield", row.text("yield").orElseThrow(), "give price or yield, not both");
    }
    OptionalDouble oas = row.rate("oas");
    if (row.has("oas") && (row.has("price") || row.has("yield"))) {
      row.problem("oas", row.text("oas").orElseThrow(), "give price, yield or oas, not several");
    }
    QuoteTerms quote =
        new QuoteTerms(
            row.value("yield_kind", YieldKind::of).orElse(YieldKind.STREET),
            row.value("last_period", LastPeriodRule::of).orElse(LastPeriodRule.SIMPLE),
            row.value("rounding", PriceRounding::of).orElse(PriceRounding.NONE));
    Optional<? extends Instrument> instrument =
        BookColumns.KINDS.get(kind).read(new RowCells(row, calendars));
    return row.problems().isEmpty()
        ? instrument.map(i -> new BookRow(id, i, face, price, yield, oas, quote, carried))
        : Optional.empty();
  }
}
