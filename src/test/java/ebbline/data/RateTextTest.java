package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.math.BigDecimal;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class RateTextTest {

  @ParameterizedTest
  @CsvSource({
    "4.25%, 0.0425",
    "35bp, 0.0035",
    "35 BP, 0.0035",
    "0.0425, 0.0425",
    "-0.5%, -0.005",
    "+4%, 0.04",
    ".5%, 0.005",
    "0, 0",
    "1e-3, 0.001",
    "120%, 1.2",
    "-0.999, -0.999",
    "12.5e1bp, 0.0125"
  })
  void ratesAreReadInTheirThreeForms(String text, double rate) {
    assertThat(RateText.parse(text)).isEqualTo(rate);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "4.25|4.25 means 425 %; write 4.25% or 0.0425",
        "-4.25|-4.25 means -425 %; write -4.25% or -0.0425",
        "1|1 means 100 %; write 1% or 0.01",
        "1.0|1.0 means 100 %; write 1.0% or 0.01",
        "425|425 means 42500 %; write 425% or 4.25",
        "1e3|1e3 means 100000 %; write 1e3% or 10"
      })
  void aBareNumberOfOneOrMoreIsRefused(String text, String message) {
    assertThatThrownBy(() -> RateText.parse(text)).hasMessage(message);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "NaN",
        "Infinity",
        "-inf",
        "1,000",
        "4,25",
        "4.2.5",
        "",
        " ",
        "%",
        "4%%",
        "x",
        "4bps"
      })
  void whatIsNoRateIsRefused(String text) {
    assertThatThrownBy(() -> RateText.parse(text))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("expected a rate, 4.25%, 35bp or 0.0425");
  }

  @Test
  void ratesEndAtTenThousandPerCent() {
    assertThat(RateText.parse("10000%")).isEqualTo(100);
    assertThat(RateText.parse("-10000", RateText.Unit.PER_CENT)).isEqualTo(-100);
    for (String text : List.of("10000.1%", "-1e300%", "1000001bp", "1e999%")) {
      assertThatThrownBy(() -> RateText.parse(text))
          .hasMessage("a rate must lie between -100 and 100 (10000 %)");
    }
  }

  @Test
  void theRemedyIsNamedWhereItCanBeGuessed() {
    assertThatThrownBy(() -> RateText.parse("4,25%")).hasMessageContaining("separator is a point");
    assertThatThrownBy(() -> RateText.parse("1,000")).hasMessageContaining("thousands separators");
    assertThatThrownBy(() -> RateText.parse("NaN")).hasMessageContaining("finite number");
    assertThatThrownBy(() -> NumberText.parse("1,000.5")).hasMessageContaining("thousands");
    assertThatThrownBy(() -> NumberText.parse("1e999")).hasMessageContaining("expected a number");
    assertThat(NumberText.parse(" -98.5 ")).isEqualTo(-98.5);
  }

  @Test
  void columnsWithAUnitHoldBareNumbersOnly() {
    assertThat(RateText.parse("4.25", RateText.Unit.PER_CENT)).isEqualTo(0.0425);
    assertThat(RateText.parse("35", RateText.Unit.BASIS_POINTS)).isEqualTo(0.0035);
    assertThatThrownBy(() -> RateText.parse("4.25%", RateText.Unit.PER_CENT))
        .hasMessageContaining("heading gives the unit");
  }

  @Test
  void theDoubleIsTheOneNearestToTheDecimal() {
    Random random = new Random(7);
    for (int i = 0; i < 10_000; i++) {
      String digits =
          String.format(
              Locale.ROOT,
              "%d.%0" + (1 + random.nextInt(12)) + "d",
              random.nextInt(20),
              random.nextInt(9));
      assertThat(RateText.parse(digits + "%"))
          .isEqualTo(new BigDecimal(digits).movePointLeft(2).doubleValue());
      assertThat(RateText.parse(digits + "bp"))
          .isEqualTo(new BigDecimal(digits).movePointLeft(4).doubleValue());
    }
  }

  @Test
  void theNearestNameCountsEdits() {
    List<String> known = List.of("maturity", "coupon", "frequency");
    assertThat(NearestName.of("cupon", known)).isEqualTo("coupon");
    assertThat(NearestName.of("matruity", known)).isEqualTo("maturity");
    assertThat(NearestName.of("FREQ", known)).isEqualTo("frequency");
  }
}
