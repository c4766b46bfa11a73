package ebbline.pricing;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.instrument.Right.Party;
import ebbline.model.GaussianRates;
import ebbline.model.StandardNormal;
import java.util.List;
import java.util.Optional;

/**
 * Claims with rights on a {@link TrinomialTree} that ends with the last decision.
 *
 * <p>The tree carries the value of the rights only; what a right exchanges is priced at its nodes
 * by the model's bond formula, so flows may fall between nodes. A decision between nodes is taken
 * at the node before it.
 */
public final class TrinomialPricing {
  /** The tree is refined by up to this factor to bring every decision onto nodes. */
  private static final int MOST_REFINED = 3;

  private static final double ON_NODE = 1e-7;

  private static final double SAFETY = 5;

  private TrinomialPricing() {}

  /**
   * The value; its error bound is five times the largest difference to four coarser trees, and what
   * lies beyond the tree's top: an estimate, since the error falls like the step and not smoothly.
   *
   * @param steps to the last decision, at least 4; a few more where that brings the decisions onto
   *     nodes
   * @throws IllegalArgumentException as {@link TrinomialTree#of}
   */
  public static Valuation value(Claim claim, GaussianRates rates, int steps) {
    Valuation flows = Discounting.value(claim.flows(), rates.curve());
    if (claim.rights().isEmpty()) {
      return flows;
    }
    if (!(steps >= 4)) {
      throw new IllegalArgumentException("a tree needs at least 4 steps, found " + steps);
    }
    double fine = rightsValue(claim, rates, steps);
    double spread = 0;
    for (int eighths = 4; eighths < 8; eighths++) {
      double coarser = rightsValue(claim, rates, Math.max(2, steps * eighths / 8));
      spread = Math.max(spread, Math.abs(fine - coarser));
    }
    double bound = SAFETY * spread + beyondReach(claim, rates, steps);
    return new Valuation(flows.presentValue() + fine, Method.TRINOMIAL, flows.errorBound() + bound);
  }

  /** The worth of the flows times the probability of rates that no node stands for. */
  private static double beyondReach(Claim claim, GaussianRates rates, int steps) {
    double horizon = claim.rights().get(claim.rights().size() - 1).decision();
    double deviation = Math.sqrt(rates.variance(horizon));
    if (!(deviation > 0)) {
      return 0;
    }
    TrinomialTree tree = TrinomialTree.of(rates, horizon, steps);
    double state = tree.rateStep() * tree.stepLength() / rates.g(tree.stepLength());
    double size = 0;
    for (Right right : claim.rights()) {
      CashFlows flows = ExerciseValue.exchanged(claim, right);
      double sum = 0;
      for (int i = 0; i < flows.size(); i++) {
        sum += Math.abs(flows.amount(i)) * rates.curve().discount(flows.time(i));
      }
      size = Math.max(size, sum);
    }
    return size * (1e-10 + 2 * StandardNormal.upper(tree.reach(tree.steps()) * state / deviation));
  }

  /**
   * The tree that {@link #value} takes for a number of steps; empty if nothing is decided after
   * today.
   *
   * @throws IllegalArgumentException as {@link TrinomialTree#of}
   */
  public static Optional<TrinomialTree> tree(Claim claim, GaussianRates rates, int steps) {
    List<Right> rights = claim.rights();
    double horizon = rights.isEmpty() ? 0 : rights.get(rights.size() - 1).decision();
    return horizon > 0
        ? Optional.of(TrinomialTree.of(rates, horizon, aligned(rights, horizon, steps)))
        : Optional.empty();
  }

  /** The value of the rights on one tree. */
  static double rightsValue(Claim claim, GaussianRates rates, int steps) {
    List<Right> rights = claim.rights();
    int left = rights.size() - 1;
    double[] value = {0};
    Optional<TrinomialTree> grown = tree(claim, rates, steps);
    if (grown.isPresent()) {
      TrinomialTree tree = grown.get();
      double length = tree.stepLength();
      value = new double[2 * tree.reach(tree.steps()) + 1];
      for (int i = tree.steps(); i >= 0; i--) {
        value = i < tree.steps() ? tree.back(i, value) : value;
        while (left >= 0 && rights.get(left).decision() / length > i - ON_NODE) {
          decide(claim, rights.get(left--), rates, tree, i, value);
        }
      }
      return value[0];
    }
    for (; left >= 0; left--) {
      Right right = rights.get(left);
      CashFlows flows = ExerciseValue.exchanged(claim, right);
      value[0] = chosen(right, value[0], Discounting.value(flows, rates.curve()).presentValue());
    }
    return value[0];
  }

  /** The least number of steps, not far above the wanted one, with all decisions on nodes. */
  private static int aligned(List<Right> rights, double horizon, int steps) {
    for (int n = steps; n <= MOST_REFINED * steps; n++) {
      boolean all = true;
      for (Right right : rights) {
        double at = right.decision() / horizon * n;
        all &= Math.abs(at - Math.rint(at)) < ON_NODE;
      }
      if (all) {
        return n;
      }
    }
    return steps;
  }

  /** Seen from the right's owner's side in {@code exchanged}, to the holder in {@code value}. */
  private static double chosen(Right right, double hold, double exchanged) {
    return right.party() == Party.HOLDER ? Math.max(hold, exchanged) : Math.min(hold, -exchanged);
  }

  private static void decide(
      Claim claim, Right right, GaussianRates rates, TrinomialTree tree, int step, double[] value) {
    CashFlows flows = ExerciseValue.exchanged(claim, right);
    double t = step * tree.stepLength();
    int reach = tree.reach(step);
    double[] worth = new double[value.length];
    double x = tree.state(step, -reach);
    double by = tree.rateStep() * tree.stepLength() / rates.g(tree.stepLength());
    for (int i = 0; i < flows.size(); i++) {
      double time = Math.max(t, flows.time(i));
      double bond = flows.amount(i) * Math.exp(rates.logBond(t, time, x));
      double ratio = Math.exp(-rates.g(time - t) * by);
      for (int k = 0; k < worth.length; k++) {
        worth[k] += bond;
        bond *= ratio;
      }
    }
    for (int k = 0; k < value.length; k++) {
      value[k] = chosen(right, value[k], worth[k]);
    }
  }
}
