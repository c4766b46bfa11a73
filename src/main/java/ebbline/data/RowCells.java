package ebbline.data;

import ebbline.instrument.OptionKind;
import ebbline.time.BusinessCalendar;
import ebbline.time.CalendarRegistry;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.function.Supplier;

/**
 * The cells of a book's row as the kinds of instruments ask for them: with defaults, and every
 * wrong value added to the row's problems.
 */
final class RowCells {
  private final CsvRow row;
  private final CalendarRegistry calendars;

  RowCells(CsvRow row, CalendarRegistry calendars) {
    this.row = row;
    this.calendars = calendars;
  }

  boolean has(String column) {
    return row.has(column);
  }

  boolean hasProblems() {
    return !row.problems().isEmpty();
  }

  void problem(String column, String expected) {
    row.problem(column, row.text(column).orElse(""), expected);
  }

  Optional<String> text(String column) {
    return row.text(column);
  }

  <T> Optional<T> value(String column, Function<String, T> reader) {
    return row.value(column, reader);
  }

  <T> Optional<T> required(String column, Function<String, T> reader) {
    return row.required(column, row.value(column, reader));
  }

  OptionalDouble number(String column) {
    return row.number(column);
  }

  OptionalDouble rate(String column) {
    return row.rate(column);
  }

  OptionalDouble requiredNumber(String column) {
    return required(column, number(column));
  }

  OptionalDouble requiredRate(String column) {
    return required(column, rate(column));
  }

  private OptionalDouble required(String column, OptionalDouble value) {
    if (value.isEmpty() && !row.has(column)) {
      problem(column, "a value is missing");
    }
    return value;
  }

  Optional<Moment> moment(String column) {
    return row.moment(column);
  }

  Optional<Moment> requiredMoment(String column) {
    return row.required(column, row.moment(column));
  }

  /** Money; 100 where the row does not say. */
  double face() {
    return row.number("face").orElse(100);
  }

  int frequency(int otherwise) {
    return row.value("frequency", RowCells::frequency).orElse(otherwise);
  }

  DayCount dayCount(DayCount otherwise) {
    return row.value("day_count", DayCount::of).orElse(otherwise);
  }

  double redemption() {
    return row.number("redemption").orElse(100);
  }

  int settleDays() {
    return row.value("settle_days", RowCells::days).orElse(0);
  }

  BusinessCalendar calendar() {
    return row.value("calendar", calendars::find).orElse(BusinessCalendar.WEEKENDS);
  }

  Optional<OptionKind> requiredCallOrPut() {
    return required("kind", OptionKind::of);
  }

  /** A strike that must be there: a rate, or none inside where the row says {@code atm}. */
  Optional<OptionalDouble> requiredRateStrike() {
    return required("strike", text -> strike(text, RateText::parse));
  }

  /** As {@link #requiredRateStrike}, a price per 100. */
  Optional<OptionalDouble> requiredPriceStrike() {
    return required("strike", text -> strike(text, NumberText::parse));
  }

  private static OptionalDouble strike(String text, Function<String, Double> reader) {
    return text.equalsIgnoreCase("atm")
        ? OptionalDouble.empty()
        : OptionalDouble.of(reader.apply(text));
  }

  private static int frequency(String text) {
    for (String known : List.of("1", "2", "4", "12")) {
      if (known.equals(text)) {
        return Integer.parseInt(known);
      }
    }
    throw new IllegalArgumentException("expected 1, 2, 4 or 12 payments a year");
  }

  private static int days(String text) {
    if (text.matches("\\d{1,3}")) {
      return Integer.parseInt(text);
    }
    throw new IllegalArgumentException("expected a number of business days, 0 or more");
  }

  /** What the builder makes, unless a value it needs is missing or wrong or it refuses. */
  <T> Optional<T> build(boolean complete, Supplier<T> builder) {
    if (!complete || hasProblems()) {
      return Optional.empty();
    }
    try {
      return Optional.of(builder.get());
    } catch (IllegalArgumentException e) {
      row.problem("", "", e.getMessage());
      return Optional.empty();
    }
  }
}
