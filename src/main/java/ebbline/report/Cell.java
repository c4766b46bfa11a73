package ebbline.report;

import java.util.List;
import java.util.Objects;

/** One figure or word of a result, with what a table needs to show it. */
public sealed interface Cell {

  /** A rate per year as a decimal fraction; tables show it in per cent. */
  record Rate(double value) implements Cell {
    public Rate {
      requireFinite(value);
    }
  }

  /** A number with the decimals that a table shows; CSV and JSON give all its digits. */
  record Amount(double value, int decimals) implements Cell {
    public Amount {
      requireFinite(value);
    }
  }

  /** A number whose size matters more than its digits, an error bound for example. */
  record Magnitude(double value) implements Cell {
    public Magnitude {
      requireFinite(value);
    }
  }

  /** A whole number. */
  record Count(long value) implements Cell {}

  /** A word or a sentence. */
  record Text(String value) implements Cell {
    public Text {
      Objects.requireNonNull(value, "value");
    }
  }

  /** Yes or no. */
  record Flag(boolean value) implements Cell {}

  /** A list of results inside a result; a table of its own below the main one. */
  record Rows(List<ResultRow> rows) implements Cell {
    public Rows {
      rows = List.copyOf(rows);
    }
  }

  /** A result inside a result. */
  record Group(ResultRow row) implements Cell {
    public Group {
      Objects.requireNonNull(row, "row");
    }
  }

  private static void requireFinite(double value) {
    if (!Double.isFinite(value)) {
      throw new IllegalStateException("a figure that leaves the program is finite, found " + value);
    }
  }
}
