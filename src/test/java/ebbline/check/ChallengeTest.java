package ebbline.check;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import ebbline.curve.FlatCurve;
import ebbline.data.BookEntry;
import ebbline.data.RowText;
import ebbline.instrument.BookRow;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import ebbline.pricing.Market;
import ebbline.pricing.Method;
import ebbline.pricing.Valuation;
import ebbline.pricing.simulation.Sampling;
import ebbline.time.CalendarRegistry;
import ebbline.time.TimeAxis;
import java.util.List;
import org.junit.jupiter.api.Test;

class ChallengeTest {
  private static Challenge challenge(VolatilitySteps volatility) {
    return new Challenge(
        Market.of(TimeAxis.undated(), new HullWhite(0.1, volatility).on(FlatCurve.of(0.05))),
        240,
        Sampling.of(4096, 1, 1));
  }

  private static final Challenge CHALLENGE = challenge(VolatilitySteps.constant(0.01));

  private static List<ChallengeFigure> of(Challenge challenge, String text) {
    BookEntry entry = RowText.parse(text, "--row", 1, CalendarRegistry.standard());
    BookRow row = ((BookEntry.Good) entry).row();
    return challenge.of(row);
  }

  private static List<String> methods(List<ChallengeFigure> figures) {
    return figures.stream().map(ChallengeFigure::method).toList();
  }

  @Test
  void everyRowIsPricedByEveryMethodThatCan() {
    List<ChallengeFigure> bond = of(CHALLENGE, "instrument=bond maturity=7 coupon=4%");
    assertThat(methods(bond)).containsExactly("discounting", "simulation");
    List<ChallengeFigure> option =
        of(CHALLENGE, "instrument=zero-option kind=call expiry=1 maturity=3 strike=90");
    assertThat(methods(option))
        .containsExactly(
            "closed-form", "integration", "backward-induction", "trinomial", "simulation");
    List<ChallengeFigure> callable =
        of(CHALLENGE, "instrument=callable-bond maturity=8 coupon=5% calls=3..7.5@100 face=-1e6");
    assertThat(methods(callable)).containsExactly("backward-induction", "trinomial", "simulation");
    assertThat(callable.get(0).value().orElseThrow().presentValue()).isBetween(-1e6, -9e5);
    List<ChallengeFigure> cap = of(CHALLENGE, "instrument=cap maturity=5 strike=5% frequency=4");
    assertThat(methods(cap)).containsExactly("closed-form", "integration", "simulation");
    List<ChallengeFigure> arrears =
        of(CHALLENGE, "instrument=floor maturity=5 strike=5% frequency=4 rate_basis=backward");
    assertThat(methods(arrears)).containsExactly("closed-form", "simulation");
    for (List<ChallengeFigure> row : List.of(bond, option, callable, cap, arrears)) {
      assertThat(row.get(0).verdict()).isEqualTo(ChallengeVerdict.REFERENCE);
      assertThat(row.subList(1, row.size()))
          .allMatch(f -> f.verdict() == ChallengeVerdict.EXPLAINED)
          .allMatch(f -> f.seconds() > 0)
          .noneMatch(ChallengeFigure::fails);
    }
  }

  @Test
  void aMethodThatCannotSaysWhyAndFailsNothing() {
    List<ChallengeFigure> figures =
        of(
            challenge(VolatilitySteps.of(new double[] {2}, new double[] {0.01, 0.008})),
            "instrument=callable-bond maturity=8 coupon=5% calls=3..7.5@100");
    ChallengeFigure tree = figures.get(1);
    assertThat(tree.method()).isEqualTo("trinomial");
    assertThat(tree.verdict()).isEqualTo(ChallengeVerdict.NOT_APPLICABLE);
    assertThat(tree.message()).contains("one constant volatility");
    assertThat(figures).noneMatch(ChallengeFigure::fails);
    assertThat(figures.get(2).verdict()).isEqualTo(ChallengeVerdict.EXPLAINED);
  }

  @Test
  void aRowWithoutAnyValueFails() {
    List<ChallengeFigure> figures = of(CHALLENGE, "instrument=bond maturity=-1 coupon=4%");
    assertThat(figures).hasSize(1);
    assertThat(figures.get(0).fails()).isTrue();
    assertThat(figures.get(0).message()).startsWith("maturity must lie after today");
    Claim wild =
        new Claim(
            CashFlows.NONE,
            List.of(new Right(Right.Party.HOLDER, 5, 5, CashFlows.single(9, 100))),
            0,
            0);
    Challenge extreme = challenge(VolatilitySteps.constant(1e200));
    assertThat(extreme.of("wild", 100, wild))
        .last()
        .matches(ChallengeFigure::fails)
        .extracting(ChallengeFigure::message)
        .isEqualTo("no method prices this row");
  }

  private static Valuation valuation(double value, Method method, double bound) {
    return new Valuation(value, method, bound);
  }

  @Test
  void aDifferenceIsExplainedUpToBothBoundsAndNoFurther() {
    Valuation reference = valuation(100, Method.CLOSED_FORM, 1e-3);
    double allowed = 3e-3;
    for (int side = -1; side <= 1; side += 2) {
      assertThat(
              Challenge.verdict(
                  valuation(100 + side * 0.999 * allowed, Method.TRINOMIAL, 2e-3), reference))
          .isEqualTo(ChallengeVerdict.EXPLAINED);
      assertThat(
              Challenge.verdict(
                  valuation(100 + side * 1.001 * allowed, Method.TRINOMIAL, 2e-3), reference))
          .isEqualTo(ChallengeVerdict.UNEXPLAINED);
      double five = 1e-3 + 5 * 2e-3;
      assertThat(
              Challenge.verdict(
                  valuation(100 + side * 0.999 * five, Method.SIMULATION, 2e-3), reference))
          .isEqualTo(ChallengeVerdict.EXPLAINED);
      assertThat(
              Challenge.verdict(
                  valuation(100 + side * 1.001 * five, Method.SIMULATION, 2e-3), reference))
          .isEqualTo(ChallengeVerdict.UNEXPLAINED);
    }
  }

  @Test
  void aCurveAloneIsNoMatchForAChallenge() {
    Market curve = Market.of(TimeAxis.undated(), FlatCurve.of(0.05));
    assertThatThrownBy(() -> new Challenge(curve, 240, Sampling.of(64, 1, 1)))
        .hasMessageContaining("needs a model");
  }
}
