package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.model.GaussianRates;

/**
 * The trinomial tree of Hull and White 1994, J. of Derivatives 2(1): the Δt-period rate R = α(i) +
 * j ΔR, with α found step by step so that the tree reprices the curve.
 *
 * <p>Time in years, rates continuously compounded for the period Δt. Immutable.
 */
public final class TrinomialTree {
  /** Where the branching turns inward, in units of 1/(aΔt). */
  private static final double INWARD = 0.184;

  /** Middle branches keep positive probabilities up to here: √(2/3). */
  private static final double OUTWARD = 0.816;

  private final GaussianRates rates;
  private final int steps;
  private final double stepLength;
  private final double rateStep;
  private final int top;
  private final double[] alphas;
  private final double[][] prices;

  private TrinomialTree(GaussianRates rates, int steps, double stepLength, int top) {
    this.rates = rates;
    this.steps = steps;
    this.stepLength = stepLength;
    this.rateStep = rates.volatility().value(0) * Math.sqrt(3 * stepLength);
    this.top = top;
    this.alphas = new double[steps + 1];
    this.prices = new double[steps + 1][];
    grow(rates.curve());
  }

  /**
   * @param horizon time of the last nodes, years; positive
   * @param steps up to it, 1 to 20000; the rate at the last nodes runs one step further
   * @throws IllegalArgumentException if a rule above is broken, the volatility is not constant, or
   *     a probability would be negative
   */
  public static TrinomialTree of(GaussianRates rates, double horizon, int steps) {
    if (!(horizon > 0 && Double.isFinite(horizon))) {
      throw new IllegalArgumentException("a tree ends after today, found " + horizon);
    }
    if (!(steps >= 1 && steps <= 20_000)) {
      throw new IllegalArgumentException("a tree has 1 to 20000 steps, found " + steps);
    }
    if (!rates.volatility().isConstant()) {
      throw new IllegalArgumentException(
          "the trinomial tree needs one constant volatility, found "
              + rates.volatility().count()
              + " steps");
    }
    double length = horizon / steps;
    double pull = rates.meanReversion() * length;
    int top = steps;
    if (pull > 0) {
      top = (int) Math.min(steps, Math.ceil(INWARD / pull));
    }
    if (!(Math.abs(pull) * top < OUTWARD)) {
      throw new IllegalArgumentException(
          "the tree's probabilities turn negative: mean reversion times the step must stay below"
              + " 0.816, and a negative one times the horizon; found "
              + pull
              + " a step over "
              + steps
              + " steps");
    }
    return new TrinomialTree(rates, steps, length, top);
  }

  /** α forward in time: each from the Arrow–Debreu prices of its step and the curve's next bond. */
  private void grow(DiscountCurve curve) {
    prices[0] = new double[] {1};
    for (int i = 0; i <= steps; i++) {
      int reach = reach(i);
      double sum = 0;
      for (int j = -reach; j <= reach; j++) {
        sum += prices[i][j + reach] * Math.exp(-j * rateStep * stepLength);
      }
      alphas[i] = (Math.log(sum) - curve.logDiscount((i + 1) * stepLength)) / stepLength;
      if (i < steps) {
        int next = reach(i + 1);
        double[] q = new double[2 * next + 1];
        for (int j = -reach; j <= reach; j++) {
          double carried = prices[i][j + reach] * Math.exp(-rate(i, j) * stepLength);
          int k = target(j) + next;
          q[k + 1] += carried * up(j);
          q[k] += carried * middle(j);
          q[k - 1] += carried * down(j);
        }
        prices[i + 1] = q;
      }
    }
  }

  public int steps() {
    return steps;
  }

  /** Δt, years. */
  public double stepLength() {
    return stepLength;
  }

  /** ΔR = σ√(3Δt). */
  public double rateStep() {
    return rateStep;
  }

  /** The largest j anywhere, j_max or the number of steps. */
  public int top() {
    return top;
  }

  /** The largest j after {@code step} steps. */
  public int reach(int step) {
    return Math.min(step, top);
  }

  /** α after {@code step} steps, the rate at j = 0. */
  public double alpha(int step) {
    return alphas[step];
  }

  /** The Δt-period rate at a node. */
  public double rate(int step, int j) {
    return alphas[step] + j * rateStep;
  }

  /** Today's price of one unit paid at the node and nowhere else. */
  public double arrowDebreu(int step, int j) {
    return prices[step][j + reach(step)];
  }

  private boolean turnsDown(int j) {
    return j == top && top < steps;
  }

  private boolean turnsUp(int j) {
    return j == -top && top < steps;
  }

  /** The j that the middle branch leads to. */
  public int target(int j) {
    return turnsDown(j) ? j - 1 : turnsUp(j) ? j + 1 : j;
  }

  /** Probability of the upper branch. */
  public double up(int j) {
    double m = -rates.meanReversion() * stepLength * j;
    return turnsDown(j)
        ? 7.0 / 6 + 0.5 * (m * m + 3 * m)
        : turnsUp(j) ? 1.0 / 6 + 0.5 * (m * m - m) : 1.0 / 6 + 0.5 * (m * m + m);
  }

  /** Probability of the middle branch. */
  public double middle(int j) {
    double m = -rates.meanReversion() * stepLength * j;
    return turnsDown(j)
        ? -1.0 / 3 - m * m - 2 * m
        : turnsUp(j) ? -1.0 / 3 - m * m + 2 * m : 2.0 / 3 - m * m;
  }

  /** Probability of the lower branch. */
  public double down(int j) {
    double m = -rates.meanReversion() * stepLength * j;
    return turnsDown(j)
        ? 1.0 / 6 + 0.5 * (m * m + m)
        : turnsUp(j) ? 7.0 / 6 + 0.5 * (m * m - 3 * m) : 1.0 / 6 + 0.5 * (m * m - m);
  }

  /**
   * The model's state x at a node: the one at which the model's bond over Δt yields the node's
   * rate.
   */
  public double state(int step, int j) {
    double t = step * stepLength;
    double g = rates.g(stepLength);
    return (rates.logBond(t, t + stepLength, 0) + rate(step, j) * stepLength) / g;
  }

  /** One step back: the value at a step from the values at the next, in place. */
  double[] back(int step, double[] next) {
    int reach = reach(step);
    int shift = reach(step + 1);
    double[] value = new double[2 * reach + 1];
    double discount = Math.exp(-rate(step, -reach) * stepLength);
    double ratio = Math.exp(-rateStep * stepLength);
    for (int j = -reach; j <= reach; j++) {
      int k = target(j) + shift;
      value[j + reach] =
          discount * (up(j) * next[k + 1] + middle(j) * next[k] + down(j) * next[k - 1]);
      discount *= ratio;
    }
    return value;
  }
}
