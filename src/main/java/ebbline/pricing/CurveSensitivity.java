package ebbline.pricing;

import ebbline.curve.SpreadCurve;
import ebbline.instrument.Claim;
import ebbline.instrument.Instrument;
import java.util.EnumMap;
import java.util.Optional;

/**
 * What paper with floating coupons gains when all zero rates move together by one basis point:
 * floating coupons move with them, which a yield at fixed payments would not see.
 */
final class CurveSensitivity {
  private static final double BASIS_POINT = 1e-4;

  private CurveSensitivity() {}

  /**
   * @param dirty price per 100 at settlement, or 0 for a swap, which has no duration
   */
  static void put(
      Instrument instrument, Market market, double dirty, EnumMap<PriceFigure, Double> figures) {
    double down = value(instrument, market, -BASIS_POINT);
    double up = value(instrument, market, BASIS_POINT);
    double dv01 = (down - up) / 2;
    figures.put(PriceFigure.DV01, dv01);
    if (dirty > 0) {
      double middle = value(instrument, market, 0);
      figures.put(PriceFigure.EFFECTIVE_DURATION, dv01 / (middle * BASIS_POINT));
    }
  }

  private static double value(Instrument instrument, Market market, double shift) {
    Market moved =
        new Market(
            market.axis(),
            new SpreadCurve(market.curve(), shift),
            Optional.empty(),
            market.projection().map(curve -> new SpreadCurve(curve, shift)));
    Claim claim = moved.claim(instrument);
    return Discounting.value(claim, moved.curve()).presentValue()
        / moved.curve().discount(claim.settlement());
  }
}
