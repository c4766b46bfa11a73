package ebbline.data;

import ebbline.fitting.options.OptionQuote;
import ebbline.fitting.options.QuoteUnit;
import ebbline.instrument.Claim;
import ebbline.instrument.Instrument;
import ebbline.pricing.Market;
import ebbline.pricing.VolatilityTerms;
import ebbline.time.CalendarRegistry;
import ebbline.time.InputProblem;
import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** One option quote read: the option as a book's row, then what is quoted for it. */
final class OptionQuoteRow {
  private final Market market;
  private final CalendarRegistry calendars;
  private final Map<String, String> defaults;

  OptionQuoteRow(Market market, CalendarRegistry calendars, Map<String, String> defaults) {
    this.market = market;
    this.calendars = calendars;
    this.defaults = defaults;
  }

  /** The quote; empty where the row has problems, which are added to the list. */
  Optional<OptionQuote> read(CsvRow source, List<InputProblem> all) {
    List<InputProblem> problems = new ArrayList<>();
    CsvRow row = source.collecting(problems);
    Optional<OptionQuote> quote = Optional.empty();
    String kind = row.text("instrument").orElse("");
    if (kind.isEmpty()) {
      row.problem("instrument", "", "a value is missing");
    } else if (!OptionQuotesFile.kinds().contains(kind)) {
      row.problem(
          "instrument",
          kind,
          "no option of that name; did you mean '"
              + NearestName.of(kind, OptionQuotesFile.kinds())
              + "'?");
    } else {
      quote = quote(row, kind);
    }
    all.addAll(problems);
    return problems.isEmpty() ? quote : Optional.empty();
  }

  private Optional<OptionQuote> quote(CsvRow source, String kind) {
    CsvRow row = source.withDefaults(filled(source, kind));
    RowKind reader = BookColumns.KINDS.get(kind);
    Optional<? extends Instrument> instrument = reader.read(new RowCells(row, calendars));
    QuoteUnit unit = row.value("quote_kind", QuoteUnit::of).orElse(QuoteUnit.NORMAL_VOL);
    OptionalDouble figure = figure(row, unit);
    OptionalDouble shift = row.rate("shift");
    OptionalDouble weight = row.number("weight");
    if (weight.isPresent() && !(weight.getAsDouble() >= 0)) {
      row.problem("weight", row.text("weight").orElse(""), "a weight is at least 0");
    }
    if (instrument.isEmpty() || figure.isEmpty() || !row.problems().isEmpty()) {
      return Optional.empty();
    }
    Claim claim;
    VolatilityTerms terms;
    try {
      claim = market.claim(instrument.get());
      terms = VolatilityTerms.of(claim, market.curve());
    } catch (IllegalArgumentException e) {
      row.problem("", "", e.getMessage());
      return Optional.empty();
    }
    if (isBeyondTheCurve(row, terms)) {
      return Optional.empty();
    }
    try {
      return Optional.of(
          new OptionQuote(
              label(row, kind),
              claim,
              terms,
              unit,
              figure.getAsDouble(),
              shift.orElse(0),
              weight.orElse(1)));
    } catch (IllegalArgumentException e) {
      row.problem("quote", row.text("quote").orElse(""), e.getMessage());
      return Optional.empty();
    }
  }

  private boolean isBeyondTheCurve(CsvRow row, VolatilityTerms terms) {
    double[] nodes = market.curve().nodes();
    if (nodes.length == 0 || terms.lastExpiry() <= nodes[nodes.length - 1] + TimeAxis.SAME_MOMENT) {
      return false;
    }
    String column = row.has("expiry") ? "expiry" : "maturity";
    row.problem(
        column,
        row.text(column).orElse(""),
        String.format(
            Locale.ROOT,
            "the option expires after the curve's end, %.6g years from today",
            nodes[nodes.length - 1]));
    return true;
  }

