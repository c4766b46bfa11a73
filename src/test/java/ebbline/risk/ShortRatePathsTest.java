package ebbline.risk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.curve.FlatCurve;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.NormalLaw;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import java.util.List;
import org.junit.jupiter.api.Test;

class ShortRatePathsTest {
  private static final Vasicek MODEL = new Vasicek(0.041, 0.028, 0.35, 0.011);
  private static final double[] TIMES = {0.25, 1, 5, 30};

  private static GaussianRates stepped() {
    return new HullWhite(
            0.1, VolatilitySteps.of(new double[] {0.6, 2}, new double[] {0.008, 0.02, 0.005}))
        .on(FlatCurve.of(0.03));
  }

  @Test
  void theLawOfVasicekIsItsOwnFormula() {
    List<HorizonLaw> laws = HorizonLaw.of(MODEL.rates(), TIMES);
    for (int k = 0; k < TIMES.length; k++) {
      NormalLaw exact = MODEL.after(TIMES[k], MODEL.shortRate());
      assertThat(laws.get(k).law().mean()).isCloseTo(exact.mean(), within(1e-16));
      assertThat(laws.get(k).law().standardDeviation())
          .isCloseTo(exact.standardDeviation(), within(1e-16));
    }
  }

  @Test
  void quantilesAndTheShareOfNegativeRatesBelongToTheNormalLaw() {
    Distribution law = new HorizonLaw(1, new NormalLaw(0.01, 0.02)).distribution();
    // Φ⁻¹(0.99), Φ⁻¹(0.95) and Φ(−1/2) from tables of the normal law.
    assertThat(law.p01()).isCloseTo(0.01 - 0.02 * 2.326347874, within(1e-11));
    assertThat(law.p05()).isCloseTo(0.01 - 0.02 * 1.644853627, within(1e-11));
    assertThat(law.p50()).isEqualTo(0.01);
    assertThat(law.p95()).isCloseTo(0.01 + 0.02 * 1.644853627, within(1e-11));
    assertThat(law.p99()).isCloseTo(0.01 + 0.02 * 2.326347874, within(1e-11));
    assertThat(law.probabilityBelowZero()).isCloseTo(0.3085375387, within(1e-10));
  }

  @Test
  void pathsFollowTheExactLawAtEveryTime() {
    for (GaussianRates rates : List.of(MODEL.rates(), stepped())) {
      ShortRatePaths paths = ShortRatePaths.draw(rates, TIMES, 200_000, 11, 2);
      for (int k = 0; k < TIMES.length; k++) {
        SampleLaw sample = paths.sample(k);
        double sd = paths.laws().get(k).law().standardDeviation();
        // One sample in a thousand lies farther off than 1.95/√n (Kolmogorov's law).
        assertThat(sample.distance()).isLessThan(1.95 / Math.sqrt(200_000));
        assertThat(sample.meanError()).isCloseTo(sd / Math.sqrt(200_000), within(0.01 * sd));
        assertThat(sample.distribution().p05())
            .isCloseTo(paths.laws().get(k).distribution().p05(), within(0.02 * sd));
      }
    }
  }

  @Test
  void twoTimesOfAPathHangTogetherAsTheReversionSays() {
    ShortRatePaths paths = ShortRatePaths.draw(MODEL.rates(), new double[] {1, 3}, 200_000, 5, 2);
    double cross = 0;
    NormalLaw first = paths.laws().get(0).law();
    NormalLaw second = paths.laws().get(1).law();
    for (int i = 0; i < paths.count(); i++) {
      cross += (paths.rate(i, 0) - first.mean()) * (paths.rate(i, 1) - second.mean());
    }
    double correlation =
        cross / paths.count() / (first.standardDeviation() * second.standardDeviation());
    double exact = Math.exp(-0.7) * first.standardDeviation() / second.standardDeviation();
    assertThat(correlation).isCloseTo(exact, within(0.01));
  }

  @Test
  void theNumberOfThreadsChangesNoBit() {
    ShortRatePaths one = ShortRatePaths.draw(stepped(), TIMES, 5_000, 42, 1);
    for (int threads : new int[] {2, 3, 8}) {
      ShortRatePaths other = ShortRatePaths.draw(stepped(), TIMES, 5_000, 42, threads);
      for (int k = 0; k < TIMES.length; k++) {
        for (int i = 0; i < 5_000; i++) {
          assertThat(other.rate(i, k)).isEqualTo(one.rate(i, k));
        }
      }
    }
    assertThat(ShortRatePaths.draw(stepped(), TIMES, 5_000, 43, 1).rate(0, 0))
        .isNotEqualTo(one.rate(0, 0));
  }

  @Test
  void nothingRandomIsLeftWithoutVolatilityOrTime() {
    Vasicek still = new Vasicek(0.04, 0.02, 0.5, 0);
    ShortRatePaths paths = ShortRatePaths.draw(still.rates(), new double[] {0, 2}, 100, 1, 1);
    assertThat(paths.rate(7, 0)).isEqualTo(0.04);
    assertThat(paths.sample(1).distribution().sd()).isZero();
    assertThat(paths.laws().get(1).distribution().p99())
        .isCloseTo(0.02 + 0.02 * Math.exp(-1), within(1e-16));
  }

  @Test
  void whatCannotBeDrawnIsSaidInWords() {
    GaussianRates away = new Vasicek(0.04, 0.02, -5, 0.01).rates();
    assertThatThrownBy(() -> HorizonLaw.of(away, new double[] {900}))
        .hasMessageContaining("runs away");
    assertThatThrownBy(() -> HorizonLaw.of(MODEL.rates(), new double[] {-1}))
        .hasMessageContaining("not before today");
    assertThatThrownBy(() -> HorizonLaw.of(MODEL.rates(), new double[] {Double.NaN}))
        .hasMessageContaining("not before today");
    assertThatThrownBy(() -> ShortRatePaths.draw(MODEL.rates(), TIMES, 99, 1, 1))
        .hasMessageContaining("at least 100");
    assertThatThrownBy(() -> ShortRatePaths.draw(MODEL.rates(), TIMES, 6_000_000, 1, 1))
        .hasMessageContaining("at most 20000000");
    assertThatThrownBy(() -> ShortRatePaths.draw(MODEL.rates(), new double[] {1, 1}, 100, 1, 1))
        .hasMessageContaining("must increase");
  }
}
