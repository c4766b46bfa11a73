package ebbline.pricing;

import ebbline.model.GaussianRates;
import java.util.Arrays;

/**
 * Present values of flows as functions of the state of a decision date: Σ wᵢ exp(−bᵢ u − bᵢ²/2), u
 * standard normal under the forward measure of the last decision.
 *
 * <p>Immutable.
 */
final class DeflatedFlows {
  /*
   * Deflated by the bond of the last decision T*, a flow at T is a martingale driven by z: seen from t it is
   * P(0,T)/P(0,T*) exp(−bu − b²/2), where b = √y(t) (G(T − t) − G(T* − t)). The constant P(0,T*) is left out, so
   * that expectations are present values.
   */
  private static final int RESTART = 128;

  private final double[] times;
  private final double[] worth;

  private DeflatedFlows(double[] times, double[] worth) {
    this.times = times;
    this.worth = worth;
  }

  /**
   * @param times years from today
   * @param worth present values
   */
  static DeflatedFlows of(double[] times, double[] worth) {
    return new DeflatedFlows(times, worth);
  }

  /** Both sums, the other one negative where {@code sign} is −1. */
  DeflatedFlows plus(DeflatedFlows other, int sign) {
    int n = times.length;
    double[] t = Arrays.copyOf(times, n + other.times.length);
    double[] w = Arrays.copyOf(worth, t.length);
    for (int i = 0; i < other.times.length; i++) {
      t[n + i] = other.times[i];
      w[n + i] = sign * other.worth[i];
    }
    return new DeflatedFlows(t, w);
  }

  /** The present value. */
  double total() {
    double sum = 0;
    for (double w : worth) {
      sum += w;
    }
    return sum;
  }

  /** b of a flow at {@code time} seen from {@code date}. */
  static double loading(
      GaussianRates rates, double deviation, double date, double horizon, double time) {
    double t = Math.max(time, date);
    return t >= horizon
        ? deviation * Math.exp(-rates.meanReversion() * (horizon - date)) * rates.g(t - horizon)
        : -deviation * Math.exp(-rates.meanReversion() * (t - date)) * rates.g(horizon - t);
  }

  /** The function of the state at a date. */
  Seen from(GaussianRates rates, double deviation, double date, double horizon) {
    double[] loadings = new double[times.length];
    double[] factors = new double[times.length];
    for (int i = 0; i < times.length; i++) {
      double b = loading(rates, deviation, date, horizon, times[i]);
      loadings[i] = b;
      factors[i] = worth[i] * Math.exp(-0.5 * b * b);
    }
    return new Seen(loadings, factors);
  }

  /** Flows seen from one date. */
  static final class Seen {
    private final double[] loadings;
    private final double[] factors;

    private Seen(double[] loadings, double[] factors) {
      this.loadings = loadings;
      this.factors = factors;
    }

    double at(double u) {
      double sum = 0;
      for (int i = 0; i < loadings.length; i++) {
        sum += factors[i] * Math.exp(-loadings[i] * u);
      }
      return sum;
    }

    /** Adds the values at {@code from + k step} to {@code out[k]}. */
    void addTo(double[] out, int count, double from, double step) {
      for (int i = 0; i < loadings.length; i++) {
        // A fresh exponential now and then keeps the products' rounding to a few units; four of
        // them run at once.
        double ratio = Math.exp(-loadings[i] * step);
        double square = ratio * ratio;
        double fourth = square * square;
        for (int start = 0; start < count; start += RESTART) {
          double a = factors[i] * Math.exp(-loadings[i] * (from + start * step));
          double b = a * ratio;
          double c = a * square;
          double d = b * square;
          int end = Math.min(count, start + RESTART);
          int k = start;
          for (; k + 4 <= end; k += 4) {
            out[k] += a;
            out[k + 1] += b;
            out[k + 2] += c;
            out[k + 3] += d;
            a *= fourth;
            b *= fourth;
            c *= fourth;
            d *= fourth;
          }
          for (; k < end; k++) {
            out[k] += a;
            a *= ratio;
          }
        }
      }
    }
  }
}
