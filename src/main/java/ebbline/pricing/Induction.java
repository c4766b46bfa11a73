package ebbline.pricing;

import ebbline.instrument.Right.Party;
import ebbline.pricing.Decisions.Date;
import ebbline.pricing.Decisions.Exchange;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;

/** One run of the backward induction at one resolution. */
final class Induction {
  /*
   * The value of the rights is a martingale between decisions. After a date it is
   *   B(u) + Σ J_k(u) 1{u beyond x_k},
   * B one exchange in closed form (a sum of bonds, or nothing), J_k smooth with J_k(x_k) = 0: the difference of what holds
   * on the two sides of the boundary x_k. So the expectation of B is B, and each J_k is smoothed on a grid of its own
   * that starts at its boundary. Nothing is interpolated and no integral crosses a kink. A date on which nobody exercises
   * drops out; one on which somebody always does leaves B alone.
   */
  private static final int MOST_PHASES = 64;

  private final Decisions decisions;
  private final double spacing;
  private final double range;
  private final Hints hints;

  private Date ahead;
  private Exchange base;
  private List<HalfLine> lines = List.of();

  private List<HalfLine.Smoothed> smoothed = List.of();
  private double decay;
  private double step;

  /**
   * @param spacing of the nodes in deviations of a step
   * @param range of the state in its deviations
   * @param hints where an earlier run found the boundaries; this one leaves its own
   */
  Induction(Decisions decisions, double spacing, double range, Hints hints) {
    this.decisions = decisions;
    this.spacing = spacing;
    this.range = range;
    this.hints = hints;
  }

  /** Boundaries of one run, from which another begins its search. */
  static final class Hints {
    private final double[] roots;
    private final double[] slopes;

    Hints(Decisions decisions) {
      roots = new double[decisions.dates().size()];
      slopes = new double[roots.length];
      Arrays.fill(roots, Double.NaN);
    }
  }

  /** The present value of the rights to the holder. */
  double value() {
    List<Date> dates = decisions.dates();
    for (int i = dates.size() - 1; i >= 0; i--) {
      Date date = dates.get(i);
      if (date.deviation() == 0) {
        return certain(date);
      }
      lookAhead(date);
      decide(date, i, i == 0 ? null : dates.get(i - 1));
    }
    return today();
  }

  private double today() {
    double sum = decisions.difference(base, null).total();
    for (HalfLine line : lines) {
      sum += line.new Smoothed(0, 1, reach(1)).at(0);
    }
    return sum;
  }

  /** A bond that varies by e^b a deviation moves the weight of its expectation by b deviations. */
  private double reach(double deviation) {
    return range + deviation * Math.max(ahead.low(), ahead.high());
  }

  /** The value at a date at which nothing is random yet. */
  private double certain(Date date) {
    double value = today();
    for (int r = date.rights().size() - 1; r >= 0; r--) {
      Exchange right = date.rights().get(r);
      double worth = decisions.difference(right, null).total();
      value = right.party() == Party.HOLDER ? Math.max(value, worth) : Math.min(value, worth);
    }
    return value;
  }

  private void lookAhead(Date date) {
    List<HalfLine.Smoothed> result = new ArrayList<>();
    if (ahead != null) {
      decay = decisions.decay(date, ahead);
      step = decisions.step(date, ahead);
      for (HalfLine line : lines) {
        result.add(line.new Smoothed(decay, step, reach(step)));
      }
    }
    smoothed = result;
  }

  /** The choice {@code first} less the choice {@code second}; −1 holds, others are rights. */
  private final class Gap implements DoubleUnaryOperator {
    private final DeflatedFlows.Seen flows;
    private final int sign;

    Gap(Date date, int first, int second) {
      Exchange a = first < 0 ? base : date.rights().get(first);
      Exchange b = second < 0 ? base : date.rights().get(second);
      flows = decisions.seen(decisions.difference(a, b), date);
      sign = (first < 0 ? 1 : 0) - (second < 0 ? 1 : 0);
    }

    @Override
    public double applyAsDouble(double u) {
      double sum = 0;
      if (sign != 0) {
        for (HalfLine.Smoothed line : smoothed) {
          sum += line.at(u);
        }
      }
      return sign * sum + flows.at(u);
    }

    double[] values(int count, double from, double by) {
      double[] out = new double[count];
      if (sign != 0) {
        for (HalfLine.Smoothed line : smoothed) {
          line.addTo(out, count, from, by);
        }
      }
      if (sign < 0) {
        for (int k = 0; k < count; k++) {
          out[k] = -out[k];
        }
      }
      flows.addTo(out, count, from, by);
      return out;
    }
  }

