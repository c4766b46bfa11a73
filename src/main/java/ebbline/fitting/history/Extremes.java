package ebbline.fitting.history;

/**
 * The lowest and highest rate, and the largest move where it could matter.
 *
 * @param lowest rate
 * @param highest rate
 * @param largestMove its square; 0 where no move can be half of all squared moves
 * @param after number of the rate that it leads to, from 0
 */
record Extremes(double lowest, double highest, double largestMove, int after) {

  /**
   * Of at least one rate.
   *
   * @param squaredChanges their sum
   */
  static Extremes of(double[] x, double squaredChanges) {
    double low = x[0];
    double high = x[0];
    for (double here : x) {
      // Plain comparisons: hardly ever true, so they cost next to nothing.
      if (here < low) {
        low = here;
      }
      if (here > high) {
        high = here;
      }
    }
    // No move is longer than the range, which spares long histories a pass.
    double range = high - low;
    if (!(range * range > 0.4 * squaredChanges)) {
      return new Extremes(low, high, 0, 0);
    }
    double largest = 0;
    int where = 0;
    for (int i = 1; i < x.length; i++) {
      double move = x[i] - x[i - 1];
      if (move * move > largest) {
        largest = move * move;
        where = i;
      }
    }
    return new Extremes(low, high, largest, where);
  }
}
