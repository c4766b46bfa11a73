package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;

import ebbline.fitting.history.RateHistory;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class HistoryFileTest {
  private static final Optional<Step> MONTH = Optional.of(Step.parse("1M"));

  @TempDir private Path folder;

  private HistoryInput read(String text, Optional<Step> step, Optional<String> column)
      throws IOException {
    Path file = folder.resolve("h.csv");
    Files.writeString(file, text);
    return HistoryFile.read(file.toString(), step, column);
  }

  private List<String> problems(String text, Optional<Step> step, Optional<String> column)
      throws IOException {
    try {
      read(text, step, column);
    } catch (InputProblems e) {
      return e.problems().stream()
          .map(InputProblem::message)
          .map(m -> m.replace(folder.resolve("h.csv").toString(), "F"))
          .toList();
    }
    throw new AssertionError("the file was accepted");
  }

  private static double[] times(RateHistory history) {
    double[] times = new double[history.size()];
    for (int i = 0; i < times.length; i++) {
      times[i] = history.time(i);
    }
    return times;
  }

  @Test
  void datesCountByTheirDays() throws IOException {
    HistoryInput input =
        read(
            "# source: a release\ndate,rate_pct\n2020-01-31,1.5\n2020-02-29,\n2020-03-31,-0.25\n",
            Optional.empty(),
            Optional.empty());
    assertThat(times(input.history())).containsExactly(0, 60 / 365.0);
    assertThat(input.history().rate(1)).isEqualTo(-0.0025);
    assertThat(input.history().missing()).isEqualTo(1);
    assertThat(input.column()).isEqualTo("rate_pct");
    assertThat(input.dates()).hasSize(3).startsWith(LocalDate.of(2020, 1, 31));
    assertThat(input.file().sha256()).hasSize(64);
  }

  @Test
  void aStepOfMonthsCountsTheMonthsOfTheCalendar() throws IOException {
    HistoryInput input =
        read("date,rate\n2019-12-31,1%\n2020-01-30,2%\n2020-04-01,3%\n", MONTH, Optional.empty());
    assertThat(times(input.history())).containsExactly(0, 1 / 12.0, 4 / 12.0);
    assertThat(input.history().isRegular()).isFalse();
    assertThat(
            read(
                    "# step: 1/12\ndate,rate\n2020-01-01,1%\n2020-02-03,2%\n2020-03-02,2%\n",
                    Optional.empty(), Optional.empty())
                .history()
                .isRegular())
        .isTrue();
    assertThat(problems("date,rate\n2020-01-01,1%\n2020-01-31,2%\n", MONTH, Optional.empty()))
        .containsExactly(
            "F:3: column 'date': found '2020-01-31': with a step of a month from 2020-01-01 no"
                + " observation falls into this month, or another one did");
    assertThat(
            problems(
                "date,rate\n2020-01-01,1%\n2020-03-01,2%\n",
                Optional.of(Step.parse("0.25")), Optional.empty()))
        .hasSize(1);
  }

  @Test
  void anotherStepIsTheSameFromRowToRow() throws IOException {
    Optional<Step> day = Optional.of(Step.parse("1/250"));
    HistoryInput input =
        read("date,rate\n2020-01-02,1%\n2020-01-03,2%\n2020-01-06,3%\n", day, Optional.empty());
    assertThat(times(input.history())).containsExactly(0, 1 / 250.0, 2 / 250.0);
    assertThat(times(read("rate\n1%\n\"\"\n30bp\n", day, Optional.empty()).history()))
        .containsExactly(0, 2 / 250.0);
  }

  @Test
  void theCommandLineOverridesTheFilesStep() throws IOException {
    HistoryInput input = read("# step: 1D\nrate\n1%\n2%\n", MONTH, Optional.empty());
    assertThat(input.history().time(1)).isEqualTo(1 / 12.0);
  }

  @Test
  void oneOfSeveralColumnsIsPickedByName() throws IOException {
    String text = "date,tbill_3m_pct,real,x-note\n2020-01-01,1,2,a\n2020-02-01,2,z,b\n";
    assertThat(read(text, MONTH, Optional.of("tbill_3m")).history().rate(1)).isEqualTo(0.02);
    assertThat(read(text, MONTH, Optional.of("TBILL_3M_pct")).column()).isEqualTo("tbill_3m_pct");
    assertThat(problems(text, MONTH, Optional.of("reel")))
        .containsExactly("F:1: column 'reel': there is no such column; did you mean 'real'?");
    assertThat(problems(text, MONTH, Optional.empty()).get(0))
        .isEqualTo(
            "F:1: column 'tbill_3m_pct': a history has no such column; did you mean 'date'?"
                + " (columns of your own are headed x-…)");
    assertThat(problems("date,3M,1Y\n2020-01-01,1%,2%\n", MONTH, Optional.empty()))
        .containsExactly("F:1: several columns hold rates; pick one with --column: 3M, 1Y");
    assertThat(read("date,3M_bp\n2020-01-01,100\n", MONTH, Optional.empty()).history().rate(0))
        .isEqualTo(0.01);
  }

  @Test
  void whatIsWrongIsSaidWithItsPlace() throws IOException {
    assertThat(
            problems(
                "date,rate\n2020-02-01,1.25\n2020-01-01,2%\n2020-02-30,1%\nsoon,NaN\n,1%\n"
                    + "2020-03-01,20000%\n1,1%\n",
                Optional.empty(), Optional.empty()))
        .containsExactly(
            "F:2: column 'rate': found '1.25': 1.25 means 125 %; write 1.25% or 0.0125",
            "F:3: column 'date': found '2020-01-01': dates must increase; the row above has"
                + " 2020-02-01",
            "F:4: column 'date': found '2020-02-30': no such day in the calendar",
            "F:5: column 'rate': found 'NaN': expected a rate, 4.25%, 35bp or 0.0425; it must be a"
                + " finite number",
            "F:5: column 'date': found 'soon': expected a date 2031-11-15, a tenor such as 3M, 10Y"
                + " or 1Y6M, or a number of years such as 0.25",
            "F:6: column 'date': a value is missing",
            "F:7: column 'rate': found '20000%': a rate must lie between -100 and 100 (10000 %)",
            "F:8: column 'date': found '1': expected a date such as 2026-11-30");
    assertThat(problems("rate\n1%\n", Optional.empty(), Optional.empty()))
        .containsExactly(
            "F:1: column 'date': the column is missing; rows without dates need a step, --step 1M,"
                + " 1D or years");
    assertThat(problems("# step: monthly\ndate\n2020-01-01\n", Optional.empty(), Optional.empty()))
        .containsExactly(
            "F:1: column 'step': found 'monthly': expected a step such as 1M, 1D, 0.25 or 1/12,"
                + " above 0 and at most 100 years",
            "F:2: column 'rate': the column is missing; a history needs it");
    assertThat(problems("date,rate\n", MONTH, Optional.empty()))
        .containsExactly("F: there are no rows below the header");
  }

  @Test
  void anEmptyLineInRowsWithoutDatesIsNotPassedOver() throws IOException {
    assertThat(problems("rate\n1%\n\n2%\n", MONTH, Optional.empty()))
        .containsExactly(
            "F:4: an empty line stands above this row; write \"\" for a rate that is missing, or"
                + " take the line out");
    assertThat(read("rate\n1%\n2%\n\n\n", MONTH, Optional.empty()).history().size()).isEqualTo(2);
  }
}
