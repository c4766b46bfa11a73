package ebbline.check;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class CaseResultTest {

  private static PublishedCase printed(String published, String recomputed) {
    return new PublishedCase("X", "topic", "{}", published, recomputed, "printed", "a source");
  }

  @Test
  void halfAUnitOfTheLastPrintedDigitIsReadFromTheFigure() {
    assertThat(CaseResult.halfUnit("0.8752")).isCloseTo(0.00005, within(1e-20));
    assertThat(CaseResult.halfUnit("30")).isEqualTo(0.5);
    assertThat(CaseResult.halfUnit("3.30")).isEqualTo(0.005);
    assertThat(CaseResult.halfUnit("-9.15e-6")).isCloseTo(0.005e-6, within(1e-20));
  }

  @Test
  void aFigureWithinHalfAUnitMatches() {
    assertThat(CaseResult.of(printed("2.59", "2.592983"), "call", 2.592983).verdict())
        .isEqualTo(Verdict.MATCHES);
    assertThat(CaseResult.of(printed("2.59", "2.592983"), "call", 2.5949999).verdict())
        .isEqualTo(Verdict.MATCHES);
    assertThat(CaseResult.of(printed("2.59", "2.592983"), "call", 2.5951).verdict())
        .isEqualTo(Verdict.MISSES);
  }

  @Test
  void aSourceThatRoundsOnTheWayIsNotCalledAMatch() {
    PublishedCase total = printed("0.8752", "0.8751256364");
    assertThat(CaseResult.of(total, "put", 0.87512563640).verdict())
        .isEqualTo(Verdict.SOURCE_ROUNDED);
    assertThat(CaseResult.of(total, "put", 0.8751257).verdict()).isEqualTo(Verdict.MISSES);
  }

  @Test
  void anOwnRecomputationIsNeverCalledPublished() {
    PublishedCase own =
        new PublishedCase("X", "t", "{}", "", "0.9274", "own recomputation", "a source");
    CaseResult result = CaseResult.of(own, "callable", 0.92742);
    assertThat(own.isPublished()).isFalse();
    assertThat(result.verdict()).isEqualTo(Verdict.MATCHES);
    assertThat(result.note()).contains("own recomputation");
  }

  @Test
  void theShippedCasesAreReadWhole() {
    assertThat(PublishedCases.read("short-rate")).hasSize(205);
    assertThat(PublishedCases.read("bonds")).hasSize(454);
    for (PublishedCase c : PublishedCases.read("bonds")) {
      assertThat(CaseInputs.parse(c.inputs()).names()).as(c.id()).isNotEmpty();
    }
  }

  @Test
  void inputsAreReadWithTheirTypes() {
    CaseInputs in =
        CaseInputs.parse(
            "{\"a\": 1.5, \"n\": 3, \"t\": \"x\", \"l\": [1, 2.5], \"o\": {\"1\": 4}}");
    assertThat(in.number("a")).isEqualTo(1.5);
    assertThat(in.integer("n")).isEqualTo(3);
    assertThat(in.text("t")).isEqualTo("x");
    assertThat(in.numbers("l")).containsExactly(1, 2.5);
    assertThat(in.object("o").number("1")).isEqualTo(4);
    assertThatThrownBy(() -> in.number("missing")).hasMessageContaining("missing");
    assertThatThrownBy(() -> CaseInputs.parse("{\"a\": }")).hasMessageContaining("a value");
    assertThatThrownBy(() -> CaseInputs.parse("{\"a\": 1} x")).hasMessageContaining("end of text");
  }
}
