package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class TreeBoundTest {

  @Test
  void theTreesErrorBoundHoldsAgainstBackwardInduction() {
    SplittableRandom random = new SplittableRandom(77);
    int priced = 0;
    double worst = 0;
    for (int i = 0; priced < 150; i++) {
      RandomRights drawn = RandomRights.draw(random, i % 3, 14);
      if (drawn.claim().rights().isEmpty() || !drawn.rates().volatility().isConstant()) {
        continue;
      }
      Valuation tree;
      try {
        tree = TrinomialPricing.value(drawn.claim(), drawn.rates(), 96);
      } catch (IllegalArgumentException e) {
        continue;
      }
      priced++;
      Valuation main = BackwardInduction.value(drawn.claim(), drawn.rates());
      double off = Math.abs(tree.presentValue() - main.presentValue());
      double ratio = off / (tree.errorBound() + main.errorBound());
      assertThat(ratio).as("seed 77, case %s", i).isLessThanOrEqualTo(1);
      worst = Math.max(worst, ratio);
    }
    // A bound far above every error would hold too and say nothing.
    assertThat(worst).isGreaterThan(0.2);
  }
}
