package ebbline.pricing;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.StandardNormal;
import java.util.Arrays;

/**
 * What one right is worth to its owner: E[max(0, X)], X = Σ wᵢ exp(−bᵢ z − bᵢ²/2), z standard
 * normal.
 *
 * <p>Under the forward measure of the decision S the state x(S) has mean 0 and variance y(S), so
 * with z = x(S)/√y(S) a flow of c at T is worth c P(0,T) exp(−bz − b²/2) times 1/P(0,S), b = √y(S)
 * G(T − S). Jamshidian 1989, J. Finance 44(1), is the case of one root.
 */
final class ExerciseValue {
  /** Beyond this many deviations a normal density is below the smallest double. */
  private static final double REACH = 39;

  private static final double LARGEST_SHIFT = 1e150; // its square must be finite

  private static final double ROUNDING = Math.ulp(1.0);

  private final double[] worth;
  private final double[] shifts;
  private final double[] logs;
  private final int count;

  private double value;
  private double bound;
  private double[] edges = {};

  private ExerciseValue(double[] worth, double[] shifts, double[] logs, int count) {
    this.worth = worth;
    this.shifts = shifts;
    this.logs = logs;
    this.count = count;
  }

  /** What the owner of a right gets less what he gives up, seen from him. */
  static CashFlows exchanged(Claim claim, Right right) {
    CashFlows taken = right.received().plus(claim.flows().after(right.keptUntil()).times(-1));
    return right.party() == Right.Party.HOLDER ? taken : taken.times(-1);
  }

  static ExerciseValue of(CashFlows exchanged, double decision, GaussianRates rates) {
    int n = exchanged.size();
    double deviation = Math.sqrt(rates.variance(decision));
    double[][] flows = new double[n][];
    for (int i = 0; i < n; i++) {
      double t = exchanged.time(i);
      flows[i] =
          new double[] {
            deviation * rates.g(Math.max(0, t - decision)),
            exchanged.amount(i) * rates.curve().discount(t),
            Math.abs(rates.curve().logDiscount(t))
          };
    }
    Arrays.sort(flows, (f, g) -> Double.compare(f[0], g[0]));
    double[] worth = new double[n];
    double[] shifts = new double[n];
    double[] logs = new double[n];
    int count = 0;
    for (double[] flow : flows) {
      // A bond that is worth more than any double would leave the sums without an answer.
      if (!(flow[0] < LARGEST_SHIFT && Double.isFinite(flow[1]))) {
        throw new IllegalArgumentException(
            "under these parameters a flow is worth more than can be counted; they are too extreme");
      }
      boolean same = count > 0 && shifts[count - 1] == flow[0];
      int k = same ? count - 1 : count++;
      shifts[k] = flow[0];
      worth[k] += flow[1];
      logs[k] = Math.max(logs[k], flow[2]);
      if (worth[k] == 0) {
        count--;
      }
    }
    ExerciseValue result = new ExerciseValue(worth, shifts, logs, count);
    result.integrate();
    return result;
  }

  double value() {
    return value;
  }

  /** Bound of the rounding error, at least 0. */
  double bound() {
    return bound;
  }

  private void integrate() {
    if (count == 0) {
      return;
    }
    double[] halfSquares = new double[count];
    for (int i = 0; i < count; i++) {
      halfSquares[i] = -0.5 * shifts[i] * shifts[i];
    }
    ExponentialSum sum =
        ExponentialSum.of(Arrays.copyOf(worth, count), halfSquares, Arrays.copyOf(shifts, count));
    double low = -REACH - shifts[count - 1];
    double[] roots = sum.roots(low, REACH);
    double from = Double.NEGATIVE_INFINITY;
    for (int r = 0; r <= roots.length; r++) {
      double to = r < roots.length ? roots[r] : Double.POSITIVE_INFINITY;
      double inside = 0.5 * (Math.max(from, low) + Math.min(to, REACH));
      if (sum.logRatio(inside) > 0) {
        add(from, to);
        edges = Arrays.copyOf(edges, edges.length + 2);
        edges[edges.length - 2] = from;
        edges[edges.length - 1] = to;
      }
      from = to;
    }
    value = Math.max(0, value);
  }

  /** Probability of exercise under the measure of a flow with this shift. */
  double probability(double shift) {
    double sum = 0;
    for (int i = 0; i < edges.length; i += 2) {
      sum += StandardNormal.between(edges[i] + shift, edges[i + 1] + shift);
    }
    return sum;
  }

  /**
   * Its derivative in the shift at fixed boundaries; there X is 0, so they add nothing to the
   * derivative of the value.
   */
  double density(double shift) {
    double sum = 0;
    for (int i = 0; i < edges.length; i += 2) {
      sum += density(edges[i + 1], shift) - density(edges[i], shift);
    }
    return sum;
  }

  private static double density(double edge, double shift) {
    return Double.isInfinite(edge) ? 0 : StandardNormal.density(edge + shift);
  }

  /** E[X; from < z < to]: each flow shifts the normal law by its b. */
  private void add(double from, double to) {
    for (int i = 0; i < count; i++) {
      double a = from + shifts[i];
      double b = to + shifts[i];
      double probability = StandardNormal.between(a, b);
      value = Math.fma(worth[i], probability, value);
      // Discount factor and probability to a few units; the rounding of z + b and of b itself
      // through the density.
      double moved = edge(a, shifts[i]) + edge(b, shifts[i]);
      double larger = a > 0 ? StandardNormal.upper(a) : StandardNormal.cdf(b);
      bound +=
          ROUNDING
              * (Math.abs(worth[i]) * ((2 + 2 * logs[i]) * probability + 4 * larger + moved)
                  + 0.5 * Math.abs(value));
    }
  }

  private static double edge(double at, double shift) {
    return Double.isInfinite(at) ? 0 : StandardNormal.density(at) * (4 * shift + Math.abs(at));
  }
}
