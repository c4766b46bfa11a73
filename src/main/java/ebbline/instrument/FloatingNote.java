package ebbline.instrument;

import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * A note whose coupons are a floating rate plus a spread, fixed in advance and paid in arrears.
 *
 * @param running the whole coupon of the period that runs today, annual; needed where one began
 *     before today, and used where one begins today
 * @param spread over the floating rate, annual, a decimal
 */
public record FloatingNote(BondTerms terms, OptionalDouble running, double spread)
    implements Instrument {

  public FloatingNote {
    Objects.requireNonNull(terms, "terms");
    Objects.requireNonNull(running, "running");
    if (!Double.isFinite(spread)) {
      throw new IllegalArgumentException("spread must be finite, found " + spread);
    }
  }

  @Override
  public String kind() {
    return "floating-note";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    PlacedLeg leg = FixedLeg.of(terms, 0).on(axis);
    double settlement = leg.settlement();
    leg.owedAfter(settlement);
    int at = leg.periodAt(settlement);
    CashFlows fixed = leg.flowsAfter(settlement);
    List<FloatingCoupon> floating = new ArrayList<>();
    double accrued = 0;
    for (int i = 0; i < leg.periods().size(); i++) {
      LegPeriod period = leg.periods().get(i);
      boolean owed = leg.isOwed(i, settlement);
      double part = i == at ? leg.accruedYears(i, settlement) / period.years() : 0;
      if (period.runsToday(running.isPresent())) {
        double coupon = 100 * known() * period.years();
        accrued += i == at ? coupon * part - (owed ? 0 : coupon) : 0;
        if (owed) {
          fixed = fixed.plus(CashFlows.single(period.payment(), coupon));
        }
      } else if (owed) {
        floating.add(
            new FloatingCoupon(
                Math.max(0, period.start()),
                period.end(),
                period.payment(),
                100,
                100 * spread * period.years(),
                part));
      }
    }
    return new Claim(fixed, List.of(), floating, settlement, accrued);
  }

  private double known() {
    return running.orElseThrow(
        () ->
            new IllegalArgumentException(
                "the coupon of the period that runs today is fixed already; give it as coupon"));
  }
}
