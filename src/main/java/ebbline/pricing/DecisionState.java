package ebbline.pricing;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;

/**
 * One right as a function of the state at its decision: what its owner's choice brings the holder
 * of the claim, discounted along the path.
 *
 * <p>Immutable.
 */
final class DecisionState {
  /*
   * Along a path the discount factor is P(0,t) e^(−∫x), and L = e^(−∫x − x G − ½ y G²), G = G(T* − t), is the density of
   * the forward measure of T*. Under that measure u = (x + y G)/√y is standard normal, so a function of u has its
   * expectation there in closed form, and L times it is what the risk-neutral paths carry.
   */
  private final boolean holders;
  private final double discount;
  private final double[] amounts;
  private final double[] loadings;
  private final double shift;
  private final double perDeviation;
  private final double forwardLoading;
  private final double logDensity;

  private DecisionState(
      Right right, CashFlows gained, GaussianRates rates, double horizon, double variance) {
    double t = right.decision();
    holders = right.party() == Right.Party.HOLDER;
    discount = rates.curve().discount(t);
    double[] value = new double[gained.size()];
    double[] g = new double[gained.size()];
    int count = 0;
    for (int i = 0; i < gained.size(); i++) {
      double time = Math.max(t, gained.time(i));
      double bond = gained.amount(i) * Math.exp(rates.logBond(t, time, 0));
      double load = rates.g(time - t);
      boolean same = count > 0 && g[count - 1] == load;
      int k = same ? count - 1 : count++;
      g[k] = load;
      value[k] += bond;
    }
    amounts = java.util.Arrays.copyOf(value, count);
    loadings = java.util.Arrays.copyOf(g, count);
    forwardLoading = rates.g(horizon - t);
    shift = variance * forwardLoading;
    perDeviation = variance > 0 ? 1 / Math.sqrt(variance) : 0;
    logDensity = -0.5 * variance * forwardLoading * forwardLoading;
    if (!(Double.isFinite(shift) && Double.isFinite(perDeviation))) {
      throw new IllegalArgumentException(
          "the rate's variance is too large to simulate at time " + (float) t);
    }
  }

  static DecisionState of(Claim claim, Right right, GaussianRates rates, double horizon) {
    CashFlows gained = right.received().plus(claim.flows().after(right.keptUntil()).times(-1));
    return new DecisionState(right, gained, rates, horizon, rates.variance(right.decision()));
  }

  /** Whether the holder of the claim decides. */
  boolean isHolders() {
    return holders;
  }

  /** u of the state. */
  void standard(double[] x, double[] u, int n) {
    for (int i = 0; i < n; i++) {
      u[i] = (x[i] + shift) * perDeviation;
    }
  }

  /** The density L of the forward measure. */
  void density(double[] x, double[] integral, double[] out, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = logDensity - integral[i] - forwardLoading * x[i];
    }
    FastExp.exp(out, out, n);
  }

  /** What exercise brings the holder, discounted along the path. */
  void gain(double[] x, double[] integral, double[] out, double[] scratch, int n) {
    worth(x, out, scratch, n);
    for (int i = 0; i < n; i++) {
      scratch[i] = -integral[i];
    }
    FastExp.exp(scratch, scratch, n);
    for (int i = 0; i < n; i++) {
      out[i] *= discount * scratch[i];
    }
  }

  /** The same over the density, a function of u. */
  void deflatedGain(double[] u, double[] out, double[] state, double[] scratch, int n) {
    for (int i = 0; i < n; i++) {
      state[i] = perDeviation > 0 ? u[i] / perDeviation - shift : 0;
    }
    worth(state, out, scratch, n);
    for (int i = 0; i < n; i++) {
      out[i] *= discount * Math.exp(forwardLoading * state[i] - logDensity);
    }
  }

  /** Seen from the decision. */
  private void worth(double[] x, double[] out, double[] scratch, int n) {
    java.util.Arrays.fill(out, 0, n, 0);
    for (int j = 0; j < amounts.length; j++) {
      double g = -loadings[j];
      for (int i = 0; i < n; i++) {
        scratch[i] = g * x[i];
      }
      FastExp.exp(scratch, scratch, n);
      double amount = amounts[j];
      for (int i = 0; i < n; i++) {
        out[i] = Math.fma(amount, scratch[i], out[i]);
      }
    }
  }
}
