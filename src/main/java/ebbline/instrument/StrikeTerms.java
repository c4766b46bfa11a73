package ebbline.instrument;

import java.util.Objects;
import java.util.OptionalDouble;

/**
 * The strike of a right: what exercise brings for each unit of it.
 *
 * @param value money per 100 for a price, a decimal for a rate; absent where it is at the money,
 *     which only a curve can say
 * @param perUnit flows of exercise per unit of strike, seen from the holder of the claim; negative
 *     where the strike is paid
 */
public record StrikeTerms(OptionalDouble value, CashFlows perUnit) {

  public StrikeTerms {
    Objects.requireNonNull(value, "value");
    Objects.requireNonNull(perUnit, "perUnit");
    requireFinite(value);
  }

  static void requireFinite(OptionalDouble strike) {
    if (strike.isPresent() && !Double.isFinite(strike.getAsDouble())) {
      throw new IllegalArgumentException("strike must be finite, found " + strike.getAsDouble());
    }
  }
}
