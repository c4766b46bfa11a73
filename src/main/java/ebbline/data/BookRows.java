package ebbline.data;

import ebbline.instrument.Bond;
import ebbline.instrument.BondOption;
import ebbline.instrument.BookRow;
import ebbline.instrument.Instrument;
import ebbline.instrument.OptionKind;
import ebbline.instrument.ZeroBond;
import ebbline.instrument.ZeroOption;
import ebbline.time.DayCount;
import ebbline.time.InputProblem;
import ebbline.time.Moment;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;

/** Turns the cells of a book's row into an instrument, with everything that is wrong with them. */
final class BookRows {
  private BookRows() {}

  /**
   * @param number of the row, its label where it has none
   */
  static BookEntry entry(CsvRow source, int number) {
    List<InputProblem> problems = new ArrayList<>();
    CsvRow row = source.collecting(problems);
    String id = row.text("id").orElse(Integer.toString(number));
    String kind = row.text("instrument").orElse("bond");
    Map<String, String> carried = carried(row);
    Optional<BookRow> read = Optional.empty();
    if (BookColumns.KINDS.containsKey(kind)) {
      foreignColumns(row, kind);
      read = read(row, id, kind, carried);
    } else if (BookColumns.LATER.contains(kind)) {
      row.problem("instrument", kind, "this version does not price this kind");
    } else {
      Set<String> known = new TreeSet<>(BookColumns.KINDS.keySet());
      known.addAll(BookColumns.LATER);
      row.problem(
          "instrument",
          kind,
          "no such instrument; did you mean '" + NearestName.of(kind, known) + "'?");
    }
    return read.isPresent() && problems.isEmpty()
        ? new BookEntry.Good(read.get())
        : bad(id, kind, problems, carried);
  }

  static BookEntry bad(
      String id, String kind, List<InputProblem> problems, Map<String, String> carried) {
    return new BookEntry.Bad(
        id,
        kind,
        problems.stream().map(InputProblem::message).collect(Collectors.joining("; ")),
        carried);
  }

  private static Map<String, String> carried(CsvRow row) {
    Map<String, String> carried = new LinkedHashMap<>();
    for (int i = 0; i < row.columns().size(); i++) {
      if (row.columns().get(i).carried()) {
        carried.put(row.columns().get(i).heading(), row.raw(i));
      }
    }
    return carried;
  }

  /** A filled cell that the kind does not use is a mistake, not something to pass over. */
  private static void foreignColumns(CsvRow row, String kind) {
    for (int i = 0; i < row.columns().size(); i++) {
      Column column = row.columns().get(i);
      Optional<String> cell = row.cell(i);
      if (!column.carried()
          && cell.isPresent()
          && !BookColumns.uses(kind, column.name())
          && !isNothing(column.name(), cell.get())) {
        row.problem(
            column.name(),
            cell.get(),
            "a " + kind + " has no such column; it uses " + BookColumns.list(kind));
      }
    }
  }

  /** Values that say nothing beyond the default of a column that this version does not need. */
  private static boolean isNothing(String column, String cell) {
    return switch (column) {
      case "roll" -> cell.equalsIgnoreCase("none");
      case "calendar" -> cell.equalsIgnoreCase("weekends");
      case "eom" -> cell.equalsIgnoreCase("no");
      case "ex_days", "notice" -> cell.equals("0");
      default -> false;
    };
  }

  private static Optional<BookRow> read(
      CsvRow row, String id, String kind, Map<String, String> carried) {
    double face = row.number("face").orElse(100);
    OptionalDouble price = row.number("price");
    OptionalDouble yield = row.rate("yield");
    if (row.has("price") && row.has("yield")) {
      row.problem("yield", row.text("yield").orElseThrow(), "give price or yield, not both");
    }
    row.value("yield_kind", BookRows::street);
    Optional<Instrument> instrument =
        switch (kind) {
          case "zero-bond" -> zeroBond(row).map(z -> z);
          case "zero-option" -> zeroOption(row).map(z -> z);
          case "bond-option" -> bondOption(row).map(z -> z);
          default -> bond(row).map(z -> z);
        };
    return row.problems().isEmpty()
        ? instrument.map(i -> new BookRow(id, i, face, price, yield, carried))
        : Optional.empty();
  }

  private static String street(String text) {
    if (text.equals("street")) {
      return text;
    }
    throw new IllegalArgumentException("expected street, the kind that this version has");
  }

  private static Optional<ZeroBond> zeroBond(CsvRow row) {
    Optional<Moment> maturity = row.required("maturity", row.moment("maturity"));
    double redemption = row.number("redemption").orElse(100);
    return build(row, maturity.isPresent(), () -> new ZeroBond(maturity.get(), redemption));
  }

  private static Optional<Bond> bond(CsvRow row) {
    Optional<Moment> maturity = row.required("maturity", row.moment("maturity"));
    OptionalDouble coupon = row.rate("coupon");
    if (!row.has("coupon")) {
      row.problem("coupon", "", "a value is missing");
    }
    int frequency = row.value("frequency", BookRows::frequency).orElse(2);
    DayCount dayCount = row.value("day_count", DayCount::of).orElse(DayCount.ACT_ACT_ICMA);
    double redemption = row.number("redemption").orElse(100);
    int settleDays = row.value("settle_days", BookRows::days).orElse(0);
    return build(
        row,
        maturity.isPresent() && coupon.isPresent(),
        () ->
            new Bond(
                maturity.get(), coupon.getAsDouble(), frequency, dayCount, redemption, settleDays));
  }

  private static Optional<ZeroOption> zeroOption(CsvRow row) {
    Optional<ZeroBond> underlying = zeroBond(row);
    Optional<Moment> expiry = row.required("expiry", row.moment("expiry"));
    Optional<OptionKind> kind = row.required("kind", row.value("kind", OptionKind::of));
    OptionalDouble strike = strike(row);
    return build(
        row,
        underlying.isPresent() && expiry.isPresent() && kind.isPresent() && strike.isPresent(),
        () -> new ZeroOption(kind.get(), expiry.get(), underlying.get(), strike.getAsDouble()));
  }

  private static Optional<BondOption> bondOption(CsvRow row) {
    Optional<Bond> underlying = bond(row);
    Optional<Moment> expiry = row.required("expiry", row.moment("expiry"));
    Optional<OptionKind> kind = row.required("kind", row.value("kind", OptionKind::of));
    OptionalDouble strike = strike(row);
    BondOption.StrikeKind strikeKind =
        row.value("strike_kind", BondOption.StrikeKind::of).orElse(BondOption.StrikeKind.CLEAN);
    return build(
        row,
        underlying.isPresent() && expiry.isPresent() && kind.isPresent() && strike.isPresent(),
        () ->
            new BondOption(
                kind.get(), expiry.get(), underlying.get(), strike.getAsDouble(), strikeKind));
  }

  private static OptionalDouble strike(CsvRow row) {
    OptionalDouble strike = row.number("strike");
    if (!row.has("strike")) {
      row.problem("strike", "", "a value is missing");
    }
    return strike;
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

  private static <T> Optional<T> build(
      CsvRow row, boolean complete, java.util.function.Supplier<T> builder) {
    if (!complete || !row.problems().isEmpty()) {
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
