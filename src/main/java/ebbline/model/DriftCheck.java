package ebbline.model;

import java.util.Arrays;

/**
 * How well the model's drift reprices the curve: discount factors recomputed by integrating the
 * mean of the short rate numerically, never read off the curve.
 *
 * @param worst largest |P_model/P_curve − 1|
 * @param at where, years
 * @param points number of discount factors compared
 */
public record DriftCheck(double worst, double at, int points) {
  private static final int RULE = 24;
  // On a panel this long (times |a|) e^(−at) is a polynomial of degree 47 to far below rounding.
  private static final double PANEL = 2;

  /** At the curve's nodes. */
  public static DriftCheck of(GaussianRates rates) {
    return at(rates, rates.curve().nodes());
  }

  /**
   * At other times.
   *
   * @param times positive and increasing, years
   */
  public static DriftCheck at(GaussianRates rates, double[] times) {
    double[] logs = logDiscounts(rates, times);
    double worst = 0;
    double where = 0;
    for (int i = 0; i < times.length; i++) {
      double error = Math.abs(Math.expm1(logs[i] - rates.curve().logDiscount(times[i])));
      if (!(error <= worst)) {
        worst = error;
        where = times[i];
      }
    }
    return new DriftCheck(worst, where, times.length);
  }

  /**
   * ln P_model at each time, by way of the drift.
   *
   * @param times positive and increasing, years
   */
  public static double[] logDiscounts(GaussianRates rates, double[] times) {
    double[] stops = stops(rates, times);
    double[] logs = new double[times.length];
    GaussLegendre rule = GaussLegendre.of(RULE);
    double integral = 0;
    double carry = 0;
    double from = 0;
    int next = 0;
    for (double to : stops) {
      int panels =
          (int) Math.ceil((to - from) * Math.max(1, Math.abs(rates.meanReversion())) / PANEL);
      for (int k = 0; k < panels; k++) {
        double a = from + (to - from) * k / panels;
        double b = from + (to - from) * (k + 1) / panels;
        double term = rule.integrate(rates::expectedShortRate, a, b) - carry;
        double sum = integral + term;
        carry = (sum - integral) - term;
        integral = sum;
      }
      from = to;
      if (next < times.length && times[next] == to) {
        logs[next++] = 0.5 * rates.integralVariance(0, to) - integral;
      }
    }
    return logs;
  }

  /** Every time at which the integrand may have a kink, and the times themselves. */
  private static double[] stops(GaussianRates rates, double[] times) {
    double last = 0;
    for (double time : times) {
      if (!(time > last && Double.isFinite(time))) {
        throw new IllegalArgumentException(
            "times to check must be positive and increase, found " + time);
      }
      last = time;
    }
    double end = last;
    double[] breaks = rates.curve().breaks();
    VolatilitySteps steps = rates.volatility();
    double[] all = Arrays.copyOf(times, times.length + breaks.length + steps.count());
    System.arraycopy(breaks, 0, all, times.length, breaks.length);
    for (int i = 0; i < steps.count(); i++) {
      all[times.length + breaks.length + i] = steps.from(i);
    }
    return Arrays.stream(all).filter(t -> t > 0 && t <= end).sorted().distinct().toArray();
  }
}
