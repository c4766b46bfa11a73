package ebbline.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.StringWriter;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ResultWriterTest {
  private static final Envelope ENVELOPE =
      new Envelope(
          "9.9",
          "price",
          Optional.of("2031-11-15"),
          List.of(new Envelope.Fingerprint("book.csv", "ab12")),
          List.of("id", "present_value", "yield", "message"));

  private static String write(OutputFormat format, ResultRow... rows) throws IOException {
    StringWriter out = new StringWriter();
    ResultWriter writer = ResultWriter.of(format, out);
    writer.begin(ENVELOPE);
    for (ResultRow row : rows) {
      writer.row(row);
    }
    writer.end(List.of("mind this"));
    return out.toString();
  }

  private static ResultRow row(String id, double value, double yield) {
    return ResultRow.builder()
        .text("id", id)
        .number("present_value", value, 2)
        .rate("yield", yield)
        .build();
  }

  @Test
  void csvGivesAllDigitsAndTheSameHeaderWhateverTheRows() throws IOException {
    double awkward = 0.1 + 0.2;
    assertThat(write(OutputFormat.CSV, row("a", awkward, 1 / 3.0)))
        .isEqualTo("id,present_value,yield,message\na,0.30000000000000004,0.3333333333333333,\n");
  }

  @Test
  void csvQuotesWhatNeedsItAndDisarmsFormulas() throws IOException {
    ResultRow row =
        ResultRow.builder()
            .text("id", "=1+1")
            .number("present_value", -1.5, 2)
            .text("message", "said \"no\", twice")
            .build();
    assertThat(write(OutputFormat.CSV, row)).endsWith("'=1+1,-1.5,,\"said \"\"no\"\", twice\"\n");
    assertThat(write(OutputFormat.CSV, ResultRow.builder().text("id", "-5").build()))
        .endsWith("\n-5,,,\n");
    assertThat(write(OutputFormat.CSV, ResultRow.builder().text("id", "@sum").build()))
        .endsWith("\n'@sum,,,\n");
  }

  @Test
  void jsonIsOneObjectWithFingerprintsAndWarnings() throws IOException {
    JsonNode json = new ObjectMapper().readTree(write(OutputFormat.JSON, row("a", 12.5, 0.04)));
    assertThat(json.get("ebbline").asText()).isEqualTo("9.9");
    assertThat(json.get("command").asText()).isEqualTo("price");
    assertThat(json.get("as_of").asText()).isEqualTo("2031-11-15");
    assertThat(json.at("/inputs/0/sha256").asText()).isEqualTo("ab12");
    assertThat(json.at("/results/0/yield").asDouble()).isEqualTo(0.04);
    assertThat(json.at("/warnings/0").asText()).isEqualTo("mind this");
    assertThat(json.at("/results/0/message").isMissingNode()).isTrue();
  }

  @Test
  void numbersReadBackToTheSameDouble() throws IOException {
    java.util.Random random = new java.util.Random(5);
    for (int i = 0; i < 2000; i++) {
      double value = Double.longBitsToDouble(random.nextLong());
      if (Double.isFinite(value)) {
        String csv = write(OutputFormat.CSV, row("a", value, value));
        assertThat(Double.parseDouble(csv.split("\n", -1)[1].split(",", -1)[1])).isEqualTo(value);
        String json = write(OutputFormat.JSON, row("a", value, value));
        assertThat(new ObjectMapper().readTree(json).at("/results/0/yield").doubleValue())
            .isEqualTo(value);
      }
    }
  }

  @Test
  void tablesAlignAndShowRatesInPerCent() throws IOException {
    assertThat(write(OutputFormat.TABLE, row("a", 12.5, 0.0425), row("long", -3, -0.00000001)))
        .isEqualTo(
            """
            id    present_value     yield
            a             12.50  4.25000%
            long          -3.00  0.00000%
            """);
  }

  @Test
  void aSingleResultStandsUprightWithItsListsBelow() throws IOException {
    ResultRow row =
        ResultRow.builder()
            .text("model", "vasicek")
            .rows("quotes", List.of(row("1Y", 1, 0.01), row("2Y", 2, 0.02)))
            .build();
    assertThat(write(OutputFormat.TABLE, row))
        .isEqualTo(
            """
            model   vasicek

            quotes
            id  present_value     yield
            1Y           1.00  1.00000%
            2Y           2.00  2.00000%
            """);
  }

  @Test
  void nothingThatIsNotANumberLeaves() {
    assertThatThrownBy(() -> row("a", Double.NaN, 0)).hasMessageContaining("NaN");
    assertThatThrownBy(() -> row("a", 0, Double.POSITIVE_INFINITY))
        .hasMessageContaining("Infinity");
    assertThatThrownBy(() -> ResultRow.builder().text("id", "a").text("id", "b"))
        .hasMessageContaining("second id");
  }
}
