package ebbline.fitting.history;

import java.util.Arrays;

/**
 * Observed rates at increasing times. Immutable; missing observations are dropped, so that a gap is
 * a longer step.
 */
public final class RateHistory {
  /** Steps that differ by less than this share of themselves are equal. */
  private static final double SAME_STEP = 1e-9;

  private final double[] times;
  private final double[] rates;
  private final int missing;
  private final boolean regular;

  /** Of uneven steps; null where they are even. */
  private final StepGroups groups;

  private RateHistory(double[] times, double[] rates, int missing, boolean regular) {
    this(times, rates, missing, regular, regular ? null : StepGroups.of(times));
  }

  private RateHistory(
      double[] times, double[] rates, int missing, boolean regular, StepGroups groups) {
    this.times = times;
    this.rates = rates;
    this.missing = missing;
    this.regular = regular;
    this.groups = groups;
  }

  /**
   * @param times years, strictly increasing; the origin does not matter
   * @param rates decimals per year; NaN stands for a missing observation
   * @throws IllegalArgumentException if lengths differ, times do not increase or a rate is infinite
   */
  public static RateHistory of(double[] times, double[] rates) {
    if (times.length != rates.length) {
      throw new IllegalArgumentException(
          "a history has as many times as rates, found " + times.length + " and " + rates.length);
    }
    double[] t = new double[times.length];
    double[] r = new double[times.length];
    int count = 0;
    for (int i = 0; i < times.length; i++) {
      if (!(Double.isFinite(times[i]) && (i == 0 || times[i] > times[i - 1]))) {
        throw new IllegalArgumentException(
            "times of a history must increase, found " + times[i] + " in place " + (i + 1));
      }
      requireRate(rates[i]);
      if (!Double.isNaN(rates[i])) {
        t[count] = times[i];
        r[count++] = rates[i];
      }
    }
    t = Arrays.copyOf(t, count);
    r = Arrays.copyOf(r, count);
    return new RateHistory(t, r, times.length - count, evenlySpaced(t));
  }

  /**
   * Evenly spaced rates.
   *
   * @param step years between two rates, positive
   * @param rates decimals per year; NaN stands for a missing observation
   * @throws IllegalArgumentException if the step is not positive or a rate is infinite
   */
  public static RateHistory ofStep(double step, double[] rates) {
    if (!(step > 0 && Double.isFinite(step))) {
      throw new IllegalArgumentException("the step must be positive, found " + step);
    }
    double[] t = new double[rates.length];
    double[] r = new double[rates.length];
    int count = 0;
    boolean gap = false;
    for (int i = 0; i < rates.length; i++) {
      requireRate(rates[i]);
      if (!Double.isNaN(rates[i])) {
        gap |= count > 0 && t[count - 1] != (i - 1) * step;
        t[count] = i * step;
        r[count++] = rates[i];
      }
    }
    t = Arrays.copyOf(t, count);
    r = Arrays.copyOf(r, count);
    return new RateHistory(t, r, rates.length - count, !gap || evenlySpaced(t));
  }

  private static void requireRate(double rate) {
    if (!(Double.isNaN(rate) || Math.abs(rate) < 1e6)) {
      throw new IllegalArgumentException("a rate of a history must be finite, found " + rate);
    }
  }

  private static boolean evenlySpaced(double[] t) {
    if (t.length < 2) {
      return true;
    }
    double mean = (t[t.length - 1] - t[0]) / (t.length - 1);
    // Rounding of i × step and of differences of dates grows with the times themselves.
    double slack = SAME_STEP * mean + 4 * Math.ulp(Math.abs(t[0]) + Math.abs(t[t.length - 1]));
    for (int i = 1; i < t.length; i++) {
      if (!(Math.abs(t[i] - t[i - 1] - mean) <= slack)) {
        return false;
      }
    }
    return true;
  }

  /** Rates that are there. */
  public int size() {
    return rates.length;
  }

  /** Rates that were given as missing. */
  public int missing() {
    return missing;
  }

  public double time(int i) {
    return times[i];
  }

  public double rate(int i) {
    return rates[i];
  }

  /** Whether all steps between rates that are there are equal. */
  public boolean isRegular() {
    return regular;
  }

  /** Years from the first to the last rate; 0 for fewer than two. */
  public double span() {
    return times.length < 2 ? 0 : times[times.length - 1] - times[0];
  }

  /** Mean years between two rates; 0 for fewer than two. */
  public double step() {
    return times.length < 2 ? 0 : span() / (times.length - 1);
  }

  /** The part from the {@code from}-th rate up to but not including the {@code to}-th. */
  public RateHistory between(int from, int to) {
    double[] t = Arrays.copyOfRange(times, from, to);
    double[] r = Arrays.copyOfRange(rates, from, to);
    return new RateHistory(t, r, 0, regular || evenlySpaced(t));
  }

  /** The same times with other rates; for simulated histories. */
  RateHistory withRates(double[] other) {
    return new RateHistory(times, other, missing, regular, groups);
  }

  /** Different lengths among the steps; 1 where they are even. */
  public int distinctSteps() {
    return regular ? 1 : groups.count();
  }

  StepGroups groups() {
    return groups;
  }

  double[] ratesInPlace() {
    return rates;
  }

  double mean() {
    double sum = 0;
    for (double r : rates) {
      sum += r;
    }
    return rates.length == 0 ? 0 : sum / rates.length;
  }

  /** Root of the mean squared deviation from the mean. */
  double deviation() {
    double mean = mean();
    double sum = 0;
    for (double r : rates) {
      sum += (r - mean) * (r - mean);
    }
    return rates.length == 0 ? 0 : Math.sqrt(sum / rates.length);
  }
}
