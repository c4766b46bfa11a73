package ebbline.curve;

import java.util.Arrays;
import java.util.Objects;

/**
 * One discount factor a calendar day, so that flows which fall on whole days are discounted by a
 * load and no interpolation; the factors are the curve's own, to the last bit.
 *
 * <p>Day d stands at d / (days per year) years, which is act/365f for 365. Sixty years take 175 kB.
 * Immutable.
 */
public final class DayTable {
  /** Days held at most: 800 years. */
  public static final int MOST_DAYS = 292_200;

  private final double[] discounts;
  private final double daysPerYear;

  private DayTable(double[] discounts, double daysPerYear) {
    this.discounts = discounts;
    this.daysPerYear = daysPerYear;
  }

  /**
   * @param lastDay the last day held, counted from today as day 0; at most {@link #MOST_DAYS}
   * @param daysPerYear days that make a year of the curve's time, 365 for act/365f
   */
  public static DayTable of(DiscountCurve curve, int lastDay, double daysPerYear) {
    Objects.requireNonNull(curve, "curve");
    if (!(lastDay >= 0 && lastDay <= MOST_DAYS)) {
      throw new IllegalArgumentException(
          "a day table holds 0 to " + MOST_DAYS + " days, found " + lastDay);
    }
    if (!(daysPerYear > 0 && Double.isFinite(daysPerYear))) {
      throw new IllegalArgumentException(
          "days per year must be positive and finite, found " + daysPerYear);
    }
    double[] discounts = new double[lastDay + 1];
    for (int day = 0; day <= lastDay; day++) {
      discounts[day] = curve.discount(day / daysPerYear);
    }
    return new DayTable(discounts, daysPerYear);
  }

  public int lastDay() {
    return discounts.length - 1;
  }

  public double daysPerYear() {
    return daysPerYear;
  }

  /**
   * P(0, day).
   *
   * @param day from 0 to {@link #lastDay}
   */
  public double discount(int day) {
    return discounts[day];
  }

  /**
   * Present value of flows {@code from} to {@code to} − 1, summed in four fixed strands: the same
   * bits on every run.
   *
   * @param days of the flows, each from 0 to {@link #lastDay}
   * @param amounts of the flows
   */
  public double presentValue(int[] days, double[] amounts, int from, int to) {
    double[] table = discounts;
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int i = from;
    for (; i + 3 < to; i += 4) {
      s0 += amounts[i] * table[days[i]];
      s1 += amounts[i + 1] * table[days[i + 1]];
      s2 += amounts[i + 2] * table[days[i + 2]];
      s3 += amounts[i + 3] * table[days[i + 3]];
    }
    for (; i < to; i++) {
      s0 += amounts[i] * table[days[i]];
    }
    return (s0 + s1) + (s2 + s3);
  }

  /**
   * Present value of one unit on each of the days {@code from} to {@code to} − 1: what a level
   * coupon is worth per unit.
   *
   * @param days each from 0 to {@link #lastDay}
   */
  public double annuity(int[] days, int from, int to) {
    double[] table = discounts;
    double s0 = 0;
    double s1 = 0;
    int i = from;
    for (; i + 1 < to; i += 2) {
      s0 += table[days[i]];
      s1 += table[days[i + 1]];
    }
    return i < to ? s0 + s1 + table[days[i]] : s0 + s1;
  }

  /** All factors, from day 0. A fresh array. */
  public double[] discounts() {
    return Arrays.copyOf(discounts, discounts.length);
  }
}
