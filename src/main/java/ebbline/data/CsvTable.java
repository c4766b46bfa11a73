package ebbline.data;

import com.opencsv.CSVReader;
import com.opencsv.CSVReaderBuilder;
import com.opencsv.RFC4180Parser;
import com.opencsv.exceptions.CsvValidationException;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.io.StringReader;
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
  /** A quoted cell that runs over more lines than this is an unbalanced quote. */
  private static final int MOST_LINES_A_RECORD = 50;

  private final SourceFile file;
  private final Map<String, Setting> settings;
  private final List<Column> columns;
  private final int headerLine;
  private final int bodyAt;

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
      int bodyAt) {
    this.file = file;
    this.settings = settings;
    this.columns = columns;
    this.headerLine = headerLine;
    this.bodyAt = bodyAt;
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
    int end = text.indexOf('\n', at);
    String header = text.substring(at, end < 0 ? text.length() : end);
    List<Column> columns = columns(file, layout, line, header, problems);
    if (!problems.isEmpty()) {
      throw new InputProblems(problems);
    }
    return new CsvTable(file, settings, columns, line, end < 0 ? text.length() : end + 1);
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
      SourceFile file, Layout layout, int line, String header, List<InputProblem> problems) {
    List<Column> columns = new ArrayList<>();
    Map<String, String> seen = new HashMap<>();
    String[] headings;
    try {
      headings = new RFC4180Parser().parseLine(header.strip());
    } catch (IOException e) {
      throw InputProblems.of(
          new InputProblem(file.path(), line, "", header.strip(), "a quote is not closed"));
    }
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
    try (CSVReader csv =
        new CSVReaderBuilder(new StringReader(file.text().substring(bodyAt)))
            .withCSVParser(new RFC4180Parser())
            .withMultilineLimit(MOST_LINES_A_RECORD)
            .build()) {
      int line = headerLine + 1;
      while (true) {
        String[] cells = csv.readNext();
        if (cells == null) {
          return;
        }
        int next = headerLine + 1 + (int) csv.getLinesRead();
        if (cells.length > 1 || !cells[0].isBlank()) {
          row(line, next, cells, problems, reader);
        }
        line = next;
      }
    } catch (IOException | CsvValidationException e) {
      problems.add(
          new InputProblem(
              file.path(), unbalancedLine(), "", "", "a quote is opened and not closed"));
    }
  }

  private void row(
      int line, int next, String[] cells, List<InputProblem> problems, Consumer<CsvRow> reader) {
    int bad = strayQuote(line, next);
    if (bad > 0) {
      problems.add(
          new InputProblem(
              file.path(),
              bad,
              "",
              "",
              "a quote stands inside a cell; put the whole cell in quotes and double those in it"));
    } else if (cells.length != columns.size()) {
      problems.add(
          new InputProblem(
              file.path(),
              line,
              "",
              "",
              "the row has "
                  + cells.length
                  + " cells, the header has "
                  + columns.size()
                  + "; give every row as many"));
    } else {
      reader.accept(new CsvRow(file.path(), line, columns, cells, problems));
    }
  }

  /** The line of a quote that neither opens nor closes a cell, or 0; the parser accepts those. */
  private int strayQuote(int line, int next) {
    String record = lines(line, next);
    if (record.indexOf('"') < 0) {
      return 0;
    }
    boolean quoted = false;
    int at = line;
    for (int i = 0; i < record.length(); i++) {
      char c = record.charAt(i);
      if (c == '\n') {
        at++;
      } else if (c == '"' && quoted) {
        char after = i + 1 < record.length() ? record.charAt(i + 1) : ',';
        if (after == '"') {
          i++;
        } else if (after == ',' || after == '\r' || after == '\n') {
          quoted = false;
        } else {
          return at;
        }
      } else if (c == '"') {
        char before = i == 0 ? ',' : record.charAt(i - 1);
        if (before != ',') {
          return at;
        }
        quoted = true;
      }
    }
    return 0;
  }

  private String lines(int from, int to) {
    int start = offset(from);
    int end = offset(to);
    return file.text().substring(start, end);
  }

  private int lastLine = -1;
  private int lastOffset;

  /** Where a line starts; asked for in rising order, so that the file is walked once. */
  private int offset(int line) {
    if (lastLine < 0 || line < lastLine) {
      lastLine = headerLine + 1;
      lastOffset = bodyAt;
    }
    String text = file.text();
    while (lastLine < line && lastOffset < text.length()) {
      int end = text.indexOf('\n', lastOffset);
      lastOffset = end < 0 ? text.length() : end + 1;
      lastLine++;
    }
    return lastOffset;
  }

  /** The last line on which the number of quotes up to there is odd for the rest of the file. */
  private int unbalancedLine() {
    String text = file.text();
    boolean open = false;
    int opened = headerLine + 1;
    int line = headerLine + 1;
    for (int i = bodyAt; i < text.length(); i++) {
      char c = text.charAt(i);
      if (c == '"') {
        open = !open;
        opened = open ? line : opened;
      } else if (c == '\n') {
        line++;
      }
    }
    return opened;
  }
}
