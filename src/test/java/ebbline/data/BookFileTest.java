package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import ebbline.instrument.Bond;
import ebbline.instrument.BondOption;
import ebbline.instrument.BookRow;
import ebbline.instrument.ZeroOption;
import ebbline.time.CalendarRegistry;
import ebbline.time.DayCount;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class BookFileTest {
  @TempDir private Path folder;

  private List<BookEntry> read(String text) throws IOException {
    Path file = folder.resolve("book.csv");
    Files.writeString(file, text);
    List<BookEntry> entries = new ArrayList<>();
    BookFile.open(file.toString(), CalendarRegistry.standard()).forEach(entries::add);
    return entries;
  }

  private static BookRow good(BookEntry entry) {
    return ((BookEntry.Good) entry).row();
  }

  private static String bad(BookEntry entry) {
    return ((BookEntry.Bad) entry).message().replaceAll("\\S*book\\.csv", "F");
  }

  @Test
  void aBondHasTheFormatsDefaults() throws IOException {
    BookRow row = good(read("maturity,coupon_pct\n2030-05-15,4\n").get(0));
    assertThat(row.id()).isEqualTo("1");
    assertThat(row.face()).isEqualTo(100);
    Bond bond = (Bond) row.instrument();
    assertThat(bond.leg().coupon()).isEqualTo(0.04);
    assertThat(bond.leg().terms().frequency()).isEqualTo(2);
    assertThat(bond.leg().terms().conventions().dayCount()).isEqualTo(DayCount.ACT_ACT_ICMA);
    assertThat(bond.leg().terms().redemption()).isEqualTo(100);
    assertThat(bond.leg().terms().settleDays()).isZero();
    assertThat(row.price()).isEmpty();
  }

  @Test
  void everyKindIsReadWithItsColumns() throws IOException {
    List<BookEntry> entries =
        read(
            """
            id,instrument,face,maturity,coupon,frequency,expiry,kind,strike,strike_kind,x-desk
            z,zero-bond,1000,5,,,,,,,a
            o,zero-option,-10,5,,,1,put,80,,b
            b,bond-option,10,5,4%,1,2,CALL,99,cash,"c, d"
            """);
    assertThat(good(entries.get(0)).instrument().kind()).isEqualTo("zero-bond");
    assertThat(((ZeroOption) good(entries.get(1)).instrument()).strike()).hasValue(80);
    assertThat(((BondOption) good(entries.get(2)).instrument()).strikeKind())
        .isEqualTo(BondOption.StrikeKind.CASH);
    assertThat(good(entries.get(2)).carried()).containsEntry("x-desk", "c, d");
  }

  @Test
  void aBadRowDoesNotStopTheOthers() throws IOException {
    List<BookEntry> entries =
        read("id,maturity,coupon,frequency\na,5,4.25,5\nb,5,4%,2\nc,5,4%,2,9\nb,6,4%,2\n,,4%,\n");
    assertThat(bad(entries.get(0)))
        .isEqualTo(
            "F:2: column 'frequency': found '5': expected 1, 2, 4 or 12 payments a year; F:2:"
                + " column 'coupon': found '4.25': 4.25 means 425 %; write 4.25% or 0.0425");
    assertThat(good(entries.get(1)).id()).isEqualTo("b");
    assertThat(bad(entries.get(2)))
        .isEqualTo("F:4: the row has 5 cells, the header has 4; give every row as many");
    assertThat(bad(entries.get(3))).contains("the label stands twice");
    assertThat(bad(entries.get(4))).isEqualTo("F:6: column 'maturity': a value is missing");
    assertThat(entries).hasSize(5);
  }

  @Test
  void cellsThatAKindDoesNotUseAreMistakes() throws IOException {
    List<BookEntry> entries =
        read(
            "instrument,maturity,coupon,strike,roll\nzero-bond,5,4%,,none\nbond,5,4%,90,following\n");
    assertThat(bad(entries.get(0)))
        .contains("column 'coupon': found '4%': a zero-bond has no such column");
    assertThat(bad(entries.get(1))).contains("'strike'").doesNotContain("'roll'");
  }

  @Test
  void kindsAreNamedOrCorrected() throws IOException {
    List<BookEntry> entries = read("instrument,maturity\nzero-bnd,5\n");
    assertThat(bad(entries.get(0))).contains("did you mean 'zero-bond'?");
  }

  @Test
  void priceAndYieldTogetherAreRefused() throws IOException {
    assertThat(bad(read("maturity,coupon,price,yield\n5,4%,99,4%\n").get(0)))
        .contains("give price or yield, not both");
  }

  @Test
  void theFileItselfIsCheckedOnce() throws IOException {
    assertThatThrownBy(() -> read("id,coupon\na,4%\n"))
        .hasMessageContaining("'maturity': the column is missing");
    assertThatThrownBy(() -> read("maturity,coupon,coupon_bp\n5,4%,1\n"))
        .hasMessageContaining("stands twice");
    assertThatThrownBy(() -> read("maturity,coupon\n")).hasMessageContaining("no rows below");
    assertThatThrownBy(() -> read("maturity,cupon\n5,4%\n"))
        .hasMessageContaining("did you mean 'coupon'?");
    assertThatThrownBy(() -> read("# as-of: 2026-11-30\nmaturity,coupon\n5,4%\n"))
        .hasMessageContaining("a book has no settings");
  }

  @Test
  void anUnbalancedQuoteIsReportedWhereItOpens() throws IOException {
    List<BookEntry> entries = read("id,maturity,coupon\na,5,4%\n\"b,5,4%\nc,5,4%\n");
    assertThat(good(entries.get(0)).id()).isEqualTo("a");
    assertThat(bad(entries.get(1))).isEqualTo("F:3: a quote is opened and not closed");
  }

  @Test
  void aTypedRowIsReadLikeALine() {
    BookRow row =
        good(
            RowText.parse(
                "id=a maturity=5  coupon=4% x-note=\"two words\"",
                "--row", 1, CalendarRegistry.standard()));
    assertThat(row.carried()).containsEntry("x-note", "two words");
    assertThat(
            bad(RowText.parse("maturity=5 coupon=4.25", "--row", 3, CalendarRegistry.standard())))
        .startsWith("--row: column 'coupon'");
    assertThatThrownBy(
            () -> RowText.parse("maturity=5 maturity=6", "--row", 1, CalendarRegistry.standard()))
        .hasMessage("the key 'maturity' is given twice");
    assertThatThrownBy(
            () -> RowText.parse("coupon=4% coupon_pct=4", "--row", 1, CalendarRegistry.standard()))
        .hasMessage("the key 'coupon' is given twice");
    assertThatThrownBy(() -> RowText.parse("cupon=4%", "--row", 1, CalendarRegistry.standard()))
        .hasMessage("a row has no key 'cupon'; did you mean 'coupon'?");
    assertThatThrownBy(() -> RowText.parse("id=\"open", "--row", 1, CalendarRegistry.standard()))
        .hasMessageContaining("not closed");
    assertThatThrownBy(() -> RowText.parse("  ", "--row", 1, CalendarRegistry.standard()))
        .hasMessageContaining("found nothing");
    assertThatThrownBy(() -> RowText.parse("a bond", "--row", 1, CalendarRegistry.standard()))
        .hasMessageContaining("found 'a'");
    assertThatThrownBy(() -> RowText.parse("=5", "--row", 1, CalendarRegistry.standard()))
        .hasMessageContaining("without a key");
  }
}
