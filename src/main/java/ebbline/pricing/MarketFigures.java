package ebbline.pricing;

import ebbline.bond.AssetSwap;
import ebbline.bond.ZSpread;
import ebbline.instrument.BookRow;
import ebbline.instrument.Claim;
import ebbline.instrument.CouponBond;
import ebbline.instrument.LegPeriod;
import ebbline.instrument.PlacedLeg;
import java.util.EnumMap;
import java.util.Optional;

/** What a row's quote says beside the curve's own price: market price, yield and spreads. */
final class MarketFigures {
  private MarketFigures() {}

  /** Dirty price of the row's quote; empty where it gives none. */
  static Optional<Double> dirty(BookRow row, Claim claim, Optional<YieldFigures> yields) {
    if (row.price().isPresent()) {
      return Optional.of(row.price().getAsDouble() + claim.accrued());
    } else if (row.yield().isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        yields
            .orElseThrow(
                () -> new IllegalArgumentException("this kind has no yield; give its price"))
            .dirtyPrice(row.yield().getAsDouble()));
  }

  /** Adds the figures. */
  static void put(
      BookRow row,
      Claim claim,
      Market market,
      double quoted,
      Optional<YieldFigures> yields,
      EnumMap<PriceFigure, Double> figures) {
    double clean = quoted - claim.accrued();
    figures.put(PriceFigure.MARKET_CLEAN_PRICE, clean);
    yields.ifPresent(y -> figures.put(PriceFigure.MARKET_YIELD, y.yieldOf(quoted)));
    figures.put(
        PriceFigure.Z_SPREAD,
        ZSpread.of(claim.flows(), market.curve(), claim.settlement(), quoted));
    figures.put(PriceFigure.RICHNESS, clean - figures.get(PriceFigure.CLEAN_PRICE));
    if (row.instrument() instanceof CouponBond bond) {
      PlacedLeg leg = bond.leg().on(market.axis());
      double[] payments =
          leg.periods().stream()
              .mapToDouble(LegPeriod::payment)
              .filter(t -> t > claim.settlement() + ebbline.time.TimeAxis.SAME_MOMENT)
              .toArray();
      figures.put(
          PriceFigure.ASSET_SWAP_SPREAD,
          AssetSwap.spread(claim.flows(), market.curve(), claim.settlement(), payments, quoted));
    }
  }
}
