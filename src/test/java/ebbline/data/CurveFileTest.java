package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.Interpolation;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CurveFileTest {
  @TempDir private Path folder;

  private String file(String text) throws IOException {
    Path file = folder.resolve("curve.csv");
    Files.writeString(file, text);
    return file.toString();
  }

  private CurveInput read(String text) throws IOException {
    return CurveFile.read(file(text), Optional.empty(), Optional.empty());
  }

  private List<String> problems(String text) throws IOException {
    String file = file(text);
    try {
      CurveFile.read(file, Optional.empty(), Optional.empty());
    } catch (InputProblems e) {
      return e.problems().stream()
          .map(InputProblem::message)
          .map(m -> m.replace(file, "F"))
          .toList();
    }
    throw new AssertionError("the file was accepted");
  }

  @Test
  void nodesOfDiscountsAreReadInAnyColumnOrder() throws IOException {
    CurveInput input = read("discount,x-note,maturity\n0.98,a,6M\n0.95,b,1\n");
    assertThat(input.labels()).containsExactly("6M", "1");
    assertThat(input.curve().nodes()).containsExactly(0.5, 1);
    assertThat(input.curve().logDiscount(0.5)).isEqualTo(Math.log(0.98));
    assertThat(input.axis().asOf()).isEmpty();
  }

  @Test
  void aByteOrderMarkCarriageReturnsAndQuotesAreOrdinary() throws IOException {
    CurveInput input = read("\uFEFF# as-of: 2026-11-30\r\nmaturity,\"zero\"\r\n\"1Y\",4%\r\n\r\n");
    assertThat(input.axis().asOf()).contains(LocalDate.of(2026, 11, 30));
    assertThat(input.curve().zero(1)).isCloseTo(0.04, within(1e-16));
  }

  @Test
  void zeroRatesFollowTheFilesCompounding() throws IOException {
    String[][] cases = {
      {"continuous", Double.toString(Math.exp(-0.08))},
      {"annual", Double.toString(1 / (1.04 * 1.04))},
      {"semi-annual", Double.toString(Math.pow(1.02, -4))},
      {"quarterly", Double.toString(Math.pow(1.01, -8))},
      {"monthly", Double.toString(Math.pow(1 + 0.04 / 12, -24))},
      {"simple", Double.toString(1 / 1.08)}
    };
    for (String[] c : cases) {
      CurveInput input = read("# compounding: " + c[0] + "\nmaturity,zero\n2,4%\n");
      assertThat(input.curve().discount(2)).isCloseTo(Double.parseDouble(c[1]), within(3e-15));
    }
  }

  @Test
  void theTimeBasisTurnsDatesIntoYears() throws IOException {
    CurveInput input =
        read("# as-of: 2026-11-30\n# day-count: act/360\nmaturity,zero_bp\n2027-11-30,400\n");
    assertThat(input.curve().nodes()).containsExactly(365 / 360.0);
    assertThat(input.curve().zero(1)).isCloseTo(0.04, within(1e-16));
  }

  @Test
  void theCommandLineOverridesTheFile() throws IOException {
    String file =
        file("# as-of: 2026-11-30\n# interpolation: cubic\nmaturity,zero\n1Y,4%\n2Y,5%\n");
    CurveInput input =
        CurveFile.read(
            file, Optional.of(LocalDate.of(2027, 11, 30)), Optional.of(Interpolation.LINEAR_ZERO));
    assertThat(input.curve().nodes()).containsExactly(366 / 365.0, 731 / 365.0);
    assertThat(input.curve().zero(0.1)).isCloseTo(0.04, within(1e-16));
  }

  @Test
  void aFlatCurveNeedsNoFile() {
    CurveInput input = CurveFile.read("flat:-0.25%", Optional.empty(), Optional.empty());
    assertThat(input.curve().zero(3)).isEqualTo(-0.0025);
    assertThat(input.file()).isEmpty();
    assertThatThrownBy(() -> CurveFile.read("flat:5", Optional.empty(), Optional.empty()))
        .hasMessage("flat:5: found '5': 5 means 500 %; write 5% or 0.05");
  }

  @Test
  void formulaeAreReadByParameter() throws IOException {
    CurveInput input =
        read(
            "# form: nelson-siegel\nparameter,value\nbeta0,4%\nbeta1,-200bp\nbeta2,0.01\ntau1,1.5\n");
    assertThat(input.curve().zero(0)).isCloseTo(0.02, within(1e-17));
    assertThat(input.labels()).isEmpty();
  }

  @Test
  void discountOneTodayIsAKnotOfEveryCurve() throws IOException {
    assertThat(read("maturity,discount\n0,1\n1,0.96\n").curve().nodes()).containsExactly(1);
  }

  @Test
  void everythingWrongIsSaidAtOnceInTheOrderOfTheFile() throws IOException {
    assertThat(
            problems(
                """
                # as-of: 2026-11-30
                maturity,zero
                1Y,4.25
                soon,4%
                2Y,
                3Y,5%,6%
                2Y,5%
                2026-11-30,5%
                """))
        .containsExactly(
            "F:3: column 'zero': found '4.25': 4.25 means 425 %; write 4.25% or 0.0425",
            "F:4: column 'maturity': found 'soon': expected a date 2031-11-15, a tenor such as 3M,"
                + " 10Y or 1Y6M, or a number of years such as 0.25",
            "F:5: column 'zero': a value is missing",
            "F:6: the row has 3 cells, the header has 2; give every row as many",
            "F:8: column 'maturity': found '2026-11-30': maturities must increase; the row above"
                + " has 2Y");
  }

  @Test
  void nodesMustLieAheadAndIncrease() throws IOException {
    assertThat(problems("# as-of: 2026-11-30\nmaturity,zero\n2026-11-30,4%\n"))
        .containsExactly(
            "F:3: column 'maturity': found '2026-11-30': a node must lie after the as-of date");
    assertThat(problems("maturity,zero\n2,4%\n1,4%\n"))
        .containsExactly(
            "F:3: column 'maturity': found '1': maturities must increase; the row above has 2");
  }

  @Test
  void discountFactorsArePositive() throws IOException {
    assertThat(problems("maturity,discount\n1,0\n2,-0.5\n3,NaN\n"))
        .containsExactly(
            "F:2: column 'discount': found '0': a discount factor must be above 0",
            "F:3: column 'discount': found '-0.5': a discount factor must be above 0",
            "F:4: column 'discount': found 'NaN': expected a number such as 98.5; it must be a"
                + " finite number");
  }

  @Test
  void ratesThatLeaveNothingAreRefused() throws IOException {
    assertThat(problems("# compounding: simple\nmaturity,zero\n10,-20%\n").get(0))
        .contains("F:3: column 'zero': found '-20%'")
        .contains("simple compounding");
  }

  @Test
  void columnsAndSettingsAreCheckedFirst() throws IOException {
    assertThat(problems("maturity,zero,zero_pct\n1,4%,4\n"))
        .containsExactly("F:1: column 'zero_pct': the column stands twice, as 'zero' too");
    assertThat(problems("maturity,discount,zero\n1,0.9,4%\n"))
        .containsExactly("F:1: column 'zero': give either discount or zero, not both");
    assertThat(problems("zero\n4%\n"))
        .containsExactly("F:1: column 'maturity': the column is missing; a curve file needs it");
    assertThat(problems("maturity,,zero\n1,2,4%\n").get(0)).contains("column 2 has no heading");
    assertThat(problems("# asof: 2026-11-30\nmaturity,zero\n1,4%\n").get(0))
        .startsWith("F:1: found 'asof': no such setting; did you mean 'as-of'?");
    assertThat(problems("# as-of: 2026-11-30\n# as-of: 2026-11-30\nmaturity,zero\n1,4%\n"))
        .containsExactly("F:2: found 'as-of': the setting is given twice");
    assertThat(problems("# as-of: today\nmaturity,zero\n1,4%\n").get(0))
        .startsWith("F:1: column 'as-of': found 'today': expected a date");
    assertThat(problems("# a remark\nmaturity,zero\n1,4%\n").get(0))
        .contains("expected a setting, # key: value");
    assertThat(problems("# interpolation: spline\nmaturity,zero\n1,4%\n").get(0))
        .contains("column 'interpolation': found 'spline'")
        .contains("monotone-convex");
    assertThat(problems("maturity,zero\n"))
        .containsExactly("F: there are no rows below the header");
    assertThat(problems("# as-of: 2026-11-30\n"))
        .containsExactly("F: there is no header row; a curve file needs one");
  }

  @Test
  void quotesAreHeldToTheStandard() throws IOException {
    assertThat(problems("maturity,zero\n1,4%\n2,\"4%\n3,4%\n"))
        .contains("F:3: a quote is opened and not closed");
    assertThat(problems("maturity,zero\n1,\"4%\"x\n").get(0)).startsWith("F:2: a quote ");
    assertThat(problems("maturity,zero\n1,4\"%\n").get(0)).contains("F:2:");
  }

  @Test
  void parametersAreCheckedByName() throws IOException {
    assertThat(problems("# form: svensson\nparameter,value\nbeta0,4%\n"))
        .containsExactly("F: column 'parameter': the parameter beta1 is missing");
    assertThat(problems("# form: nelson\nparameter,value\nbeta0,4%\n"))
        .containsExactly("F:1: column 'form': found 'nelson': expected nelson-siegel or svensson");
    assertThat(problems("# form: svensson\nmaturity,zero\n1,4%\n").get(0))
        .contains("the column is missing; a formula's file needs it");
    assertThat(problems("parameter,value\nbeta0,4%\n").get(0)).contains("# form: nelson-siegel");
    assertThat(problems("# form: nelson-siegel\nparameter,value\nbeta0,4%\nbeta0,5%\ntau1,-1\n"))
        .containsExactly(
            "F:4: column 'parameter': found 'beta0': the parameter is given twice",
            "F:5: column 'value': found '-1': a tau is a number of years above 0");
  }

  @Test
  void filesThatAreNoTextAreRefused() throws IOException {
    Path file = folder.resolve("bytes.csv");
    Files.write(file, "maturity,zero\n1,4%\n\0".getBytes(StandardCharsets.UTF_8));
    assertThatThrownBy(() -> SourceFile.read(file.toString()))
        .hasMessageContaining(":3: the file is binary");
    Files.write(file, new byte[] {'a', '\n', (byte) 0xE9, 'b'});
    assertThatThrownBy(() -> SourceFile.read(file.toString()))
        .hasMessageContaining(":2: found 'byte E9': the text is not UTF-8");
    Files.write(file, new byte[] {(byte) 0xFF, (byte) 0xFE, 'a', 0});
    assertThatThrownBy(() -> SourceFile.read(file.toString())).hasMessageContaining("UTF-16");
    Files.write(file, new byte[0]);
    assertThatThrownBy(() -> SourceFile.read(file.toString()))
        .hasMessageContaining("the file is empty");
    Files.writeString(file, " \n\n");
    assertThatThrownBy(() -> SourceFile.read(file.toString())).hasMessageContaining("but blanks");
    assertThatThrownBy(() -> SourceFile.read(folder.toString()))
        .hasMessageContaining("it is a folder");
    assertThatThrownBy(() -> SourceFile.read(folder.resolve("none").toString()))
        .hasMessageContaining("there is no such file");
  }

  @Test
  void theFingerprintIsThatOfTheBytes() throws IOException {
    // FIPS 180-2, appendix B.1: the message "abc"
    assertThat(SourceFile.read(file("abc")).sha256())
        .isEqualTo("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
  }
}
