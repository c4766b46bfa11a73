package ebbline.data;

import ebbline.curve.Compounding;
import ebbline.fitting.panel.YieldPanel;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import ebbline.time.Moment;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * Panels of yields: {@code date} and one column a maturity, headed by its tenor ({@code 3M}, {@code
 * 10Y_pct}); an empty cell is a missing yield. Settings: {@code step}, {@code compounding} of the
 * yields (default continuous), and {@code source} for the reader of the file.
 */
public final class PanelFile {
  private static final Layout LAYOUT =
      new Layout(
          "panel",
          Set.of("step", "compounding", "source"),
          Set.of("date"),
          Set.of(),
          PanelFile::isMaturity);
  private static final double LONGEST = 200;
  private static final double LARGEST = 10; // 1,000 % a year

  private PanelFile() {}

  /** Whether a heading is a tenor above 0. */
  static boolean isMaturity(String name) {
    return years(name) > 0;
  }

  private static double years(String name) {
    try {
      return Moment.parse(name) instanceof Moment.After after ? after.tenor().years() : 0;
    } catch (IllegalArgumentException e) {
      return 0;
    }
  }

  /**
   * Reads a panel.
   *
   * @param step between two rows; overrides the file's own. Without one the dates count, by
   *     act/365f
   * @throws InputProblems with everything that is wrong, in the order of the file
   */
  public static PanelInput read(String path, Optional<Step> step) {
    CsvTable table = CsvTable.open(SourceFile.read(path), LAYOUT);
    List<InputProblem> problems = new ArrayList<>();
    ObservationTimes times = ObservationTimes.of(table, step, problems);
    Compounding compounding = compounding(table, problems);
    List<Column> columns = maturities(table, problems);
    if (!problems.isEmpty()) {
      throw InFileOrder.of(problems);
    }
    double[] maturities = columns.stream().mapToDouble(c -> years(c.name())).toArray();
    List<double[]> yields = new ArrayList<>();
    table.forEachRow(
        problems,
        row -> {
          double[] cells = new double[maturities.length];
          for (int j = 0; j < cells.length; j++) {
            cells[j] = continuous(row, columns.get(j).name(), maturities[j], compounding);
          }
          if (times.add(row)) {
            yields.add(cells);
          }
        });
    if (yields.isEmpty() && problems.isEmpty()) {
      problems.add(
          new InputProblem(table.file().path(), 0, "", "", "there are no rows below the header"));
    }
    if (!problems.isEmpty()) {
      throw InFileOrder.of(problems);
    }
    return new PanelInput(
        YieldPanel.of(times.times(), maturities, yields.toArray(new double[0][])),
        columns.stream().map(Column::heading).toList(),
        times.dates(),
        table.file());
  }

  private static Compounding compounding(CsvTable table, List<InputProblem> problems) {
    try {
      return table
          .setting("compounding")
          .map(s -> Compounding.of(s.value()))
          .orElse(Compounding.CONTINUOUS);
    } catch (IllegalArgumentException e) {
      problems.add(table.settingProblem("compounding", e.getMessage()));
      return Compounding.CONTINUOUS;
    }
  }

  private static List<Column> maturities(CsvTable table, List<InputProblem> problems) {
    Map<Double, Column> maturities = new LinkedHashMap<>();
    for (Column column : table.columns()) {
      if (!column.carried() && !column.name().equals("date")) {
        Column before = maturities.putIfAbsent(years(column.name()), column);
        if (before != null) {
          problems.add(
              table.headerProblem(
                  column.heading(),
                  "the maturity stands twice, as '" + before.heading() + "' too"));
        } else if (years(column.name()) > LONGEST) {
          problems.add(table.headerProblem(column.heading(), "maturities end at 200 years"));
        }
      }
    }
    if (maturities.isEmpty()) {
      problems.add(
          table.headerProblem(
              "", "a panel needs a column a maturity, headed 3M, 1Y, 10Y or 3M_pct"));
    }
    return List.copyOf(maturities.values());
  }

  /** Continuously compounded; NaN, the panel's own sign, where the cell is empty. */
  private static double continuous(
      CsvRow row, String name, double maturity, Compounding compounding) {
    OptionalDouble quoted = row.rate(name);
    if (quoted.isEmpty()) {
      return Double.NaN;
    }
    String wrong = "a yield must lie within 1000 % either side of 0";
    try {
      double yield =
          compounding == Compounding.CONTINUOUS
              ? quoted.getAsDouble()
              : -compounding.logDiscount(quoted.getAsDouble(), maturity) / maturity;
      if (Math.abs(yield) < LARGEST) {
        return yield;
      }
    } catch (IllegalArgumentException e) {
      wrong = e.getMessage();
    }
    row.problem(name, row.text(name).orElseThrow(), wrong);
    return Double.NaN;
  }
}
