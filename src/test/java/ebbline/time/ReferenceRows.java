package ebbline.time;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Rows of a reference file, which is refused if it states no source, maker or tolerance. */
final class ReferenceRows {
  private ReferenceRows() {}

  record Row(Map<String, String> cells) {
    String text(String column) {
      String cell = cells.get(column);
      if (cell == null) {
        throw new IllegalStateException("no column " + column + " in " + cells.keySet());
      }
      return cell;
    }

    LocalDate date(String column) {
      return LocalDate.parse(text(column));
    }

    int whole(String column) {
      return Integer.parseInt(text(column));
    }

    double number(String column) {
      return Double.parseDouble(text(column));
    }
  }

  static List<Row> read(String name) {
    List<Row> rows = new ArrayList<>();
    String[] columns = null;
    int stated = 0;
    try (InputStream stream = ReferenceRows.class.getResourceAsStream(name + ".csv");
        BufferedReader reader =
            new BufferedReader(new InputStreamReader(stream, StandardCharsets.UTF_8))) {
      for (String line = reader.readLine(); line != null; line = reader.readLine()) {
        if (line.startsWith("#")) {
          stated += line.matches("# (source|maker|tolerance.*): .+") ? 1 : 0;
        } else if (columns == null) {
          columns = line.split(",", -1);
        } else {
          String[] cells = line.split(",", -1);
          Map<String, String> row = new LinkedHashMap<>();
          for (int i = 0; i < columns.length; i++) {
            row.put(columns[i], cells[i]);
          }
          rows.add(new Row(row));
        }
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    if (stated != 3 || rows.isEmpty()) {
      throw new IllegalStateException(name + " lacks source, maker, tolerance or rows");
    }
    return rows;
  }
}
