package ebbline.model;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;

/** A reference file that states its source, its maker and the tolerance it is held to. */
public final class ReferenceTable {
  private final double tolerance;
  private final List<String> columns;
  private final List<List<String>> rows;

  private ReferenceTable(double tolerance, List<String> columns, List<List<String>> rows) {
    this.tolerance = tolerance;
    this.columns = columns;
    this.rows = rows;
  }

  /** A file beside {@code owner}'s class, refused if it lacks source, maker or tolerance. */
  public static ReferenceTable read(Class<?> owner, String name) {
    List<String> columns = null;
    List<List<String>> rows = new ArrayList<>();
    boolean source = false;
    boolean maker = false;
    double tolerance = Double.NaN;
    try (InputStream stream = owner.getResourceAsStream(name + ".csv")) {
      BufferedReader reader =
          new BufferedReader(new InputStreamReader(stream, StandardCharsets.UTF_8));
      for (String line = reader.readLine(); line != null; line = reader.readLine()) {
        if (line.startsWith("#")) {
          source |= line.startsWith("# source: ");
          maker |= line.startsWith("# maker: ");
          if (line.startsWith("# tolerance")) {
            tolerance = Double.parseDouble(line.substring(line.indexOf(':') + 1));
          }
        } else if (columns == null) {
          columns = List.of(line.split(","));
        } else {
          rows.add(List.of(line.split(",")));
        }
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    if (!(source && maker && tolerance > 0) || rows.isEmpty()) {
      throw new IllegalStateException(name + " lacks source, maker, tolerance or rows");
    }
    return new ReferenceTable(tolerance, columns, rows);
  }

  public double tolerance() {
    return tolerance;
  }

  public int size() {
    return rows.size();
  }

  public String text(int row, String column) {
    return rows.get(row).get(columns.indexOf(column));
  }

  public double number(int row, String column) {
    return Double.parseDouble(text(row, column));
  }

  /** |found − exact| with all the digits of the file. */
  public double error(int row, String column, double found) {
    return new BigDecimal(found).subtract(new BigDecimal(text(row, column))).abs().doubleValue();
  }

  public double relativeError(int row, String column, double found) {
    double exact = Math.abs(number(row, column));
    return exact == 0 ? Math.abs(found) : error(row, column, found) / exact;
  }

  /** Error in units of the last place of the exact value. */
  public double ulps(int row, String column, double found) {
    return error(row, column, found) / Math.ulp(number(row, column));
  }
}
