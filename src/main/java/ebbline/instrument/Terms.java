package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;

/** Checks that several instruments make, with messages for the user. */
final class Terms {
  private Terms() {}

  static void requireRedemption(double redemption) {
    if (!(redemption > 0 && Double.isFinite(redemption))) {
      throw new IllegalArgumentException("redemption must be above 0, found " + redemption);
    }
  }

  static void requireAfter(
      String name, Moment moment, double time, double earlier, String earlierName) {
    if (!(time > earlier + TimeAxis.SAME_MOMENT)) {
      throw new IllegalArgumentException(
          name + " must lie after " + earlierName + ", found " + moment);
    }
  }
}
