package ebbline.check;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.Vasicek;
import ebbline.pricing.BestMethod;
import ebbline.pricing.Discounting;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The callable bond with notice under Vasicek. */
final class CallableCases implements ShortRateCases.Computation {
  private static final int COUPONS = 21;
  private static final int FIRST_CALL = 10;
  private static final double FIRST_COUPON = 0.172;

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in) {
    if (!c.topic().equals("callable")) {
      return Optional.empty();
    } else if (c.id().endsWith("thresholds")) {
      return Optional.of(
          CaseResult.notComputed(
              c, "rates at which the issuer calls are not an output of this version"));
    }
    GaussianRates rates =
        new Vasicek(in.number("r0"), in.number("theta_Q"), in.number("kappa"), in.number("sigma"))
            .rates();
    Claim claim = claim(in);
    return Optional.of(
        c.id().endsWith("straight")
            ? CaseResult.of(
                c,
                "the bond without calls",
                Discounting.value(claim.flows(), rates.curve()).presentValue())
            : CaseResult.of(c, "the callable bond", BestMethod.value(claim, rates).presentValue()));
  }

  /** The case's times are given as text; they are 0.172 and whole years after. */
  private static Claim claim(CaseInputs in) {
    double principal = in.number("principal");
    double notice = notice(in.text("notice_years"));
    double[] prices = in.numbers("call_prices");
    double[] times = new double[COUPONS];
    double[] amounts = new double[COUPONS];
    List<Right> rights = new ArrayList<>();
    for (int i = 0; i < COUPONS; i++) {
      times[i] = FIRST_COUPON + i;
      amounts[i] = in.number("coupon") * principal + (i == COUPONS - 1 ? principal : 0);
      int call = i - FIRST_CALL;
      if (call >= 0 && call < prices.length) {
        CashFlows paid = CashFlows.single(times[i], prices[call] * principal);
        rights.add(new Right(Right.Party.ISSUER, times[i] - notice, times[i], paid));
      }
    }
    return new Claim(CashFlows.of(times, amounts), rights, 0, 0);
  }

  private static double notice(String text) {
    int slash = text.indexOf('/');
    return slash < 0
        ? Double.parseDouble(text)
        : Double.parseDouble(text.substring(0, slash))
            / Double.parseDouble(text.substring(slash + 1));
  }
}