  /** Volatilities are rates, premiums plain numbers per 100. */
  private static OptionalDouble figure(CsvRow row, QuoteUnit unit) {
    if (!row.has("quote")) {
      row.problem("quote", "", "a value is missing");
      return OptionalDouble.empty();
    }
    if (unit != QuoteUnit.PREMIUM) {
      return row.rate("quote");
    }
    if (row.unit("quote") != RateText.Unit.WRITTEN) {
      row.problem(
          "quote",
          row.text("quote").orElse(""),
          "a premium is per 100; its column is headed quote, without a unit");
      return OptionalDouble.empty();
    }
    return row.number("quote");
  }

  /** What the row leaves out: the sheet's defaults, at the money, and the end from the tenor. */
  private Map<String, String> filled(CsvRow row, String kind) {
    Map<String, String> filled = new LinkedHashMap<>(defaults);
    filled.putIfAbsent("strike", "atm");
    boolean swap = kind.equals("swaption");
    boolean takesSide = swap || kind.endsWith("-option");
    String side = filled.getOrDefault("kind", "");
    boolean fits = swap ? side.endsWith("er") : !side.endsWith("er") && !side.isEmpty();
    filled.remove("kind");
    if (takesSide) {
      filled.put("kind", fits ? side : swap ? "payer" : "call");
    }
    Optional<Tenor> tenor =
        row.has("tenor") ? quiet(row, "tenor", SwaptionRow::tenor) : Optional.empty();
    Optional<Moment> expiry = quiet(row, "expiry", Moment::parse);
    if (!swap && tenor.isPresent() && !row.has("maturity")) {
      boolean fromToday = kind.equals("cap") || kind.equals("floor");
      if (fromToday) {
        filled.put("maturity", tenor.get().toString());
      } else {
        expiry.flatMap(e -> later(e, tenor.get())).ifPresent(m -> filled.put("maturity", m));
      }
    }
    if (swap && tenor.isEmpty() && row.has("maturity")) {
      quiet(row, "maturity", Moment::parse)
          .flatMap(end -> expiry.flatMap(start -> between(start, end)))
          .ifPresent(t -> filled.put("tenor", t));
    }
    return filled;
  }

  /** A value that is there and right; a wrong one is said where the row is read. */
  private static <T> Optional<T> quiet(
      CsvRow row, String column, java.util.function.Function<String, T> reader) {
    return row.collecting(new ArrayList<>()).value(column, reader);
  }

  private Optional<String> later(Moment start, Tenor tenor) {
    TimeAxis axis = market.axis();
    if (axis.isDated(start)) {
      return Optional.of(tenor.after(axis.date(start)).toString());
    }
    return start instanceof Moment.OnDate
        ? Optional.empty()
        : Optional.of(Double.toString(axis.years(start) + tenor.years()));
  }

  private Optional<String> between(Moment start, Moment end) {
    TimeAxis axis = market.axis();
    if (axis.isDated(start) && axis.isDated(end)) {
      LocalDate from = axis.date(start);
      LocalDate to = axis.date(end);
      long months = ChronoUnit.MONTHS.between(from, to);
      long days = ChronoUnit.DAYS.between(from.plusMonths(months), to);
      return from.isBefore(to)
          ? Optional.of(new Tenor((int) months, (int) days).toString())
          : Optional.empty();
    }
    if (start instanceof Moment.OnDate || end instanceof Moment.OnDate) {
      return Optional.empty();
    }
    double months = 12 * (axis.years(end) - axis.years(start));
    return Math.abs(months - Math.rint(months)) < 1e-6 && months > 0
        ? Optional.of(new Tenor((int) Math.rint(months), 0).toString())
        : Optional.empty();
  }

  /** The row's own label, or what tells it from the others: 1Y x 5Y, with its strike. */
  private static String label(CsvRow row, String kind) {
    if (row.has("id")) {
      return row.text("id").orElseThrow();
    }
    List<String> words = new ArrayList<>(List.of(kind));
    row.text("expiry").ifPresent(words::add);
    row.text("tenor").or(() -> row.text("maturity")).ifPresent(words::add);
    row.text("kind").filter(k -> !k.equals("payer") && !k.equals("call")).ifPresent(words::add);
    row.text("strike").filter(k -> !k.equalsIgnoreCase("atm")).ifPresent(words::add);
    return String.join(" ", words);
  }
}
