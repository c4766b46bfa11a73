package ebbline.bond;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import ebbline.instrument.PeriodFlows;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class PeriodYieldTest {
  private static final long SEED = 20240229;
  private static final int BONDS = 10_000;
  private static final List<FirstFraction> RULES = List.of(FirstFraction.values());
  private static final int[] FREQUENCIES = {1, 2, 4, 12};

  private record Sample(PeriodYield bond, PeriodFlows flows, FirstFraction rule, double yield) {}

  private static Sample sample(SplittableRandom random) {
    int f = FREQUENCIES[random.nextInt(4)];
    double[] amounts = new double[1 + random.nextInt(40 * f)];
    Arrays.fill(amounts, random.nextDouble(0, 12) / f);
    amounts[amounts.length - 1] += 100;
    PeriodFlows flows = new PeriodFlows(f, random.nextDouble(0.01, 1), amounts);
    FirstFraction rule = RULES.get(random.nextInt(3));
    return new Sample(new PeriodYield(flows, rule), flows, rule, random.nextDouble(-0.02, 0.15));
  }

  @Test
  void theYieldOfAPriceIsTheYieldItCameFrom() {
    SplittableRandom random = new SplittableRandom(SEED);
    double worst = 0;
    for (int i = 0; i < BONDS; i++) {
      Sample s = sample(random);
      double back = s.bond().yieldOf(s.bond().price(s.yield()));
      // A bond in its last days says little about its yield: a price's last bit is 1e-14 of it.
      double seen = Math.min(1, s.bond().macaulayDuration(s.yield()));
      worst = Math.max(worst, Math.abs(back - s.yield()) * seen);
      assertThat(s.bond().price(back) / s.bond().price(s.yield()) - 1)
          .as("price of bond %d, seed %d", i, SEED)
          .isBetween(-1e-12, 1e-12);
    }
    assertThat(worst).isLessThan(1e-13);
  }

  @Test
  void thePriceFallsWithTheYieldAndBendsUpwards() {
    SplittableRandom random = new SplittableRandom(SEED + 1);
    for (int i = 0; i < BONDS; i++) {
      Sample s = sample(random);
      double low = s.bond().price(s.yield() - 1e-3);
      double middle = s.bond().price(s.yield());
      double high = s.bond().price(s.yield() + 1e-3);
      assertThat(low).isGreaterThan(middle);
      assertThat(middle).isGreaterThan(high);
      assertThat(low + high).isGreaterThan(2 * middle);
    }
  }

  @Test
  void durationAndConvexityAreTheDerivativesOfThePrice() {
    SplittableRandom random = new SplittableRandom(SEED + 2);
    for (int i = 0; i < BONDS; i++) {
      Sample s = sample(random);
      double price = s.bond().price(s.yield());
      double h = 2e-5;
      double slope =
          (8 * (s.bond().price(s.yield() + h) - s.bond().price(s.yield() - h))
                  - (s.bond().price(s.yield() + 2 * h) - s.bond().price(s.yield() - 2 * h)))
              / (12 * h);
      double duration = s.bond().modifiedDuration(s.yield());
      assertThat(duration).isCloseTo(-slope / price, within(1e-7 * Math.max(1, duration)));
      double up = s.bond().price(s.yield() + h) * s.bond().modifiedDuration(s.yield() + h);
      double down = s.bond().price(s.yield() - h) * s.bond().modifiedDuration(s.yield() - h);
      double convexity = s.bond().convexity(s.yield());
      assertThat(convexity)
          .isCloseTo((down - up) / (2 * h) / price, within(1e-6 * Math.max(1, convexity)));
    }
  }

  @Test
  void theFlowsOfABondAreWorthAsMuchAsTheBond() {
    SplittableRandom random = new SplittableRandom(SEED + 3);
    for (int i = 0; i < 1000; i++) {
      Sample s = sample(random);
      if (s.rule() == FirstFraction.STREET && s.flows().size() == 1) {
        continue; // the last period alone has its own rule
      }
      FirstFraction rule = s.rule() == FirstFraction.STREET ? FirstFraction.COMPOUND : s.rule();
      double sum = 0;
      for (int k = 0; k < s.flows().size(); k++) {
        double[] amounts = new double[k + 1];
        amounts[k] = s.flows().amount(k);
        PeriodFlows part = new PeriodFlows(s.flows().frequency(), s.flows().toFirst(), amounts);
        sum += new PeriodYield(part, rule).price(s.yield());
      }
      assertThat(sum / s.bond().price(s.yield()) - 1).isBetween(-1e-12, 1e-12);
    }
  }

  @Test
  void whatNoYieldCanGiveIsSaidInWords() {
    PeriodYield bond =
        new PeriodYield(new PeriodFlows(2, 0.5, new double[] {2, 102}), FirstFraction.STREET);
    assertThatThrownBy(() -> bond.yieldOf(0)).hasMessageContaining("no yield gives");
    assertThatThrownBy(() -> bond.yieldOf(Double.NaN)).hasMessageContaining("no yield gives");
    assertThatThrownBy(() -> bond.price(-2)).hasMessageContaining("must be above -2.0");
    assertThat(bond.price(-1.99)).isPositive().isFinite();
    PeriodYield mixed =
        new PeriodYield(new PeriodFlows(2, 0.5, new double[] {-2, 102}), FirstFraction.STREET);
    assertThatThrownBy(() -> mixed.yieldOf(95)).hasMessageContaining("several yields");
  }

  private static org.assertj.core.data.Offset<Double> within(double tolerance) {
    return org.assertj.core.api.Assertions.within(tolerance);
  }
}
