package ebbline.pricing.simulation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import ebbline.model.StandardNormal;
import org.apache.commons.math3.random.SobolSequenceGenerator;
import org.junit.jupiter.api.Test;

class PointsTest {

  private static double quantile(double p) {
    double[] out = new double[1];
    NormalQuantile.at(new double[] {p - 0.5}, out, 1);
    return out[0];
  }

  @Test
  void theQuantileInvertsTheDistributionFunction() {
    double worst = 0;
    for (int i = 1; i < 20_000; i++) {
      // Multiples of 2^-53, as points have them: ½ less of them is exact.
      double p =
          Math.rint((i < 10_000 ? Math.pow(10, -i / 700.0) : i / 20_000.0) * 0x1p53) * 0x1p-53;
      double x = quantile(p);
      // An error of dx in x moves the probability by the density times dx.
      double error = (StandardNormal.cdf(x) - p) / StandardNormal.density(x);
      worst = Math.max(worst, Math.abs(error) / Math.max(1, Math.abs(x)));
    }
    assertThat(worst).isBetween(1e-17, 2e-15);
    assertThat(quantile(0.5)).isZero();
    assertThat(quantile(0x1p-53)).isEqualTo(-quantile(1 - 0x1p-53));
    assertThat(StandardNormal.cdf(quantile(0x1p-53)) / 0x1p-53).isCloseTo(1, within(1e-13));
  }

  @Test
  void directionNumbersReproduceTheLibrarysPoints() {
    SobolPoints points = new SobolPoints(40);
    SobolSequenceGenerator generator = new SobolSequenceGenerator(40);
    for (int i = 0; i < 3000; i++) {
      double[] wanted = generator.nextVector();
      for (int d = 0; d < 40; d++) {
        assertThat(points.digits(d, i) * 0x1p-52).isEqualTo(wanted[d]);
      }
    }
  }

  @Test
  void aScrambledSetHasOnePointInEachDyadicInterval() {
    SobolPoints points = new SobolPoints(6).scrambled(7);
    double[] normals = new double[1024];
    for (int d = 0; d < 6; d++) {
      points.normals(d, 0, SobolPoints.shift(11, d), normals, new double[1024], 1024);
      boolean[] hit = new boolean[1024];
      for (double z : normals) {
        int cell = (int) Math.floor(StandardNormal.cdf(z) * 1024);
        assertThat(hit[cell]).isFalse();
        hit[cell] = true;
      }
    }
  }

  @Test
  void pointsDoNotDependOnWhereAChunkBegins() {
    SobolPoints points = new SobolPoints(3).scrambled(1);
    double[] all = new double[100];
    double[] part = new double[63];
    points.normals(2, 0, 5, all, new double[100], 100);
    points.normals(2, 37, 5, part, new double[63], 63);
    for (int i = 0; i < 63; i++) {
      assertThat(part[i]).isEqualTo(all[37 + i]);
    }
  }

  @Test
  void theBridgeKeepsIndependentNormals() {
    for (int steps : new int[] {1, 2, 3, 7, 50}) {
      BridgeOrder order = new BridgeOrder(steps);
      double[][] rows = new double[steps][steps];
      for (int i = 0; i < steps; i++) {
        rows[i][i] = 1; // column i is the image of the i-th unit vector
      }
      order.inTime(rows, new double[steps + 1][steps], steps);
      for (int a = 0; a < steps; a++) {
        for (int b = 0; b < steps; b++) {
          double product = 0;
          for (int i = 0; i < steps; i++) {
            product += rows[a][i] * rows[b][i];
          }
          assertThat(product).isCloseTo(a == b ? 1 : 0, within(1e-13));
        }
      }
    }
  }

  @Test
  void zigguratNormalsFollowTheNormalLaw() {
    int n = 4_000_000;
    double[] z = new double[n];
    new Ziggurat(20, 3).fill(z, n);
    int cells = 200;
    long[] counts = new long[cells];
    double[] moments = new double[5];
    long far = 0;
    for (double x : z) {
      counts[Math.min(cells - 1, (int) (StandardNormal.cdf(x) * cells))]++;
      double power = 1;
      for (int k = 1; k < 5; k++) {
        power *= x;
        moments[k] += power / n;
      }
      far += Math.abs(x) > 3.654152885361009 ? 1 : 0;
    }
    double chi = 0;
    for (long count : counts) {
      double off = count - (double) n / cells;
      chi += off * off / ((double) n / cells);
    }
    // χ² with 199 degrees has mean 199 and deviation 20.
    assertThat(chi).isBetween(120.0, 280.0);
    double root = Math.sqrt(n);
    assertThat(moments[1]).isCloseTo(0, within(4 / root));
    assertThat(moments[2]).isCloseTo(1, within(4 * Math.sqrt(2) / root));
    assertThat(moments[3]).isCloseTo(0, within(4 * Math.sqrt(15) / root));
    assertThat(moments[4]).isCloseTo(3, within(4 * Math.sqrt(96) / root));
    double beyond = 2 * n * StandardNormal.upper(3.654152885361009);
    assertThat((double) far).isCloseTo(beyond, within(4 * Math.sqrt(beyond)));
  }

  @Test
  void aStreamDoesNotDependOnTheBlocksItIsDrawnIn() {
    double[] whole = new double[5000];
    new Ziggurat(1, 2).fill(whole, 5000);
    Ziggurat again = new Ziggurat(1, 2);
    double[] part = new double[500];
    for (int i = 0; i < 10; i++) {
      again.fill(part, 500);
      for (int k = 0; k < 500; k++) {
        assertThat(part[k]).isEqualTo(whole[500 * i + k]);
      }
    }
  }
}
