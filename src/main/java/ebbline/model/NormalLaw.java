package ebbline.model;

/**
 * A normal law.
 *
 * @param mean finite
 * @param standardDeviation at least 0
 */
public record NormalLaw(double mean, double standardDeviation) {
  public NormalLaw {
    if (!(Double.isFinite(mean) && standardDeviation >= 0 && Double.isFinite(standardDeviation))) {
      throw new IllegalArgumentException(
          "a normal law has a finite mean and a deviation of at least 0, found "
              + mean
              + " and "
              + standardDeviation);
    }
  }

  /** The probability of a value below {@code bound}; 0 or 1 where nothing is random. */
  public double probabilityBelow(double bound) {
    if (standardDeviation == 0) {
      return mean < bound ? 1 : 0;
    }
    return StandardNormal.cdf((bound - mean) / standardDeviation);
  }
}
