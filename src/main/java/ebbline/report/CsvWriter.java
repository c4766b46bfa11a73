package ebbline.report;

import com.fasterxml.jackson.core.io.NumberOutput;
import java.io.IOException;
import java.io.Writer;
import java.util.List;
import java.util.regex.Pattern;

/**
 * RFC 4180 with LF line ends. Lists inside a result do not fit a flat file and are left to JSON.
 *
 * <p>A text that a spreadsheet would run as a formula is written with a leading apostrophe.
 */
final class CsvWriter implements ResultWriter {
  private static final Pattern NUMBER =
      Pattern.compile("[+-]?(\\d+(\\.\\d*)?|\\.\\d+)([eE][+-]?\\d+)?%?");

  private final Writer out;
  private List<String> columns = List.of();
  private boolean headed;

  CsvWriter(Writer out) {
    this.out = out;
  }

  @Override
  public void begin(Envelope envelope) throws IOException {
    columns = envelope.columns();
    if (!columns.isEmpty()) {
      header();
    }
  }

  private void header() throws IOException {
    headed = true;
    StringBuilder line = new StringBuilder();
    for (String column : columns) {
      line.append(line.isEmpty() ? "" : ",").append(quoted(safe(column)));
    }
    out.write(line.append('\n').toString());
  }

  @Override
  public void row(ResultRow row) throws IOException {
    if (!headed) {
      columns =
          row.cells().entrySet().stream()
              .filter(e -> !isNested(e.getValue()))
              .map(java.util.Map.Entry::getKey)
              .toList();
      header();
    }
    StringBuilder line = new StringBuilder();
    for (int i = 0; i < columns.size(); i++) {
      if (i > 0) {
        line.append(',');
      }
      Cell cell = row.cells().get(columns.get(i));
      if (cell != null) {
        line.append(text(cell));
      }
    }
    out.write(line.append('\n').toString());
  }

  @Override
  public void beside(ResultRow figures) {
    // CSV output is the results alone.
  }

  @Override
  public void end(List<String> warnings) throws IOException {
    out.flush();
  }

  static boolean isNested(Cell cell) {
    return cell instanceof Cell.Rows || cell instanceof Cell.Group;
  }

  private static String text(Cell cell) {
    if (cell instanceof Cell.Rate rate) {
      return number(rate.value());
    } else if (cell instanceof Cell.Amount number) {
      return number(number.value());
    } else if (cell instanceof Cell.Magnitude magnitude) {
      return number(magnitude.value());
    } else if (cell instanceof Cell.Count count) {
      return Long.toString(count.value());
    } else if (cell instanceof Cell.Flag flag) {
      return Boolean.toString(flag.value());
    } else if (cell instanceof Cell.Text words) {
      return quoted(safe(words.value()));
    }
    return "";
  }

  /** The shortest text that reads back to the same double, the same on every JDK. */
  static String number(double value) {
    return NumberOutput.toString(value, true);
  }

  private static String safe(String text) {
    boolean runs = !text.isEmpty() && "=+-@\t\r".indexOf(text.charAt(0)) >= 0;
    return runs && !NUMBER.matcher(text).matches() ? "'" + text : text;
  }

  private static String quoted(String text) {
    for (int i = 0; i < text.length(); i++) {
      if (",\"\n\r".indexOf(text.charAt(i)) >= 0) {
        return '"' + text.replace("\"", "\"\"") + '"';
      }
    }
    return text;
  }
}
