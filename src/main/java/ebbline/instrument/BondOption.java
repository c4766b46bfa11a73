package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * A European option on a coupon bond.
 *
 * @param expiry moment of exercise; today is allowed
 * @param strike per 100 face; absent where it is at the money, the forward price
 * @param strikeKind whether accrued interest is added to the strike
 */
public record BondOption(
    OptionKind option,
    Moment expiry,
    CouponBond underlying,
    OptionalDouble strike,
    StrikeKind strikeKind)
    implements Instrument {

  /** What is paid on exercise. */
  public enum StrikeKind {
    /** The strike plus accrued interest. */
    CLEAN,
    /** The strike as it stands. */
    CASH;

    public static StrikeKind of(String text) {
      if (text.equalsIgnoreCase("clean")) {
        return CLEAN;
      } else if (text.equalsIgnoreCase("cash")) {
        return CASH;
      }
      throw new IllegalArgumentException("expected clean or cash");
    }
  }

  public BondOption {
    Objects.requireNonNull(option, "option");
    Objects.requireNonNull(expiry, "expiry");
    Objects.requireNonNull(underlying, "underlying");
    Objects.requireNonNull(strikeKind, "strikeKind");
    StrikeTerms.requireFinite(strike);
  }

  /** At a strike. */
  public BondOption(
      OptionKind option,
      Moment expiry,
      CouponBond underlying,
      double strike,
      StrikeKind strikeKind) {
    this(option, expiry, underlying, OptionalDouble.of(strike), strikeKind);
  }

  @Override
  public String kind() {
    return "bond-option";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    double exercise = OptionClaim.exercise(expiry, axis);
    PlacedLeg bond = underlying.leg().on(axis);
    CashFlows flows = bond.flowsAfter(exercise);
    double accrued = strikeKind == StrikeKind.CLEAN ? bond.accrued(exercise) : 0;
    OptionalDouble cash =
        strike.isPresent() ? OptionalDouble.of(strike.getAsDouble() + accrued) : strike;
    return OptionClaim.of(option, exercise, flows, cash);
  }
}
