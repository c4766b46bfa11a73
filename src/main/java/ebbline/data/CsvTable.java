package ebbline.data;

import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Consumer;

/**
 * A CSV file: settings, a header, rows. What is wrong with the file as such is thrown at once; what
 * is wrong with a row is left to whoever reads the row.
 */
final class CsvTable {
  private final SourceFile file;
  private final Map<String, Setting> settings;
  private final List<Column> columns;
  private final int headerLine;
  private final int bodyAt;
  private final int bodyLine;

  /**
   * A line {@code # key: value}.
   *
   * @param line of the file
   */
  record Setting(int line, String value) {}

  private CsvTable(
      SourceFile file,
      Map<String, Setting> settings,
      List<Column> columns,
      int headerLine,
      CsvRecords body) {
    this.file = file;
    this.settings = settings;
    this.columns = columns;
    this.headerLine = headerLine;
    this.bodyAt = body.at();
    this.bodyLine = body.line();
  }

  /**
   * Reads the settings and the header.
   *
   * @throws InputProblems for unknown or repeated settings and columns, or no header
   */
  static CsvTable open(SourceFile file, Layout layout) {
    List<InputProblem> problems = new ArrayList<>();
    Map<String, Setting> settings = new LinkedHashMap<>();
    String text = file.text();
    int at = 0;
    int line = 1;
    while (at < text.length()) {
      int end = text.indexOf('\n', at);
      String row = text.substring(at, end < 0 ? text.length() : end).strip();
      if (!row.isEmpty() && row.charAt(0) != '#') {
        break;
      }
      if (!row.isEmpty()) {
        setting(file, layout, line, row, settings, problems);
      }
      at = end < 0 ? text.length() : end + 1;
      line++;
    }
    if (at >= text.length()) {
      problems.add(
          new InputProblem(
              file.path(), 0, "", "", "there is no header row; a " + layout.kind() + " needs one"));
      throw new InputProblems(problems);
    }
    CsvRecords records = new CsvRecords(text, at, line);
    CsvRecords.Cut header = records.next().orElseThrow(); // not blank: the loop above stopped at it
    if (!header.problem().isEmpty()) {
      problems.add(new InputProblem(file.path(), header.line(), "", "", header.problem()));
      throw new InputProblems(problems);
    }
    List<Column> columns = columns(file, layout, line, header.cells(), problems);
    if (!problems.isEmpty()) {
      throw new InputProblems(problems);
    }
    return new CsvTable(file, settings, columns, line, records);
  }

  private static void setting(
      SourceFile file,
      Layout layout,
      int line,
      String row,
      Map<String, Setting> settings,
      List<InputProblem> problems) {
    String body = row.substring(1).strip();
    int colon = body.indexOf(':');
    if (colon < 0) {
      if (!body.isEmpty()) {
        problems.add(
            new InputProblem(file.path(), line, "", row, "expected a setting, # key: value"));
      }
      return;
    }
    String key = body.substring(0, colon).strip().toLowerCase(Locale.ROOT);
    String value = body.substring(colon + 1).strip();
    if (!layout.settings().contains(key)) {
      List<String> known = layout.settings().stream().sorted().toList();
      problems.add(
          new InputProblem(
              file.path(),
              line,
              "",
              key,
              known.isEmpty()
                  ? "a " + layout.kind() + " has no settings"
                  : "no such setting; did you mean '"
                      + NearestName.of(key, known)
                      + "'? known: "
                      + String.join(", ", known)));
    } else if (settings.put(key, new Setting(line, value)) != null) {
      problems.add(new InputProblem(file.path(), line, "", key, "the setting is given twice"));
    }
  }

  private static List<Column> columns(
      SourceFile file,
      Layout layout,
      int line,
      List<String> headings,
      List<InputProblem> problems) {
    List<Column> columns = new ArrayList<>();
    Map<String, String> seen = new HashMap<>();
    for (String each : headings) {
      String heading = each.strip();
      Column column = Column.of(heading, layout);
      columns.add(column);
      if (heading.isEmpty()) {
        problems.add(
            new InputProblem(
                file.path(), line, "", "", "column " + columns.size() + " has no heading"));
      } else if (!column.isKnown(layout)) {
        problems.add(
            new InputProblem(
                file.path(),
                line,
                heading,
                "",
                "a "
                    + layout.kind()
                    + " has no such column; did you mean '"
                    + NearestName.of(column.name(), layout.known())
                    + "'? (columns of your own are headed x-…)"));
      }
      String before = seen.put(column.name(), heading);
      if (before != null && !heading.isEmpty()) {
        problems.add(
            new InputProblem(
                file.path(),
                line,
                heading,
                "",
                before.equals(heading)
                    ? "the column stands twice"
                    : "the column stands twice, as '" + before + "' too"));
      }
    }
    return Collections.unmodifiableList(columns);
  }

  SourceFile file() {
    return file;
  }

  List<Column> columns() {
    return columns;
  }

  int headerLine() {
    return headerLine;
  }

  boolean hasColumn(String name) {
    return columns.stream().anyMatch(c -> c.name().equals(name));
  }

  Optional<Setting> setting(String key) {
    return Optional.ofNullable(settings.get(key));
  }

  /** A problem of a setting. */
  InputProblem settingProblem(String key, String expected) {
    Setting setting = settings.get(key);
    return new InputProblem(file.path(), setting.line(), key, setting.value(), expected);
  }

  /** A problem of the header. */
  InputProblem headerProblem(String column, String expected) {
    return new InputProblem(file.path(), headerLine, column, "", expected);
  }

  /**
   * Hands every row to the reader, in the order of the file. Rows that are no rows (a field too few
   * or too many, an unbalanced quote) go to the problems.
   */
  void forEachRow(List<InputProblem> problems, Consumer<CsvRow> reader) {
    CsvRecords records = new CsvRecords(file.text(), bodyAt, bodyLine);
    for (Optional<CsvRecords.Cut> next = records.next(); next.isPresent(); next = records.next()) {
      CsvRecords.Cut cut = next.get();
      if (!cut.problem().isEmpty()) {
        problems.add(new InputProblem(file.path(), cut.line(), "", "", cut.problem()));
      } else if (cut.cells().size() != columns.size()) {
        problems.add(
            new InputProblem(
                file.path(),
                cut.line(),
                "",
                "",
                "the row has "
                    + cut.cells().size()
                    + (cut.cells().size() == 1 ? " cell" : " cells")
                    + ", the header has "
                    + columns.size()
                    + "; give every row as many"));
      } else {
        reader.accept(
            new CsvRow(
                file.path(), cut.line(), columns, cut.cells().toArray(new String[0]), problems));
      }
    }
  }
}
