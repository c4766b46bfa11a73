package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.TreeSet;

/**
 * The right to enter what is left of a swap on one of several dates of its fixed leg. Floating
 * payments are projected from the discount curve, so that at the start of a period the floating leg
 * is worth its face.
 *
 * @param side of the fixed rate, once exercised
 * @param terms schedule of the swap
 * @param rate fixed, annual, a decimal
 * @param exercise dates or ranges of fixed-leg dates; their prices mean nothing
 */
public record BermudanSwaption(SwapSide side, BondTerms terms, double rate, List<Window> exercise)
    implements Instrument {

  /** Every fixed-leg date from one moment to another, both included. */
  public record Window(Moment from, Moment to) {
    public Window {
      Objects.requireNonNull(from, "from");
      Objects.requireNonNull(to, "to");
    }
  }

  public BermudanSwaption {
    Objects.requireNonNull(side, "side");
    Objects.requireNonNull(terms, "terms");
    exercise = List.copyOf(exercise);
    if (!Double.isFinite(rate)) {
      throw new IllegalArgumentException("strike must be finite, found " + rate);
    }
    if (exercise.isEmpty()) {
      throw new IllegalArgumentException(
          "a Bermudan swaption must have exercise dates, found none");
    }
  }

  @Override
  public String kind() {
    return "bermudan-swaption";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    PlacedLeg leg = FixedLeg.of(terms, rate).on(axis);
    TreeSet<Double> starts = new TreeSet<>();
    for (LegPeriod period : leg.periods()) {
      if (period.start() >= -TimeAxis.SAME_MOMENT) {
        starts.add(Math.max(0, period.start()));
      }
    }
    TreeSet<Double> dates = new TreeSet<>();
    for (Window window : exercise) {
      double from = axis.years(window.from());
      double to = axis.years(window.to());
      boolean met = false;
      for (double start : starts) {
        if (start >= from - TimeAxis.SAME_MOMENT && start <= to + TimeAxis.SAME_MOMENT) {
          dates.add(start);
          met = true;
        }
      }
      if (!met) {
        throw new IllegalArgumentException(
            "exercise "
                + PlacedLeg.near(leg.periods(), from, window.from(), true)
                + (window.from().equals(window.to()) ? "" : ".." + window.to()));
      }
    }
    List<Right> rights = new ArrayList<>();
    for (double date : dates) {
      rights.add(new Right(Right.Party.HOLDER, date, date, entered(leg, date)));
    }
    return new Claim(CashFlows.NONE, rights, 0, 0);
  }

  /** Fixed payments after a date and the face at the end, against the face on the date. */
  private CashFlows entered(PlacedLeg leg, double date) {
    CashFlows flows = CashFlows.single(date, -100);
    for (int i = 0; i < leg.periods().size(); i++) {
      LegPeriod period = leg.periods().get(i);
      if (period.start() >= date - TimeAxis.SAME_MOMENT) {
        boolean last = i == leg.periods().size() - 1;
        double amount = leg.coupon(i) + (last ? 100 : 0);
        flows = flows.plus(CashFlows.single(period.payment(), amount));
      }
    }
    return flows.times(side.sign());
  }
}
