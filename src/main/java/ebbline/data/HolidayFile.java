package ebbline.data;

import ebbline.time.BusinessCalendar;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/**
 * A user's holidays: one column {@code date}; settings {@code first-year} and {@code last-year}
 * state the years that the list is complete for, otherwise those of its first and last holiday.
 */
public final class HolidayFile {
  private static final Layout LAYOUT =
      new Layout(
          "holiday file", Set.of("first-year", "last-year"), Set.of("date", "name"), Set.of());

  private HolidayFile() {}

  /**
   * Reads a calendar.
   *
   * @param name how books call it
   * @throws InputProblems with every line that is wrong
   * @throws IllegalArgumentException in words if the name cannot be a calendar's
   */
  public static BusinessCalendar read(String name, String path) {
    CsvTable table = CsvTable.open(SourceFile.read(path), LAYOUT);
    List<InputProblem> problems = new ArrayList<>();
    if (!table.hasColumn("date")) {
      throw InputProblems.of(table.headerProblem("date", "the column is missing"));
    }
    Set<LocalDate> days = new TreeSet<>();
    table.forEachRow(
        problems,
        row -> {
          Optional<LocalDate> day = row.required("date", row.value("date", HolidayFile::date));
          if (day.isPresent() && !days.add(day.get())) {
            row.problem("date", day.get().toString(), "the holiday stands twice");
          }
        });
    Optional<Integer> first = year(table, "first-year", problems);
    Optional<Integer> last = year(table, "last-year", problems);
    if (problems.isEmpty() && days.isEmpty() && (first.isEmpty() || last.isEmpty())) {
      problems.add(
          new InputProblem(
              path,
              0,
              "",
              "",
              "there are no holidays; a list without any states '# first-year' and '# last-year'"));
    }
    if (!problems.isEmpty()) {
      throw new InputProblems(problems);
    }
    List<LocalDate> sorted = List.copyOf(days);
    int from = first.orElseGet(() -> sorted.get(0).getYear());
    int to = last.orElseGet(() -> sorted.get(sorted.size() - 1).getYear());
    try {
      return BusinessCalendar.of(name, days, from, to);
    } catch (IllegalArgumentException e) {
      throw InputProblems.of(new InputProblem(path, 0, "", name, e.getMessage()));
    }
  }

  private static LocalDate date(String text) {
    try {
      return LocalDate.parse(text);
    } catch (DateTimeParseException e) {
      throw new IllegalArgumentException("expected a date such as 2026-12-25", e);
    }
  }

  private static Optional<Integer> year(CsvTable table, String key, List<InputProblem> problems) {
    Optional<CsvTable.Setting> setting = table.setting(key);
    if (setting.isEmpty()) {
      return Optional.empty();
    }
    if (setting.get().value().matches("\\d{4}")) {
      return Optional.of(Integer.parseInt(setting.get().value()));
    }
    problems.add(table.settingProblem(key, "expected a year such as 2026"));
    return Optional.empty();
  }
}
