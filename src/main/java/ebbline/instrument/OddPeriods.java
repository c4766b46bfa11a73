package ebbline.instrument;

import ebbline.time.Moment;
import java.util.Objects;
import java.util.Optional;

/**
 * Where a bond's periods begin, and its odd first and last ones.
 *
 * @param issue where the first period starts; absent for a seasoned bond
 * @param firstCoupon end of an odd first period, a date; needs an issue
 * @param lastCoupon start of an odd last period, a date
 */
public record OddPeriods(
    Optional<Moment> issue, Optional<Moment> firstCoupon, Optional<Moment> lastCoupon) {

  /** A seasoned bond with regular periods back from maturity. */
  public static final OddPeriods NONE =
      new OddPeriods(Optional.empty(), Optional.empty(), Optional.empty());

  public OddPeriods {
    Objects.requireNonNull(issue, "issue");
    Objects.requireNonNull(firstCoupon, "firstCoupon");
    Objects.requireNonNull(lastCoupon, "lastCoupon");
  }

  /** A first period that starts at the issue, regular or a stub before regular ones. */
  public static OddPeriods from(Moment issue) {
    return new OddPeriods(Optional.of(issue), Optional.empty(), Optional.empty());
  }
}
