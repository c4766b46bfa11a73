package ebbline.fitting.options;

import java.util.Objects;
import java.util.OptionalDouble;

/**
 * What a Hull–White calibration seeks.
 *
 * @param objective in which unit errors are squared
 * @param meanReversion held there; empty where it is fitted
 * @param stepEnds ends of all volatility steps but the last, years; empty for one volatility
 * @param bootstrap whether the steps are found one after the other, each from the quotes that
 *     expire in it; needs a mean reversion that is held
 * @param lowestMeanReversion per year
 * @param highestMeanReversion per year
 * @param iterations at most, for one start
 */
@SuppressWarnings("ArrayRecordComponent")
public record CalibrationTerms(
    Objective objective,
    OptionalDouble meanReversion,
    double[] stepEnds,
    boolean bootstrap,
    double lowestMeanReversion,
    double highestMeanReversion,
    int iterations) {
  static final double LOWEST_VOLATILITY = 1e-7;
  static final double HIGHEST_VOLATILITY = 1;

  public CalibrationTerms {
    Objects.requireNonNull(objective, "objective");
    Objects.requireNonNull(meanReversion, "meanReversion");
    stepEnds = stepEnds.clone();
    if (!(lowestMeanReversion < highestMeanReversion
        && lowestMeanReversion >= -1
        && highestMeanReversion <= 100)) {
      throw new IllegalArgumentException(
          "mean reversion is sought in a range within -1 to 100, found "
              + lowestMeanReversion
              + " to "
              + highestMeanReversion);
    }
    if (meanReversion.isPresent() && !(Math.abs(meanReversion.getAsDouble()) <= 100)) {
      throw new IllegalArgumentException(
          "mean reversion must lie between -100 and 100, found " + meanReversion.getAsDouble());
    }
    for (int i = 0; i < stepEnds.length; i++) {
      if (!(stepEnds[i] > (i == 0 ? 0 : stepEnds[i - 1]) && Double.isFinite(stepEnds[i]))) {
        throw new IllegalArgumentException(
            "volatility steps must end after today, one after the other, found " + stepEnds[i]);
      }
    }
    if (bootstrap && meanReversion.isEmpty()) {
      throw new IllegalArgumentException(
          "steps are found one after the other only where mean reversion is held; hold it, or fit"
              + " all together");
    }
    if (iterations < 1) {
      throw new IllegalArgumentException("iterations must be at least 1, found " + iterations);
    }
  }

  /** One volatility and mean reversion between −0.5 and 5, 200 iterations. */
  public static CalibrationTerms standard(Objective objective) {
    return new CalibrationTerms(
        objective, OptionalDouble.empty(), new double[0], false, -0.5, 5, 200);
  }

  public CalibrationTerms holding(double reversion) {
    return new CalibrationTerms(
        objective,
        OptionalDouble.of(reversion),
        stepEnds,
        bootstrap,
        lowestMeanReversion,
        highestMeanReversion,
        iterations);
  }

  public CalibrationTerms withSteps(double[] ends, boolean oneAfterTheOther) {
    return new CalibrationTerms(
        objective,
        meanReversion,
        ends,
        oneAfterTheOther,
        lowestMeanReversion,
        highestMeanReversion,
        iterations);
  }

  @Override
  public double[] stepEnds() {
    return stepEnds.clone();
  }

  int steps() {
    return stepEnds.length + 1;
  }
}