  private void decide(Date date, int index, Date before) {
    double low = -range - date.low();
    double high = range + date.high();
    int m = date.rights().size();
    Gap[][] gaps = new Gap[m][m + 1];
    double[] cuts = new double[0];
    for (int p = 0; p < m; p++) {
      for (int q = p + 1; q <= m; q++) {
        gaps[p][q] = new Gap(date, q == m ? -1 : q, p);
        cuts = Boundaries.joined(cuts, roots(gaps[p][q], q == m, index, low, high));
      }
    }
    Arrays.sort(cuts);
    List<Integer> choices = new ArrayList<>();
    List<Double> bounds = new ArrayList<>();
    double left = low;
    for (int i = 0; i <= cuts.length; i++) {
      double right = i < cuts.length ? cuts[i] : high;
      int choice = choice(date, gaps, 0.5 * (left + right));
      if (choices.isEmpty() || choices.get(choices.size() - 1) != choice) {
        if (!choices.isEmpty()) {
          bounds.add(left);
        }
        choices.add(choice);
      }
      left = right;
    }
    int anchor = 0;
    while (anchor < choices.size() && choices.get(anchor) < 0) {
      anchor++;
    }
    if (anchor == choices.size()) {
      return;
    }
    double loading = date.low() + date.high();
    double h = spacing(date, before, loading);
    List<HalfLine> result = new ArrayList<>();
    for (int k = 0; k + 1 < choices.size(); k++) {
      int side = k >= anchor ? 1 : -1;
      int far = choices.get(k >= anchor ? k + 1 : k);
      int near = choices.get(k >= anchor ? k : k + 1);
      double at = bounds.get(k);
      int count = (int) ((side > 0 ? high - at : at - low) / h) + 2 + 2 * HalfLine.GHOSTS;
      double from = at - side * h * HalfLine.GHOSTS;
      Gap gap = far < 0 ? gaps[near][m] : new Gap(date, far, near);
      HalfLine line = new HalfLine(at, side, h, gap.values(count, from, side * h));
      result.add(line);
      if (choices.size() == 2 && m == 1) {
        hints.roots[index] = at;
        hints.slopes[index] = far < 0 ? line.slope() : -line.slope();
      }
    }
    base = date.rights().get(choices.get(anchor));
    lines = result;
    ahead = date;
  }

  /** Who decides what at one state: the last right first, so that the first has the last word. */
  private static int choice(Date date, Gap[][] gaps, double u) {
    int m = date.rights().size();
    int choice = -1;
    for (int p = m - 1; p >= 0; p--) {
      double gain = -gaps[p][choice < 0 ? m : choice].applyAsDouble(u);
      boolean holder = date.rights().get(p).party() == Party.HOLDER;
      if (holder ? gain > 0 : gain < 0) {
        choice = p;
      }
    }
    return choice;
  }

  /** Fine enough for the step before, for the step after and for the bonds. */
  private double spacing(Date date, Date before, double loading) {
    double limit = before == null ? 0.5 : decisions.step(before, date);
    if (!smoothed.isEmpty()) {
      limit = Math.min(limit, step / decay);
    }
    limit = spacing * Math.min(limit, 1 / Math.max(1, loading));
    if (!lines.isEmpty()) {
      // A step that falls on the nodes of the next date, or divides them, makes one convolution of
      // the whole grid.
      double matched = lines.get(0).spacing() / decay;
      double phases = Math.ceil(matched / limit - 1e-12);
      if (phases <= MOST_PHASES && matched >= 0.4 * limit) {
        return matched / Math.max(1, phases);
      }
    }
    return 0.8 * limit;
  }

  private double[] roots(Gap gap, boolean holds, int index, double low, double high) {
    int sign = decisions.order();
    if (sign != 0 && holds) {
      double guess = hints.roots[index];
      double slope = hints.slopes[index];
      boolean known = !Double.isNaN(guess);
      if (!known) {
        guess = index + 1 < hints.roots.length ? extrapolated(index) : 0;
        slope = index + 1 < hints.roots.length ? hints.slopes[index + 1] : 0;
      }
      double root = Boundaries.near(gap, low, high, sign, guess, slope, known);
      if (!Double.isNaN(root)) {
        return new double[] {root};
      }
    }
    int points = Boundaries.scanned();
    double[] values = gap.values(points, low, (high - low) / (points - 1));
    return Boundaries.all(gap, values, low, high);
  }

  /** The boundary as a line through those of the two dates after it. */
  private double extrapolated(int index) {
    double next = state(index + 1);
    if (Double.isNaN(next)) {
      return 0;
    }
    List<Date> dates = decisions.dates();
    double here = next;
    if (index + 2 < dates.size() && !Double.isNaN(hints.roots[index + 2])) {
      double gone = dates.get(index + 1).time() - dates.get(index).time();
      double span = dates.get(index + 2).time() - dates.get(index + 1).time();
      here += (next - state(index + 2)) * Math.min(2, gone / span);
    }
    return here / dates.get(index).deviation();
  }

  private double state(int index) {
    return hints.roots[index] * decisions.dates().get(index).deviation();
  }
}
