package ebbline.pricing;

import java.util.Objects;

/**
 * What a simulation says about a value with early exercise: an estimate whose expectation is not
 * above it, and one whose expectation is not below it.
 *
 * @param low biased low, by what the holder's policy loses or the bound on the issuer's lacks
 * @param high biased high
 * @param middle half their sum, its error from the same paths
 */
public record SimulatedBounds(Estimate low, Estimate high, Estimate middle) {

  public SimulatedBounds {
    Objects.requireNonNull(low, "low");
    Objects.requireNonNull(high, "high");
    Objects.requireNonNull(middle, "middle");
  }

  /** Half the distance between the two; 0 where chance has them cross. */
  public double halfGap() {
    return Math.max(0, 0.5 * (high.mean() - low.mean()));
  }
}
