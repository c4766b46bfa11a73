package ebbline.pricing;

/** One bond of {@link LevelBonds} summed over its flows: right at every yield, also near 0. */
final class FlowByFlow {
  private static final int MOST_STEPS = 100;
  private static final double BASIS_POINT = 1e-4;

  private FlowByFlow() {}

  static void measure(LevelBonds.Bonds bonds, LevelBonds.Figures out, int i) {
    double f = bonds.frequency;
    double dirty = bonds.dirty[i];
    double[] at = new double[3];
    double u = 0.01;
    double low = -1;
    double high = Double.POSITIVE_INFINITY;
    for (int step = 0; step < MOST_STEPS; step++) {
      price(bonds, i, u, at);
      if (at[0] > dirty) {
        low = u;
      } else {
        high = u;
      }
      double next = u - Math.log(at[0] / dirty) * at[0] / at[1];
      if (!(next > low && next < high)) {
        next = Double.isInfinite(high) ? 2 * Math.abs(u) + 1 : 0.5 * (low + high);
      }
      boolean done = Math.abs(next - u) <= 1e-16 + 1e-15 * Math.abs(u);
      u = next;
      if (done) {
        break;
      }
    }
    price(bonds, i, u, at);
    out.yield[i] = f * u;
    out.modifiedDuration[i] = -at[1] / (f * at[0]);
    out.convexity[i] = at[2] / (f * f * at[0]);
    price(bonds, i, u - BASIS_POINT / f, at);
    double up = at[0];
    price(bonds, i, u + BASIS_POINT / f, at);
    out.dv01[i] = 0.5 * (up - at[0]);
  }

  /** Price and two derivatives in u, by Horner's rule in v = 1/(1 + u). */
  private static void price(LevelBonds.Bonds bonds, int i, double u, double[] at) {
    double v = 1 / (1 + u);
    double c = bonds.coupon[i];
    double w = bonds.toFirst[i];
    double s0 = c + bonds.redemption[i];
    double s1 = 0;
    double s2 = 0;
    for (int k = (int) bonds.payments[i] - 1; k > 0; k--) {
      s2 = s2 * v + 2 * s1;
      s1 = s1 * v + s0;
      s0 = s0 * v + c;
    }
    double g = Math.exp(w * Math.log(v));
    double g1 = w * g / v;
    double g2 = (w - 1) * g1 / v;
    double p1 = g * s1 + g1 * s0;
    double p2 = g * s2 + 2 * g1 * s1 + g2 * s0;
    at[0] = g * s0;
    at[1] = -p1 * v * v;
    at[2] = v * v * v * (p2 * v + 2 * p1);
  }
}
