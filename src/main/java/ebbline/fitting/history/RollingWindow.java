package ebbline.fitting.history;

import java.util.ArrayList;
import java.util.List;

/**
 * The estimate in one stretch of the history; a path of them shows whether one law holds
 * throughout.
 *
 * @param firstTime of the stretch
 * @param lastTime of the stretch
 * @param estimate by the method asked for, or why there is none
 */
public record RollingWindow(double firstTime, double lastTime, HistoryEstimate estimate) {

  /**
   * Estimates in windows of equal numbers of rates.
   *
   * @param length rates in a window, at least 4 and at most all
   * @param every rates between the starts of two windows, at least 1
   */
  public static List<RollingWindow> over(
      RateHistory history, HistoryMethod method, int length, int every) {
    if (!(length >= 4 && length <= history.size() && every >= 1)) {
      throw new IllegalArgumentException(
          "a window holds 4 to "
              + history.size()
              + " rates and moves by at least 1, found "
              + length
              + " moving by "
              + every);
    }
    List<RollingWindow> path = new ArrayList<>();
    for (int from = 0; from + length <= history.size(); from += every) {
      RateHistory window = history.between(from, from + length);
      path.add(
          new RollingWindow(
              history.time(from),
              history.time(from + length - 1),
              HistoryEstimator.estimate(window, method)));
    }
    return path;
  }
}
