package ebbline.pricing;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Optionlet;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.pricing.simulation.Sampling;
import ebbline.pricing.simulation.StatePaths;
import java.util.List;

/**
 * Claims by simulation: exact joint steps of the state and its integral under the risk-neutral
 * measure, on decision or flow times only, so that chance is the only error.
 *
 * <p>Flows without rights are discounted along each path. Rights are valued between two estimates,
 * see {@link SimulatedBounds}; the flows beneath them are discounted on the curve.
 */
public final class Simulation {
  /** Paths where the user names none. */
  public static final int PATHS = 65_536;

  private static final double ROUNDING = 1e-13;

  /**
   * Of the flows' worth: what rights bring on paths so rare that none was drawn, and the standard
   * error says nothing of; 6e-10 was seen.
   */
  private static final double UNSEEN = 2e-9;

  /**
   * Deviation of a discount factor's logarithm beyond which its mean lives on paths that no run
   * meets: at 3 a single path's variance is e⁹ times its squared mean.
   */
  private static final double MOST_DEVIATION = 3;

  private Simulation() {}

  /**
   * The value. The error bound is one standard error; with rights, half the distance of the two
   * estimates is added to it. Not a bound in the strict sense: chance exceeds one standard error in
   * a third of all runs.
   *
   * @throws IllegalArgumentException if the discount factor varies too much for any number of paths
   */
  public static Valuation value(Claim claim, GaussianRates rates, Sampling sampling) {
    if (!claim.optionlets().isEmpty()) {
      return withOptionlets(claim, rates, sampling);
    }
    if (claim.rights().isEmpty()) {
      Estimate flows = flows(claim.flows(), rates, sampling);
      return new Valuation(
          flows.mean(),
          Method.SIMULATION,
          flows.standardError() + ROUNDING * size(claim.flows(), rates));
    }
    Valuation flows = Discounting.value(claim.flows(), rates.curve());
    SimulatedBounds rights = rights(claim, rates, sampling);
    double size = size(claim.flows(), rates);
    for (Right right : claim.rights()) {
      size = Math.max(size, size(right.received(), rates));
    }
    return new Valuation(
        flows.presentValue() + rights.middle().mean(),
        Method.SIMULATION,
        rights.middle().standardError() + rights.halfGap() + UNSEEN * size);
  }

  private static Valuation withOptionlets(Claim claim, GaussianRates rates, Sampling sampling) {
    if (!claim.rights().isEmpty()) {
      throw new IllegalArgumentException(
          "options on single rates beside other rights are not simulated");
    }
    SimulatedOptionlets optionlets = new SimulatedOptionlets(claim.optionlets(), rates);
    double[][] batches =
        paths(rates, optionlets.times()).sums(sampling, 1, () -> optionlets.new Paths());
    Estimate found = estimate(batches, 0, sampling);
    Valuation flows = Discounting.value(claim.flows(), rates.curve());
    double size = size(claim.flows(), rates);
    for (Optionlet each : claim.optionlets()) {
      size += size(each.exchanged(), rates);
    }
    return new Valuation(
        flows.presentValue() + found.mean(),
        Method.SIMULATION,
        found.standardError() + UNSEEN * size);
  }

  /** Low and high estimates of a claim with rights, its flows included. */
  public static SimulatedBounds bounds(Claim claim, GaussianRates rates, Sampling sampling) {
    double flows = Discounting.value(claim.flows(), rates.curve()).presentValue();
    SimulatedBounds found = rights(claim, rates, sampling);
    return new SimulatedBounds(
        found.low().plus(flows), found.high().plus(flows), found.middle().plus(flows));
  }

  private static SimulatedBounds rights(Claim claim, GaussianRates rates, Sampling sampling) {
    return rights(claim, rates, sampling, ExercisePlan.of(claim, rates));
  }

  /** What the rights bring the holder, by a given plan. */
  static SimulatedBounds rights(
      Claim claim, GaussianRates rates, Sampling sampling, ExercisePlan plan) {
    List<Right> rights = claim.rights();
    double[] times = new double[rights.size()];
    for (int k = 0; k < times.length; k++) {
      times[k] = rights.get(k).decision();
    }
    double[][] batches = StatePaths.of(rates, times).sums(sampling, 3, () -> plan.new Paths());
    return new SimulatedBounds(
        estimate(batches, 0, sampling),
        estimate(batches, 1, sampling),
        estimate(batches, 2, sampling));
  }

  /** Flows, each discounted by the path's own rates. */
  static Estimate flows(CashFlows flows, GaussianRates rates, Sampling sampling) {
    int n = flows.size();
    double[] times = new double[n];
    double[] worth = new double[n];
    double certain = 0;
    int count = 0;
    for (int i = 0; i < n; i++) {
      double value = flows.amount(i) * rates.curve().discount(flows.time(i));
      if (!(flows.time(i) > 0)) {
        certain += value;
      } else if (count > 0 && times[count - 1] == flows.time(i)) {
        worth[count - 1] += value;
      } else {
        times[count] = flows.time(i);
        worth[count++] = value;
      }
    }
    double[] at = java.util.Arrays.copyOf(times, count);
    double[][] batches = paths(rates, at).sums(sampling, 1, () -> new DiscountedFlows(worth));
    return estimate(batches, 0, sampling).plus(certain);
  }

  private static StatePaths paths(GaussianRates rates, double[] times) {
    double last = times.length == 0 ? 0 : times[times.length - 1];
    double deviation = Math.sqrt(rates.integralVariance(0, last));
    if (deviation <= MOST_DEVIATION) {
      return StatePaths.of(rates, times);
    }
    throw new IllegalArgumentException(
        "a simulation needs a discount factor whose logarithm has a deviation of at most "
            + (int) MOST_DEVIATION
            + "; lower the volatility, found "
            + (float) deviation
            + " at time "
            + (float) last);
  }

  private static Estimate estimate(double[][] batches, int column, Sampling sampling) {
    double[] sums = new double[batches.length];
    for (int b = 0; b < sums.length; b++) {
      sums[b] = batches[b][column];
    }
    return Estimate.of(sums, sampling.pathsPerBatch());
  }

  private static double size(CashFlows flows, GaussianRates rates) {
    double sum = 0;
    for (int i = 0; i < flows.size(); i++) {
      sum += Math.abs(flows.amount(i)) * rates.curve().discount(flows.time(i));
    }
    return sum;
  }

  /** Σ c P(0,t) e^(−∫x). */
  private static final class DiscountedFlows implements StatePaths.Work {
    private final double[] worth;
    private final double[] factor = new double[StatePaths.BLOCK];
    private final double[] total = new double[StatePaths.BLOCK];

    DiscountedFlows(double[] worth) {
      this.worth = worth;
    }

    @Override
    public void add(double[][] x, double[][] integral, int n, double[] sums) {
      java.util.Arrays.fill(total, 0, n, 0);
      for (int k = 0; k < integral.length; k++) {
        for (int i = 0; i < n; i++) {
          factor[i] = -integral[k][i];
        }
        FastExp.exp(factor, factor, n);
        double amount = worth[k];
        for (int i = 0; i < n; i++) {
          total[i] = Math.fma(amount, factor[i], total[i]);
        }
      }
      for (int i = 0; i < n; i++) {
        sums[0] += total[i];
      }
    }
  }
}
