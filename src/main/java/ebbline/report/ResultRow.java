package ebbline.report;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * One result: named cells in the order in which they are shown. A name that means nothing for a
 * result is absent from it.
 */
public final class ResultRow {
  private final Map<String, Cell> cells;

  private ResultRow(Map<String, Cell> cells) {
    this.cells = cells;
  }

  public static Builder builder() {
    return new Builder();
  }

  public Map<String, Cell> cells() {
    return cells;
  }

  List<String> names() {
    return new ArrayList<>(cells.keySet());
  }

  /** Collects the cells of one result. */
  public static final class Builder {
    private final Map<String, Cell> cells = new LinkedHashMap<>();

    private Builder() {}

    public Builder put(String name, Cell cell) {
      if (cells.put(name, cell) != null) {
        throw new IllegalStateException("a result has one cell a name, found a second " + name);
      }
      return this;
    }

    public Builder text(String name, String value) {
      return put(name, new Cell.Text(value));
    }

    public Builder rate(String name, double value) {
      return put(name, new Cell.Rate(value));
    }

    public Builder number(String name, double value, int decimals) {
      return put(name, new Cell.Amount(value, decimals));
    }

    public Builder magnitude(String name, double value) {
      return put(name, new Cell.Magnitude(value));
    }

    public Builder count(String name, long value) {
      return put(name, new Cell.Count(value));
    }

    public Builder flag(String name, boolean value) {
      return put(name, new Cell.Flag(value));
    }

    public Builder rows(String name, List<ResultRow> rows) {
      return put(name, new Cell.Rows(rows));
    }

    /** Leaves the name out where there is no value. */
    public Builder rate(String name, OptionalDouble value) {
      value.ifPresent(v -> rate(name, v));
      return this;
    }

    public ResultRow build() {
      return new ResultRow(Collections.unmodifiableMap(new LinkedHashMap<>(cells)));
    }
  }
}
