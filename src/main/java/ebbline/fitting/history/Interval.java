package ebbline.fitting.history;

import java.util.OptionalDouble;
import org.apache.commons.statistics.distribution.NormalDistribution;

/**
 * A confidence interval; a side is absent where the sample sets no bound there.
 *
 * @param low lower end, absent where there is none
 * @param high upper end, absent where there is none
 * @param confidence in (0, 1)
 */
public record Interval(OptionalDouble low, OptionalDouble high, double confidence) {
  public Interval {
    requireConfidence(confidence);
    if (low.isPresent() && high.isPresent() && !(low.getAsDouble() <= high.getAsDouble())) {
      throw new IllegalArgumentException(
          "an interval runs upwards, found " + low.getAsDouble() + " to " + high.getAsDouble());
    }
  }

  static Interval of(double low, double high, double confidence) {
    return new Interval(OptionalDouble.of(low), OptionalDouble.of(high), confidence);
  }

  /** The symmetric one of large-sample theory, estimate ± quantile × standard error. */
  public static Interval gaussian(double estimate, double standardError, double confidence) {
    requireConfidence(confidence);
    double quantile =
        NormalDistribution.of(0, 1).inverseSurvivalProbability(0.5 * (1 - confidence));
    return of(estimate - quantile * standardError, estimate + quantile * standardError, confidence);
  }

  public boolean contains(double value) {
    return !(low.isPresent() && value < low.getAsDouble())
        && !(high.isPresent() && value > high.getAsDouble());
  }

  static void requireConfidence(double confidence) {
    if (!(confidence > 0 && confidence < 1)) {
      throw new IllegalArgumentException(
          "confidence must lie between 0 and 100 %, found " + confidence);
    }
  }
}
