package ebbline.pricing;

import ebbline.instrument.BookRow;
import ebbline.instrument.CallableBond;
import ebbline.instrument.Claim;
import ebbline.instrument.PlacedLeg;
import ebbline.time.TimeAxis;
import java.util.EnumMap;
import java.util.Optional;

/**
 * Prices rows from their own quotes alone: of price and yield the one that is not given, and all
 * figures from it.
 */
public final class QuotedRows implements BookPricer {
  private final TimeAxis axis;

  public QuotedRows(TimeAxis axis) {
    this.axis = axis;
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
    PlacedLeg leg =
        row.instrument()
            .fixedLeg()
            .orElseThrow(
                () ->
                    new IllegalArgumentException(
                        "a "
                            + row.instrument().kind()
                            + " needs a curve or a model to be priced from: give --curve FILE or"
                            + " --model"))
            .on(axis);
    Claim claim = MarketFigures.printed(row, leg.claim());
    YieldFigures yields = new YieldFigures(leg, row.quote());
    double dirty =
        MarketFigures.dirty(row, claim, Optional.of(yields))
            .orElseThrow(
                () ->
                    new IllegalArgumentException(
                        "there is nothing to price from: give the row a price or a yield, or"
                            + " --curve FILE"));
    EnumMap<PriceFigure, Double> figures = new EnumMap<>(PriceFigure.class);
    figures.put(PriceFigure.DIRTY_PRICE, dirty);
    figures.put(PriceFigure.CLEAN_PRICE, dirty - claim.accrued());
    figures.put(PriceFigure.ACCRUED, claim.accrued());
    yields.put(dirty, figures);
    if (row.instrument() instanceof CallableBond bond) {
      figures.put(PriceFigure.YIELD_TO_WORST, YieldToWorst.of(bond, leg, row.quote(), dirty, axis));
    }
    double scale = row.face() / 100;
    // A unit of rounding for each flow's product and sum.
    double bound = (4 + 2.0 * claim.flows().size()) * Math.ulp(dirty);
    figures.put(PriceFigure.PRESENT_VALUE, dirty * scale);
    figures.put(PriceFigure.ERROR_BOUND, bound * Math.abs(scale));
    String message =
        claim.settlement() > TimeAxis.SAME_MOMENT
            ? "without a curve the present value is the money paid at settlement"
            : "";
    return PricedRow.of(row.id(), row.instrument().kind(), Method.QUOTED, figures, message);
  }
}
