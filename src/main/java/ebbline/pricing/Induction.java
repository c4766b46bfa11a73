package ebbline.pricing;

import ebbline.instrument.Right.Party;
import ebbline.pricing.Decisions.Date;
import ebbline.pricing.Decisions.Exchange;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

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
  private static final int SCAN = 40;
  private static final int MOST_STEPS = 100;
  private static final int NEAR_MISS_STEPS = 40;

  private final Decisions decisions;
  private final double spacing;
  private final double range;

  private Date ahead;
  private Exchange base;
  private List<HalfLine> lines = List.of();

  private List<HalfLine.Smoothed> smoothed = List.of();
  private double decay;
  private double step;

  /**
   * @param spacing of the nodes in deviations of a step
   * @param range of the state in its deviations
   */
  Induction(Decisions decisions, double spacing, double range) {
    this.decisions = decisions;
    this.spacing = spacing;
    this.range = range;
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
      decide(date, i == 0 ? null : dates.get(i - 1));
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
  private final class Gap {
    private final DeflatedFlows.Seen flows;
    private final int sign;

    Gap(Date date, int first, int second) {
      Exchange a = first < 0 ? base : date.rights().get(first);
      Exchange b = second < 0 ? base : date.rights().get(second);
      flows = decisions.seen(decisions.difference(a, b), date);
      sign = (first < 0 ? 1 : 0) - (second < 0 ? 1 : 0);
    }

    double at(double u) {
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

  private void decide(Date date, Date before) {
    double low = -range - date.low();
    double high = range + date.high();
    int m = date.rights().size();
    Gap[][] gaps = new Gap[m][m + 1];
    double[] cuts = new double[0];
    for (int p = 0; p < m; p++) {
      for (int q = p + 1; q <= m; q++) {
        gaps[p][q] = new Gap(date, q == m ? -1 : q, p);
        cuts = joined(cuts, roots(gaps[p][q], low, high));
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
      double[] values = new Gap(date, far, near).values(count, from, side * h);
      result.add(new HalfLine(at, side, h, values));
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
      double gain = -gaps[p][choice < 0 ? m : choice].at(u);
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
      // A step that falls on the nodes of the next date makes one convolution of the whole grid.
      double matched = lines.get(0).spacing() / decay;
      if (matched <= limit * (1 + 1e-12) && matched >= 0.5 * limit) {
        return matched;
      }
    }
    return 0.8 * limit;
  }

  private static double[] joined(double[] a, double[] b) {
    double[] all = Arrays.copyOf(a, a.length + b.length);
    System.arraycopy(b, 0, all, a.length, b.length);
    return all;
  }

  /** Changes of sign between points of a scan, and where the function nearly touches 0 between. */
  private static double[] roots(Gap gap, double low, double high) {
    double by = (high - low) / SCAN;
    double[] f = gap.values(SCAN + 1, low, by);
    double[] found = new double[0];
    for (int k = 0; k < SCAN; k++) {
      double a = low + k * by;
      if (f[k] > 0 != f[k + 1] > 0) {
        found = joined(found, new double[] {root(gap, a, f[k], a + by, f[k + 1])});
      } else if (k + 2 <= SCAN
          && f[k + 1] > 0 == f[k + 2] > 0
          && Math.abs(f[k + 1]) < Math.abs(f[k])
          && Math.abs(f[k + 1]) <= Math.abs(f[k + 2])) {
        found = joined(found, between(gap, a, a + 2 * by, f[k], f[k + 2]));
      }
    }
    return found;
  }

  /** Two roots between points of one sign, if the least magnitude between them changes it. */
  private static double[] between(Gap gap, double from, double to, double first, double last) {
    double golden = 0.5 * (3 - Math.sqrt(5));
    double sign = Math.signum(first);
    double a = from;
    double b = to;
    double x = a + golden * (b - a);
    double y = b - golden * (b - a);
    double fx = sign * gap.at(x);
    double fy = sign * gap.at(y);
    for (int i = 0; i < NEAR_MISS_STEPS; i++) {
      if (Math.min(fx, fy) < 0) {
        double inside = fx < fy ? x : y;
        double value = sign * Math.min(fx, fy);
        return new double[] {
          root(gap, from, first, inside, value), root(gap, inside, value, to, last)
        };
      }
      if (fx < fy) {
        b = y;
        y = x;
        fy = fx;
        x = a + golden * (b - a);
        fx = sign * gap.at(x);
      } else {
        a = x;
        x = y;
        fx = fy;
        y = b - golden * (b - a);
        fy = sign * gap.at(y);
      }
    }
    return new double[0];
  }

  /** Regula falsi with halved weights (Illinois), kept in the bracket. */
  private static double root(Gap gap, double from, double first, double to, double last) {
    double a = from;
    double fa = first;
    double b = to;
    double fb = last;
    double x = a;
    for (int i = 0; i < MOST_STEPS && Math.abs(b - a) > 1e-9; i++) {
      double next = b - fb * (b - a) / (fb - fa);
      if (!(next > Math.min(a, b) && next < Math.max(a, b))) {
        next = 0.5 * (a + b);
      }
      double moved = Math.abs(next - x);
      x = next;
      double fx = gap.at(x);
      if (fx == 0 || moved < 1e-8) {
        return x;
      }
      if (fx > 0 != fb > 0) {
        a = b;
        fa = fb;
      } else {
        fa *= 0.5;
      }
      b = x;
      fb = fx;
    }
    return 0.5 * (a + b);
  }
}
