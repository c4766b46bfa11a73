package ebbline.fitting.history;

/**
 * The lowest and highest rate, and the largest move.
 *
 * @param lowest rate
 * @param highest rate
 * @param largestMove its square
 * @param after number of the rate that it leads to, from 0
 */
record Extremes(double lowest, double highest, double largestMove, int after) {

  /** Of at least one rate. */
  static Extremes of(double[] x) {
    double low = x[0];
    double high = x[0];
    double largest = 0;
    int where = 0;
    double before = x[0];
    for (int i = 1; i < x.length; i++) {
      double here = x[i];
      double move = here - before;
      // Plain comparisons: hardly ever true, so they cost next to nothing.
      if (here < low) {
        low = here;
      }
      if (here > high) {
        high = here;
      }
      if (move * move > largest) {
        largest = move * move;
        where = i;
      }
      before = here;
    }
    return new Extremes(low, high, largest, where);
  }
}
