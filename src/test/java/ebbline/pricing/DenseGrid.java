package ebbline.pricing;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussLegendre;
import ebbline.model.GaussianRates;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Early exercise by another road than the one under test: the whole claim's value, rolled back in
 * the state x from date to date under each next date's forward measure, on dense Gauss panels cut
 * wherever a choice changes. One right a date.
 */
final class DenseGrid {
  private static final double HALF = 0.3989422804014327;

  private final Claim claim;
  private final GaussianRates rates;
  private final GaussLegendre rule;
  private final double panel;
  private final double latest;

  private double[] nodes = new double[0];
  private double[] weighted = new double[0];
  private double ahead = Double.NaN;

  private DenseGrid(Claim claim, GaussianRates rates, int points, double panel) {
    this.claim = claim;
    this.rates = rates;
    this.rule = GaussLegendre.of(points);
    this.panel = panel;
    double last = 0;
    for (double t : claim.flows().times()) {
      last = Math.max(last, t);
    }
    for (Right right : claim.rights()) {
      for (double t : right.received().times()) {
        last = Math.max(last, t);
      }
    }
    this.latest = last;
  }

  static double value(Claim claim, GaussianRates rates) {
    return value(claim, rates, 12, 1.5);
  }

  static double value(Claim claim, GaussianRates rates, int points, double panel) {
    return new DenseGrid(claim, rates, points, panel).induce();
  }

  private double induce() {
    List<Right> rights = claim.rights();
    for (int i = rights.size() - 1; i >= 0; i--) {
      double before = i == 0 ? 0 : rights.get(i - 1).decision();
      roll(rights.get(i), before);
    }
    return hold(0, 0);
  }

  private double flows(CashFlows flows, double t, double until, double x) {
    double sum = 0;
    for (int i = 0; i < flows.size() && flows.time(i) <= until + 1e-9; i++) {
      sum += flows.amount(i) * Math.exp(rates.logBond(t, Math.max(t, flows.time(i)), x));
    }
    return sum;
  }

  private double hold(double t, double x) {
    CashFlows after = claim.flows().after(t);
    if (Double.isNaN(ahead)) {
      return flows(after, t, Double.POSITIVE_INFINITY, x);
    }
    var step = rates.step(t, ahead);
    double mean = step.decay() * x + step.stateMean() - step.covariance();
    double deviation = Math.sqrt(step.stateVariance());
    int from = Arrays.binarySearch(nodes, mean - 9 * deviation);
    double sum = 0;
    for (int i = from < 0 ? -from - 1 : from; i < nodes.length; i++) {
      double u = (nodes[i] - mean) / deviation;
      if (u > 9) {
        break;
      }
      sum += weighted[i] * Math.exp(-0.5 * u * u);
    }
    return flows(after, t, ahead, x)
        + Math.exp(rates.logBond(t, ahead, x)) * sum * HALF / deviation;
  }

  private double exercise(Right right, double x) {
    double t = right.decision();
    return flows(right.received(), t, Double.POSITIVE_INFINITY, x)
        + flows(claim.flows().after(t), t, right.keptUntil(), x);
  }

  private void roll(Right right, double before) {
    double t = right.decision();
    double sd = Math.sqrt(rates.variance(t));
    double low = -9.5 * sd - sd * sd * rates.g(latest - t);
    double high = 9.5 * sd + rates.stateMean(t);
    double width = panel * Math.sqrt(rates.stateVariance(before, t));
    if (!Double.isNaN(ahead)) {
      var step = rates.step(t, ahead);
      width = Math.min(width, panel * Math.sqrt(step.stateVariance()) / step.decay());
    }
    int panels = (int) Math.ceil((high - low) / width);
    double by = (high - low) / panels;
    List<double[]> pieces = new ArrayList<>();
    double a = low;
    double fa = hold(t, a) - exercise(right, a);
    for (int k = 1; k <= 4 * panels; k++) {
      double b = low + 0.25 * k * by;
      double fb = hold(t, b) - exercise(right, b);
      if (fa > 0 != fb > 0) {
        double cut = cut(right, b - 0.25 * by, b, fa > 0);
        pieces.add(new double[] {a, cut});
        a = cut;
      }
      if (k % 4 == 0) {
        pieces.add(new double[] {a, b});
        a = b;
      }
      fa = fb;
    }
    int n = rule.points();
    double[] x = new double[pieces.size() * n];
    double[] v = new double[x.length];
    int count = 0;
    for (double[] piece : pieces) {
      double half = 0.5 * (piece[1] - piece[0]);
      for (int q = 0; q < n; q++) {
        double at = piece[0] + half * (1 + rule.node(q));
        double keep = hold(t, at);
        double take = exercise(right, at);
        boolean holder = right.party() == Right.Party.HOLDER;
        x[count] = at;
        v[count++] = half * rule.weight(q) * (holder ? Math.max(keep, take) : Math.min(keep, take));
      }
    }
    nodes = x;
    weighted = v;
    ahead = t;
  }

  private double cut(Right right, double from, double to, boolean positive) {
    double a = from;
    double b = to;
    for (int i = 0; i < 40; i++) {
      double middle = 0.5 * (a + b);
      if (hold(right.decision(), middle) - exercise(right, middle) > 0 == positive) {
        a = middle;
      } else {
        b = middle;
      }
    }
    return 0.5 * (a + b);
  }
}
