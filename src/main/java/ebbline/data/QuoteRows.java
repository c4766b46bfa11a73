package ebbline.data;

import ebbline.fitting.quotes.MarketQuotes;
import ebbline.fitting.quotes.QuoteEquation;
import ebbline.fitting.quotes.QuoteKind;
import ebbline.fitting.quotes.SheetQuote;
import ebbline.instrument.Bond;
import ebbline.instrument.LastPeriodRule;
import ebbline.instrument.PriceRounding;
import ebbline.instrument.QuoteTerms;
import ebbline.instrument.YieldKind;
import ebbline.time.DayCount;
import ebbline.time.Frequency;
import ebbline.time.InputProblem;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Turns the rows of a quote sheet into equations, with everything that is wrong with them. */
final class QuoteRows {
  private static final Set<String> EVERY =
      Set.of("id", "instrument", "maturity", "quote", "weight");
  private static final Set<String> MONEY =
      Set.of("start", "day_count", "settle_days", "calendar", "roll");
  private static final Map<QuoteKind, Set<String>> COLUMNS = columns();

  /** A hundred less half: nobody quotes a future on a rate of 50 %. */
  private static final double FARTHEST_FUTURE = 50;

  private final SheetTerms terms;

  QuoteRows(SheetTerms terms) {
    this.terms = terms;
  }

  private static Map<QuoteKind, Set<String>> columns() {
    Map<QuoteKind, Set<String>> columns = new EnumMap<>(QuoteKind.class);
    columns.put(QuoteKind.DEPOSIT, MONEY);
    columns.put(QuoteKind.FRA, MONEY);
    columns.put(QuoteKind.FUTURE, MONEY);
    columns.put(QuoteKind.BILL, with(MONEY, "price", "yield_kind"));
    columns.put(QuoteKind.SWAP, with(MONEY, "frequency", "eom"));
    columns.put(QuoteKind.OIS, with(MONEY, "frequency", "eom", "payment_lag"));
    columns.put(
        QuoteKind.BOND,
        without(BondRow.couponColumns(), "rounding")); // a rounded price cannot be met
    columns.put(QuoteKind.ZERO, Set.of());
    return columns;
  }

  private static Set<String> with(Set<String> columns, String... more) {
    Set<String> all = new TreeSet<>(columns);
    all.addAll(List.of(more));
    return all;
  }

  private static Set<String> without(Set<String> columns, String less) {
    Set<String> all = new TreeSet<>(columns);
    all.remove(less);
    return all;
  }

  /** All columns that quotes have besides {@code quote} and {@code yield}, {@code coupon}. */
  static Set<String> allColumns() {
    Set<String> all = new TreeSet<>(EVERY);
    COLUMNS.values().forEach(all::addAll);
    all.removeAll(Set.of("quote", "yield", "coupon"));
    return all;
  }

  /** The quote; empty where the row has problems, which it has collected. */
  Optional<SheetQuote> read(CsvRow given, List<InputProblem> problems) {
    List<InputProblem> own = new ArrayList<>();
    CsvRow row = given.collecting(own);
    Optional<QuoteKind> kind = row.required("instrument", row.value("instrument", QuoteRows::kind));
    Optional<SheetQuote> quote = Optional.empty();
    if (kind.isPresent()) {
      foreignColumns(row, kind.get());
      quote = weighted(row, read(row.withDefaults(terms.defaults(kind.get())), kind.get()));
    }
    problems.addAll(own);
    return own.isEmpty() ? quote : Optional.empty();
  }

  private static QuoteKind kind(String text) {
    try {
      return QuoteKind.of(text);
    } catch (IllegalArgumentException e) {
      List<String> known = List.of(QuoteKind.known().split(", "));
      throw new IllegalArgumentException(
          "no such instrument; did you mean '"
              + NearestName.of(text, known)
              + "'? known: "
              + QuoteKind.known(),
          e);
    }
  }

  /** A filled cell that the kind does not use is a mistake, not something to pass over. */
  private static void foreignColumns(CsvRow row, QuoteKind kind) {
    for (int i = 0; i < row.columns().size(); i++) {
      Column column = row.columns().get(i);
      Optional<String> cell = row.cell(i);
      if (!column.carried()
          && cell.isPresent()
          && !EVERY.contains(column.name())
          && !COLUMNS.get(kind).contains(column.name())) {
        row.problem(
            column.name(),
            cell.get(),
            "a "
                + kind.label()
                + " has no such column; it uses "
                + String.join(", ", with(COLUMNS.get(kind), EVERY.toArray(new String[0]))));
      }
    }
  }

