package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.instrument.Right.Party;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import java.util.List;
import org.junit.jupiter.api.Test;

class TrinomialTreeTest {
  private static GaussianRates rates(double[] times, double[] zeros) {
    double[] logs = new double[times.length];
    for (int i = 0; i < times.length; i++) {
      logs[i] = -zeros[i] * times[i];
    }
    DiscountCurve curve = InterpolatedCurve.of(Interpolation.LINEAR_ZERO, times, logs);
    return new HullWhite(0.1, VolatilitySteps.constant(0.01)).on(curve);
  }

  private static final GaussianRates FLAT =
      new HullWhite(0.1, VolatilitySteps.constant(0.01)).on(FlatCurve.of(0.05));

  /** Hull, Options, Futures, and Other Derivatives, 11th ed., section 32.5. */
  private static GaussianRates threeSteps() {
    return rates(new double[] {1, 2, 3}, new double[] {0.03824, 0.04512, 0.05086});
  }

  @Test
  void thePublishedThreeStepTreeComesOutToAllPrintedDigits() {
    TrinomialTree tree = TrinomialTree.of(threeSteps(), 2, 2);
    assertThat(tree.rateStep()).isCloseTo(0.0173, within(5e-5));
    assertThat(tree.alpha(0)).isCloseTo(0.03824, within(5e-6));
    assertThat(tree.alpha(1)).isCloseTo(0.05205, within(5e-6));
    assertThat(tree.alpha(2)).isCloseTo(0.06252, within(5e-6));
    double[][] printed = {{0.1604, 0.6417, 0.1604}, {0.0189, 0.2033, 0.4736, 0.1998, 0.0182}};
    for (int i = 1; i <= 2; i++) {
      for (int j = -i; j <= i; j++) {
        assertThat(tree.arrowDebreu(i, j))
            .as("Q(%s,%s)", i, j)
            .isCloseTo(printed[i - 1][j + i], within(5e-5));
      }
    }
    // Recomputed in high precision.
    assertThat(tree.alpha(2)).isCloseTo(0.0625205, within(1e-7));
    assertThat(tree.arrowDebreu(1, 0)).isCloseTo(0.6416546117, within(1e-10));
    assertThat(tree.arrowDebreu(2, 0)).isCloseTo(0.4735937652, within(1e-10));
    assertThat(tree.arrowDebreu(2, -2)).isCloseTo(0.01885081415, within(1e-11));
  }

  @Test
  void thePublishedBranchingProbabilitiesComeOut() {
    // Same source, figures from memory: a = 0.1, one-year steps, j_max = 2.
    TrinomialTree tree = TrinomialTree.of(threeSteps(), 3, 3);
    assertThat(tree.top()).isEqualTo(2);
    double[][] printed = {
      {0.1667, 0.6666, 0.1667}, {0.1217, 0.6566, 0.2217}, {0.8867, 0.0266, 0.0867}
    };
    for (int j = 0; j <= 2; j++) {
      assertThat(tree.up(j)).isCloseTo(printed[j][0], within(1e-4));
      assertThat(tree.middle(j)).isCloseTo(printed[j][1], within(1e-4));
      assertThat(tree.down(j)).isCloseTo(printed[j][2], within(1e-4));
      assertThat(tree.down(-j)).isCloseTo(tree.up(j), within(1e-15));
      assertThat(tree.middle(-j)).isCloseTo(tree.middle(j), within(1e-15));
    }
    assertThat(tree.target(2)).isEqualTo(1);
    assertThat(tree.target(-2)).isEqualTo(-1);
  }

  @Test
  void theTreeColumnOfThePutOnTheNineYearZeroComesOut() {
    // Hull, earlier editions of the same book; figures from memory, recomputed independently.
    double[] days = {3, 31, 62, 94, 185, 367, 731, 1096, 1461, 1826, 2194, 2558, 2922, 3287, 3653};
    double[] zeros = {
      5.01772, 4.98284, 4.97234, 4.96157, 4.99058, 5.09389, 5.79733, 6.30595, 6.73464, 6.94816,
      7.08807, 7.27527, 7.30852, 7.3979, 7.49015
    };
    for (int i = 0; i < days.length; i++) {
      days[i] /= 365;
      zeros[i] /= 100;
    }
    GaussianRates rates = rates(days, zeros);
    double expiry = 1095 / 365.0;
    CashFlows flows = CashFlows.of(new double[] {expiry, 3285 / 365.0}, new double[] {63, -100});
    Claim put =
        new Claim(CashFlows.NONE, List.of(new Right(Party.HOLDER, expiry, expiry, flows)), 0, 0);
    int[] steps = {10, 30, 50, 100, 200, 500};
    double[] printed = {1.8658, 1.8234, 1.8093, 1.8144, 1.8097, 1.8093};
    double[] exact = {1.865792639, 1.823435188, 1.809336171, 1.814441953, 1.809742739, 1.80928008};
    for (int i = 0; i < steps.length; i++) {
      double found = TrinomialPricing.rightsValue(put, rates, steps[i]);
      assertThat(found).as("%s steps", steps[i]).isCloseTo(printed[i], within(5e-5));
      assertThat(found).as("%s steps", steps[i]).isCloseTo(exact[i], within(2e-9));
    }
    assertThat(ClosedForm.value(put, rates).presentValue()).isCloseTo(1.8093, within(5e-5));
  }

