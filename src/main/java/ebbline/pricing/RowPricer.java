package ebbline.pricing;

import ebbline.bond.StreetYield;
import ebbline.bond.ZSpread;
import ebbline.instrument.BookRow;
import ebbline.instrument.Claim;
import ebbline.instrument.CouponBond;
import ebbline.instrument.ZeroBond;
import java.util.EnumMap;
import java.util.Optional;

/** Prices one row of a book, or says why it cannot. */
public final class RowPricer {
  private final Market market;
  private final Optional<Method> wanted;

  /**
   * @param wanted the method to use; empty: the most accurate that applies
   */
  public RowPricer(Market market, Optional<Method> wanted) {
    this.market = market;
    this.wanted = wanted;
  }

  /** The row's figures; a row that makes no sense comes back failed and never throws. */
  public PricedRow price(BookRow row) {
    try {
      return priced(row);
    } catch (IllegalArgumentException e) {
      return PricedRow.failed(row.id(), row.instrument().kind(), e.getMessage());
    }
  }

  private PricedRow priced(BookRow row) {
    Claim claim = market.claim(row.instrument());
    Valuation value = value(claim);
    EnumMap<PriceFigure, Double> figures = new EnumMap<>(PriceFigure.class);
    double scale = row.face() / 100;
    figures.put(PriceFigure.PRESENT_VALUE, value.presentValue() * scale);
    figures.put(PriceFigure.ERROR_BOUND, value.errorBound() * Math.abs(scale));
    if (claim.rights().isEmpty()) {
      double dirty = value.presentValue() / market.curve().discount(claim.settlement());
      figures.put(PriceFigure.DIRTY_PRICE, dirty);
      figures.put(PriceFigure.CLEAN_PRICE, dirty - claim.accrued());
      figures.put(PriceFigure.ACCRUED, claim.accrued());
      if (row.instrument() instanceof CouponBond bond && !(bond instanceof ZeroBond)) {
        bondFigures(bond, dirty, row, claim, figures);
      }
    }
    return PricedRow.of(row.id(), row.instrument().kind(), value.method(), figures, "");
  }

  private Valuation value(Claim claim) {
    if (claim.rights().isEmpty()) {
      if (wanted.isPresent()
          && wanted.get() != Method.DISCOUNTING
          && wanted.get() != Method.CLOSED_FORM) {
        throw new IllegalArgumentException(
            "a row without rights is discounted; leave --method at auto");
      }
      return Discounting.value(claim, market.curve());
    }
    if (wanted.isPresent() && wanted.get() != Method.CLOSED_FORM) {
      throw new IllegalArgumentException(
          "the method " + wanted.get().label() + " does not price this row; use auto");
    }
    if (market.rates().isEmpty()) {
      throw new IllegalArgumentException(
          "an option needs a model and not only a curve: give --model FILE, or --model hull-white"
              + " with --mean-reversion and --volatility");
    }
    return ClosedForm.value(claim, market.rates().get());
  }

  private void bondFigures(
      CouponBond bond,
      double dirty,
      BookRow row,
      Claim claim,
      EnumMap<PriceFigure, Double> figures) {
    StreetYield street = new StreetYield(bond.leg().on(market.axis()).periodFlows());
    double yield = street.yieldOf(dirty);
    figures.put(PriceFigure.YIELD, yield);
    figures.put(PriceFigure.MACAULAY_DURATION, street.macaulayDuration(yield));
    figures.put(PriceFigure.MODIFIED_DURATION, street.modifiedDuration(yield));
    figures.put(PriceFigure.CONVEXITY, street.convexity(yield));
    figures.put(PriceFigure.DV01, street.dv01(yield));
    if (row.price().isEmpty() && row.yield().isEmpty()) {
      return;
    }
    double quoted =
        row.price().isPresent()
            ? row.price().getAsDouble() + claim.accrued()
            : street.price(row.yield().getAsDouble());
    double clean = quoted - claim.accrued();
    figures.put(PriceFigure.MARKET_CLEAN_PRICE, clean);
    figures.put(PriceFigure.MARKET_YIELD, street.yieldOf(quoted));
    figures.put(
        PriceFigure.Z_SPREAD,
        ZSpread.of(claim.flows(), market.curve(), claim.settlement(), quoted));
    figures.put(PriceFigure.RICHNESS, clean - (dirty - claim.accrued()));
  }
}