  private Optional<SheetQuote> weighted(CsvRow row, Optional<SheetQuote> quote) {
    OptionalDouble weight = row.number("weight");
    if (weight.isPresent() && !(weight.getAsDouble() > 0)) {
      row.problem(
          "weight",
          row.text("weight").orElseThrow(),
          "a weight is above 0; leave the row out where it shall not count");
      return Optional.empty();
    }
    if (weight.isEmpty()) {
      return quote;
    }
    return quote.map(
        q ->
            new SheetQuote(
                q.kind(),
                q.equation().withWeight(q.equation().weight() * weight.getAsDouble()),
                q.start(),
                q.end(),
                q.priced()));
  }

  private static String id(CsvRow row, QuoteKind kind) {
    return row.text("id")
        .orElseGet(
            () ->
                kind.label()
                    + row.text("start").map(start -> "-" + start).orElse("")
                    + "-"
                    + row.text("maturity").orElse("?"));
  }

  private Optional<SheetQuote> read(CsvRow row, QuoteKind kind) {
    String id = id(row, kind);
    return kind == QuoteKind.BOND ? bond(row, id) : spanned(row, kind, id);
  }

  private Optional<SheetQuote> spanned(CsvRow row, QuoteKind kind, String id) {
    boolean needsStart = kind == QuoteKind.FRA || kind == QuoteKind.FUTURE;
    Optional<QuoteSpan> span = QuoteSpan.read(row, terms, needsStart);
    OptionalDouble price = row.number("price");
    boolean priced = kind == QuoteKind.FUTURE || price.isPresent();
    OptionalDouble quote = kind == QuoteKind.FUTURE ? futurePrice(row) : row.rate("quote");
    if (price.isPresent() == row.has("quote")) {
      row.problem(
          "quote",
          row.text("quote").orElse(""),
          price.isPresent() ? "give quote or price, not both" : "a value is missing");
    }
    if (span.isEmpty() || !row.problems().isEmpty()) {
      return Optional.empty();
    }
    String column = price.isPresent() ? "price" : "quote";
    double value = price.isPresent() ? price.getAsDouble() : quote.orElseThrow();
    try {
      QuoteEquation equation =
          price.isPresent()
              ? billPrice(id, span.get(), value)
              : equation(row, kind, id, span.get(), value);
      return Optional.of(new SheetQuote(kind, equation, span.get().start, span.get().end, priced));
    } catch (IllegalArgumentException e) {
      row.problem(column, row.text(column).orElse(""), e.getMessage());
      return Optional.empty();
    }
  }

  private static OptionalDouble futurePrice(CsvRow row) {
    OptionalDouble price = row.number("quote");
    if (row.unit("quote") != RateText.Unit.WRITTEN
        || (price.isPresent() && !(Math.abs(price.getAsDouble() - 100) < FARTHEST_FUTURE))) {
      row.problem(
          "quote",
          row.text("quote").orElse(""),
          "a future is quoted as 100 less its rate in per cent, 95.75 for 4.25 %");
    }
    return price;
  }

  private QuoteEquation equation(
      CsvRow row, QuoteKind kind, String id, QuoteSpan span, double quote) {
    if (kind == QuoteKind.ZERO) {
      return MarketQuotes.zero(id, span.end, terms.compounding, quote);
    }
    DayCount dayCount = row.value("day_count", DayCount::of).orElse(DayCount.ACT_360);
    if (kind == QuoteKind.OIS || kind == QuoteKind.SWAP) {
      int frequency = row.value("frequency", Frequency::parse).orElse(Frequency.ANNUAL).perYear();
      boolean endOfMonth = row.value("eom", SheetTerms::yesOrNo).orElse(false);
      int lag = row.value("payment_lag", SheetTerms::days).orElse(0);
      QuoteSpan.Leg leg = span.leg(frequency, dayCount, endOfMonth, lag);
      return kind == QuoteKind.OIS
          ? MarketQuotes.overnightSwap(id, span.start, leg.ends, leg.payments, leg.accruals, quote)
          : MarketQuotes.swap(id, span.start, leg.end(), leg.payments, leg.accruals, quote);
    }
    double accrual = span.accrual(dayCount);
    if (kind == QuoteKind.FUTURE) {
      requireGrowth(1 + (1 - quote / 100) * accrual);
      return MarketQuotes.future(
              id,
              span.start,
              span.end,
              accrual,
              quote,
              terms.meanReversion,
              terms.volatility.orElse(0))
          .withWeight(1e-4); // an error of price in per cent is one of rate
    }
    boolean discount = kind == QuoteKind.BILL && isDiscount(row);
    requireGrowth(1 + (discount ? -quote : quote) * accrual);
    return discount
        ? MarketQuotes.billDiscount(id, span.start, span.end, accrual, quote)
        : MarketQuotes.deposit(id, span.start, span.end, accrual, quote);
  }

