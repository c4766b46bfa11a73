package ebbline.data;

import ebbline.instrument.BermudanSwaption;
import ebbline.instrument.BondTerms;
import ebbline.instrument.SwapSide;
import ebbline.time.DayCount;
import ebbline.time.ScheduleTerms.AccrualDates;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Rows of Bermudan swaptions: {@code maturity} is the end of the swap. */
final class BermudanSwaptionRow implements RowKind {

  @Override
  public String name() {
    return "bermudan-swaption";
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(TermsCells.SCHEDULE);
    columns.removeAll(List.of("issue", "first_coupon", "last_coupon"));
    columns.addAll(List.of("start", "strike", "kind", "exercise"));
    return columns;
  }

  @Override
  public Optional<BermudanSwaption> read(RowCells cells) {
    Optional<BondTerms> terms =
        TermsCells.read(cells, 2, DayCount.ACT_ACT_ICMA, AccrualDates.ADJUSTED, "start");
    OptionalDouble strike = cells.requiredRate("strike");
    Optional<SwapSide> side = cells.required("kind", SwapSide::of);
    Optional<List<BermudanSwaption.Window>> exercise =
        cells.required("exercise", ExerciseText::windows);
    return cells.build(
        terms.isPresent() && strike.isPresent() && side.isPresent() && exercise.isPresent(),
        () -> new BermudanSwaption(side.get(), terms.get(), strike.getAsDouble(), exercise.get()));
  }
}
