package ebbline.pricing;

import ebbline.bond.ZSpread;
import ebbline.instrument.BookRow;
import ebbline.instrument.CallableBond;
import ebbline.instrument.Claim;
import ebbline.instrument.PlacedLeg;
import java.util.EnumMap;
import java.util.Optional;

/**
 * Prices, yields, spreads and sensitivities of a bond with rights in it. Durations and dv01 are at
 * a constant option-adjusted spread: the quote's where there is one, else 0.
 */
final class RightsFigures {
  private static final double BASIS_POINT = 1e-4;

  private final Market market;
  private final CallableBond bond;
  private final Claim claim;
  private final OptionAdjusted adjusted;
  private final EnumMap<PriceFigure, Double> figures;

  RightsFigures(
      Market market, CallableBond bond, Claim claim, EnumMap<PriceFigure, Double> figures) {
    this.market = market;
    this.bond = bond;
    this.claim = claim;
    this.adjusted = new OptionAdjusted(claim, market.rates().orElseThrow());
    this.figures = figures;
  }

  void put(BookRow row, Valuation value) {
    double scale = row.face() / 100;
    double dirty = value.presentValue() / market.curve().discount(claim.settlement());
    PlacedLeg leg = bond.leg().on(market.axis());
    YieldFigures yields = new YieldFigures(leg, row.quote());
    figures.put(PriceFigure.DIRTY_PRICE, dirty);
    figures.put(PriceFigure.CLEAN_PRICE, dirty - claim.accrued());
    figures.put(PriceFigure.ACCRUED, claim.accrued());
    figures.put(PriceFigure.YIELD, yields.yieldOf(dirty));
    figures.put(
        PriceFigure.YIELD_TO_WORST, YieldToWorst.of(bond, leg, row.quote(), dirty, market.axis()));
    double straight = Discounting.value(claim.flows(), market.curve()).presentValue();
    figures.put(PriceFigure.OPTION_VALUE, (value.presentValue() - straight) * scale);
    Optional<Double> quoted =
        row.oas().isPresent()
            ? Optional.of(adjusted.dirtyPrice(row.oas().getAsDouble()).presentValue())
            : MarketFigures.dirty(row, claim, Optional.of(yields));
    double spread = 0;
    if (quoted.isPresent()) {
      spread = row.oas().orElseGet(() -> adjusted.spread(quoted.get()));
      market(quoted.get(), spread, yields);
    }
    figures.put(PriceFigure.EFFECTIVE_DURATION, adjusted.effectiveDuration(spread));
    figures.put(PriceFigure.EFFECTIVE_CONVEXITY, adjusted.effectiveConvexity(spread));
    double down = adjusted.dirtyPrice(spread - BASIS_POINT).presentValue();
    double up = adjusted.dirtyPrice(spread + BASIS_POINT).presentValue();
    figures.put(PriceFigure.DV01, (down - up) / 2);
    double vega = 0;
    for (double each : adjusted.vega(spread)) {
      vega += each;
    }
    figures.put(PriceFigure.VEGA, vega);
  }

  private void market(double quoted, double spread, YieldFigures yields) {
    double clean = quoted - claim.accrued();
    figures.put(PriceFigure.MARKET_CLEAN_PRICE, clean);
    figures.put(PriceFigure.MARKET_YIELD, yields.yieldOf(quoted));
    figures.put(PriceFigure.OAS, spread);
    figures.put(
        PriceFigure.Z_SPREAD,
        ZSpread.of(claim.flows(), market.curve(), claim.settlement(), quoted));
    figures.put(PriceFigure.RICHNESS, clean - figures.get(PriceFigure.CLEAN_PRICE));
  }
}
