package ebbline.check;

import ebbline.curve.Compounding;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.model.GaussianRates;
import ebbline.model.VolatilitySteps;
import java.util.Optional;

/**
 * Closed forms under Hull–White on the curves that the sources list, the model calibrated to its
 * own options first.
 */
final class HullWhiteCases implements ShortRateCases.Computation {
  private static final double DAYS_PER_YEAR = 365;

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in) {
    if (c.id().equals("HW-HULL32.1-analytic")) {
      return Optional.of(zeroPut(c, in));
    } else if (c.id().startsWith("HW-15m12pct-")) {
      return Optional.of(fifteenMonths(c, in));
    } else if (c.id().equals("HW-HULL32.8-call")) {
      return Optional.of(flatCurveCall(c, in));
    }
    return Optional.empty();
  }

  static GaussianRates rates(CaseInputs in, ebbline.curve.DiscountCurve curve) {
    return new GaussianRates(curve, in.number("a"), VolatilitySteps.constant(in.number("sigma")));
  }

  /** The listed zero rates, linear in the rate between the listed days. */
  static InterpolatedCurve listedCurve(CaseInputs in) {
    double[] times = in.numbers("days");
    double[] logs = in.numbers("zero_cc_act365_pct");
    for (int i = 0; i < times.length; i++) {
      times[i] /= DAYS_PER_YEAR;
      logs[i] *= -times[i] / 100;
    }
    return InterpolatedCurve.of(Interpolation.LINEAR_ZERO, times, logs);
  }

  private static CaseResult zeroPut(PublishedCase c, CaseInputs in) {
    double value =
        VasicekCases.option(
            CalibratedModel.of(rates(in, listedCurve(in))),
            -1,
            in.number("T_days") / DAYS_PER_YEAR,
            in.number("S_days") / DAYS_PER_YEAR,
            in.number("L"),
            in.number("K"));
    return CaseResult.of(c, "three-year put on a nine-year zero bond", value);
  }

  private static CaseResult flatCurveCall(PublishedCase c, CaseInputs in) {
    double rate = -Math.log(Compounding.SEMI_ANNUAL.discount(in.number("flat_semiannual"), 1));
    GaussianRates calibrated = CalibratedModel.of(rates(in, FlatCurve.of(rate)));
    Decomposition parts = Decomposition.ofDatedFlows(calibrated, in);
    return CaseResult.of(c, "call on the coupon bond", parts.bondOption(1));
  }

  /*
   * The source states the bond prices in the six-month rate R at expiry: P(T,S) = Â e^(−B̂ R). With
   * ln P = l − x g at both S and T + 0.5 and R = −ln P(T,T+0.5)/0.5, x falls out.
   */
  private static CaseResult fifteenMonths(PublishedCase c, CaseInputs in) {
    CaseInputs zeros = in.object("zero_cc");
    double[] times = zeros.names().stream().mapToDouble(Double::parseDouble).toArray();
    double[] logs = zeros.names().stream().mapToDouble(zeros::number).toArray();
    for (int i = 0; i < times.length; i++) {
      logs[i] *= -times[i];
    }
    GaussianRates rates =
        CalibratedModel.of(rates(in, InterpolatedCurve.of(Interpolation.LOG_LINEAR, times, logs)));
    Decomposition parts = Decomposition.ofDatedFlows(rates, in);
    double step = 0.5;
    double expiry = in.number("T");
    double near = parts.b(expiry + step);
    double far = parts.b(1.25);
    double logNear = rates.logBond(expiry, expiry + step, 0);
    double logFar = rates.logBond(expiry, 1.25, 0);
    return switch (c.id().substring("HW-15m12pct-".length())) {
      case "B(.25,.75)" -> CaseResult.of(c, "B(0.25,0.75)", near);
      case "B(.25,1.25)" -> CaseResult.of(c, "B(0.25,1.25)", far);
      case "Bhat" -> CaseResult.of(c, "B of the six-month rate", far / near * step);
      case "Ahat" ->
          CaseResult.of(c, "A of the six-month rate", Math.exp(logFar - far * logNear / near));
      case "RK" ->
          CaseResult.of(
              c, "six-month rate at the strike", (parts.boundary() * near - logNear) / step);
      case "K1" -> CaseResult.of(c, "strike of part 1", parts.strike(0));
      case "K2" -> CaseResult.of(c, "strike of part 2", parts.strike(1));
      case "put1" -> CaseResult.of(c, "put on part 1", parts.put(0));
      case "put2" -> CaseResult.of(c, "put on part 2", parts.put(1));
      default -> CaseResult.of(c, "put on the coupon bond", parts.bondOption(-1));
    };
  }
}
