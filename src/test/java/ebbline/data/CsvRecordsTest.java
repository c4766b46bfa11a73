package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;

class CsvRecordsTest {
  private static final String NOT_CLOSED = "a quote is opened and not closed";

  private static List<CsvRecords.Cut> cuts(String text) {
    CsvRecords records = new CsvRecords(text, 0, 1);
    List<CsvRecords.Cut> cuts = new ArrayList<>();
    for (Optional<CsvRecords.Cut> next = records.next(); next.isPresent(); next = records.next()) {
      cuts.add(next.get());
    }
    return cuts;
  }

  private static CsvRecords.Cut row(int line, String... cells) {
    return new CsvRecords.Cut(line, List.of(cells), "");
  }

  private static CsvRecords.Cut wrong(int line, String problem) {
    return new CsvRecords.Cut(line, List.of(), problem);
  }

  @Test
  void rowsCarryTheLineTheyStartOn() {
    assertThat(cuts("a,b\r\n\n \n,\nc,\"d\ne\"\nf,\"g\"\"h\""))
        .containsExactly(
            row(1, "a", "b"), row(4, "", ""), row(5, "c", "d\ne"), row(7, "f", "g\"h"));
  }

  @Test
  void aQuoteThatIsNotClosedCostsItsOwnLineOnly() {
    assertThat(cuts("a,1\n\"b,2\nc,3\n\"d\",4\n"))
        .containsExactly(
            row(1, "a", "1"), wrong(2, NOT_CLOSED), row(3, "c", "3"), row(4, "d", "4"));
    assertThat(cuts("\"a\nb\",\"c\nd,e\n")).containsExactly(wrong(2, NOT_CLOSED), row(3, "d", "e"));
  }

  @Test
  void aCellOfManyLinesWasNotMeant() {
    String fifty = "\"x" + "\ny".repeat(49) + "\",1";
    assertThat(cuts(fifty)).hasSize(1);
    assertThat(cuts("\"x" + "\ny".repeat(50) + "\",1").get(0)).isEqualTo(wrong(1, NOT_CLOSED));
  }

  @Test
  void quotesInsideACellAreNamed() {
    String inside =
        "a quote stands inside a cell; put the whole cell in quotes and double those in it";
    assertThat(cuts("a,b\"c\nd,\"e\"f\ng,h"))
        .containsExactly(wrong(1, inside), wrong(2, inside), row(3, "g", "h"));
  }

  @Test
  void carriageReturnsAloneAreNoLineEnds() {
    assertThat(cuts("a,1\rb,2\nc,3\r\n"))
        .containsExactly(
            wrong(1, "a carriage return stands alone; end lines with LF or CR LF"),
            row(2, "c", "3"));
  }

  @Test
  void whatIsWrittenByTheStandardComesBack() {
    Random random = new Random(11);
    for (int trial = 0; trial < 2_000; trial++) {
      List<CsvRecords.Cut> written = new ArrayList<>();
      StringBuilder text = new StringBuilder();
      int line = 1;
      for (int r = 0; r < 5; r++) {
        String[] cells = new String[3];
        for (int c = 0; c < 3; c++) {
          StringBuilder cell = new StringBuilder(c == 0 ? "k" : "");
          for (int i = random.nextInt(5); i > 0; i--) {
            cell.append("a\",\n'# ".charAt(random.nextInt(7)));
          }
          cells[c] = cell.toString();
          boolean plain = cells[c].matches("[a'# ]*") && random.nextBoolean();
          text.append(c == 0 ? "" : ",");
          text.append(plain ? cells[c] : "\"" + cells[c].replace("\"", "\"\"") + "\"");
        }
        text.append(random.nextBoolean() ? "\n" : "\r\n");
        written.add(row(line, cells));
        line += 1 + (int) String.join("", cells).chars().filter(x -> x == '\n').count();
      }
      assertThat(cuts(text.toString())).as(text.toString()).isEqualTo(written);
    }
  }

  @Test
  void anyTextIsCutInLinesThatRise() {
    Random random = new Random(12);
    for (int trial = 0; trial < 20_000; trial++) {
      StringBuilder text = new StringBuilder();
      for (int i = random.nextInt(40); i > 0; i--) {
        text.append("a\"\",\n\r".charAt(random.nextInt(6)));
      }
      int last = 0;
      for (CsvRecords.Cut cut : cuts(text.toString())) {
        assertThat(cut.line()).as(text.toString()).isGreaterThan(last);
        last = cut.line();
      }
    }
  }
}
