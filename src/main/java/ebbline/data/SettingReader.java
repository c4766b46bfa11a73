package ebbline.data;

import ebbline.time.InputProblem;
import ebbline.time.Moment;
import ebbline.time.TimeAxis.TimeBasis;
import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.Collectors;

/** The settings of a table, each turned into what it means or into a problem with its place. */
final class SettingReader {
  private final CsvTable table;
  private final List<InputProblem> problems;

  SettingReader(CsvTable table, List<InputProblem> problems) {
    this.table = table;
    this.problems = problems;
  }

  <T> Optional<T> read(String key, Function<String, T> reader) {
    try {
      return table.setting(key).map(s -> reader.apply(s.value()));
    } catch (IllegalArgumentException e) {
      problems.add(table.settingProblem(key, e.getMessage()));
      return Optional.empty();
    }
  }

  /** The text as it stands, where the reader takes it: a wrong one is said once, at its line. */
  Optional<String> checked(String key, Function<String, ?> reader) {
    return read(key, reader).flatMap(known -> table.setting(key)).map(CsvTable.Setting::value);
  }

  OptionalDouble number(String key, Function<String, Double> reader) {
    return read(key, reader).map(OptionalDouble::of).orElse(OptionalDouble.empty());
  }

  /** The settings that Smith and Wilson's curve has. */
  KernelSettings kernel() {
    return new KernelSettings(
        number("ultimate-forward", RateText::parse),
        number("convergence", SettingReader::years),
        number("speed", NumberText::parse),
        number("tolerance", RateText::parse));
  }

  static LocalDate date(String text) {
    if (Moment.parse(text) instanceof Moment.OnDate on) {
      return on.date();
    }
    throw new IllegalArgumentException("expected a date such as 2026-11-30");
  }

  /** A tenor or a number of years. */
  static double years(String text) {
    Moment moment = Moment.parse(text);
    if (moment instanceof Moment.InYears number) {
      return number.years();
    } else if (moment instanceof Moment.After after) {
      return after.tenor().years();
    }
    throw new IllegalArgumentException("expected a length of time, 60Y or 60");
  }

  static TimeBasis basis(String text) {
    for (TimeBasis basis : TimeBasis.values()) {
      if (basis.label().equals(text.toLowerCase(Locale.ROOT))) {
        return basis;
      }
    }
    throw new IllegalArgumentException(
        "expected a time basis, one of "
            + Arrays.stream(TimeBasis.values())
                .map(TimeBasis::label)
                .collect(Collectors.joining(", ")));
  }
}
