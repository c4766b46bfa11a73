package ebbline.curve;

/** One interpolation through given nodes: its pieces, and how ln P depends on the nodes. */
interface Scheme {

  Pieces pieces();

  /** Adds weight × ∂ ln P(t)/∂ ln P(nodeᵢ) to {@code gradient[i]}; t at least 0. */
  void addGradient(double t, double weight, double[] gradient);

  /** Whether the forward has no jump. */
  boolean hasContinuousForward();

  /**
   * @param times nodes, positive and increasing, as {@link InterpolatedCurve} has checked
   * @param logs ln P at the nodes
   */
  static Scheme of(Interpolation interpolation, double[] times, double[] logs) {
    return switch (interpolation) {
      case LOG_LINEAR -> new LogLinear(times, logs);
      case LINEAR_ZERO -> new LinearZero(times, logs);
      case CUBIC -> new NaturalSpline(times, logs);
      case MONOTONE_CONVEX -> new MonotoneConvex(times, logs);
      case SMITH_WILSON ->
          throw new IllegalArgumentException(
              "smith-wilson needs an ultimate forward rate and a speed besides its nodes");
    };
  }

  /** Index of the interval (tᵢ₋₁, tᵢ] of the nodes that holds t, right-open; n beyond the last. */
  static int interval(double[] times, double t) {
    int low = 0;
    int high = times.length;
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (times[middle] <= t) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return low;
  }
}
