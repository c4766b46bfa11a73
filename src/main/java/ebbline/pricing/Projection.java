package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.FloatingCoupon;
import java.util.List;

/**
 * Floating coupons at the amounts that a curve's forward rates imply. For a rate fixed in advance
 * and paid at the end of its period this is what the coupon is worth, whatever the volatility.
 */
final class Projection {
  private Projection() {}

  /** The same claim with every floating coupon fixed at its forward. */
  static Claim fixed(Claim claim, DiscountCurve forwards) {
    if (claim.floating().isEmpty()) {
      return claim;
    }
    int n = claim.floating().size();
    double[] times = new double[n];
    double[] amounts = new double[n];
    double accrued = claim.accrued();
    for (int i = 0; i < n; i++) {
      FloatingCoupon coupon = claim.floating().get(i);
      times[i] = coupon.payment();
      double log = forwards.logDiscount(coupon.start()) - forwards.logDiscount(coupon.end());
      amounts[i] = coupon.amount(log);
      accrued += amounts[i] * coupon.accruedPart();
    }
    return new Claim(
        claim.flows().plus(CashFlows.of(times, amounts)),
        claim.rights(),
        List.of(),
        claim.settlement(),
        accrued);
  }
}
