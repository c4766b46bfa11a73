package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.FlatCurve;
import ebbline.fitting.quotes.QuoteKind;
import ebbline.fitting.quotes.SheetQuote;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class QuotesFileTest {
  private static final LocalDate TODAY = LocalDate.of(2026, 11, 30); // a Monday
  private static final double RATE = 0.04;
  private static final FlatCurve CURVE = FlatCurve.of(RATE);

  @TempDir Path folder;

  private QuotesInput read(String... lines) throws IOException {
    Path file = folder.resolve("quotes.csv");
    Files.writeString(file, String.join("\n", lines) + "\n");
    return QuotesFile.read(file.toString(), QuoteOverrides.none());
  }

  private String problem(String... lines) {
    try {
      read(lines);
      return "";
    } catch (InputProblems e) {
      return e.problems().get(0).message().substring(folder.toString().length() + 1);
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  private static double discount(LocalDate date) {
    return Math.exp(-RATE * ChronoUnit.DAYS.between(TODAY, date) / 365.0);
  }

  private double fitted(String setting, String header, String row) throws IOException {
    QuotesInput input = read("# as-of: 2026-11-30", setting, header, row);
    assertThat(input.quotes()).hasSize(1);
    return input.quotes().get(0).equation().fittedQuote(CURVE);
  }

  private static double simple(LocalDate from, LocalDate to) {
    return (discount(from) / discount(to) - 1) / (ChronoUnit.DAYS.between(from, to) / 360.0);
  }

  @Test
  void aDepositRunsFromSettlement() throws IOException {
    LocalDate end = LocalDate.of(2027, 3, 2);
    double quote = fitted("# settle-days: 2", "instrument,maturity,quote", "deposit,2027-03-02,4%");
    assertThat(quote).isCloseTo(simple(LocalDate.of(2026, 12, 2), end), within(1e-15));
  }

  @Test
  void tenorsCountFromTodayUnlessTheSheetSaysSettlement() throws IOException {
    String header = "instrument,maturity,quote,settle_days";
    double today = fitted("# day-count: act/360", header, "deposit,3M,4%,2");
    assertThat(today)
        .isCloseTo(simple(LocalDate.of(2026, 12, 2), LocalDate.of(2027, 2, 28)), within(1e-15));
    double settled = fitted("# tenors-from: settlement", header, "deposit,3M,4%,2");
    assertThat(settled)
        .isCloseTo(simple(LocalDate.of(2026, 12, 2), LocalDate.of(2027, 3, 2)), within(1e-15));
  }

  @Test
  void aForwardRateRunsBetweenItsDatesAndRolls() throws IOException {
    // 28 February 2027 is a Sunday, so modified following goes back to Friday the 26th.
    double quote =
        fitted("# roll: modified-following", "instrument,start,maturity,quote", "fra,3M,6M,4%");
    assertThat(quote)
        .isCloseTo(simple(LocalDate.of(2027, 2, 26), LocalDate.of(2027, 5, 31)), within(1e-15));
  }

  @Test
  void aBillIsQuotedByDiscountByYieldOrByPrice() throws IOException {
    LocalDate end = LocalDate.of(2027, 5, 28);
    double years = ChronoUnit.DAYS.between(TODAY, end) / 360.0;
    String header = "instrument,maturity,quote,yield_kind,price";
    assertThat(fitted("", header, "bill,2027-05-28,4%,,"))
        .isCloseTo((1 - discount(end)) / years, within(1e-15));
    assertThat(fitted("", header, "bill,2027-05-28,4%,money-market,"))
        .isCloseTo((1 / discount(end) - 1) / years, within(1e-15));
    assertThat(fitted("", header, "bill,2027-05-28,,,98"))
        .isCloseTo(100 * discount(end), within(1e-12));
  }

  @Test
  void aFutureIsAHundredLessTheForwardAndItsConvexity() throws IOException {
    String header = "instrument,start,maturity,quote";
    double plain = fitted("", header, "future,2027-06-16,2027-09-15,96");
    LocalDate start = LocalDate.of(2027, 6, 16);
    LocalDate end = LocalDate.of(2027, 9, 15);
    assertThat(plain).isCloseTo(100 * (1 - simple(start, end)), within(1e-12));
    double adjusted = fitted("# volatility: 1.2%", header, "future,2027-06-16,2027-09-15,96");
    double t = ChronoUnit.DAYS.between(TODAY, start) / 365.0;
    double length = ChronoUnit.DAYS.between(start, end) / 365.0;
    double continuous = 0.5 * 0.012 * 0.012 * t * (t + length); // no mean reversion
    double accrual = ChronoUnit.DAYS.between(start, end) / 360.0;
    double future = (Math.exp((RATE + continuous) * length) - 1) / accrual;
    assertThat(adjusted).isCloseTo(100 * (1 - future), within(1e-10)).isLessThan(plain);
  }

  @Test
  void anIndexSwapPaysOnceAYearAfterItsLag() throws IOException {
    LocalDate first = LocalDate.of(2027, 11, 30);
    LocalDate second = LocalDate.of(2028, 11, 30);
    double fixed = 0;
    double floating = 0;
    LocalDate from = TODAY;
    for (LocalDate to : List.of(first, second)) {
      // Two business days after a Tuesday, and after a Thursday.
      double paid = discount(to.plusDays(to.equals(first) ? 2 : 4));
      fixed += ChronoUnit.DAYS.between(from, to) / 360.0 * paid;
      floating += (discount(from) / discount(to) - 1) * paid;
      from = to;
    }
    double quote = fitted("# payment-lag: 2", "instrument,maturity,quote", "ois,2028-11-30,4%");
    assertThat(quote).isCloseTo(floating / fixed, within(1e-15));
  }

  @Test
  void aSwapHasAShortFirstPeriodWhereItsYearsAreNotWhole() throws IOException {
    LocalDate end = LocalDate.of(2028, 5, 30);
    LocalDate middle = LocalDate.of(2027, 5, 30);
    double quote =
        fitted("# fixed-day-count: 30e/360", "instrument,maturity,quote", "swap,2028-05-30,4%");
    assertThat(quote)
        .isCloseTo((1 - discount(end)) / (0.5 * discount(middle) + discount(end)), within(1e-15));
  }

  @Test
  void aBondIsQuotedByPriceOrByYieldAndSettles() throws IOException {
    String header = "instrument,maturity,quote,coupon,frequency,settle_days";
    LocalDate settles = LocalDate.of(2026, 12, 2);
    double value = 0;
    for (int year = 2027; year <= 2029; year++) {
      value += 4 * discount(LocalDate.of(year, 6, 15));
    }
    value = (value + 100 * discount(LocalDate.of(2029, 6, 15))) / discount(settles);
    double accrued = 4 * ChronoUnit.DAYS.between(LocalDate.of(2026, 6, 15), settles) / 365.0;
    double clean = fitted("", header, "bond,2029-06-15,99.5,4%,1,2");
    assertThat(clean).isCloseTo(value - accrued, within(1e-12));
    double yield = fitted("", header, "bond,2029-06-15,3.9%,4%,1,2");
    double w = ChronoUnit.DAYS.between(settles, LocalDate.of(2027, 6, 15)) / 365.0;
    double back = 0;
    for (int k = 0; k < 3; k++) {
      back += (k == 2 ? 104 : 4) * Math.pow(1 + yield, -w - k);
    }
    assertThat(back).isCloseTo(value, within(1e-12));
  }

  @Test
  void bareYearsNeedNoDates() throws IOException {
    QuotesInput input =
        read(
            "# settle-days: 2",
            "instrument,start,maturity,quote,frequency",
            "deposit,,0.5,4%,",
            "swap,0.25,2,4%,2");
    assertThat(input.quotes().get(0).equation().fittedQuote(CURVE))
        .isCloseTo(2 * Math.expm1(0.02), within(1e-15));
    double annuity = 0.25 * Math.exp(-0.02);
    for (double t : new double[] {1, 1.5, 2}) {
      annuity += 0.5 * Math.exp(-RATE * t);
    }
    assertThat(input.quotes().get(1).equation().fittedQuote(CURVE))
        .isCloseTo((Math.exp(-0.01) - Math.exp(-0.08)) / annuity, within(1e-15));
  }

  @Test
  void aUnitInTheHeadingMakesABondsQuoteAYield() throws IOException {
    QuotesInput input = read("instrument,maturity,quote_pct,coupon", "bond,5,3.9,4%", "zero,1,4,");
    assertThat(input.quotes().get(0).priced()).isFalse();
    assertThat(input.quotes().get(0).equation().quote()).isEqualTo(0.039);
    assertThat(input.quotes().get(1).equation().quote()).isEqualTo(0.04);
  }

  @Test
  void pricesWeighAsErrorsOfYield() throws IOException {
    QuotesInput input =
        read(
            "instrument,maturity,quote,coupon,weight",
            "bond,5,100,4%,2",
            "zero,1,4%,,",
            "bond,7,4%,4%,");
    SheetQuote bond = input.quotes().get(0);
    double dollar = 0; // −dP/dy of the par bond, half-yearly
    for (int k = 1; k <= 10; k++) {
      dollar += k / 2.0 * (k == 10 ? 102 : 2) * Math.pow(1.02, -k - 1);
    }
    assertThat(bond.priced()).isTrue();
    assertThat(bond.equation().weight() * dollar * dollar).isCloseTo(2, within(1e-12));
    assertThat(input.quotes().get(1).equation().weight()).isEqualTo(1);
    assertThat(input.quotes().get(2).equation().weight()).isEqualTo(1);
  }

  @Test
  void aRepeatedQuoteCountsOnceAndIsNamed() throws IOException {
    QuotesInput input = read("instrument,maturity,quote", "zero,1,4%", "zero,2,4%", "zero,1,0.04");
    assertThat(input.quotes()).extracting(SheetQuote::id).containsExactly("zero-1", "zero-2");
    assertThat(input.remarks())
        .containsExactly("line 4 repeats the zero of line 2; it counts once");
  }

  @Test
  void twoBondsOfOneMaturityAreTwoQuotes() throws IOException {
    QuotesInput input =
        read("id,instrument,maturity,quote,coupon", "a,bond,5,101,4%", "b,bond,5,97,3%");
    assertThat(input.quotes()).hasSize(2);
  }

  @Test
  void theCommandLineGoesBeforeTheSheet() throws IOException {
    Path file = folder.resolve("q.csv");
    Files.writeString(
        file, "# as-of: 2020-01-01\n# volatility: 1%\ninstrument,maturity,quote\nzero,1Y,4%\n");
    QuotesInput input =
        QuotesFile.read(
            file.toString(),
            new QuoteOverrides(
                Optional.of(TODAY),
                OptionalDouble.empty(),
                OptionalDouble.of(0.02),
                QuoteOverrides.none().calendars()));
    assertThat(input.axis().asOf()).contains(TODAY);
    assertThat(input.quotes().get(0).kind()).isEqualTo(QuoteKind.ZERO);
  }

  @Test
  void whatIsWrongIsSaidWithItsPlace() {
    assertThat(problem("instrument,maturity,quote", "zero,1,4.25"))
        .isEqualTo(
            "quotes.csv:2: column 'quote': found '4.25': 4.25 means 425 %; write 4.25% or 0.0425");
    assertThat(problem("instrument,maturity,quote", "zero,1,4%", "zero,1,4.1%"))
        .isEqualTo(
            "quotes.csv:3: column 'quote': found '4.1%': line 2 quotes a zero of the same terms at"
                + " another value; keep one of them");
    assertThat(problem("instrument,maturity,quote,coupon", "bond,5,-98,4%"))
        .isEqualTo("quotes.csv:2: column 'quote': found '-98': a bond's price is above 0");
    assertThat(problem("instrument,maturity,price,quote", "bill,1,98,4%"))
        .isEqualTo("quotes.csv:2: column 'quote': found '4%': give quote or price, not both");
    assertThat(problem("instrument,maturity,quote", "zero,1,"))
        .isEqualTo("quotes.csv:2: column 'quote': a value is missing");
    assertThat(problem("instrument,maturity,quote,coupon", "zero,1,4%,3%"))
        .startsWith("quotes.csv:2: column 'coupon': found '3%': a zero has no such column");
    assertThat(problem("# roll: sideways", "instrument,maturity,quote", "zero,1,4%"))
        .startsWith("quotes.csv:1: column 'roll': found 'sideways': expected a roll, one of none");
    assertThat(
            problem(
                "# as-of: 2026-11-30",
                "instrument,maturity,quote",
                "ois,2199-12-31,4%",
                "ois,2200-06-30,4%"))
        .isEmpty();
    assertThat(
            problem(
                "# as-of: 2026-11-30",
                "# calendar: target",
                "instrument,maturity,quote",
                "ois,2200-06-30,4%"))
        .contains(
            "the calendar target knows no holidays after 2199, and this quote runs to 2200-06-30");
    assertThat(problem("instrument,maturity,quote", "zero,2027-01-01,4%"))
        .contains("a date needs an as-of date");
    assertThat(problem("instrument,maturity,quote", "deposit,1,-150%"))
        .isEqualTo(
            "quotes.csv:2: column 'quote': found '-150%': over its period such a rate leaves no"
                + " discount factor");
    assertThat(problem("instrument,maturity,quote", "deposit,1,-50%")).isEmpty();
    assertThat(problem("maturity,quote", "1,4%")).contains("'instrument': the column is missing");
    assertThatThrownBy(() -> read("instrument,maturity,quote")).isInstanceOf(InputProblems.class);
  }
}
