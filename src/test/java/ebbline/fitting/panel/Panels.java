package ebbline.fitting.panel;

import ebbline.fitting.ReferenceCsv;
import java.util.HashMap;
import java.util.Map;
import java.util.Objects;

/** Panels and reference figures of the tests. */
final class Panels {
  static final double[] MATURITIES = {0.25, 0.5, 1, 2, 3, 5, 7, 10};
  static final String[] COLUMNS = {"3m", "6m", "1y", "2y", "3y", "5y", "7y", "10y"};
  private static final Map<String, String> FIGURES = new HashMap<>();

  static {
    ReferenceCsv reference = ReferenceCsv.read("history/estimation-reference.csv");
    for (int i = 0; i < reference.size(); i++) {
      FIGURES.put(
          reference.text(i, "set") + "." + reference.text(i, "quantity"),
          reference.text(i, "value"));
    }
  }

  private Panels() {}

  static double reference(String set, String quantity) {
    return Double.parseDouble(text(set, quantity));
  }

  private static String text(String set, String quantity) {
    String key = set + "." + quantity;
    return Objects.requireNonNull(FIGURES.get(key), "no reference figure " + key);
  }

  /** The monthly panel of a reference set, steps of exactly 1/12. */
  static YieldPanel of(String set) {
    ReferenceCsv table = ReferenceCsv.read("history/cmt-panel-monthly.csv");
    String start = text(set, "start");
    String end = text(set, "end");
    int first = 0;
    while (table.text(first, "date").compareTo(start) < 0) {
      first++;
    }
    int last = first;
    while (last < table.size() && table.text(last, "date").compareTo(end) <= 0) {
      last++;
    }
    double[] times = new double[last - first];
    double[][] yields = new double[last - first][COLUMNS.length];
    for (int i = 0; i < times.length; i++) {
      times[i] = i / 12.0;
      for (int j = 0; j < COLUMNS.length; j++) {
        yields[i][j] = table.number(first + i, COLUMNS[j]) / 100;
      }
    }
    return YieldPanel.of(times, MATURITIES, yields);
  }
}
