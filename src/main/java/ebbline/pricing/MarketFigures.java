package ebbline.pricing;

import ebbline.bond.AssetSwap;
import ebbline.bond.PrintedPrice;
import ebbline.bond.ZSpread;
import ebbline.instrument.BookRow;
import ebbline.instrument.Claim;
import ebbline.instrument.PlacedLeg;
import ebbline.instrument.PriceRounding;
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
    double exact =
        yields
            .orElseThrow(
                () -> new IllegalArgumentException("this kind has no yield; give its price"))
            .dirtyPrice(row.yield().getAsDouble());
    double clean = PrintedPrice.of(exact - claim.accrued(), row.quote().rounding());
    return Optional.of(
        row.quote().rounding() == PriceRounding.NONE ? exact : clean + claim.accrued());
  }

  /** The row's terms with accrued interest rounded where the row asks for it. */
  static Claim printed(BookRow row, Claim claim) {
    return claim.withAccrued(PrintedPrice.of(claim.accrued(), row.quote().rounding()));
  }

  /** Adds the figures. */
  static void put(
      Optional<PlacedLeg> fixed,
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
    if (fixed.isPresent()) {
      PlacedLeg leg = fixed.get();
      double[] payments = leg.paymentsAfter(claim.settlement());
      double[] faces = new double[payments.length];
      double before = claim.settlement();
      for (int i = 0; i < payments.length; i++) {
        faces[i] = leg.outstanding(before);
        before = payments[i];
      }
      figures.put(
          PriceFigure.ASSET_SWAP_SPREAD,
          AssetSwap.spread(
              claim.flows(), market.curve(), claim.settlement(), payments, faces, quoted));
    }
  }
}
