package ebbline.data;

import ebbline.time.InputProblem;
import ebbline.time.Moment;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;

/**
 * One row of a table, read cell by cell; whatever is wrong is added to the problems, with its
 * place.
 */
final class CsvRow {
  private final String source;
  private final int line;
  private final List<Column> columns;
  private final String[] cells;
  private final List<InputProblem> problems;

  CsvRow(
      String source, int line, List<Column> columns, String[] cells, List<InputProblem> problems) {
    this.source = source;
    this.line = line;
    this.columns = columns;
    this.cells = cells;
    this.problems = problems;
  }

  /** The same row with its own list of problems. */
  CsvRow collecting(List<InputProblem> own) {
    return new CsvRow(source, line, columns, cells, own);
  }

  /** The same row with values for cells that are empty or that the file has no column for. */
  CsvRow withDefaults(Map<String, String> defaults) {
    List<Column> more = new ArrayList<>(columns);
    List<String> filled = new ArrayList<>(List.of(cells));
    defaults.forEach(
        (name, value) -> {
          int at = index(name);
          if (at < 0) {
            more.add(new Column(name, name, RateText.Unit.WRITTEN, false));
            filled.add(value);
          } else if (filled.get(at).isBlank()) {
            filled.set(at, value);
          }
        });
    return new CsvRow(source, line, more, filled.toArray(new String[0]), problems);
  }

  int line() {
    return line;
  }

  /** The unit of bare numbers in a column. */
  RateText.Unit unit(String name) {
    int at = index(name);
    return at < 0 ? RateText.Unit.WRITTEN : columns.get(at).unit();
  }

  String source() {
    return source;
  }

  List<Column> columns() {
    return columns;
  }

  List<InputProblem> problems() {
    return problems;
  }

  /** The cell without blanks around it; empty where the column or the value is not given. */
  Optional<String> text(String name) {
    int at = index(name);
    return at < 0 ? Optional.empty() : cell(at);
  }

  private int index(String name) {
    for (int i = 0; i < columns.size(); i++) {
      if (columns.get(i).name().equals(name)) {
        return i;
      }
    }
    return -1;
  }

  Optional<String> cell(int column) {
    String text = cells[column].strip();
    return text.isEmpty() ? Optional.empty() : Optional.of(text);
  }

  /** The cell as it stands, for columns that are carried through. */
  String raw(int column) {
    return cells[column];
  }

  boolean has(String name) {
    return text(name).isPresent();
  }

  /** A problem of this row. */
  void problem(String column, String value, String expected) {
    problems.add(new InputProblem(source, line, heading(column), value, expected));
  }

  private String heading(String name) {
    int at = index(name);
    return at < 0 ? name : columns.get(at).heading();
  }

  /** A value that the reader turns into something, or a problem with the reader's words. */
  <T> Optional<T> value(String name, Function<String, T> reader) {
    Optional<String> text = text(name);
    if (text.isEmpty()) {
      return Optional.empty();
    }
    try {
      return Optional.of(reader.apply(text.get()));
    } catch (IllegalArgumentException e) {
      problem(name, text.get(), e.getMessage());
      return Optional.empty();
    }
  }

  OptionalDouble number(String name) {
    return asDouble(value(name, NumberText::parse));
  }

  OptionalDouble rate(String name) {
    RateText.Unit unit = unit(name);
    return asDouble(value(name, text -> RateText.parse(text, unit)));
  }

  Optional<Moment> moment(String name) {
    return value(name, Moment::parse);
  }

  /** A value that must be there. */
  <T> Optional<T> required(String name, Optional<T> value) {
    if (value.isEmpty() && !has(name)) {
      problem(name, "", "a value is missing");
    }
    return value;
  }

  private static OptionalDouble asDouble(Optional<Double> value) {
    return value.isPresent() ? OptionalDouble.of(value.get()) : OptionalDouble.empty();
  }
}
