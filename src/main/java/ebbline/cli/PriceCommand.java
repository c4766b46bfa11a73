package ebbline.cli;

import ebbline.data.BookEntry;
import ebbline.data.BookFile;
import ebbline.data.CurveInput;
import ebbline.data.ModelInput;
import ebbline.data.RowText;
import ebbline.data.SourceFile;
import ebbline.instrument.BookRow;
import ebbline.pricing.BookPricer;
import ebbline.pricing.Market;
import ebbline.pricing.Method;
import ebbline.pricing.PricedRow;
import ebbline.pricing.PricingRequest;
import ebbline.pricing.QuotedRows;
import ebbline.pricing.RowPricer;
import ebbline.report.OutputFormat;
import ebbline.report.PriceReport;
import ebbline.report.ResultRow;
import ebbline.time.CalendarRegistry;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Prices a book. */
@Command(
    name = "price",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Prices a book of bonds and options from a curve or a model, each row with its method and the"
          + " bound of its numerical error. A row that cannot be priced is reported in its place"
          + " (exit status 1)."
    },
    footer = {
      "",
      "A calculation aid, not advice: local rules and your own licensed and independent review"
          + " prevail.",
      "",
      "Examples (from the project's root):",
      "  java -jar target/ebbline.jar price --model hull-white --mean-reversion 0.05 \\",
      "    --volatility 0.9%% --curve curves/saltmere.csv --book examples/book.csv",
      "  java -jar target/ebbline.jar price --model vasicek --short-rate 5%% \\",
      "    --long-run-mean 8%% --mean-reversion 0.1 --volatility 1.5%% --format json \\",
      "    --row 'instrument=zero-option kind=call expiry=1 maturity=3 strike=87'"
    })
final class PriceCommand implements Callable<Integer> {
  @Mixin private MarketOptions market;
  @Mixin private ProjectionOption projection;
  @Mixin private ModelOptions model;

  @Option(names = "--book", paramLabel = "FILE", description = "the book, one instrument a row")
  private String book;

  @Option(
      names = "--row",
      paramLabel = "'KEY=VALUE …'",
      description =
          "one row typed here, with the book's columns as keys; values with blanks in double"
              + " quotes; repeatable")
  private List<String> rows = List.of();

  @Option(
      names = "--method",
      paramLabel = "NAME",
      defaultValue = "auto",
      description =
          "auto (default: the most accurate that applies), closed-form, backward-induction,"
              + " trinomial or simulation")
  private String method;

  @Option(
      names = "--steps",
      paramLabel = "N",
      defaultValue = "500",
      description = "steps of a trinomial tree (default 500)")
  private int steps;

  @Mixin private PathsOption paths;

  @Option(
      names = "--explain",
      paramLabel = "ID",
      description = "show the flows of the row with this id, their discount factors and values")
  private String explain;

  @Option(
      names = "--horizon",
      paramLabel = "MOMENT",
      description = "adds forward price, carry and roll-down of bonds until then, 3M")
  private String horizon;

  @Mixin private HolidayOptions holidays;
  @Mixin private OutputOptions output;

  private boolean failed;
  private boolean explained;

  @Override
  public Integer call() {
    if (book == null && rows.isEmpty()) {
      throw new UsageProblem("nothing to price: give --book FILE or --row 'KEY=VALUE …'");
    }
    CalendarRegistry calendars = holidays.calendars();
    Optional<BookFile> file = Optional.ofNullable(book).map(path -> BookFile.open(path, calendars));
    PricingRequest request = new PricingRequest(method(), steps, paths.sampling(output), horizon());
    List<Optional<SourceFile>> files = new ArrayList<>();
    Optional<Market> priced = market(files);
    file.ifPresent(f -> files.add(Optional.of(f.file())));
    TimeAxis axis = priced.map(Market::axis).orElseGet(this::quotedAxis);
    BookPricer pricer =
        priced
            .<BookPricer>map(m -> new RowPricer(m, request))
            .orElseGet(() -> new QuotedRows(axis));
    List<ResultRow> results = new ArrayList<>();
    file.ifPresent(f -> f.forEach(entry -> results.addAll(results(entry, pricer, priced))));
    int number = results.size();
    for (String row : rows) {
      results.addAll(results(entry(row, ++number, calendars), pricer, priced));
    }
    if (explain != null && !explained) {
      throw UsageProblem.of("--explain", explain, "no row of this run has this id");
    }
    List<String> carried = file.map(BookFile::carried).orElse(List.of());
    boolean flowsOnly = explain != null && output.format() == OutputFormat.CSV;
    output.write(
        Inputs.envelope("price", axis, files, flowsOnly ? List.of() : PriceReport.columns(carried)),
        results);
    if (failed) {
      output.note("some rows could not be priced; their message says why");
    }
    return (failed ? ExitStatus.CHECK_FAILED : ExitStatus.DONE).code();
  }

