package ebbline.data;

import ebbline.fitting.options.OptionQuote;
import ebbline.fitting.options.QuoteUnit;
import ebbline.pricing.Market;
import ebbline.time.CalendarRegistry;
import ebbline.time.DayCount;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import ebbline.time.Roll;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/** Sheets of option quotes: one a row, the settings hold what the rows leave out. */
public final class OptionQuotesFile {
  /** Columns of the book that options use, beside those of a quote. */
  private static final Set<String> COLUMNS =
      Set.of(
          "id",
          "instrument",
          "expiry",
          "tenor",
          "maturity",
          "strike",
          "strike_kind",
          "kind",
          "frequency",
          "day_count",
          "calendar",
          "roll",
          "eom",
          "issue",
          "first_coupon",
          "last_coupon",
          "redemption",
          "ex_days",
          "start",
          "rate_basis",
          "quote_kind",
          "weight");

  private static final Layout LAYOUT =
      new Layout(
          "sheet of option quotes",
          Set.of("frequency", "day-count", "calendar", "roll", "kind", "quote-kind", "shift"),
          COLUMNS,
          Set.of("quote", "shift", "coupon"));

  private OptionQuotesFile() {}

  /**
   * Reads a sheet of option quotes.
   *
   * @param market the curve on which strikes at the money and forwards stand
   * @throws InputProblems with everything that is wrong, in the order of the file
   */
  public static OptionQuotesInput read(String path, Market market, CalendarRegistry calendars) {
    CsvTable table = CsvTable.open(SourceFile.read(path), LAYOUT);
    List<InputProblem> problems = new ArrayList<>();
    for (String column : List.of("instrument", "quote")) {
      if (!table.hasColumn(column)) {
        problems.add(
            table.headerProblem(
                column, "the column is missing; a sheet of option quotes needs it"));
      }
    }
    Map<String, String> defaults = defaults(new SettingReader(table, problems), calendars);
    throwIfAny(problems);
    OptionQuoteRow reader = new OptionQuoteRow(market, calendars, defaults);
    List<OptionQuote> quotes = new ArrayList<>();
    List<String> expiries = new ArrayList<>();
    Map<String, Integer> lines = new HashMap<>();
    int[] count = {0};
    table.forEachRow(
        problems,
        row -> {
          count[0]++;
          Optional<OptionQuote> quote = reader.read(row, problems);
          quote.ifPresent(
              q -> {
                Integer line = lines.put(q.id(), row.line());
                if (line != null) {
                  row.problem(
                      "id",
                      q.id(),
                      "the same quote, or its label, stands in line " + line + " too");
                }
                quotes.add(q);
                expiries.add(row.text("expiry").orElse(""));
              });
        });
    if (count[0] == 0 && problems.isEmpty()) {
      problems.add(new InputProblem(path, 0, "", "", "there are no rows below the header"));
    }
    if (problems.isEmpty() && quotes.stream().allMatch(q -> q.weight() == 0)) {
      problems.add(
          table.headerProblem(
              "weight", "some weight must be above 0; with all of them 0 nothing is fitted"));
    }
    throwIfAny(problems);
    return new OptionQuotesInput(quotes, expiries, table.file());
  }

  private static Map<String, String> defaults(SettingReader settings, CalendarRegistry calendars) {
    Map<String, String> defaults = new LinkedHashMap<>();
    settings
        .checked("frequency", OptionQuotesFile::frequency)
        .ifPresent(t -> defaults.put("frequency", t));
    settings.checked("day-count", DayCount::of).ifPresent(t -> defaults.put("day_count", t));
    settings.checked("calendar", calendars::find).ifPresent(t -> defaults.put("calendar", t));
    settings.checked("roll", Roll::of).ifPresent(t -> defaults.put("roll", t));
    settings.checked("kind", OptionQuotesFile::side).ifPresent(t -> defaults.put("kind", t));
    settings.checked("quote-kind", QuoteUnit::of).ifPresent(t -> defaults.put("quote_kind", t));
    settings.checked("shift", RateText::parse).ifPresent(t -> defaults.put("shift", t));
    return defaults;
  }

  private static String frequency(String text) {
    if (Set.of("1", "2", "4", "12").contains(text)) {
      return text;
    }
    throw new IllegalArgumentException("expected 1, 2, 4 or 12 payments a year");
  }

  private static String side(String text) {
    if (Set.of("payer", "receiver", "call", "put").contains(text)) {
      return text;
    }
    throw new IllegalArgumentException("expected payer, receiver, call or put");
  }

  /** Kinds of the book that are options by themselves. */
  static Set<String> kinds() {
    return new TreeSet<>(
        Set.of("zero-option", "bond-option", "caplet", "floorlet", "cap", "floor", "swaption"));
  }

  private static void throwIfAny(List<InputProblem> problems) {
    if (!problems.isEmpty()) {
      throw InFileOrder.of(problems);
    }
  }
}
