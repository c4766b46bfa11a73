package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.Objects;

/**
 * A European option on a coupon bond.
 *
 * @param expiry moment of exercise; today is allowed
 * @param strike per 100 face; finite
 * @param strikeKind whether accrued interest is added to the strike
 */
public record BondOption(
    OptionKind option, Moment expiry, CouponBond underlying, double strike, StrikeKind strikeKind)
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
    if (!Double.isFinite(strike)) {
      throw new IllegalArgumentException("strike must be finite, found " + strike);
    }
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
    return OptionClaim.of(option, exercise, flows, strike + accrued);
  }
}
