package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * A European option on a zero bond.
 *
 * @param expiry moment of exercise; today is allowed
 * @param strike price of the bond, per 100 face; absent where it is at the money
 */
public record ZeroOption(
    OptionKind option, Moment expiry, ZeroBond underlying, OptionalDouble strike)
    implements Instrument {

  public ZeroOption {
    Objects.requireNonNull(option, "option");
    Objects.requireNonNull(expiry, "expiry");
    Objects.requireNonNull(underlying, "underlying");
    StrikeTerms.requireFinite(strike);
  }

  /** At a strike. */
  public ZeroOption(OptionKind option, Moment expiry, ZeroBond underlying, double strike) {
    this(option, expiry, underlying, OptionalDouble.of(strike));
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
