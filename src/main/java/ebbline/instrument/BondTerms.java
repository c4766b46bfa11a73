package ebbline.instrument;

import ebbline.time.DayCount;
import ebbline.time.ExDividend;
import ebbline.time.Frequency;
import ebbline.time.Moment;
import java.util.Objects;

/**
 * What every paper with coupons and a redemption has in common.
 *
 * <p>With a dated maturity the coupons fall on dates and accrue by the day count; with a bare
 * number of years they fall every 1/frequency years back from maturity and accrue by exactly that.
 *
 * @param maturity last coupon and redemption
 * @param frequency coupons a year: 1, 2, 4 or 12
 * @param redemption per 100 face; at least 0
 * @param settleDays business days from the as-of date to settlement; dates only
 * @param exDividend from when a coupon goes to the seller; dates only
 */
public record BondTerms(
    Moment maturity,
    int frequency,
    double redemption,
    Conventions conventions,
    OddPeriods ends,
    int settleDays,
    ExDividend exDividend) {

  public BondTerms {
    Objects.requireNonNull(maturity, "maturity");
    Objects.requireNonNull(conventions, "conventions");
    Objects.requireNonNull(ends, "ends");
    Objects.requireNonNull(exDividend, "exDividend");
    Terms.requireRedemption(redemption);
    Frequency.of(frequency);
    if (settleDays < 0) {
      throw new IllegalArgumentException("settle_days must be at least 0, found " + settleDays);
    }
  }

  /** Regular periods, redeemed at 100, settled at once, never ex-dividend, weekends only. */
  public static BondTerms of(Moment maturity, int frequency, DayCount dayCount) {
    return new BondTerms(
        maturity, frequency, 100, Conventions.of(dayCount), OddPeriods.NONE, 0, ExDividend.never());
  }

  public BondTerms withRedemption(double amount) {
    return new BondTerms(maturity, frequency, amount, conventions, ends, settleDays, exDividend);
  }

  public BondTerms withEnds(OddPeriods odd) {
    return new BondTerms(maturity, frequency, redemption, conventions, odd, settleDays, exDividend);
  }

  public BondTerms withConventions(Conventions other) {
    return new BondTerms(maturity, frequency, redemption, other, ends, settleDays, exDividend);
  }

  public BondTerms withSettlement(int days, ExDividend ex) {
    return new BondTerms(maturity, frequency, redemption, conventions, ends, days, ex);
  }
}
