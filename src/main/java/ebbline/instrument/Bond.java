package ebbline.instrument;

import ebbline.time.DayCount;
import ebbline.time.Moment;
import java.util.Objects;

/** A bond with one fixed coupon and one redemption at maturity. */
public record Bond(FixedLeg leg) implements CouponBond {

  public Bond {
    Objects.requireNonNull(leg, "leg");
  }

  public static Bond of(BondTerms terms, double coupon) {
    return new Bond(FixedLeg.of(terms, coupon));
  }

  /** A bond with regular periods, weekends only. */
  public static Bond of(
      Moment maturity,
      double coupon,
      int frequency,
      DayCount dayCount,
      double redemption,
      int settleDays) {
    return of(
        BondTerms.of(maturity, frequency, dayCount)
            .withRedemption(redemption)
            .withSettlement(settleDays, ebbline.time.ExDividend.never()),
        coupon);
  }

  @Override
  public String kind() {
    return "bond";
  }
}
