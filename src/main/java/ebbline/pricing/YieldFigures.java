package ebbline.pricing;

import ebbline.bond.BondYield;
import ebbline.instrument.PlacedLeg;
import ebbline.instrument.QuoteTerms;
import java.util.EnumMap;
import java.util.Map;

/** Yield, durations and dv01 of paper with fixed payments at a dirty price. */
final class YieldFigures {
  private final BondYield yields;

  YieldFigures(PlacedLeg leg, QuoteTerms quote) {
    this.yields = BondYield.of(leg.yieldTerms(), quote);
  }

  double yieldOf(double dirty) {
    return yields.yieldOf(dirty);
  }

  double dirtyPrice(double yield) {
    return yields.price(yield);
  }

  void put(double dirty, EnumMap<PriceFigure, Double> figures) {
    double yield = yieldOf(dirty);
    figures.putAll(
        Map.of(
            PriceFigure.YIELD, yield,
            PriceFigure.MACAULAY_DURATION, yields.macaulayDuration(yield),
            PriceFigure.MODIFIED_DURATION, yields.modifiedDuration(yield),
            PriceFigure.CONVEXITY, yields.convexity(yield),
            PriceFigure.DV01, yields.dv01(yield)));
  }
}
