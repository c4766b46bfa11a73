package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.FlatCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right.Party;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import ebbline.pricing.simulation.Sampling;
import ebbline.pricing.simulation.Sampling.Points;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class SimulationTest {
  private static final GaussianRates RATES =
      new HullWhite(0.1, VolatilitySteps.constant(0.01)).on(FlatCurve.of(0.05));

  private static Sampling sampling(Points points, int paths, long seed) {
    return new Sampling(points, paths, seed, 1);
  }

  /**
   * Errors in units of their standard errors. With 32 batches they follow Student's law with 31
   * degrees: one in 190 lies beyond 3, one in 50,000 beyond 5.
   */
  private static final class Scores {
    private int count;
    private int beyondThree;
    private double squares;

    void add(double error, double standardError, String name) {
      double score = error / standardError;
      assertThat(Math.abs(score)).as(name).isLessThan(5);
      count++;
      beyondThree += Math.abs(score) > 3 ? 1 : 0;
      squares += score * score;
    }

    void check() {
      assertThat(beyondThree).isLessThanOrEqualTo(1 + count / 60);
      // Student's law with 31 degrees has a mean square of 1.07; its square has variance 2.6.
      assertThat(squares / count).isCloseTo(1.07, within(4 * Math.sqrt(2.6 / count)));
    }
  }

  @Test
  void flowsDiscountedAlongThePathsAreWorthWhatTheCurveSays() {
    SplittableRandom random = new SplittableRandom(17);
    for (Points points : Points.values()) {
      Scores scores = new Scores();
      for (int i = 0; i < 120; i++) {
        RandomRights drawn = RandomRights.draw(random, 0, 20);
        CashFlows flows = drawn.claim().flows();
        double exact = Discounting.value(flows, drawn.rates().curve()).presentValue();
        Estimate found = Simulation.flows(flows, drawn.rates(), sampling(points, 1024, i));
        scores.add(found.mean() - exact, found.standardError(), "seed 17, case " + i);
      }
      scores.check();
    }
  }

  @Test
  void europeanOptionsAgreeWithTheClosedForm() {
    SplittableRandom random = new SplittableRandom(23);
    for (Points points : Points.values()) {
      Scores scores = new Scores();
      for (int i = 0; i < 150; i++) {
        RandomOption option = RandomOption.draw(random, i % 2 == 0);
        double last = option.received().time(option.received().size() - 1);
        if (Math.sqrt(option.rates().variance(option.expiry()))
                * option.rates().g(last - option.expiry())
            > 1) {
          continue;
        }
        Claim claim = option.claim(i % 4 < 2 ? 1 : -1);
        double exact = ClosedForm.value(claim, option.rates()).presentValue();
        SimulatedBounds found =
            Simulation.bounds(claim, option.rates(), sampling(points, 1024, 100 + i));
        // Where nothing is random, or too little to show, only rounding is left.
        if (found.middle().standardError() > 1e-11 * option.face()) {
          scores.add(
              found.middle().mean() - exact, found.middle().standardError(), "seed 23, case " + i);
        } else {
          assertThat(found.middle().mean()).isCloseTo(exact, within(2e-10 * option.face()));
        }
        assertThat(found.halfGap()).isLessThan(1e-9 * option.face());
      }
      assertThat(scores.count).isGreaterThan(40);
      scores.check();
    }
  }

  @Test
  void theBoundsBracketBackwardInductionInTwoHundredCases() {
    SplittableRandom random = new SplittableRandom(31);
    int priced = 0;
    int outside = 0;
    double widest = 0;
    for (int i = 0; priced < 200; i++) {
      RandomRights drawn = RandomRights.draw(random, i % 3, 24);
      if (drawn.claim().rights().isEmpty()) {
        continue;
      }
      priced++;
      Valuation main = BackwardInduction.value(drawn.claim(), drawn.rates());
      SimulatedBounds found =
          Simulation.bounds(
              drawn.claim(),
              drawn.rates(),
              sampling(i % 2 == 0 ? Points.SOBOL : Points.ANTITHETIC, 1024, 7 + i));
      double value = main.presentValue();
      // What happens beyond four deviations only, no path has met; seen to be worth 6e-8.
      double slack = main.errorBound() + 1.5e-7;
      String name = "seed 31, case " + i;
      double below = found.low().mean() - slack - value;
      double above = value - found.high().mean() - slack;
      assertThat(below).as(name).isLessThan(5 * found.low().standardError());
      assertThat(above).as(name).isLessThan(5 * found.high().standardError());
      if (below > 3 * found.low().standardError() || above > 3 * found.high().standardError()) {
        outside++;
      }
      widest = Math.max(widest, found.halfGap());
    }
    assertThat(outside).isLessThanOrEqualTo(2);
    assertThat(widest).isBetween(1e-6, 5e-3);
  }

  @Test
  void thirtyYearBondCallableOnFiftyDatesLiesBetweenItsBounds() {
    Claim claim = BackwardInductionTest.bond(60, 2, 5, Party.ISSUER, 10, 59, 100);
    SimulatedBounds found = Simulation.bounds(claim, RATES, Sampling.of(16_384, 1, 2));
    assertThat(found.low().standardError()).isLessThan(1e-4);
    assertThat(found.halfGap()).isLessThan(1e-4);
    assertThat(found.middle().mean())
        .isCloseTo(93.3288934768, within(3 * found.middle().standardError() + found.halfGap()));
  }

  @Test
  void theBoundsHoldForAPlanThatKnowsNothing() {
    // Without a fit the follower takes the first gain he sees and the other knows the whole path.
    for (Party party : Party.values()) {
      Claim claim = BackwardInductionTest.bond(20, 2, 5, party, 2, 19, 100);
      Valuation main = BackwardInduction.rightsValue(claim, RATES);
      ExercisePlan blind = ExercisePlan.of(claim, RATES, (values, gain) -> KinkedPolynomial.ZERO);
      SimulatedBounds found =
          Simulation.rights(claim, RATES, sampling(Points.SOBOL, 8192, 3), blind);
      assertThat(found.low().mean() + 10 * found.low().standardError())
          .isLessThan(main.presentValue());
      assertThat(found.high().mean() - 10 * found.high().standardError())
          .isGreaterThan(main.presentValue());
    }
  }

  @Test
  void anyNumberOfThreadsGivesTheSameBits() {
    Claim claim = BackwardInductionTest.bond(10, 2, 5, Party.ISSUER, 2, 9, 100);
    for (Points points : Points.values()) {
      Valuation alone = Simulation.value(claim, RATES, new Sampling(points, 50_000, 5, 1));
      Estimate flows = Simulation.flows(claim.flows(), RATES, new Sampling(points, 50_000, 5, 1));
      for (int threads : new int[] {2, 4, 7}) {
        Sampling shared = new Sampling(points, 50_000, 5, threads);
        assertThat(Simulation.value(claim, RATES, shared)).isEqualTo(alone);
        assertThat(Simulation.flows(claim.flows(), RATES, shared)).isEqualTo(flows);
      }
      Valuation other = Simulation.value(claim, RATES, new Sampling(points, 50_000, 6, 1));
      assertThat(other.presentValue()).isNotEqualTo(alone.presentValue());
    }
  }

  @Test
  void sobolErrorsAreFarBelowPseudoRandomOnesAtEqualWork() {
    CashFlows flows = CashFlows.single(10, 100);
    double exact = Discounting.value(flows, RATES.curve()).presentValue();
    // The deviation of one path's discount factor, a lognormal, known in closed form.
    double variance = RATES.integralVariance(0, 10);
    double pseudo = exact * Math.sqrt(Math.expm1(variance) / 65_536);
    double error = 0;
    double claimed = 0;
    double mirrored = 0;
    for (int seed = 0; seed < 8; seed++) {
      Estimate found = Simulation.flows(flows, RATES, sampling(Points.SOBOL, 65_536, seed));
      error += Math.pow(found.mean() - exact, 2) / 8;
      claimed += Math.pow(found.standardError(), 2) / 8;
      Estimate other = Simulation.flows(flows, RATES, sampling(Points.ANTITHETIC, 65_536, seed));
      mirrored += Math.pow(other.standardError(), 2) / 8;
    }
    assertThat(Math.sqrt(error)).isLessThan(pseudo / 50);
    assertThat(Math.sqrt(claimed)).isLessThan(pseudo / 50);
    assertThat(Math.sqrt(mirrored)).isBetween(5 * Math.sqrt(claimed), pseudo / 3);
  }

  @Test
  void manyFlowsProfitFromThePointsOrderToo() {
    CashFlows flows = BackwardInductionTest.bond(60, 2, 5, Party.ISSUER, 60, 59, 100).flows();
    Estimate sobol = Simulation.flows(flows, RATES, sampling(Points.SOBOL, 65_536, 1));
    Estimate pseudo = Simulation.flows(flows, RATES, sampling(Points.ANTITHETIC, 65_536, 1));
    assertThat(sobol.standardError()).isLessThan(pseudo.standardError() / 10);
  }

  @Test
  void aSamplingSaysWhatItCannotDo() {
    assertThatThrownBy(() -> Sampling.of(1, 1, 1))
        .hasMessageStartingWith("a simulation has 2 to")
        .hasMessageEndingWith("found 1");
    assertThatThrownBy(() -> Sampling.of(100, 1, 0)).hasMessage("at least 1 thread, found 0");
    assertThat(Sampling.of(65_536, 1, 1).pathsPerBatch()).isEqualTo(2048);
    assertThat(Sampling.of(65_537, 1, 1).pathsPerBatch()).isEqualTo(4096);
    assertThat(new Sampling(Points.ANTITHETIC, 65_537, 1, 1).pathsPerBatch()).isEqualTo(2050);
  }

  @Test
  void ratesBeyondAllRangeAreRefusedInWords() {
    GaussianRates wild = new HullWhite(-2, VolatilitySteps.constant(3)).on(FlatCurve.of(0.05));
    Claim claim = BackwardInductionTest.bond(60, 2, 5, Party.ISSUER, 10, 59, 100);
    assertThatThrownBy(() -> Simulation.value(claim, wild, Sampling.of(64, 1, 1)))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> Simulation.value(Claim.of(claim.flows()), wild, Sampling.of(64, 1, 1)))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("deviation of at most 3");
  }
}