  private Optional<Moment> horizon() {
    return MarketOptions.read("--horizon", horizon, Moment::parse);
  }

  private Optional<Method> method() {
    if (method.equals("auto")) {
      return Optional.empty();
    }
    for (Method known :
        List.of(
            Method.CLOSED_FORM, Method.BACKWARD_INDUCTION, Method.TRINOMIAL, Method.SIMULATION)) {
      if (known.label().equals(method.toLowerCase(Locale.ROOT))) {
        return Optional.of(known);
      }
    }
    throw UsageProblem.of(
        "--method",
        method,
        "expected auto, closed-form, backward-induction, trinomial or simulation");
  }

  /** What rows are priced from; empty where each has its own quote only. */
  private Optional<Market> market(List<Optional<SourceFile>> files) {
    Optional<ModelInput> named = model.model(market);
    Market found;
    if (named.isPresent()) {
      files.add(named.get().file());
      found = Market.of(named.get().axis(), named.get().rates());
      found = named.get().fitted().map(found::withFitted).orElse(found);
    } else if (market.hasCurve()) {
      CurveInput curve = market.curve();
      files.add(curve.file());
      found = Market.of(curve.axis(), curve.curve());
    } else {
      return Optional.empty();
    }
    Optional<CurveInput> forwards = projection.curve(market, found.axis());
    if (forwards.isPresent()) {
      files.add(forwards.get().file());
      found = found.withProjection(forwards.get().curve());
    }
    return Optional.of(found);
  }

  private TimeAxis quotedAxis() {
    List<String> needing = new ArrayList<>(market.needingCurve());
    if (projection.isGiven()) {
      needing.add("--projection");
    }
    if (horizon != null) {
      needing.add("--horizon");
    }
    if (!needing.isEmpty()) {
      throw new UsageProblem(needing.get(0) + " needs --curve FILE or --model to work on");
    }
    if (explain != null) {
      throw new UsageProblem("--explain needs --curve FILE or --model: it shows discount factors");
    }
    return market.asOf().map(TimeAxis::from).orElse(TimeAxis.undated());
  }

  private static BookEntry entry(String row, int number, CalendarRegistry calendars) {
    try {
      return RowText.parse(row, "--row", number, calendars);
    } catch (IllegalArgumentException e) {
      throw new UsageProblem("--row: " + e.getMessage());
    }
  }

  private List<ResultRow> results(BookEntry entry, BookPricer pricer, Optional<Market> priced) {
    if (entry instanceof BookEntry.Bad bad) {
      failed = true;
      explained |= bad.id().equals(explain);
      return explain != null && output.format() == OutputFormat.CSV
          ? List.of()
          : List.of(
              PriceReport.result(
                      PricedRow.failed(bad.id(), bad.instrument(), bad.message()), bad.carried())
                  .build());
    }
    BookRow row = ((BookEntry.Good) entry).row();
    PricedRow result = pricer.price(row);
    failed |= result.hasFailed();
    boolean explains = row.id().equals(explain);
    explained |= explains;
    if (explain != null && output.format() == OutputFormat.CSV) {
      return explains && !result.hasFailed()
          ? FlowReport.flows(row, priced.orElseThrow())
          : List.of();
    }
    ResultRow.Builder built = PriceReport.result(result, row.carried());
    if (explains && !result.hasFailed()) {
      FlowReport.explain(built, row, priced.orElseThrow());
      if (method().equals(Optional.of(Method.TRINOMIAL))) {
        TreeReport.explain(built, row, priced.orElseThrow(), steps, output.format());
      }
    }
    return List.of(built.build());
  }
}
