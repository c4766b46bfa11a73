package ebbline.pricing;

import ebbline.instrument.Optionlet;
import ebbline.instrument.RateBasis;
import ebbline.model.GaussianRates;
import ebbline.pricing.simulation.StatePaths;
import java.util.Arrays;
import java.util.List;

/**
 * Options on single rates along paths: the rate fixed in advance from the bond at its start, the
 * one in arrears from the interest that the path itself has compounded.
 *
 * <p>Immutable; workers are made for each thread.
 */
final class SimulatedOptionlets {
  private final double[] times;
  private final List<Optionlet> optionlets;
  private final GaussianRates rates;

  SimulatedOptionlets(List<Optionlet> optionlets, GaussianRates rates) {
    this.optionlets = optionlets;
    this.rates = rates;
    times =
        optionlets.stream()
            .flatMapToDouble(o -> java.util.stream.DoubleStream.of(o.start(), o.end()))
            .sorted()
            .distinct()
            .toArray();
  }

  /** Starts and ends, in order. */
  double[] times() {
    return times.clone();
  }

  /** The sum of one block. */
  final class Paths implements StatePaths.Work {
    @Override
    public void add(double[][] x, double[][] integral, int n, double[] sums) {
      for (Optionlet each : optionlets) {
        int start = Arrays.binarySearch(times, each.start());
        int end = Arrays.binarySearch(times, each.end());
        double discount = rates.curve().discount(each.end());
        double bond = rates.logBond(each.start(), each.end(), 0);
        double g = rates.g(each.end() - each.start());
        double certain =
            rates.curve().logDiscount(each.start()) - rates.curve().logDiscount(each.end());
        double sign = each.option().sign();
        double strike = each.strikeGrowth();
        boolean arrears = each.basis() == RateBasis.BACKWARD;
        double total = 0;
        for (int i = 0; i < n; i++) {
          double log =
              arrears ? certain + integral[end][i] - integral[start][i] : g * x[start][i] - bond;
          double gain = sign * (each.growthOver() * Math.exp(log) - strike);
          total += gain > 0 ? gain * Math.exp(-integral[end][i]) : 0;
        }
        sums[0] += each.notional() * discount * total;
      }
    }
  }
}
