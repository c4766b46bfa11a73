package ebbline.pricing;

import ebbline.instrument.BookRow;
import ebbline.instrument.Claim;
import ebbline.instrument.CouponBond;
import ebbline.instrument.Swap;
import java.util.EnumMap;
import java.util.Optional;

/** Prices one row of a book, or says why it cannot. */
public final class RowPricer implements BookPricer {
  private final Market market;
  private final PricingRequest request;
  private final Optional<Method> wanted;

  public RowPricer(Market market, PricingRequest request) {
    this.market = market;
    this.request = request;
    this.wanted = request.method();
  }

  @Override
  public PricedRow price(BookRow row) {
    try {
      return priced(row);
    } catch (IllegalArgumentException e) {
      return PricedRow.failed(row.id(), row.instrument().kind(), e.getMessage());
    }
  }

  private PricedRow priced(BookRow row) {
    Claim claim = MarketFigures.printed(row, market.claim(row.instrument()));
    Valuation value = value(claim);
    EnumMap<PriceFigure, Double> figures = new EnumMap<>(PriceFigure.class);
    double scale = row.face() / 100;
    figures.put(PriceFigure.PRESENT_VALUE, value.presentValue() * scale);
    figures.put(PriceFigure.ERROR_BOUND, value.errorBound() * Math.abs(scale));
    String message = "";
    if (row.instrument() instanceof Swap swap) {
      figures.put(PriceFigure.PAR_RATE, ParRate.of(swap, market));
      CurveSensitivity.put(row.instrument(), market, 0, figures);
    } else if (claim.isCertain()) {
      message = priceFigures(row, claim, value, figures);
    }
    return PricedRow.of(row.id(), row.instrument().kind(), value.method(), figures, message);
  }

  private String priceFigures(
      BookRow row, Claim claim, Valuation value, EnumMap<PriceFigure, Double> figures) {
    double dirty = value.presentValue() / market.curve().discount(claim.settlement());
    figures.put(PriceFigure.DIRTY_PRICE, dirty);
    figures.put(PriceFigure.CLEAN_PRICE, dirty - claim.accrued());
    figures.put(PriceFigure.ACCRUED, claim.accrued());
    Optional<YieldFigures> yields = Optional.empty();
    if (row.instrument() instanceof CouponBond bond) {
      yields = Optional.of(new YieldFigures(bond.leg().on(market.axis()), row.quote()));
      yields.get().put(dirty, figures);
    } else {
      CurveSensitivity.put(row.instrument(), market, dirty, figures);
    }
    Optional<Double> quoted = MarketFigures.dirty(row, claim, yields);
    if (quoted.isPresent()) {
      MarketFigures.put(row, claim, market, quoted.get(), yields, figures);
    }
    if (request.horizon().isEmpty() || !(row.instrument() instanceof CouponBond bond)) {
      return "";
    }
    double spread = figures.getOrDefault(PriceFigure.Z_SPREAD, 0.0);
    return new HorizonFigures(market, request.horizon().get())
        .put(bond.leg().on(market.axis()), claim, quoted.orElse(dirty), spread, figures);
  }

  private Valuation value(Claim claim) {
    if (claim.isCertain()) {
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
}
