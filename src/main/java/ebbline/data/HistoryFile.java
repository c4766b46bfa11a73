package ebbline.data;

import ebbline.fitting.history.RateHistory;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * Histories of a rate: {@code date,rate}, or {@code rate} alone with a step; an empty cell is a
 * missing observation. Settings: {@code step}, and {@code source} for the reader of the file.
 */
public final class HistoryFile {
  private HistoryFile() {}

  /**
   * Reads a history.
   *
   * @param step between two observations; overrides the file's own. Without one the dates count, by
   *     act/365f
   * @param column which of several; with it the file's columns may have any names
   * @throws InputProblems with everything that is wrong, in the order of the file
   */
  public static HistoryInput read(String path, Optional<Step> step, Optional<String> column) {
    Layout layout =
        new Layout(
            "history",
            Set.of("step", "source"),
            Set.of("date"),
            Set.of("rate"),
            name -> column.isPresent() || PanelFile.isMaturity(name));
    CsvTable table = CsvTable.open(SourceFile.read(path), layout);
    List<InputProblem> problems = new ArrayList<>();
    Column chosen = chosen(table, column, problems);
    ObservationTimes times = ObservationTimes.of(table, step, problems);
    if (!problems.isEmpty()) {
      throw InFileOrder.of(problems);
    }
    List<Double> rates = new ArrayList<>();
    table.forEachRow(
        problems,
        row -> {
          OptionalDouble rate = row.rate(chosen.name());
          if (times.add(row)) {
            rates.add(rate.orElse(Double.NaN)); // the history's own sign for a missing rate
          }
        });
    if (rates.isEmpty() && problems.isEmpty()) {
      problems.add(
          new InputProblem(table.file().path(), 0, "", "", "there are no rows below the header"));
    }
    if (!problems.isEmpty()) {
      throw InFileOrder.of(problems);
    }
    return new HistoryInput(
        RateHistory.of(times.times(), rates.stream().mapToDouble(Double::doubleValue).toArray()),
        chosen.heading(),
        times.dates(),
        times.dates().isEmpty() ? List.of() : Arrays.stream(times.times()).boxed().toList(),
        table.file());
  }

  private static Column chosen(
      CsvTable table, Optional<String> wanted, List<InputProblem> problems) {
    List<Column> rates =
        table.columns().stream().filter(c -> !c.carried() && !c.name().equals("date")).toList();
    String names = rates.stream().map(Column::heading).collect(Collectors.joining(", "));
    if (rates.isEmpty()) {
      problems.add(table.headerProblem("rate", "the column is missing; a history needs it"));
    } else if (wanted.isPresent()) {
      for (Column each : rates) {
        if (each.heading().equalsIgnoreCase(wanted.get())
            || each.name().equalsIgnoreCase(wanted.get())) {
          return each;
        }
      }
      problems.add(
          table.headerProblem(
              wanted.get(),
              "there is no such column; did you mean '"
                  + NearestName.of(wanted.get(), rates.stream().map(Column::heading).toList())
                  + "'?"));
    } else if (rates.size() > 1) {
      problems.add(
          table.headerProblem("", "several columns hold rates; pick one with --column: " + names));
    }
    return rates.isEmpty() ? table.columns().get(0) : rates.get(0);
  }
}
