package ebbline.check;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

class VerificationTest {

  private static List<CaseResult> run(String topic) {
    return Verification.run(c -> c.topic().equals(topic));
  }

  @Test
  void noPublishedCaseIsMissed() {
    assertThat(Verification.run(c -> true))
        .filteredOn(r -> r.verdict() == Verdict.MISSES)
        .extracting(r -> r.published().id() + " " + r.computedText())
        .isEmpty();
  }

  @Test
  void everyClosedFormOfTheSourcesIsComputed() {
    assertThat(run("Vasicek"))
        .filteredOn(r -> r.verdict() == Verdict.NOT_COMPUTED)
        .extracting(r -> r.published().id())
        .allMatch(id -> id.startsWith("VAS-TS-")); // a binomial tree
    assertThat(run("Hull-White"))
        .filteredOn(r -> !r.published().id().contains("newtree")) // nobody says how it is made
        .allMatch(r -> r.verdict() != Verdict.NOT_COMPUTED);
    assertThat(run("estimation")).allMatch(r -> r.verdict() != Verdict.NOT_COMPUTED);
    assertThat(run("Black")).allMatch(r -> r.verdict() != Verdict.NOT_COMPUTED);
    assertThat(run("convexity")).allMatch(r -> r.verdict() != Verdict.NOT_COMPUTED);
    assertThat(run("curves")).allMatch(r -> r.verdict() != Verdict.NOT_COMPUTED);
    assertThat(run("callable"))
        .filteredOn(r -> !r.published().id().endsWith("thresholds"))
        .allMatch(r -> r.verdict() != Verdict.NOT_COMPUTED);
  }

  @Test
  void everyComputedFigureAgreesWithTheIndependentRecomputation() {
    for (CaseResult result : Verification.run(c -> true)) {
      String recomputed = result.published().recomputed();
      if (result.published().id().equals("CRV-EIOPA-alpha")) {
        // The source rounds its speed up to the next multiple of 1e-6, and so do we.
        double exact = Double.parseDouble(recomputed);
        assertThat(result.computed().getAsDouble()).isBetween(exact, exact + 1e-6);
      } else if (result.published().id().endsWith("-rounded")) {
        // The recomputation rounds on the way as the source does; we do not.
        assertThat(result.computed().getAsDouble())
            .isCloseTo(Double.parseDouble(recomputed), within(1e-6));
      } else if (result.computed().isPresent() && !recomputed.isEmpty()) {
        double exact = Double.parseDouble(recomputed);
        assertThat(Math.abs(result.computed().getAsDouble() - exact))
            .as(result.published().id())
            .isLessThanOrEqualTo(
                Math.max(1.01 * CaseResult.halfUnit(recomputed), 1e-9 * Math.abs(exact)));
      }
    }
  }
}
