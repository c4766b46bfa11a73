package ebbline.pricing;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussLegendre;
import ebbline.model.GaussianRates;
import ebbline.model.StandardNormal;
import java.util.Arrays;

/**
 * The same claims as {@link ClosedForm} by brute force: bonds seen from the decision at every
 * state, integrated against the normal density. Shares no formula with it.
 */
public final class IntegrationCheck {
  private static final double REACH = 13;
  private static final double PANEL = 0.5;
  private static final int SCAN = 16;

  /** More would take minutes, and no bond varies so. */
  private static final double MOST_SHIFT = 1000;

  private static final GaussLegendre FINE = GaussLegendre.of(20);
  private static final GaussLegendre COARSE = GaussLegendre.of(14);

  private final double[] amounts;
  private final double[] logs;
  private final double[] loadings;
  private final double deviation;

  private IntegrationCheck(CashFlows flows, double decision, GaussianRates rates) {
    int n = flows.size();
    amounts = flows.amounts();
    logs = new double[n];
    loadings = new double[n];
    deviation = Math.sqrt(rates.variance(decision));
    for (int i = 0; i < n; i++) {
      double t = Math.max(decision, flows.time(i));
      logs[i] = rates.logBond(decision, t, 0);
      loadings[i] = rates.g(t - decision);
    }
  }

  /**
   * The value of a claim with at most one right; the error bound is the difference between two
   * rules, and rounding.
   *
   * @throws IllegalArgumentException if the claim has more than one right
   */
  public static Valuation value(Claim claim, GaussianRates rates) {
    Valuation flows = Discounting.value(claim.flows(), rates.curve());
    if (claim.rights().isEmpty()) {
      return flows;
    }
    if (claim.rights().size() > 1) {
      throw new IllegalArgumentException(
          "integration over one decision, found " + claim.rights().size());
    }
    Right right = claim.rights().get(0);
    CashFlows given = claim.flows().after(right.keptUntil());
    double side = right.party() == Right.Party.HOLDER ? 1 : -1;
    CashFlows exchanged = right.received().plus(given.times(-1)).times(side);
    IntegrationCheck check = new IntegrationCheck(exchanged, right.decision(), rates);
    double discount = rates.curve().discount(right.decision());
    double fine = discount * check.integral(FINE);
    double coarse = discount * check.integral(COARSE);
    double rounding = 0;
    for (int i = 0; i < exchanged.size(); i++) {
      rounding += Math.abs(exchanged.amount(i)) * rates.curve().discount(exchanged.time(i));
    }
    return new Valuation(
        flows.presentValue() + side * fine,
        Method.CLOSED_FORM,
        flows.errorBound() + Math.abs(fine - coarse) + 32 * Math.ulp(1.0) * rounding);
  }

  /** What exercise brings at the decision with the state z deviations from its mean. */
  private double gain(double z) {
    double sum = 0;
    for (int i = 0; i < amounts.length; i++) {
      sum += amounts[i] * Math.exp(logs[i] - deviation * loadings[i] * z);
    }
    return sum;
  }

  private double integral(GaussLegendre rule) {
    if (deviation == 0) {
      return Math.max(0, gain(0));
    }
    double shift = deviation * Arrays.stream(loadings).max().orElse(0);
    if (!(shift <= MOST_SHIFT)) {
      throw new IllegalArgumentException(
          "a bond varies too much to be integrated over, by e^"
              + (float) shift
              + " a standard deviation of the rate");
    }
    double low = -REACH - shift;
    int panels = (int) Math.ceil((REACH - low) / PANEL);
    double width = (REACH - low) / panels;
    double sum = 0;
    for (int k = 0; k < panels; k++) {
      double from = low + k * width;
      double left = gain(from);
      // Within a panel a change of sign is looked for at the points of a scan, then halved down to
      // rounding.
      for (int s = 1; s <= SCAN; s++) {
        double to = s == SCAN ? low + (k + 1) * width : low + (k + s / (double) SCAN) * width;
        double right = gain(to);
        if (left > 0 != right > 0) {
          double kink = kink(from, to, left > 0);
          sum += left > 0 ? piece(rule, from, kink) : piece(rule, kink, to);
          from = to;
        } else if (s == SCAN || (left > 0 && s % (SCAN / 2) == 0)) {
          sum += right > 0 ? piece(rule, from, to) : 0;
          from = to;
        }
        left = right;
      }
    }
    return sum;
  }

  private double piece(GaussLegendre rule, double from, double to) {
    return rule.integrate(z -> gain(z) * StandardNormal.density(z), from, to);
  }

  private double kink(double from, double to, boolean positiveAtFrom) {
    double low = from;
    double high = to;
    while (true) {
      double middle = 0.5 * (low + high);
      if (!(middle > low && middle < high)) {
        return middle;
      }
      if (gain(middle) > 0 == positiveAtFrom) {
        low = middle;
      } else {
        high = middle;
      }
    }
  }
}
