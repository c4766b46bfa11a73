package ebbline.fitting.history;

import java.util.HashMap;
import java.util.Map;

/**
 * Which steps of an uneven history are equal. Dates make few lengths (one to five days, 28 to 31),
 * and all that a likelihood needs of equal steps are their sums.
 */
final class StepGroups {
  /** Steps that differ by less than this share of the mean step are equal. */
  private static final double SAME = 1e-10;

  private final int[] groupOf;
  private final double[] lengths;
  private final int[] sizes;

  private StepGroups(int[] groupOf, double[] lengths, int[] sizes) {
    this.groupOf = groupOf;
    this.lengths = lengths;
    this.sizes = sizes;
  }

  /**
   * @param times increasing
   */
  static StepGroups of(double[] times) {
    int n = Math.max(0, times.length - 1);
    int[] groupOf = new int[n];
    double[] lengths = new double[n];
    int[] sizes = new int[n];
    double unit = n == 0 ? 1 : SAME * (times[n] - times[0]) / n;
    Map<Double, Integer> known = new HashMap<>();
    for (int i = 0; i < n; i++) {
      double step = times[i + 1] - times[i];
      int group = known.computeIfAbsent(Math.rint(step / unit), key -> known.size());
      groupOf[i] = group;
      sizes[group]++;
      lengths[group] += (step - lengths[group]) / sizes[group];
    }
    int count = known.size();
    return new StepGroups(
        groupOf, java.util.Arrays.copyOf(lengths, count), java.util.Arrays.copyOf(sizes, count));
  }

  int count() {
    return lengths.length;
  }

  /** Years of the steps of a group. */
  double length(int group) {
    return lengths[group];
  }

  /** Steps in a group. */
  int size(int group) {
    return sizes[group];
  }

  /** The group of the {@code i}-th step. */
  int of(int i) {
    return groupOf[i];
  }
}
