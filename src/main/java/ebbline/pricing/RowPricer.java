package ebbline.pricing;

import ebbline.instrument.BookRow;
import ebbline.instrument.CallableBond;
import ebbline.instrument.Claim;
import ebbline.instrument.PlacedLeg;
import ebbline.instrument.Swap;
import ebbline.time.TimeAxis;
import java.util.EnumMap;
import java.util.Locale;
import java.util.Optional;

/** Prices one row of a book, or says why it cannot. */
public final class RowPricer implements BookPricer {
  private final Market market;
  private final PricingRequest request;

  public RowPricer(Market market, PricingRequest request) {
    this.market = market;
    this.request = request;
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
    Valuation value = new ClaimPricer(market, request).value(claim);
    EnumMap<PriceFigure, Double> figures = new EnumMap<>(PriceFigure.class);
    double scale = row.face() / 100;
    figures.put(PriceFigure.PRESENT_VALUE, value.presentValue() * scale);
    figures.put(PriceFigure.ERROR_BOUND, value.errorBound() * Math.abs(scale));
    if (market.fitted().isPresent()) {
      double deviation = market.fitted().get().deviation(row.instrument(), claim, market);
      figures.put(PriceFigure.PARAMETER_SD, deviation * Math.abs(scale));
    }
    if (!claim.isCertain()) {
      VolatilityTerms.impliedBy(claim, market.curve(), value.presentValue())
          .ifPresent(vol -> figures.put(PriceFigure.IMPLIED_VOL, vol));
    }
    String message = "";
    if (row.instrument() instanceof Swap swap) {
      figures.put(PriceFigure.PAR_RATE, ParRate.of(swap, market));
      CurveSensitivity.put(row.instrument(), market, 0, figures);
    } else if (row.instrument() instanceof CallableBond bond && !claim.rights().isEmpty()) {
      new RightsFigures(market, bond, claim, figures).put(row, value);
      message =
          request.method().isPresent() && value.method() != Method.BACKWARD_INDUCTION
              ? "spreads and sensitivities are by the most accurate method"
              : "";
    } else if (claim.isCertain()) {
      message = priceFigures(row, claim, value, figures);
    }
    String beyond = beyondTheCurve(claim);
    String both =
        message.isEmpty() || beyond.isEmpty() ? message + beyond : message + "; " + beyond;
    return PricedRow.of(row.id(), row.instrument().kind(), value.method(), figures, both);
  }

  /** A remark where the row's own payments lie beyond the last node. */
  private String beyondTheCurve(Claim claim) {
    double[] nodes = market.curve().nodes();
    int n = claim.flows().size();
    if (nodes.length == 0 || n == 0) {
      return "";
    }
    double last = nodes[nodes.length - 1];
    return claim.flows().time(n - 1) > last + TimeAxis.SAME_MOMENT
        ? String.format(
            Locale.ROOT,
            "pays beyond the curve's last node at %.4g years, where it is extended",
            last)
        : "";
  }

  private String priceFigures(
      BookRow row, Claim claim, Valuation value, EnumMap<PriceFigure, Double> figures) {
    double dirty = value.presentValue() / market.curve().discount(claim.settlement());
    figures.put(PriceFigure.DIRTY_PRICE, dirty);
    figures.put(PriceFigure.CLEAN_PRICE, dirty - claim.accrued());
    figures.put(PriceFigure.ACCRUED, claim.accrued());
    Optional<PlacedLeg> leg = row.instrument().fixedLeg().map(fixed -> fixed.on(market.axis()));
    Optional<YieldFigures> yields = leg.map(placed -> new YieldFigures(placed, row.quote()));
    if (yields.isPresent()) {
      yields.get().put(dirty, figures);
    } else {
      CurveSensitivity.put(row.instrument(), market, dirty, figures);
    }
    Optional<Double> quoted = MarketFigures.dirty(row, claim, yields);
    if (quoted.isPresent()) {
      MarketFigures.put(leg, claim, market, quoted.get(), yields, figures);
    }
    if (request.horizon().isEmpty() || leg.isEmpty()) {
      return "";
    }
    double spread = figures.getOrDefault(PriceFigure.Z_SPREAD, 0.0);
    return new HorizonFigures(market, request.horizon().get())
        .put(leg.get(), claim, quoted.orElse(dirty), spread, figures);
  }
}
