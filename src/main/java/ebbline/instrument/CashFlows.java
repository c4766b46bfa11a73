package ebbline.instrument;

import java.util.Arrays;

/**
 * Amounts at times: two primitive arrays of one length, times in years from today, not decreasing.
 *
 * <p>Positive amounts are received by the holder. Immutable.
 */
public final class CashFlows {
  public static final CashFlows NONE = new CashFlows(new double[0], new double[0]);

  private final double[] times;
  private final double[] amounts;

  private CashFlows(double[] times, double[] amounts) {
    this.times = times;
    this.amounts = amounts;
  }

  /**
   * @throws IllegalArgumentException if the lengths differ, a figure is not finite, or times fall
   */
  public static CashFlows of(double[] times, double[] amounts) {
    if (times.length != amounts.length) {
      throw new IllegalArgumentException(
          "as many times as amounts, found " + times.length + " and " + amounts.length);
    }
    for (int i = 0; i < times.length; i++) {
      if (!(Double.isFinite(times[i]) && Double.isFinite(amounts[i]))) {
        throw new IllegalArgumentException(
            "flows must be finite, found " + amounts[i] + " at " + times[i]);
      }
      if (i > 0 && !(times[i] >= times[i - 1])) {
        throw new IllegalArgumentException(
            "flow times must not fall, found " + times[i] + " after " + times[i - 1]);
      }
    }
    return new CashFlows(times.clone(), amounts.clone());
  }

  public static CashFlows single(double time, double amount) {
    return of(new double[] {time}, new double[] {amount});
  }

  public int size() {
    return times.length;
  }

  public boolean isEmpty() {
    return times.length == 0;
  }

  public double time(int i) {
    return times[i];
  }

  public double amount(int i) {
    return amounts[i];
  }

  /** A fresh array. */
  public double[] times() {
    return times.clone();
  }

  /** A fresh array. */
  public double[] amounts() {
    return amounts.clone();
  }

  /** The flows after {@code moment}; one that falls on it belongs to the past. */
  public CashFlows after(double moment) {
    int from = 0;
    while (from < times.length && times[from] <= moment + ebbline.time.TimeAxis.SAME_MOMENT) {
      from++;
    }
    return new CashFlows(
        Arrays.copyOfRange(times, from, times.length),
        Arrays.copyOfRange(amounts, from, times.length));
  }

  /** Every amount times {@code factor}. */
  public CashFlows times(double factor) {
    double[] scaled = amounts.clone();
    for (int i = 0; i < scaled.length; i++) {
      scaled[i] *= factor;
    }
    return of(times, scaled);
  }

  /** Both lists in the order of time, flows at equal times kept apart. */
  public CashFlows plus(CashFlows other) {
    double[] t = new double[size() + other.size()];
    double[] a = new double[t.length];
    int i = 0;
    int j = 0;
    for (int k = 0; k < t.length; k++) {
      boolean mine = j >= other.size() || (i < size() && times[i] <= other.times[j]);
      t[k] = mine ? times[i] : other.times[j];
      a[k] = mine ? amounts[i++] : other.amounts[j++];
    }
    return new CashFlows(t, a);
  }

  /** Flows in any order of time, put into it; those at one time keep theirs. */
  public static CashFlows sorted(double[] times, double[] amounts) {
    Integer[] order = new Integer[times.length];
    Arrays.setAll(order, i -> i);
    Arrays.sort(order, (i, j) -> Double.compare(times[i], times[j]));
    double[] t = new double[order.length];
    double[] a = new double[order.length];
    for (int i = 0; i < order.length; i++) {
      t[i] = times[order[i]];
      a[i] = amounts[order[i]];
    }
    return of(t, a);
  }

  /** Flows at one time added up; those that cancel to nothing are left out. */
  public CashFlows merged() {
    double[] t = new double[size()];
    double[] a = new double[size()];
    int n = 0;
    for (int i = 0; i < size(); ) {
      double sum = 0;
      int from = i;
      while (i < size() && times[i] == times[from]) {
        sum += amounts[i++];
      }
      if (sum != 0) {
        t[n] = times[from];
        a[n++] = sum;
      }
    }
    return new CashFlows(Arrays.copyOf(t, n), Arrays.copyOf(a, n));
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof CashFlows that
        && Arrays.equals(times, that.times)
        && Arrays.equals(amounts, that.amounts);
  }

  @Override
  public int hashCode() {
    return 31 * Arrays.hashCode(times) + Arrays.hashCode(amounts);
  }

  @Override
  public String toString() {
    StringBuilder text = new StringBuilder("CashFlows[");
    for (int i = 0; i < times.length; i++) {
      text.append(i == 0 ? "" : ", ").append(amounts[i]).append(" at ").append(times[i]);
    }
    return text.append(']').toString();
  }
}
