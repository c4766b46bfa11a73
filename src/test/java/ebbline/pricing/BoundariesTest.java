package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.FlatCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.instrument.Right.Party;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class BoundariesTest {
  private static final GaussianRates RATES =
      new HullWhite(0.05, VolatilitySteps.constant(0.011)).on(FlatCurve.of(0.035));

  /** Rights to a swap of yearly payments until year 10, on each year end from 1. */
  private static Claim swaption(double rate, int sign) {
    List<Right> rights = new ArrayList<>();
    for (int t = 1; t < 10; t++) {
      rights.add(new Right(Party.HOLDER, t, t, swap(rate, sign, t)));
    }
    return new Claim(CashFlows.NONE, rights, 0, 0);
  }

  private static CashFlows swap(double rate, int sign, int from) {
    double[] times = new double[11 - from];
    double[] amounts = new double[times.length];
    for (int i = 0; i < times.length; i++) {
      times[i] = from + i;
      amounts[i] = -sign * (i == 0 ? -100 : 100 * rate + (i == times.length - 1 ? 100 : 0));
    }
    return CashFlows.of(times, amounts);
  }

  @Test
  void bondsAndSwapsHaveOneBoundaryAndOtherFlowsMayHaveMore() {
    Claim callable = BackwardInductionTest.bond(20, 2, 5, Party.ISSUER, 4, 19, 100);
    assertThat(SingleBoundary.order(callable)).isEqualTo(1);
    assertThat(SingleBoundary.order(swaption(0.03, 1))).isEqualTo(1);
    assertThat(SingleBoundary.order(swaption(0.03, -1))).isEqualTo(-1);
    Claim negative = BackwardInductionTest.bond(20, 2, -1, Party.ISSUER, 4, 19, 100);
    assertThat(SingleBoundary.order(negative)).isZero();
    Right two =
        new Right(Party.ISSUER, 2, 2, CashFlows.of(new double[] {2, 3}, new double[] {1, 1}));
    assertThat(SingleBoundary.order(new Claim(callable.flows(), List.of(two), 0, 0))).isZero();
    Right late = new Right(Party.ISSUER, 2, 2, CashFlows.single(3, 100));
    assertThat(SingleBoundary.order(new Claim(callable.flows(), List.of(late), 0, 0))).isZero();
    assertThat(SingleBoundary.order(swaption(-0.01, 1))).isZero();
  }

  @Test
  void bermudanSwaptionsAgreeWithADenseGridAndBeatEachEuropean() {
    for (int sign = -1; sign <= 1; sign += 2) {
      for (double rate : new double[] {0.02, 0.035, 0.06}) {
        Claim claim = swaption(rate, sign);
        Valuation found = BackwardInduction.value(claim, RATES);
        assertThat(found.presentValue())
            .isCloseTo(DenseGrid.value(claim, RATES), within(found.errorBound() + 1e-11));
        for (Right right : claim.rights()) {
          Claim one = new Claim(CashFlows.NONE, List.of(right), 0, 0);
          assertThat(found.presentValue())
              .isGreaterThan(ClosedForm.value(one, RATES).presentValue());
        }
      }
    }
  }

  @Test
  void flowsThatAddNothingMakeTheScanFindTheSameValue() {
    // One unit more and one less at one time changes nothing and hides that there is one boundary.
    SplittableRandom random = new SplittableRandom(12);
    for (int i = 0; i < 60; i++) {
      RandomRights drawn = RandomRights.draw(random, i % 3, 20);
      Claim claim = drawn.claim();
      if (claim.rights().isEmpty()) {
        continue;
      }
      List<Right> rights = new ArrayList<>();
      for (Right right : claim.rights()) {
        double paid = right.received().time(0);
        double[] times = {paid, paid};
        double[] amounts = {right.received().amount(0) + 1, -1};
        rights.add(
            new Right(
                right.party(), right.decision(), right.keptUntil(), CashFlows.of(times, amounts)));
      }
      Claim scanned = new Claim(claim.flows(), rights, 0, 0);
      assertThat(SingleBoundary.order(claim)).isEqualTo(1);
      assertThat(SingleBoundary.order(scanned)).isZero();
      assertThat(BackwardInduction.rightsValue(scanned, drawn.rates()).presentValue())
          .as("seed 12, case %s", i)
          .isCloseTo(
              BackwardInduction.rightsValue(claim, drawn.rates()).presentValue(), within(2e-11));
    }
  }

  @Test
  void tangentsLeadToTheRootOrGiveUpButNeverElsewhere() {
    for (double root : new double[] {-7.9, -1, 0.3, 7.99}) {
      for (int sign = -1; sign <= 1; sign += 2) {
        int s = sign;
        for (double guess : new double[] {-20, -3, root - 0.1, root, root + 0.1, 7, 20}) {
          for (double slope : new double[] {0, -1e-3, 1, -1, 1e3, -1e6}) {
            double found =
                Boundaries.near(
                    u -> s * (Math.exp(-0.7 * u) - Math.exp(-0.7 * root)),
                    -8,
                    8,
                    sign,
                    guess,
                    slope,
                    false);
            if (!Double.isNaN(found)) {
              assertThat(found).isCloseTo(root, within(1e-6));
            }
          }
        }
        double local = -s * 0.7 * Math.exp(-0.7 * root);
        double found =
            Boundaries.near(
                u -> s * (Math.exp(-0.7 * u) - Math.exp(-0.7 * root)),
                -8,
                8,
                sign,
                root - 0.005,
                local,
                false);
        assertThat(found).isCloseTo(root, within(1e-7));
      }
    }
    assertThat(Boundaries.near(u -> -1 - u * u, -8, 8, 1, 0, 0, false)).isNaN();
    assertThat(Boundaries.near(u -> 1 + Math.exp(-u), -8, 8, 1, 0, -1, false)).isNaN();
  }
}
