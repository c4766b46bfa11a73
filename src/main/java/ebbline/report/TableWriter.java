package ebbline.report;

import java.io.IOException;
import java.io.Writer;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;

/**
 * Aligned columns for a person. Several results make one table; a single result, and every list
 * inside a result, is laid out on its own.
 */
final class TableWriter implements ResultWriter {
  private final Writer out;
  private final List<ResultRow> rows = new ArrayList<>();
  private List<String> order = List.of();
  private ResultRow beside = ResultRow.builder().build();

  TableWriter(Writer out) {
    this.out = out;
  }

  @Override
  public void begin(Envelope envelope) {
    order = envelope.columns();
  }

  @Override
  public void row(ResultRow row) {
    rows.add(row);
  }

  @Override
  public void beside(ResultRow figures) {
    beside = figures;
  }

  @Override
  public void end(List<String> warnings) throws IOException {
    if (rows.size() == 1) {
      upright(rows.get(0));
    } else {
      table(rows);
    }
    for (ResultRow row : rows) {
      nested(row);
    }
    nested(beside);
    out.flush();
  }

  private void nested(ResultRow row) throws IOException {
    for (Map.Entry<String, Cell> entry : row.cells().entrySet()) {
      String title = entry.getKey();
      if (rows.size() > 1 && row.cells().get("id") instanceof Cell.Text id) {
        title += " of " + id.value();
      }
      if (entry.getValue() instanceof Cell.Rows list && !list.rows().isEmpty()) {
        out.write("\n" + title + "\n");
        table(list.rows());
      } else if (entry.getValue() instanceof Cell.Group group) {
        out.write("\n" + title + "\n");
        upright(group.row());
        nested(group.row());
      }
    }
  }

  /** One result with many figures: a line each, names at the left. */
  private void upright(ResultRow row) throws IOException {
    int width = row.names().stream().mapToInt(String::length).max().orElse(0);
    for (Map.Entry<String, Cell> entry : row.cells().entrySet()) {
      if (!CsvWriter.isNested(entry.getValue())) {
        out.write(pad(entry.getKey(), width, false) + "  " + text(entry.getValue()) + "\n");
      }
    }
  }

  private void table(List<ResultRow> shown) throws IOException {
    List<String> columns = columns(shown);
    int[] widths = new int[columns.size()];
    boolean[] right = new boolean[columns.size()];
    List<List<String>> lines = new ArrayList<>();
    for (ResultRow row : shown) {
      List<String> line = new ArrayList<>();
      for (int i = 0; i < columns.size(); i++) {
        Cell cell = row.cells().get(columns.get(i));
        String text = cell == null ? "" : text(cell);
        line.add(text);
        widths[i] = Math.max(widths[i], text.length());
        right[i] |= cell != null && !(cell instanceof Cell.Text);
      }
      lines.add(line);
    }
    for (int i = 0; i < widths.length; i++) {
      widths[i] = Math.max(widths[i], columns.get(i).length());
    }
    line(columns, widths, right);
    for (List<String> line : lines) {
      line(line, widths, right);
    }
  }

  private List<String> columns(List<ResultRow> shown) {
    Set<String> present = new LinkedHashSet<>();
    for (ResultRow row : shown) {
      for (Map.Entry<String, Cell> entry : row.cells().entrySet()) {
        if (!CsvWriter.isNested(entry.getValue())) {
          present.add(entry.getKey());
        }
      }
    }
    List<String> columns = new ArrayList<>();
    for (String column : order) {
      if (shown.equals(rows) && present.remove(column)) {
        columns.add(column);
      }
    }
    columns.addAll(present);
    return columns;
  }

  private void line(List<String> cells, int[] widths, boolean[] right) throws IOException {
    StringBuilder line = new StringBuilder();
    for (int i = 0; i < cells.size(); i++) {
      line.append(i == 0 ? "" : "  ").append(pad(cells.get(i), widths[i], right[i]));
    }
    out.write(line.toString().stripTrailing() + "\n");
  }

  private static String pad(String text, int width, boolean right) {
    String blanks = " ".repeat(Math.max(0, width - text.length()));
    return right ? blanks + text : text + blanks;
  }

  static String text(Cell cell) {
    if (cell instanceof Cell.Rate rate) {
      return String.format(Locale.ROOT, "%.5f%%", noMinusZero(100 * rate.value(), 5));
    } else if (cell instanceof Cell.Amount number) {
      return String.format(
          Locale.ROOT,
          "%." + number.decimals() + "f",
          noMinusZero(number.value(), number.decimals()));
    } else if (cell instanceof Cell.Magnitude magnitude) {
      return magnitude.value() == 0 ? "0" : String.format(Locale.ROOT, "%.1e", magnitude.value());
    } else if (cell instanceof Cell.Count count) {
      return Long.toString(count.value());
    } else if (cell instanceof Cell.Flag flag) {
      return flag.value() ? "yes" : "no";
    } else if (cell instanceof Cell.Text words) {
      return words.value().replaceAll("\\p{Cntrl}", " ");
    }
    return "";
  }

  /** A figure that rounds to zero is shown without a sign. */
  private static double noMinusZero(double value, int decimals) {
    return Math.abs(value) < 0.5 * Math.pow(10, -decimals) ? 0.0 : value;
  }
}
