package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import java.util.ArrayList;
import java.util.List;

/**
 * A claim's rights in the terms of the induction: what each exchanges, when, and how the state
 * moves between.
 *
 * <p>Rights between which nothing random happens form one date; the first of them decides first.
 */
final class Decisions {
  /**
   * Dates are one where the step between them adds less than this to the state's deviation: waiting
   * is then worth about the square of it.
   */
  private static final double NO_STEP = 3e-5;

  /** Sensitivity in deviations beyond which values no longer fit into a double's range. */
  private static final double MOST_LOADING = 30;

  /** One right: gives {@code received} for the claim's flows from {@code kept} on. */
  record Exchange(Right.Party party, DeflatedFlows received, int kept) {}

  /** Rights at one moment. */
  record Date(double time, double deviation, double low, double high, List<Exchange> rights) {}

  private final GaussianRates rates;
  private final double[] times;
  private final double[] worth;
  private final double horizon;
  private final List<Date> dates = new ArrayList<>();
  private double size;
  private double merged;
  private final int order;

  Decisions(Claim claim, GaussianRates rates) {
    this.rates = rates;
    DiscountCurve curve = rates.curve();
    CashFlows flows = claim.flows();
    times = flows.times();
    worth = worth(flows, curve);
    List<Right> rights = claim.rights();
    horizon = rights.get(rights.size() - 1).decision();
    double latest = times.length == 0 ? horizon : Math.max(horizon, times[times.length - 1]);
    for (Right right : rights) {
      CashFlows received = right.received();
      latest = Math.max(latest, received.isEmpty() ? 0 : received.time(received.size() - 1));
    }
    for (int i = 0; i < rights.size(); ) {
      double time = rights.get(i).decision();
      List<Exchange> group = new ArrayList<>();
      do {
        group.add(exchange(rights.get(i), curve));
        i++;
      } while (i < rights.size() && isStill(time, rights.get(i).decision()));
      dates.add(date(time, latest, group));
    }
    order = SingleBoundary.order(claim);
  }

  /**
   * 1 if holding on is worth more than any right at low rates and less at high ones, with one
   * boundary between; −1 the other way round; 0 if nothing of the kind is known.
   */
  int order() {
    return order;
  }

  private static double[] worth(CashFlows flows, DiscountCurve curve) {
    double[] worth = new double[flows.size()];
    for (int i = 0; i < worth.length; i++) {
      worth[i] = flows.amount(i) * curve.discount(flows.time(i));
    }
    return worth;
  }

  private Exchange exchange(Right right, DiscountCurve curve) {
    double[] taken = worth(right.received(), curve);
    double sum = 0;
    for (double w : taken) {
      sum += Math.abs(w);
    }
    int kept = times.length;
    while (kept > 0 && times[kept - 1] > right.keptUntil() + ebbline.time.TimeAxis.SAME_MOMENT) {
      kept--;
      sum += Math.abs(worth[kept]);
    }
    size = Math.max(size, sum);
    return new Exchange(right.party(), DeflatedFlows.of(right.received().times(), taken), kept);
  }

  private boolean isStill(double from, double to) {
    double variance = rates.variance(to);
    double step = rates.stateVariance(from, to);
    if (variance == 0 || step == 0) {
      return true;
    }
    double deviation = Math.sqrt(step / variance);
    if (deviation < NO_STEP) {
      merged += deviation * deviation;
      return true;
    }
    return false;
  }

  private Date date(double time, double latest, List<Exchange> group) {
    double deviation = Math.sqrt(rates.variance(time));
    double most = DeflatedFlows.loading(rates, deviation, time, horizon, latest);
    double least = DeflatedFlows.loading(rates, deviation, time, horizon, time);
    if (!(most - least <= MOST_LOADING)) {
      throw new IllegalArgumentException(
          "bonds must not vary by more than e^"
              + (int) MOST_LOADING
              + " a standard deviation of the rate; lower the volatility or raise the mean"
              + " reversion, found e^"
              + (float) (most - least)
              + " at time "
              + (float) time);
    }
    return new Date(time, deviation, Math.max(0, most), Math.max(0, -least), List.copyOf(group));
  }

  List<Date> dates() {
    return dates;
  }

  /** The largest sum of magnitudes that any right exchanges, as present value. */
  double size() {
    return size;
  }

  /** The most by which a bond's logarithm varies for a deviation of the state, at any date. */
  double mostLoading() {
    double most = 0;
    for (Date date : dates) {
      most = Math.max(most, date.low() + date.high());
    }
    return most;
  }

  /** The sum of squared deviations of the steps that were taken for none. */
  double merged() {
    return merged;
  }

  /** ρ of the step between two dates: u later has mean ρ u. */
  double decay(Date from, Date to) {
    return Math.exp(-rates.meanReversion() * (to.time() - from.time()))
        * (from.deviation() / to.deviation());
  }

  /** Deviation of u at the later date given the earlier one. */
  double step(Date from, Date to) {
    return Math.sqrt(rates.stateVariance(from.time(), to.time())) / to.deviation();
  }

  /** What one right exchanges less what another does; null stands for nothing exchanged. */
  DeflatedFlows difference(Exchange first, Exchange second) {
    int from = first == null ? times.length : first.kept();
    int to = second == null ? times.length : second.kept();
    int low = Math.min(from, to);
    int n = Math.max(from, to) - low;
    double[] t = new double[n];
    double[] w = new double[n];
    for (int i = 0; i < n; i++) {
      t[i] = times[low + i];
      w[i] = from < to ? -worth[low + i] : worth[low + i];
    }
    DeflatedFlows result = DeflatedFlows.of(t, w);
    result = first == null ? result : result.plus(first.received(), 1);
    return second == null ? result : result.plus(second.received(), -1);
  }

  DeflatedFlows.Seen seen(DeflatedFlows flows, Date date) {
    return flows.from(rates, date.deviation(), date.time(), horizon);
  }
}
