package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * A fixed rate against a floating one on the same periods, without exchange of the face.
 *
 * @param side of the fixed rate
 * @param terms schedule of both legs; its issue is the start, today where there is none
 * @param rate fixed, annual, a decimal
 * @param fixing floating rate of the period that runs today, annual; needed where one began before
 *     today, and used where one begins today
 */
public record Swap(SwapSide side, BondTerms terms, double rate, OptionalDouble fixing)
    implements Instrument {

  public Swap {
    Objects.requireNonNull(side, "side");
    Objects.requireNonNull(terms, "terms");
    Objects.requireNonNull(fixing, "fixing");
    if (!Double.isFinite(rate)) {
      throw new IllegalArgumentException("coupon must be finite, found " + rate);
    }
  }

  @Override
  public String kind() {
    return "swap";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    PlacedLeg leg = FixedLeg.of(started(axis), rate).on(axis);
    int sign = side.sign();
    CashFlows fixed = CashFlows.NONE;
    List<FloatingCoupon> floating = new ArrayList<>();
    for (int i = 0; i < leg.periods().size(); i++) {
      LegPeriod period = leg.periods().get(i);
      fixed = fixed.plus(CashFlows.single(period.payment(), sign * leg.coupon(i)));
      if (period.runsToday(fixing.isPresent())) {
        double known = -sign * 100 * known() * period.years();
        fixed = fixed.plus(CashFlows.single(period.payment(), known));
      } else {
        floating.add(
            new FloatingCoupon(
                Math.max(0, period.start()), period.end(), period.payment(), -sign * 100, 0, 0));
      }
    }
    return new Claim(fixed, List.of(), floating, 0, 0);
  }

  private BondTerms started(TimeAxis axis) {
    if (terms.ends().issue().isPresent()) {
      return terms;
    }
    Moment today =
        axis.isDated(terms.maturity()) ? Moment.of(axis.asOf().orElseThrow()) : Moment.ofYears(0);
    return terms.withEnds(
        new OddPeriods(
            java.util.Optional.of(today), terms.ends().firstCoupon(), terms.ends().lastCoupon()));
  }

  private double known() {
    return fixing.orElseThrow(
        () ->
            new IllegalArgumentException(
                "the floating rate of the period that runs today is fixed already; give it as"
                    + " fixing"));
  }
}
