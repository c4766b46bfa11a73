package ebbline.data;

import ebbline.curve.Interpolation;
import ebbline.fitting.quotes.QuoteKind;
import ebbline.fitting.quotes.SheetQuote;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Quote sheets: one market quote a row, the settings hold what the rows leave out. */
public final class QuotesFile {
  private static final Layout LAYOUT =
      new Layout(
          "quotes file",
          Set.of(
              "as-of",
              "interpolation",
              "time-basis",
              "compounding",
              "tenors-from",
              "settle-days",
              "payment-lag",
              "ex-days",
              "calendar",
              "roll",
              "eom",
              "day-count",
              "fixed-day-count",
              "bond-day-count",
              "fixed-frequency",
              "bond-frequency",
              "mean-reversion",
              "volatility",
              "ultimate-forward",
              "convergence",
              "speed",
              "tolerance"),
          QuoteRows.allColumns(),
          Set.of("quote", "yield", "coupon"));

  private QuotesFile() {}

  /**
   * Reads a quote sheet.
   *
   * @throws InputProblems with everything that is wrong, in the order of the file
   */
  public static QuotesInput read(String path, QuoteOverrides overrides) {
    CsvTable table = CsvTable.open(SourceFile.read(path), LAYOUT);
    List<InputProblem> problems = new ArrayList<>();
    for (String column : List.of("instrument", "maturity")) {
      if (!table.hasColumn(column)) {
        problems.add(table.headerProblem(column, "the column is missing; a quotes file needs it"));
      }
    }
    SettingReader settings = new SettingReader(table, problems);
    SheetTerms terms = new SheetTerms(settings, overrides);
    Optional<Interpolation> interpolation = settings.read("interpolation", Interpolation::of);
    KernelSettings kernel = settings.kernel();
    throwIfAny(problems);
    Rows rows = new Rows(new QuoteRows(terms), problems);
    table.forEachRow(problems, rows::add);
    if (rows.count == 0 && problems.isEmpty()) {
      problems.add(new InputProblem(path, 0, "", "", "there are no rows below the header"));
    }
    throwIfAny(problems);
    boolean futures = rows.quotes.stream().anyMatch(q -> q.kind() == QuoteKind.FUTURE);
    if (futures && terms.volatility.isEmpty()) {
      rows.remarks.add("futures are taken as forwards: no volatility is given for their convexity");
    }
    return new QuotesInput(
        terms.axis, rows.quotes, interpolation, kernel, rows.remarks, table.file());
  }

  private static void throwIfAny(List<InputProblem> problems) {
    if (!problems.isEmpty()) {
      throw InFileOrder.of(problems);
    }
  }

  /** The rows read so far, and what each repeats. */
  private static final class Rows {
    private final QuoteRows reader;
    private final List<InputProblem> problems;
    private final List<SheetQuote> quotes = new ArrayList<>();
    private final List<String> remarks = new ArrayList<>();
    private final Map<String, Row> byTerms = new HashMap<>();
    private final Map<String, Integer> byId = new HashMap<>();
    private int count;

    private record Row(int line, SheetQuote quote) {}

    Rows(QuoteRows reader, List<InputProblem> problems) {
      this.reader = reader;
      this.problems = problems;
    }

    void add(CsvRow row) {
      count++;
      Optional<SheetQuote> read = reader.read(row, problems);
      if (read.isEmpty()) {
        return;
      }
      SheetQuote quote = read.get();
      Row before = byTerms.putIfAbsent(terms(row, quote), new Row(row.line(), quote));
      if (before != null) {
        repeat(row, quote, before);
        return;
      }
      Integer line = byId.put(quote.id(), row.line());
      if (line != null) {
        row.problem(
            "id",
            quote.id(),
            "the label stands on line " + line + " too; give each quote its own id");
        return;
      }
      quotes.add(quote);
    }

    private void repeat(CsvRow row, SheetQuote quote, Row before) {
      String column = row.has("quote") ? "quote" : row.has("price") ? "price" : "yield";
      if (quote.equation().quote() == before.quote().equation().quote()
          && quote.priced() == before.quote().priced()) {
        remarks.add(
            String.format(
                Locale.ROOT,
                "line %d repeats the %s of line %d; it counts once",
                row.line(),
                quote.kind().label(),
                before.line()));
        return;
      }
      row.problem(
          column,
          row.text(column).orElse(""),
          "line "
              + before.line()
              + " quotes a "
              + quote.kind().label()
              + " of the same terms at another value; keep one of them");
    }

    /** What two rows share that quote the same thing. */
    private static String terms(CsvRow row, SheetQuote quote) {
      return String.format(
          Locale.ROOT,
          "%s %.6f %.6f %s %s %s",
          quote.kind(),
          quote.start(),
          quote.end(),
          row.text("coupon").orElse(""),
          row.text("frequency").orElse(""),
          row.text("redemption").orElse(""));
    }
  }
}
