package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.OptionKind;
import ebbline.instrument.Optionlet;
import ebbline.instrument.RateBasis;
import ebbline.model.GaussianRates;
import ebbline.model.StandardNormal;
import java.util.List;

/**
 * Options on the rates of single periods: the growth over a period is lognormal under the forward
 * measure of its end, so each is Black's formula on the bonds of start and end.
 *
 * <p>Fixed in advance: Jamshidian 1989, J. Finance 44(1). Compounded in arrears: {@link
 * BackwardCaplet}.
 */
final class OptionletPricing {
  private static final double ROUNDING = Math.ulp(1.0);

  private OptionletPricing() {}

  static Valuation value(List<Optionlet> optionlets, GaussianRates rates) {
    double sum = 0;
    double bound = 0;
    for (Optionlet each : optionlets) {
      Valuation one = value(each, rates);
      sum += one.presentValue();
      bound += one.errorBound() + 0.5 * ROUNDING * sum;
    }
    return new Valuation(sum, Method.CLOSED_FORM, bound);
  }

  private static Valuation value(Optionlet optionlet, GaussianRates rates) {
    DiscountCurve curve = rates.curve();
    double v = deviation(optionlet, rates);
    double grown =
        optionlet.notional() * optionlet.growthOver() * curve.discount(optionlet.start());
    double owed = optionlet.notional() * optionlet.strikeGrowth() * curve.discount(optionlet.end());
    if (!(v < 1e150 && Double.isFinite(grown) && Double.isFinite(owed))) {
      throw new IllegalArgumentException(
          "under these parameters a flow is worth more than can be counted; they are too extreme");
    }
    double value =
        optionlet.option() == OptionKind.CALL
            ? BlackFormula.call(grown, owed, v)
            : BlackFormula.put(grown, owed, v);
    double logs =
        Math.abs(curve.logDiscount(optionlet.start()))
            + Math.abs(curve.logDiscount(optionlet.end()));
    double vega = 0;
    if (owed > 0 && v > 0) {
      double d = OutOfTheMoney.logRatio(grown, owed) / v + 0.5 * v;
      vega = grown * StandardNormal.density(d) * v;
    }
    // Bonds to a few units each, the deviation to eight.
    double size = grown + Math.abs(owed);
    return new Valuation(
        value, Method.CLOSED_FORM, ROUNDING * ((8 + 2 * logs) * size + 8 * vega + value));
  }

  /** Standard deviation of the log of what the growth, seen from the period's end, comes to. */
  static double deviation(Optionlet optionlet, GaussianRates rates) {
    if (optionlet.basis() == RateBasis.BACKWARD) {
      return BackwardCaplet.deviation(rates, optionlet.start(), optionlet.end());
    }
    return Math.sqrt(rates.variance(optionlet.start()))
        * rates.g(optionlet.end() - optionlet.start());
  }
}
