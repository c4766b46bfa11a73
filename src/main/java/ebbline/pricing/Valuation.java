package ebbline.pricing;

import java.util.Objects;

/**
 * A value with the method that made it and a bound of its numerical error.
 *
 * @param presentValue money at the as-of date, per 100 face
 * @param method how
 * @param errorBound bound of the numerical error (for a simulation its standard error), same unit;
 *     at least 0
 */
public record Valuation(double presentValue, Method method, double errorBound) {

  public Valuation {
    Objects.requireNonNull(method, "method");
    if (!(Double.isFinite(presentValue) && errorBound >= 0 && Double.isFinite(errorBound))) {
      throw new IllegalArgumentException(
          "a value must be finite with a bound of at least 0, found "
              + presentValue
              + " with bound "
              + errorBound);
    }
  }
}
