package ebbline.curve;

/** What the nodes of a curve must be. */
final class NodeRules {
  private NodeRules() {}

  static void check(double[] times, double[] logDiscounts) {
    if (times.length == 0 || times.length != logDiscounts.length) {
      throw new IllegalArgumentException(
          "a curve needs as many discounts as times and at least one, found "
              + logDiscounts.length
              + " and "
              + times.length);
    }
    double previous = 0;
    for (int i = 0; i < times.length; i++) {
      if (!(times[i] > previous && Double.isFinite(times[i]))) {
        throw new IllegalArgumentException(
            "node times must be positive and increase, found " + times[i] + " after " + previous);
      }
      if (!Double.isFinite(logDiscounts[i])) {
        throw new IllegalArgumentException(
            "log discounts must be finite, found " + logDiscounts[i] + " at " + times[i]);
      }
      previous = times[i];
    }
  }

  static double[] logs(double[] discounts) {
    double[] logs = new double[discounts.length];
    for (int i = 0; i < discounts.length; i++) {
      if (!(discounts[i] > 0 && Double.isFinite(discounts[i]))) {
        throw new IllegalArgumentException(
            "a discount factor must be positive, found " + discounts[i]);
      }
      logs[i] = Math.log(discounts[i]);
    }
    return logs;
  }
}
