package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;

import ebbline.bond.BondYield;
import ebbline.instrument.Bond;
import ebbline.instrument.QuoteTerms;
import ebbline.instrument.YieldTerms;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class LevelBondsTest {

  /** The slow twin: every bond by itself, flow by flow. */
  @Test
  void blocksAgreeWithTheBondByItself() {
    Random random = new Random(5);
    for (int frequency : new int[] {1, 2, 4, 12}) {
      int n = 3000;
      double[] coupon = new double[n];
      double[] redemption = new double[n];
      double[] payments = new double[n];
      double[] toFirst = new double[n];
      double[] dirty = new double[n];
      BondYield[] twins = new BondYield[n];
      double[] yields = new double[n];
      Arrays.fill(redemption, 100);
      for (int i = 0; i < n; i++) {
        double years = (2 + random.nextInt(58)) / (double) frequency;
        double maturity = Math.min(60, years) - random.nextDouble() * 0.99 / frequency;
        double rate = 0.1 * random.nextDouble();
        Bond bond =
            Bond.of(Moment.ofYears(maturity), rate, frequency, DayCount.ACT_ACT_ICMA, 100, 0);
        YieldTerms terms = bond.leg().on(TimeAxis.undated()).yieldTerms();
        if (terms.periodsLeft() < 2) {
          i--;
          continue;
        }
        twins[i] = BondYield.of(terms, QuoteTerms.STANDARD);
        // Every tenth near 0 or negative: the road around the pole.
        yields[i] =
            i % 10 == 0 ? 0.008 * random.nextDouble() - 0.006 : 0.005 + 0.15 * random.nextDouble();
        coupon[i] = 100 * rate / frequency;
        payments[i] = terms.periodsLeft();
        toFirst[i] = terms.periods()[0];
        dirty[i] = twins[i].price(yields[i]);
      }
      LevelBonds.Figures out = new LevelBonds.Figures(n);
      new LevelBonds()
          .measure(
              new LevelBonds.Bonds(frequency, coupon, redemption, payments, toFirst, dirty), out);
      double[] worst = new double[4];
      for (int i = 0; i < n; i++) {
        worst[0] = Math.max(worst[0], Math.abs(out.yield[i] - yields[i]));
        double y = yields[i];
        worst[1] = worse(worst[1], out.modifiedDuration[i], twins[i].modifiedDuration(y));
        worst[2] = worse(worst[2], out.convexity[i], twins[i].convexity(y));
        worst[3] = worse(worst[3], out.dv01[i], twins[i].dv01(y));
      }
      assertThat(worst[0]).as("yield").isLessThan(1e-12);
      assertThat(worst[1]).as("duration").isLessThan(1e-10);
      assertThat(worst[2]).as("convexity").isLessThan(1e-10);
      assertThat(worst[3]).as("dv01").isLessThan(1e-9);
    }
  }

  private static double worse(double before, double found, double expected) {
    return Math.max(before, Math.abs(found / expected - 1));
  }
}