  @Test
  void theTreeRepricesTheCurveAndItsProbabilitiesAddUp() {
    for (double a : new double[] {0, 0.03, 0.5, -0.02}) {
      GaussianRates rates =
          new HullWhite(a, VolatilitySteps.constant(0.012)).on(FlatCurve.of(0.04));
      TrinomialTree tree = TrinomialTree.of(rates, 10, 120);
      for (int i = 1; i <= tree.steps(); i++) {
        double sum = 0;
        for (int j = -tree.reach(i); j <= tree.reach(i); j++) {
          sum += tree.arrowDebreu(i, j);
          double[] p = {tree.up(j), tree.middle(j), tree.down(j)};
          assertThat(p[0] + p[1] + p[2]).isCloseTo(1, within(1e-14));
          assertThat(Math.min(p[0], Math.min(p[1], p[2]))).isPositive();
        }
        assertThat(sum).isCloseTo(rates.curve().discount(i * tree.stepLength()), within(1e-13));
      }
    }
  }

  @Test
  void earlyExerciseComesNearTheInductionAsStepsGrow() {
    Claim claim = BackwardInductionTest.bond(20, 2, 5, Party.ISSUER, 4, 19, 100);
    double exact = BackwardInduction.value(claim, FLAT).presentValue();
    double last = 1;
    for (int steps : new int[] {76, 304, 1216}) {
      Valuation found = TrinomialPricing.value(claim, FLAT, steps);
      double error = Math.abs(found.presentValue() - exact);
      assertThat(error).isLessThan(0.5 * last).isLessThanOrEqualTo(found.errorBound());
      assertThat(found.method()).isEqualTo(Method.TRINOMIAL);
      last = error;
    }
    // About first order in the step: the exercise boundary falls between nodes.
    assertThat(last).isLessThan(4e-3);
  }

  @Test
  void decisionsBetweenNodesAndNoticeArePriced() {
    CashFlows flows = BackwardInductionTest.bond(16, 2, 4, Party.ISSUER, 17, 0, 0).flows();
    Right put = new Right(Party.HOLDER, 1.7183, 2, CashFlows.single(2, 99));
    Right call = new Right(Party.ISSUER, 3.1416, 3.5, CashFlows.single(3.5, 101));
    Claim claim = new Claim(flows, List.of(put, call), 0, 0);
    double exact = BackwardInduction.value(claim, FLAT).presentValue();
    assertThat(TrinomialPricing.value(claim, FLAT, 400).presentValue())
        .isCloseTo(exact, within(3e-3));
  }

  @Test
  void aRightToActTodayIsDecidedAtOnce() {
    Right now = new Right(Party.ISSUER, 0, 0, CashFlows.single(0, 50));
    CashFlows flows = CashFlows.single(1, 100);
    Claim claim = new Claim(flows, List.of(now), 0, 0);
    assertThat(TrinomialPricing.value(claim, FLAT, 10).presentValue()).isCloseTo(50, within(1e-12));
  }

  @Test
  void whatATreeCannotHoldIsRefusedInWords() {
    GaussianRates stepped =
        new HullWhite(0.1, VolatilitySteps.of(new double[] {1}, new double[] {0.01, 0.02}))
            .on(FLAT.curve());
    assertThatThrownBy(() -> TrinomialTree.of(stepped, 3, 10)).hasMessageContaining("constant");
    assertThatThrownBy(() -> TrinomialTree.of(FLAT, 0, 10)).hasMessageContaining("found 0.0");
    assertThatThrownBy(() -> TrinomialTree.of(FLAT, 1, 0)).hasMessageContaining("found 0");
    assertThatThrownBy(() -> TrinomialTree.of(FLAT, 1, 20_001)).hasMessageContaining("20001");
    GaussianRates fast = new HullWhite(9, VolatilitySteps.constant(0.01)).on(FLAT.curve());
    assertThatThrownBy(() -> TrinomialTree.of(fast, 1, 10)).hasMessageContaining("negative");
    GaussianRates away = new HullWhite(-0.5, VolatilitySteps.constant(0.01)).on(FLAT.curve());
    assertThatThrownBy(() -> TrinomialTree.of(away, 5, 10)).hasMessageContaining("negative");
    Claim claim = BackwardInductionTest.bond(20, 2, 5, Party.ISSUER, 4, 19, 100);
    assertThatThrownBy(() -> TrinomialPricing.value(claim, FLAT, 3))
        .hasMessageContaining("found 3");
    assertThat(TrinomialPricing.value(Claim.of(claim.flows()), FLAT, 3).method())
        .isEqualTo(Method.DISCOUNTING);
  }
}
