package ebbline.data;

import ebbline.time.InputProblem;
import ebbline.time.Moment;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * When the rows of a history were observed, in years from the first.
 *
 * <p>With dates and no step: days/365. With dates and a step of whole months: the months of the
 * calendar, so that a month that is left out is a gap. With another step, or without dates, each
 * row is one step after the row before.
 */
final class ObservationTimes {
  private final Optional<Step> step;
  private final boolean dated;
  private final List<LocalDate> dates = new ArrayList<>();
  private final List<Double> times = new ArrayList<>();
  private int lastLine;

  private ObservationTimes(CsvTable table, Optional<Step> step) {
    this.step = step;
    dated = table.hasColumn("date");
    lastLine = table.headerLine();
  }

  /**
   * @param override of the file's own setting {@code step}
   * @param problems takes a setting that cannot be read, and a step that is missing
   */
  static ObservationTimes of(CsvTable table, Optional<Step> override, List<InputProblem> problems) {
    ObservationTimes times =
        new ObservationTimes(table, override.isPresent() ? override : own(table, problems));
    if (!times.dated && times.step.isEmpty() && problems.isEmpty()) {
      problems.add(
          table.headerProblem(
              "date",
              "the column is missing; rows without dates need a step, --step 1M, 1D or years"));
    }
    return times;
  }

  private static Optional<Step> own(CsvTable table, List<InputProblem> problems) {
    try {
      return table.setting("step").map(s -> Step.parse(s.value()));
    } catch (IllegalArgumentException e) {
      problems.add(table.settingProblem("step", e.getMessage()));
      return Optional.empty();
    }
  }

  /** Takes a row; false, with its problem, if it has no place in time. */
  boolean add(CsvRow row) {
    int line = lastLine;
    lastLine = row.line();
    if (!dated) {
      if (row.line() != line + 1 && row.problems().isEmpty()) {
        row.problem(
            "",
            "",
            "an empty line stands above this row; write \"\" for a rate that is missing, or take the"
                + " line out");
        return false;
      }
      times.add(times.size() * step.orElseThrow().years());
      return true;
    }
    Optional<LocalDate> date = row.required("date", row.value("date", ObservationTimes::date));
    if (date.isEmpty()) {
      return false;
    }
    OptionalDouble time = time(row, date.get());
    if (time.isPresent()) {
      times.add(time.getAsDouble());
      dates.add(date.get());
    }
    return time.isPresent();
  }

  private OptionalDouble time(CsvRow row, LocalDate date) {
    if (dates.isEmpty()) {
      return OptionalDouble.of(0);
    }
    LocalDate before = dates.get(dates.size() - 1);
    if (!date.isAfter(before)) {
      row.problem("date", date.toString(), "dates must increase; the row above has " + before);
      return OptionalDouble.empty();
    }
    if (step.isEmpty()) {
      return OptionalDouble.of(ChronoUnit.DAYS.between(dates.get(0), date) / 365.0);
    }
    double years = step.get().years();
    if (step.get().months().isEmpty()) {
      return OptionalDouble.of(times.size() * years);
    }
    int length = step.get().months().getAsInt();
    int months = months(date) - months(dates.get(0));
    if (months(date) == months(before) || months % length != 0) {
      row.problem(
          "date",
          date.toString(),
          "with a step of "
              + (length == 1 ? "a month" : length + " months")
              + " from "
              + dates.get(0)
              + " no observation falls into this month, or another one did");
      return OptionalDouble.empty();
    }
    int steps = months / length;
    return OptionalDouble.of(steps * years);
  }

  private static int months(LocalDate date) {
    return 12 * date.getYear() + date.getMonthValue();
  }

  private static LocalDate date(String text) {
    if (Moment.parse(text) instanceof Moment.OnDate on) {
      return on.date();
    }
    throw new IllegalArgumentException("expected a date such as 2026-11-30");
  }

  double[] times() {
    return times.stream().mapToDouble(Double::doubleValue).toArray();
  }

  /** Of the rows; empty where the file has none. */
  List<LocalDate> dates() {
    return List.copyOf(dates);
  }
}
