package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.FloatingCoupon;
import ebbline.instrument.Optionlet;
import ebbline.instrument.Right;
import ebbline.instrument.StrikeTerms;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Floating interest and strikes at the money as the curves imply them.
 *
 * <p>A floating coupon of the claim itself stands at its forward: for a rate fixed in advance and
 * paid at the end of its period this is what it is worth, whatever the volatility. Where a choice
 * hangs on the floating rate it must move with the model, so there the rate's growth is held at
 * today's multiple of the discounting curve's: the basis stands still.
 */
final class Projection {
  private final DiscountCurve discount;
  private final DiscountCurve forwards;

  private Projection(DiscountCurve discount, DiscountCurve forwards) {
    this.discount = discount;
    this.forwards = forwards;
  }

  /** The same claim with everything fixed that the curves can say. */
  static Claim fixed(Claim claim, DiscountCurve discount, DiscountCurve forwards) {
    boolean fixed =
        claim.floating().isEmpty()
            && claim.optionlets().isEmpty()
            && claim.rights().stream().allMatch(Right::isFixed);
    return fixed ? claim : new Projection(discount, forwards).of(claim);
  }

  private Claim of(Claim claim) {
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
        claim.rights().stream().map(this::right).toList(),
        List.of(),
        optionlets(claim.optionlets()),
        claim.settlement(),
        accrued);
  }

  /** How much more than the discounting curve's the growth of the floating rate is. */
  private double growthOver(double start, double end) {
    if (forwards.equals(discount)) {
      return 1;
    }
    return Math.exp(
        forwards.logDiscount(start)
            - forwards.logDiscount(end)
            - (discount.logDiscount(start) - discount.logDiscount(end)));
  }

  private Right right(Right right) {
    if (right.isFixed()) {
      return right;
    }
    int n = right.floating().size();
    double[] times = new double[3 * n];
    double[] amounts = new double[3 * n];
    for (int i = 0; i < n; i++) {
      FloatingCoupon coupon = right.floating().get(i);
      double later =
          Math.exp(discount.logDiscount(coupon.payment()) - discount.logDiscount(coupon.end()));
      double notional = coupon.notional() * later;
      times[i] = coupon.start();
      amounts[i] = notional * growthOver(coupon.start(), coupon.end());
      times[n + i] = coupon.end();
      amounts[n + i] = -notional;
      times[2 * n + i] = coupon.payment();
      amounts[2 * n + i] = coupon.margin();
    }
    CashFlows all = right.known().plus(CashFlows.sorted(times, amounts));
    Optional<StrikeTerms> strike = right.strike();
    if (strike.isPresent() && strike.get().value().isEmpty()) {
      CashFlows perUnit = strike.get().perUnit();
      double atTheMoney =
          -Discounting.value(all.merged(), discount).presentValue()
              / Discounting.value(perUnit, discount).presentValue();
      if (!Double.isFinite(atTheMoney)) {
        throw new IllegalArgumentException("there is no strike at the money here");
      }
      strike = Optional.of(new StrikeTerms(OptionalDouble.of(atTheMoney), perUnit));
      all = all.plus(perUnit.times(atTheMoney));
    }
    return right.fixed(all.merged(), strike);
  }

  private List<Optionlet> optionlets(List<Optionlet> optionlets) {
    double interest = 0;
    double annuity = 0;
    for (Optionlet each : optionlets) {
      double worth = each.notional() * discount.discount(each.end());
      double log = forwards.logDiscount(each.start()) - forwards.logDiscount(each.end());
      interest += worth * Math.expm1(log);
      annuity += worth * each.accrual();
    }
    List<Optionlet> fixed = new ArrayList<>();
    for (Optionlet each : optionlets) {
      fixed.add(
          each.at(each.strike().orElse(interest / annuity), growthOver(each.start(), each.end())));
    }
    return fixed;
  }
}
