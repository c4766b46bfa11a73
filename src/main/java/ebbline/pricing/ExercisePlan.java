package ebbline.pricing;

import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.pricing.simulation.StatePaths;
import java.util.List;
import java.util.function.BiFunction;

/**
 * When each party exercises, and the martingale that goes with it: fitted backwards, then held
 * against paths that the fit has not seen.
 *
 * <p>Immutable.
 */
final class ExercisePlan {
  /*
   * Regression later (Glasserman & Yu 2004, in: Monte Carlo and Quasi-Monte Carlo Methods 2002): the value at a decision
   * is fitted by functions of the state whose conditional expectations are known exactly, so the value of waiting at the
   * decision before is one of them, and M = Σ fit − its expectation is a martingale without a simulation inside the
   * simulation. Against it (Rogers 2002, Math. Finance 12(3); Andersen & Broadie 2004, Management Science 50(9)):
   *   high: the issuer follows his policy, the holder takes the best along the path of what he gets less M;
   *   low:  the holder follows his policy, the issuer takes the least along the path.
   * Whatever the fit, the expectation of the first is not below the value and that of the second not above it, with
   * rights of either party or of both; M in the follower's value only takes its variance away.
   */
  private final DecisionState[] decisions;
  private final KinkedPolynomial[] fits;
  private final KinkedPolynomial.Smoothed[] waiting;

  private ExercisePlan(int count) {
    decisions = new DecisionState[count];
    fits = new KinkedPolynomial[count];
    waiting = new KinkedPolynomial.Smoothed[count];
  }

  static ExercisePlan of(Claim claim, GaussianRates rates) {
    return of(claim, rates, ExerciseFit::of);
  }

  /** With a fit of one's own; the bounds hold whatever it is. */
  static ExercisePlan of(
      Claim claim, GaussianRates rates, BiFunction<double[], double[], KinkedPolynomial> fit) {
    List<Right> rights = claim.rights();
    int m = rights.size();
    double horizon = rights.get(m - 1).decision();
    ExercisePlan plan = new ExercisePlan(m);
    double[] u = ExerciseFit.states();
    int n = u.length;
    double[] wait = new double[n];
    double[] gain = new double[n];
    double[] state = new double[n];
    double[] scratch = new double[n];
    for (int k = m - 1; k >= 0; k--) {
      Right right = rights.get(k);
      DecisionState decision = DecisionState.of(claim, right, rates, horizon);
      plan.decisions[k] = decision;
      if (k < m - 1) {
        plan.waitingAfter(k).at(u, wait, n);
      }
      decision.deflatedGain(u, gain, state, scratch, n);
      double[] values = new double[n];
      for (int i = 0; i < n; i++) {
        values[i] = decision.isHolders() ? Math.max(wait[i], gain[i]) : Math.min(wait[i], gain[i]);
        gain[i] -= wait[i];
      }
      plan.fits[k] = fit.apply(values, gain);
      double from = k == 0 ? 0 : rights.get(k - 1).decision();
      plan.waiting[k] = smoothed(plan.fits[k], rates, from, right.decision());
    }
    return plan;
  }

  private static KinkedPolynomial.Smoothed smoothed(
      KinkedPolynomial fit, GaussianRates rates, double from, double to) {
    double after = rates.variance(to);
    if (!(after > 0)) {
      return fit.new Smoothed(1, 0);
    }
    double decay =
        Math.exp(-rates.meanReversion() * (to - from)) * Math.sqrt(rates.variance(from) / after);
    return fit.new Smoothed(decay, Math.sqrt(rates.stateVariance(from, to) / after));
  }

  /** What is still to come after a decision that is let pass. */
  private KinkedPolynomial.Smoothed waitingAfter(int k) {
    return waiting[k + 1];
  }

  /** The estimates of one block: sums of low, high and their middle. */
  final class Paths implements StatePaths.Work {
    private final double[] u = new double[StatePaths.BLOCK];
    private final double[] density = new double[StatePaths.BLOCK];
    private final double[] gain = new double[StatePaths.BLOCK];
    private final double[] fit = new double[StatePaths.BLOCK];
    private final double[] wait = new double[StatePaths.BLOCK];
    private final double[] low = new double[StatePaths.BLOCK];
    private final double[] high = new double[StatePaths.BLOCK];

    @Override
    public void add(double[][] x, double[][] integral, int n, double[] sums) {
      java.util.Arrays.fill(low, 0, n, 0);
      java.util.Arrays.fill(high, 0, n, 0);
      for (int k = decisions.length - 1; k >= 0; k--) {
        DecisionState decision = decisions[k];
        decision.standard(x[k], u, n);
        decision.density(x[k], integral[k], density, n);
        decision.gain(x[k], integral[k], gain, fit, n);
        if (k < decisions.length - 1) {
          waitingAfter(k).at(u, wait, n);
          for (int i = 0; i < n; i++) {
            wait[i] *= density[i];
            low[i] += wait[i];
            high[i] += wait[i];
          }
        } else {
          java.util.Arrays.fill(wait, 0, n, 0);
        }
        if (decision.isHolders()) {
          choose(1, gain, wait, low, high, n);
        } else {
          choose(-1, gain, wait, high, low, n);
        }
        fits[k].at(u, fit, n);
        for (int i = 0; i < n; i++) {
          double martingale = fit[i] * density[i];
          low[i] -= martingale;
          high[i] -= martingale;
        }
      }
      u[0] = 0;
      waiting[0].at(u, wait, 1);
      for (int i = 0; i < n; i++) {
        sums[0] += low[i];
        sums[1] += high[i];
      }
      sums[0] += n * wait[0];
      sums[1] += n * wait[0];
      sums[2] = 0.5 * (sums[0] + sums[1]);
    }
  }

  /**
   * @param side 1 where the larger is chosen, −1 where the smaller
   * @param follower exercises where the fit says so
   * @param best takes the better of the two along the path
   */
  private static void choose(
      double side, double[] gain, double[] wait, double[] follower, double[] best, int n) {
    for (int i = 0; i < n; i++) {
      follower[i] = side * (gain[i] - wait[i]) > 0 ? gain[i] : follower[i];
      best[i] = side * Math.max(side * gain[i], side * best[i]);
    }
  }
}
