package ebbline.pricing.simulation;

/**
 * The order in which a Brownian path is pinned down: its end first, then middles of what lies
 * between. The first coordinates of a point, which are the most even, so decide the most.
 *
 * <p>An orthogonal map of independent normals to independent normals: it changes no law. Steps
 * count as equally long, whatever their variances. Immutable.
 */
final class BridgeOrder {
  private final int[] at;
  private final int[] left;
  private final int[] right;
  private final double[] pull;
  private final double[] deviation;

  BridgeOrder(int steps) {
    at = new int[steps];
    left = new int[steps];
    right = new int[steps];
    pull = new double[steps];
    deviation = new double[steps];
    if (steps == 0) {
      return;
    }
    boolean[] known = new boolean[steps + 1];
    known[0] = true;
    known[steps] = true;
    at[0] = steps;
    deviation[0] = Math.sqrt(steps);
    for (int k = 1; k < steps; ) {
      // One sweep over the gaps that are open now.
      for (int from = 0; from < steps && k < steps; ) {
        int to = from + 1;
        while (!known[to]) {
          to++;
        }
        if (to - from > 1) {
          int middle = (from + to) >>> 1;
          at[k] = middle;
          left[k] = from;
          right[k] = to;
          pull[k] = (double) (middle - from) / (to - from);
          deviation[k] = Math.sqrt((double) (middle - from) * (to - middle) / (to - from));
          known[middle] = true;
          k++;
        }
        from = to;
      }
    }
  }

  /**
   * Turns rows in the order of importance into rows in the order of time.
   *
   * @param rows one a step; changed in place
   * @param path one row more than steps, overwritten
   */
  void inTime(double[][] rows, double[][] path, int count) {
    java.util.Arrays.fill(path[0], 0, count, 0);
    for (int k = 0; k < at.length; k++) {
      if (k == 0) {
        scale(rows[0], deviation[0], path[at[0]], count);
      } else {
        between(rows[k], path[left[k]], path[right[k]], pull[k], deviation[k], path[at[k]], count);
      }
    }
    for (int k = 0; k < at.length; k++) {
      difference(path[k], path[k + 1], rows[k], count);
    }
  }

  private static void scale(double[] normal, double deviation, double[] out, int count) {
    for (int i = 0; i < count; i++) {
      out[i] = deviation * normal[i];
    }
  }

  private static void between(
      double[] normal,
      double[] from,
      double[] to,
      double pull,
      double deviation,
      double[] out,
      int count) {
    for (int i = 0; i < count; i++) {
      out[i] = Math.fma(pull, to[i] - from[i], Math.fma(deviation, normal[i], from[i]));
    }
  }

  private static void difference(double[] from, double[] to, double[] out, int count) {
    for (int i = 0; i < count; i++) {
      out[i] = to[i] - from[i];
    }
  }
}
