package ebbline.pricing;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.PlacedLeg;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.EnumMap;

/** Forward price, carry and roll-down of paper with fixed payments over a horizon. */
final class HorizonFigures {
  private final Market market;
  private final Moment horizon;

  HorizonFigures(Market market, Moment horizon) {
    this.market = market;
    this.horizon = horizon;
  }

  /**
   * Adds the figures: the clean price for delivery at the horizon that financing on the curve
   * implies; carry, what the holder earns until then if the clean price does not move; and
   * roll-down, what the clean price gains if the curve, and the paper's spread over it, stay as
   * they are for each time to maturity.
   *
   * @param dirty price at settlement, the market's where there is a quote
   * @param spread over the curve's zero rates at which that is the price
   * @return a remark where there are none, else empty
   */
  String put(
      PlacedLeg leg,
      Claim claim,
      double dirty,
      double spread,
      EnumMap<PriceFigure, Double> figures) {
    double at = market.axis().years(horizon);
    double settlement = claim.settlement();
    if (!(at > settlement + TimeAxis.SAME_MOMENT)) {
      throw new IllegalArgumentException("the horizon must lie after settlement, found " + horizon);
    }
    if (!(leg.lastPayment() > at + TimeAxis.SAME_MOMENT)) {
      return "nothing is left to pay at the horizon " + horizon;
    }
    CashFlows later = leg.flowsAfter(at);
    double start = market.curve().discount(settlement);
    double income =
        (Discounting.value(claim.flows(), market.curve()).presentValue()
                - Discounting.value(later, market.curve()).presentValue())
            / start;
    double forward = (dirty - income) * start / market.curve().discount(at) - leg.accrued(at);
    double clean = dirty - claim.accrued();
    double rolled = -leg.accrued(at);
    for (int i = 0; i < later.size(); i++) {
      double left = later.time(i) - at;
      rolled += later.amount(i) * Math.exp(market.curve().logDiscount(left) - spread * left);
    }
    figures.put(PriceFigure.FORWARD_PRICE, forward);
    figures.put(PriceFigure.CARRY, clean - forward);
    figures.put(PriceFigure.ROLL_DOWN, rolled - clean);
    return "";
  }
}
