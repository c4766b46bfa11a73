package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.Objects;

/**
 * A European option on a zero bond.
 *
 * @param expiry moment of exercise; today is allowed
 * @param strike price of the bond, per 100 face; finite
 */
public record ZeroOption(OptionKind option, Moment expiry, ZeroBond underlying, double strike)
    implements Instrument {

  public ZeroOption {
    Objects.requireNonNull(option, "option");
    Objects.requireNonNull(expiry, "expiry");
    Objects.requireNonNull(underlying, "underlying");
    if (!Double.isFinite(strike)) {
      throw new IllegalArgumentException("strike must be finite, found " + strike);
    }
  }

  @Override
  public String kind() {
    return "zero-option";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    double exercise = OptionClaim.exercise(expiry, axis);
    Terms.requireAfter(
        "maturity", underlying.maturity(), axis.years(underlying.maturity()), exercise, "expiry");
    return OptionClaim.of(option, exercise, underlying.claim(axis).flows(), strike);
  }
}
