package ebbline.data;

import ebbline.fitting.quotes.SmithWilsonBuilder;
import java.util.OptionalDouble;

/**
 * What Smith and Wilson's curve needs besides its quotes or nodes; whatever is empty is not given.
 *
 * @param ultimateForward annually compounded, decimal per year
 * @param convergence years
 * @param speed per year; searched where it is not given
 * @param tolerance of the search, at the convergence point, decimal per year
 */
public record KernelSettings(
    OptionalDouble ultimateForward,
    OptionalDouble convergence,
    OptionalDouble speed,
    OptionalDouble tolerance) {
  /** Years; that of the regulator's euro curve. */
  private static final double USUAL_CONVERGENCE = 60;

  /** What is missing where {@link #isComplete} says so. */
  public static final String NEEDED =
      "smith-wilson needs an ultimate forward rate, and a speed or the convergence point to search"
          + " it for: '# ultimate-forward: 3.45%' and '# speed: 0.12' or '# convergence: 60Y'";

  /** Nothing given. */
  public static final KernelSettings NONE =
      new KernelSettings(
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty(),
          OptionalDouble.empty());

  /** These, and the other's where these are silent. */
  public KernelSettings or(KernelSettings other) {
    return new KernelSettings(
        first(ultimateForward, other.ultimateForward),
        first(convergence, other.convergence),
        first(speed, other.speed),
        first(tolerance, other.tolerance));
  }

  private static OptionalDouble first(OptionalDouble one, OptionalDouble other) {
    return one.isPresent() ? one : other;
  }

  /** Whether a curve can be made from these. */
  public boolean isComplete() {
    return ultimateForward.isPresent() && (speed.isPresent() || convergence.isPresent());
  }

  /**
   * The builder of these settings.
   *
   * @throws IllegalArgumentException in words if one is out of range
   */
  public SmithWilsonBuilder builder() {
    // Without a convergence point there is nothing to search; the speed then is given.
    SmithWilsonBuilder builder =
        SmithWilsonBuilder.of(ultimateForward.orElseThrow(), convergence.orElse(USUAL_CONVERGENCE));
    if (tolerance.isPresent()) {
      builder = builder.withTolerance(tolerance.getAsDouble());
    }
    return speed.isPresent() ? builder.withSpeed(speed.getAsDouble()) : builder;
  }
}
