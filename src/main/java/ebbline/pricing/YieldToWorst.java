package ebbline.pricing;

import ebbline.bond.BondYield;
import ebbline.instrument.CallableBond;
import ebbline.instrument.PlacedLeg;
import ebbline.instrument.QuoteTerms;
import ebbline.time.TimeAxis;
import java.util.Map;

/** The least of the yield to maturity and the yields to each call that lies ahead. */
final class YieldToWorst {
  private YieldToWorst() {}

  static double of(
      CallableBond bond, PlacedLeg leg, QuoteTerms quote, double dirty, TimeAxis axis) {
    double worst = BondYield.of(leg.yieldTerms(), quote).yieldOf(dirty);
    for (Map.Entry<Double, Double> call : bond.callsAfterSettlement(axis).entrySet()) {
      double toCall =
          BondYield.of(leg.yieldTermsTo(call.getKey(), call.getValue()), quote).yieldOf(dirty);
      worst = Math.min(worst, toCall);
    }
    return worst;
  }
}
