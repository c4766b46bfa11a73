package ebbline.instrument;

import ebbline.time.DayCount;
import ebbline.time.Moment;
import java.util.Objects;

/** One payment of the redemption at maturity. */
public record ZeroBond(BondTerms terms) implements CouponBond {

  public ZeroBond {
    Objects.requireNonNull(terms, "terms");
  }

  /**
   * A zero bond settled today.
   *
   * @param redemption per 100 face; above 0
   */
  public static ZeroBond of(Moment maturity, double redemption) {
    return new ZeroBond(
        BondTerms.of(maturity, 2, DayCount.ACT_ACT_ICMA).withRedemption(redemption));
  }

  public Moment maturity() {
    return terms.maturity();
  }

  @Override
  public String kind() {
    return "zero-bond";
  }

  @Override
  public FixedLeg leg() {
    return FixedLeg.of(terms, 0);
  }
}
