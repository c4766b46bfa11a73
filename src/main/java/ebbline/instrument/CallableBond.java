package ebbline.instrument;

import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;

/**
 * Paper with fixed payments that the issuer may call, the holder may put, or both. Exercise pays
 * the clean price on what is still owed, plus accrued interest, at the call or put date; the
 * decision is taken the notice before.
 *
 * @param kind as the book writes it
 * @param leg what is paid if nobody exercises
 */
public record CallableBond(
    String kind, FixedLeg leg, List<ExerciseTerm> calls, List<ExerciseTerm> puts, Notice notice)
    implements Instrument {

  public CallableBond {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(leg, "leg");
    Objects.requireNonNull(notice, "notice");
    calls = List.copyOf(calls);
    puts = List.copyOf(puts);
  }

  @Override
  public Claim claim(TimeAxis axis) {
    PlacedLeg placed = leg.on(axis);
    Claim straight = placed.claim();
    List<Right> rights = new ArrayList<>();
    // Where both decide on one day the holder does so first; the order matters only if his price
    // is above the issuer's.
    add(Right.Party.HOLDER, ExerciseDates.of("put", puts, placed, axis), placed, axis, rights);
    add(Right.Party.ISSUER, ExerciseDates.of("call", calls, placed, axis), placed, axis, rights);
    rights.sort(Comparator.comparingDouble(Right::decision));
    return new Claim(
        straight.flows(), rights, List.of(), straight.settlement(), straight.accrued());
  }

  private void add(
      Right.Party party,
      Map<Double, Double> prices,
      PlacedLeg placed,
      TimeAxis axis,
      List<Right> rights) {
    double settlement = placed.settlement();
    for (Map.Entry<Double, Double> each : prices.entrySet()) {
      double at = each.getKey();
      if (at <= settlement + TimeAxis.SAME_MOMENT) {
        continue; // the buyer of today settles after it
      }
      double decision = notice.decision(at, placed, axis);
      if (!(decision >= -TimeAxis.SAME_MOMENT)) {
        throw new IllegalArgumentException(
            "the notice "
                + notice.length()
                + " must not be longer than the time to the first call or put, found "
                + (placed.isDated() ? placed.dateAt(at).toString() : Double.toString(at)));
      }
      double paid = placed.payment(at);
      double amount = each.getValue() * placed.outstanding(at) / 100 + placed.accrued(at);
      rights.add(new Right(party, Math.max(0, decision), paid, CashFlows.single(paid, amount)));
    }
  }

  @Override
  public Optional<FixedLeg> fixedLeg() {
    return Optional.of(leg);
  }

  /** The dates of calls that lie after settlement with their clean prices, in order. */
  public Map<Double, Double> callsAfterSettlement(TimeAxis axis) {
    PlacedLeg placed = leg.on(axis);
    Map<Double, Double> ahead = ExerciseDates.of("call", calls, placed, axis);
    double settlement = placed.settlement();
    ahead.keySet().removeIf(at -> at <= settlement + TimeAxis.SAME_MOMENT);
    return ahead;
  }
}
