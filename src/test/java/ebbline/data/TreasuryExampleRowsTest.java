package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import ebbline.pricing.PriceFigure;
import ebbline.pricing.PricedRow;
import ebbline.pricing.QuotedRows;
import ebbline.time.CalendarRegistry;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import org.junit.jupiter.api.Test;

/** Examples of 31 CFR 356, Appendix B, as rows of a book: the whole way from text to price. */
class TreasuryExampleRowsTest {
  private static final double PRINTED = 5e-7;

  private static PricedRow price(String asOf, String row) {
    BookEntry entry = RowText.parse(row, "--row", 1, CalendarRegistry.standard());
    assertThat(entry).as(row).isInstanceOf(BookEntry.Good.class);
    return new QuotedRows(TimeAxis.from(LocalDate.parse(asOf)))
        .price(((BookEntry.Good) entry).row());
  }

  private static double clean(String asOf, String row) {
    PricedRow priced = price(asOf, row + " yield_kind=treasury");
    assertThat(priced.message()).isEmpty();
    double clean = priced.figure(PriceFigure.CLEAN_PRICE).orElseThrow();
    PricedRow back =
        price(asOf, row.replaceAll("yield=\\S+", "price=" + clean) + " yield_kind=treasury");
    double yield = RateText.parse(row.replaceAll(".*yield=(\\S+).*", "$1"));
    assertThat(back.figure(PriceFigure.YIELD).orElseThrow()).isCloseTo(yield, within(1e-13));
    return clean;
  }

  @Test
  void sectionTwoFixedPrincipalNotesAndBonds() {
    assertThat(clean("1990-05-15", "issue=1990-05-15 maturity=2020-05-15 coupon=8.75% yield=8.84%"))
        .as("II.A")
        .isCloseTo(99.057893, within(PRINTED));
    assertThat(
            clean(
                "1990-04-02",
                "issue=1990-04-02 first_coupon=1990-09-30 maturity=1992-03-31 eom=yes coupon=8.5%"
                    + " yield=8.59%"))
        .as("II.B, short first period")
        .isCloseTo(99.838183, within(PRINTED));
    assertThat(clean("1985-11-29", "issue=1985-11-15 maturity=1995-11-15 coupon=9.5% yield=9.54%"))
        .as("II.D, issued with accrued interest")
        .isCloseTo(99.730918, within(PRINTED));
    assertThat(
            clean(
                "1985-11-04",
                "issue=1985-07-02 first_coupon=1986-02-15 maturity=2005-08-15 coupon=10.75%"
                    + " yield=10.47%"))
        .as("II.E, reopened in a long first period")
        .isCloseTo(102.214586, within(PRINTED));
    // The regulation rounds on the way.
    assertThat(
            clean(
                "1983-08-15",
                "issue=1983-05-16 first_coupon=1983-11-15 maturity=1991-05-15 coupon=10.5%"
                    + " yield=10.53%"))
        .as("II.F, reopened in a short first period")
        .isCloseTo(99.777074, within(1e-6));
  }

  @Test
  void roundingOnRequestGivesThePrintedPriceItself() {
    String row = "issue=1990-05-15 maturity=2020-05-15 coupon=8.75% yield=8.84%";
    PricedRow priced = price("1990-05-15", row + " yield_kind=treasury rounding=treasury");
    assertThat(priced.figure(PriceFigure.CLEAN_PRICE).orElseThrow()).isEqualTo(99.057893);
    String later = "issue=1985-11-15 maturity=1995-11-15 coupon=9.5% yield=9.54%";
    PricedRow accrued = price("1985-11-29", later + " yield_kind=treasury rounding=treasury");
    assertThat(accrued.figure(PriceFigure.ACCRUED).orElseThrow()).isEqualTo(0.367403);
    assertThat(accrued.figure(PriceFigure.CLEAN_PRICE).orElseThrow())
        .isCloseTo(99.730918, within(1e-13));
  }

  @Test
  void billsByTheirDiscount() {
    PricedRow bill =
        price("2026-12-01", "instrument=bill maturity=2027-03-02 yield=0.095% yield_kind=discount");
    assertThat(bill.figure(PriceFigure.CLEAN_PRICE).orElseThrow())
        .isCloseTo(99.975986, within(PRINTED));
  }
}
