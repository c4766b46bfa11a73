package ebbline.check;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class BondCasesTest {
  private static final List<CaseResult> RESULTS = new BondCases().run(PublishedCases.read("bonds"));

  @Test
  void atLeastFourHundredCasesAreComputedAndNoneIsMissed() {
    assertThat(RESULTS).hasSize(454).noneMatch(r -> r.verdict() == Verdict.MISSES);
    assertThat(RESULTS)
        .filteredOn(r -> r.verdict() != Verdict.NOT_COMPUTED)
        .hasSizeGreaterThanOrEqualTo(400);
  }

  @Test
  void aCaseThatIsNotComputedSaysWhy() {
    assertThat(RESULTS)
        .filteredOn(r -> r.verdict() == Verdict.NOT_COMPUTED)
        .allMatch(r -> !r.note().isEmpty());
  }

  @Test
  void spreadsheetFiguresAreHeldToNineDigits() {
    assertThat(RESULTS)
        .filteredOn(r -> r.published().id().startsWith("SS-"))
        .hasSize(82)
        .allMatch(
            r -> r.tolerance() <= 1e-9 * Math.max(1e-3, Math.abs(r.computed().orElseThrow())));
  }

  @Test
  void aCaseAloneStillFindsTheCaseItRefersTo() {
    List<PublishedCase> one =
        PublishedCases.read("bonds").stream().filter(c -> c.id().equals("CFR-II-E-PA")).toList();
    assertThat(new BondCases().run(one))
        .singleElement()
        .matches(r -> r.verdict() == Verdict.MATCHES);
  }
}
