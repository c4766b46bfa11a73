package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;
import static org.assertj.core.api.Assertions.within;

import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class PanelFileTest {
  private static final Optional<Step> MONTH = Optional.of(Step.parse("1M"));

  @TempDir private Path folder;

  private PanelInput read(String text, Optional<Step> step) throws IOException {
    Path file = folder.resolve("p.csv");
    Files.writeString(file, text);
    return PanelFile.read(file.toString(), step);
  }

  private List<String> problems(String text) throws IOException {
    try {
      read(text, MONTH);
    } catch (InputProblems e) {
      return e.problems().stream()
          .map(InputProblem::message)
          .map(m -> m.replace(folder.resolve("p.csv").toString(), "F"))
          .toList();
    }
    throw new AssertionError("the file was accepted");
  }

  @Test
  void columnsAreHeadedByTheirMaturities() throws IOException {
    PanelInput input =
        read("x-note,date,3m_pct,10Y,1Y6M_bp\n,2020-01-01,1,2%,\n,2020-02-01,,0.03,150\n", MONTH);
    assertThat(input.panel().maturities()).containsExactly(0.25, 10, 1.5);
    assertThat(input.labels()).containsExactly("3m_pct", "10Y", "1Y6M_bp");
    assertThat(input.panel().size()).isEqualTo(2);
    assertThat(input.panel().cells()).isEqualTo(4);
    assertThat(input.panel().time(1)).isEqualTo(1 / 12.0);
    assertThat(input.dates()).hasSize(2);
    assertThat(read("date,1Y\n2020-01-01,1%\n2020-02-01,1%\n", Optional.empty()).panel().time(1))
        .isEqualTo(31 / 365.0);
  }

  @Test
  void anotherCompoundingIsTurnedIntoContinuous() throws IOException {
    String rows = "date,2Y,6M_pct\n2020-01-01,4%,\n2020-02-01,-1%,3\n";
    PanelInput plain = read(rows, MONTH);
    assertThat(plain.panel().cell(0, 0)).isEqualTo(0.04);
    assertThat(plain.panel().cell(0, 1)).isNaN();
    assertThat(plain.panel().cell(1, 1)).isEqualTo(0.03);
    PanelInput halfYearly = read("# compounding: semi-annual\n" + rows, MONTH);
    assertThat(halfYearly.panel().cell(0, 0)).isCloseTo(2 * Math.log1p(0.02), within(1e-17));
    assertThat(halfYearly.panel().cell(1, 0)).isCloseTo(2 * Math.log1p(-0.005), within(1e-17));
    PanelInput simple = read("# compounding: simple\n" + rows, MONTH);
    assertThat(simple.panel().cell(1, 1)).isCloseTo(Math.log1p(0.015) / 0.5, within(1e-17));
  }

  @Test
  void whatIsWrongIsSaidWithItsPlace() throws IOException {
    assertThat(problems("date,1Y,12M,300Y\n2020-01-01,1%,1%,1%\n"))
        .containsExactly(
            "F:1: column '12M': the maturity stands twice, as '1Y' too",
            "F:1: column '300Y': maturities end at 200 years");
    assertThat(problems("date,1Y,1Y_pct\n2020-01-01,1%,1\n"))
        .containsExactly("F:1: column '1Y_pct': the column stands twice, as '1Y' too");
    assertThat(problems("date,soon\n2020-01-01,1%\n").get(0))
        .startsWith("F:1: column 'soon': a panel has no such column");
    assertThat(problems("date,0M\n2020-01-01,1%\n").get(0)).contains("a panel has no such column");
    assertThat(problems("date\n2020-01-01\n"))
        .containsExactly("F:1: a panel needs a column a maturity, headed 3M, 1Y, 10Y or 3M_pct");
    assertThat(problems("date,1Y,2Y\n2020-01-01,4.25,1000%\n2020-02-01,1%\n"))
        .containsExactly(
            "F:2: column '1Y': found '4.25': 4.25 means 425 %; write 4.25% or 0.0425",
            "F:2: column '2Y': found '1000%': a yield must lie within 1000 % either side of 0",
            "F:3: the row has 2 cells, the header has 3; give every row as many");
    assertThat(problems("# compounding: simple\ndate,2Y\n2020-01-01,-60%\n").get(0))
        .startsWith("F:3: column '2Y': found '-60%'");
    assertThat(problems("# compounding: weekly\ndate,2Y\n2020-01-01,1%\n").get(0))
        .startsWith("F:1: column 'compounding': found 'weekly'");
    assertThat(problems("date,2Y\n")).containsExactly("F: there are no rows below the header");
  }

  @Test
  void damagedHistoriesAndPanelsGiveAnAnswerOrAPlacedProblem() throws IOException {
    String original =
        "# step: 1M\n# compounding: annual\ndate,3M,1Y_pct,x-n\n2020-01-01,1%,2,\"a, b\"\n"
            + "2020-02-01,,2.5,\n2020-04-01,0.01,-1,c\n";
    Path file = folder.resolve("damaged.csv");
    Random random = new Random(31);
    int trials = Integer.getInteger("mutations", 2_000);
    for (int i = 0; i < trials; i++) {
      StringBuilder text = new StringBuilder(original);
      for (int k = random.nextInt(4); k >= 0 && text.length() > 1; k--) {
        int at = random.nextInt(text.length());
        switch (random.nextInt(4)) {
          case 0 -> text.setCharAt(at, "\",\n\r#:-%e09MY".charAt(random.nextInt(13)));
          case 1 -> text.delete(at, Math.min(text.length(), at + 1 + random.nextInt(9)));
          case 2 -> text.insert(at, text.substring(at, Math.min(text.length(), at + 14)));
          default -> text.setLength(at);
        }
      }
      Files.writeString(file, text);
      for (int kind = 0; kind < 2; kind++) {
        try {
          if (kind == 0) {
            PanelFile.read(file.toString(), Optional.empty());
          } else {
            HistoryFile.read(file.toString(), Optional.empty(), Optional.of("1Y"));
          }
        } catch (InputProblems expected) {
          assertThat(expected.problems()).isNotEmpty();
        } catch (RuntimeException e) {
          fail("damage " + i + ": " + text, e);
        }
      }
    }
  }
}