  private static boolean isDiscount(CsvRow row) {
    YieldKind kind = row.value("yield_kind", YieldKind::of).orElse(YieldKind.DISCOUNT);
    if (kind == YieldKind.DISCOUNT || kind == YieldKind.MONEY_MARKET) {
      return kind == YieldKind.DISCOUNT;
    }
    throw new IllegalArgumentException(
        "a bill is quoted by its discount rate or its money-market yield, found " + kind.label());
  }

  private static void requireGrowth(double growth) {
    if (!(growth > 0)) {
      throw new IllegalArgumentException("over its period such a rate leaves no discount factor");
    }
  }

  private static QuoteEquation billPrice(String id, QuoteSpan span, double price) {
    QuoteEquation equation =
        MarketQuotes.bondPrice(
            id, new double[] {span.end}, new double[] {100}, span.start, 0, price);
    double perYield = (span.end - span.start) * price;
    return equation.withWeight(1 / (perYield * perYield));
  }

  private Optional<SheetQuote> bond(CsvRow row, String id) {
    Optional<Bond> bond = BondRow.bond(new RowCells(row, terms.calendars));
    String column = onlyOne(row);
    QuoteTerms quoted =
        new QuoteTerms(
            row.value("yield_kind", YieldKind::of).orElse(YieldKind.STREET),
            row.value("last_period", LastPeriodRule::of).orElse(LastPeriodRule.SIMPLE),
            PriceRounding.NONE);
    boolean yield = column.equals("yield") || (column.equals("quote") && isYield(row));
    OptionalDouble value =
        column.isEmpty() ? OptionalDouble.empty() : yield ? row.rate(column) : row.number(column);
    if (bond.isEmpty() || value.isEmpty() || !row.problems().isEmpty()) {
      return Optional.empty();
    }
    String place = "maturity";
    try {
      QuoteSpan.requireKnown(
          terms.axis.isDated(bond.get().leg().terms().maturity())
              ? terms.axis.date(bond.get().leg().terms().maturity())
              : java.time.LocalDate.EPOCH,
          bond.get().leg().terms().conventions().calendar());
      BondQuote placed = new BondQuote(bond.get(), terms.axis, quoted);
      place = column;
      QuoteEquation equation =
          yield
              ? placed.quotedYield(id, value.getAsDouble())
              : placed.quotedPrice(id, value.getAsDouble());
      return Optional.of(
          new SheetQuote(QuoteKind.BOND, equation, placed.settlement(), placed.end(), !yield));
    } catch (IllegalArgumentException e) {
      row.problem(place, row.text(place).orElse(""), e.getMessage());
      return Optional.empty();
    }
  }

  /** Which of quote, price and yield the row gives. */
  private static String onlyOne(CsvRow row) {
    List<String> given = new ArrayList<>();
    for (String column : List.of("quote", "price", "yield")) {
      if (row.has(column)) {
        given.add(column);
      }
    }
    if (given.size() == 1) {
      return given.get(0);
    }
    row.problem(
        "quote",
        row.text("quote").orElse(""),
        given.isEmpty() ? "a value is missing" : "give one of quote, price and yield");
    return "";
  }

  /** A bond's quote is a clean price unless it is written as a rate. */
  private static boolean isYield(CsvRow row) {
    String text = row.text("quote").orElseThrow();
    if (row.unit("quote") != RateText.Unit.WRITTEN || text.endsWith("%")) {
      return true;
    }
    try {
      return Math.abs(NumberText.parse(text)) < 1;
    } catch (IllegalArgumentException e) {
      return text.toLowerCase(java.util.Locale.ROOT).endsWith("bp");
    }
  }
}
