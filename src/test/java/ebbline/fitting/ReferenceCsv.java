package ebbline.fitting;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/** A reference table of these packages; refuses a file that does not name its source and maker. */
public final class ReferenceCsv {
  private final Map<String, String> settings = new LinkedHashMap<>();
  private final List<String> header = new ArrayList<>();
  private final List<String[]> rows = new ArrayList<>();

  private ReferenceCsv() {}

  /** Reads a resource beside this class. */
  public static ReferenceCsv read(String name) {
    ReferenceCsv table = new ReferenceCsv();
    try (BufferedReader in =
        new BufferedReader(
            new InputStreamReader(
                Objects.requireNonNull(
                    ReferenceCsv.class.getResourceAsStream(name), "no resource " + name),
                StandardCharsets.UTF_8))) {
      for (String line = in.readLine(); line != null; line = in.readLine()) {
        if (line.startsWith("#")) {
          int colon = line.indexOf(": ");
          if (colon > 0) {
            table.settings.put(line.substring(1, colon).strip(), line.substring(colon + 2).strip());
          }
        } else if (table.header.isEmpty()) {
          table.header.addAll(List.of(line.split(",", -1)));
        } else {
          table.rows.add(line.split(",", -1));
        }
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    if (!table.settings.containsKey("source") || !table.settings.containsKey("maker")) {
      throw new IllegalStateException(name + " must name its source and maker");
    }
    return table;
  }

  public double tolerance(String name) {
    return Double.parseDouble(
        Objects.requireNonNull(settings.get("tolerance." + name), "no tolerance." + name));
  }

  public int size() {
    return rows.size();
  }

  public String text(int row, String column) {
    int j = header.indexOf(column);
    if (j < 0) {
      throw new IllegalArgumentException("no column " + column + " among " + header);
    }
    return rows.get(row)[j];
  }

  public double number(int row, String column) {
    return Double.parseDouble(text(row, column));
  }

  /** A column as numbers; an empty cell is NaN. */
  public double[] column(String column) {
    double[] values = new double[rows.size()];
    for (int i = 0; i < values.length; i++) {
      String cell = text(i, column);
      values[i] = cell.isEmpty() ? Double.NaN : Double.parseDouble(cell);
    }
    return values;
  }
}
