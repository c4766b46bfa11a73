package ebbline.pricing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import ebbline.model.GaussLegendre;
import ebbline.model.StandardNormal;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class KinkedPolynomialTest {
  private static final KinkedPolynomial FUNCTION =
      new KinkedPolynomial(
          new double[] {1, -2, 0.5, 0.1, -0.02},
          new double[] {0.3, -1},
          new double[][] {{1, 0.4, -0.1}, {-0.7, 0.2, 0.05, 0.01}});

  private static double at(double u) {
    double[] out = new double[1];
    FUNCTION.at(new double[] {u}, out, 1);
    return out[0];
  }

  private static double inside(double z) {
    return Math.min(12, Math.max(-12, z));
  }

  @Test
  void itsValueIsTheSumOfItsTerms() {
    assertThat(at(-2)).isCloseTo(1 + 4 + 2 - 0.8 - 0.32, within(1e-14));
    double right = 1 - 2 + 0.5 + 0.1 - 0.02 + 0.7 + 0.4 * 0.49 - 0.1 * 0.343;
    assertThat(at(1)).isCloseTo(right - 1.4 + 0.8 + 0.4 + 0.16, within(1e-14));
  }

  @Test
  void itsExpectationMatchesQuadrature() {
    SplittableRandom random = new SplittableRandom(8);
    GaussLegendre rule = GaussLegendre.of(40);
    double[] out = new double[1];
    for (int i = 0; i < 200; i++) {
      double u = random.nextDouble(-4, 4);
      double decay = random.nextDouble(-1, 1);
      double s = i % 10 == 0 ? 0 : random.nextDouble(1e-3, 2);
      FUNCTION.new Smoothed(decay, s).at(new double[] {u}, out, 1);
      double wanted = 0;
      if (s == 0) {
        wanted = at(decay * u);
      } else {
        double[] cuts = {-12, inside((-1 - decay * u) / s), inside((0.3 - decay * u) / s), 12};
        for (int c = 0; c < 3; c++) {
          for (int p = 0; p < 8; p++) {
            double width = (cuts[c + 1] - cuts[c]) / 8;
            wanted +=
                rule.integrate(
                    z -> at(decay * u + s * z) * StandardNormal.density(z),
                    cuts[c] + p * width,
                    cuts[c] + (p + 1) * width);
          }
        }
      }
      assertThat(out[0]).as("seed 8, case %s", i).isCloseTo(wanted, within(1e-11));
    }
  }
}
