package ebbline.data;

import ebbline.curve.Compounding;
import ebbline.fitting.quotes.QuoteKind;
import ebbline.time.BusinessCalendar;
import ebbline.time.CalendarRegistry;
import ebbline.time.DayCount;
import ebbline.time.Frequency;
import ebbline.time.Roll;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What the settings of a quote sheet say: the defaults of its rows, and the sheet's own figures.
 */
final class SheetTerms {
  /** Lengths count from the as-of date, or from each row's settlement. */
  enum TenorsFrom {
    AS_OF,
    SETTLEMENT;

    static TenorsFrom of(String text) {
      return switch (text.toLowerCase(Locale.ROOT)) {
        case "as-of" -> AS_OF;
        case "settlement" -> SETTLEMENT;
        default -> throw new IllegalArgumentException("expected as-of or settlement");
      };
    }
  }

  final TimeAxis axis;
  final CalendarRegistry calendars;
  final Compounding compounding;
  final TenorsFrom tenorsFrom;
  final double meanReversion;
  final OptionalDouble volatility;
  private final Map<String, String> texts = new LinkedHashMap<>();

  SheetTerms(SettingReader settings, QuoteOverrides overrides) {
    calendars = overrides.calendars();
    Optional<LocalDate> own = settings.read("as-of", SettingReader::date);
    TimeAxis.TimeBasis basis =
        settings.read("time-basis", SettingReader::basis).orElse(TimeAxis.TimeBasis.ACT_365F);
    axis =
        overrides
            .asOf()
            .or(() -> own)
            .map(day -> TimeAxis.from(day, basis))
            .orElse(TimeAxis.undated());
    compounding = settings.read("compounding", Compounding::of).orElse(Compounding.CONTINUOUS);
    tenorsFrom = settings.read("tenors-from", TenorsFrom::of).orElse(TenorsFrom.AS_OF);
    OptionalDouble reversion = settings.number("mean-reversion", NumberText::parse);
    OptionalDouble moves = settings.number("volatility", SheetTerms::volatility);
    meanReversion =
        overrides.meanReversion().isPresent()
            ? overrides.meanReversion().getAsDouble()
            : reversion.orElse(0);
    volatility = overrides.volatility().isPresent() ? overrides.volatility() : moves;
    keep(settings, "settle-days", SheetTerms::days);
    keep(settings, "payment-lag", SheetTerms::days);
    keep(settings, "ex-days", text -> days(text.replaceAll("[dD]$", "")));
    keep(settings, "calendar", calendars::find);
    keep(settings, "roll", Roll::of);
    keep(settings, "eom", SheetTerms::yesOrNo);
    keep(settings, "day-count", DayCount::of);
    keep(settings, "fixed-day-count", DayCount::of);
    keep(settings, "bond-day-count", DayCount::of);
    keep(settings, "fixed-frequency", Frequency::parse);
    keep(settings, "bond-frequency", Frequency::parse);
  }

  private void keep(
      SettingReader settings, String key, java.util.function.Function<String, ?> reader) {
    settings.checked(key, reader).ifPresent(text -> texts.put(key, text));
  }

  private static double volatility(String text) {
    double value = RateText.parse(text);
    if (value >= 0) {
      return value;
    }
    throw new IllegalArgumentException("a volatility is at least 0");
  }

  static int days(String text) {
    if (text.matches("\\d{1,3}")) {
      return Integer.parseInt(text);
    }
    throw new IllegalArgumentException("expected a number of days, 0 or more");
  }

  static boolean yesOrNo(String text) {
    return switch (text.toLowerCase(Locale.ROOT)) {
      case "yes" -> true;
      case "no" -> false;
      default -> throw new IllegalArgumentException("expected yes or no");
    };
  }

  /** The cells that a row of a kind has where it leaves them empty. */
  Map<String, String> defaults(QuoteKind kind) {
    Map<String, String> cells = new LinkedHashMap<>();
    put(cells, "settle_days", text("settle-days"));
    put(cells, "calendar", text("calendar"));
    put(cells, "roll", text("roll"));
    Optional<String> dayCount = text("day-count");
    switch (kind) {
      case DEPOSIT, BILL, FRA, FUTURE ->
          put(cells, "day_count", dayCount.or(() -> Optional.of(DayCount.ACT_360.label())));
      case OIS, SWAP -> {
        DayCount usual = kind == QuoteKind.OIS ? DayCount.ACT_360 : DayCount.THIRTY_360;
        put(
            cells,
            "day_count",
            text("fixed-day-count").or(() -> dayCount).or(() -> Optional.of(usual.label())));
        put(cells, "frequency", text("fixed-frequency").or(() -> Optional.of("1")));
        put(cells, "eom", text("eom"));
        if (kind == QuoteKind.OIS) {
          put(cells, "payment_lag", text("payment-lag"));
        }
      }
      case BOND -> {
        put(cells, "day_count", text("bond-day-count").or(() -> dayCount));
        put(cells, "frequency", text("bond-frequency"));
        put(cells, "eom", text("eom"));
        put(cells, "ex_days", text("ex-days"));
      }
      case ZERO -> {
        cells.remove("settle_days");
        cells.remove("calendar");
        cells.remove("roll");
      }
    }
    return cells;
  }

  private static void put(Map<String, String> cells, String column, Optional<String> text) {
    text.ifPresent(value -> cells.put(column, value));
  }

  private Optional<String> text(String key) {
    return Optional.ofNullable(texts.get(key));
  }

  BusinessCalendar calendar(CsvRow row) {
    return row.value("calendar", calendars::find).orElse(BusinessCalendar.WEEKENDS);
  }
}
