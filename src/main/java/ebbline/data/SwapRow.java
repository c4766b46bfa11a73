package ebbline.data;

import ebbline.instrument.BondTerms;
import ebbline.instrument.Swap;
import ebbline.instrument.SwapSide;
import ebbline.time.DayCount;
import ebbline.time.ScheduleTerms.AccrualDates;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Rows of fixed-for-floating swaps: {@code coupon} is the fixed rate. */
final class SwapRow implements RowKind {

  @Override
  public String name() {
    return "swap";
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(TermsCells.SCHEDULE);
    columns.remove("issue");
    columns.addAll(List.of("start", "coupon", "kind", "fixing"));
    return columns;
  }

  @Override
  public Optional<Swap> read(RowCells cells) {
    Optional<BondTerms> terms =
        TermsCells.read(cells, 2, DayCount.ACT_ACT_ICMA, AccrualDates.ADJUSTED, "start");
    OptionalDouble rate = cells.requiredRate("coupon");
    SwapSide side = cells.value("kind", SwapSide::of).orElse(SwapSide.PAYER);
    OptionalDouble fixing = cells.rate("fixing");
    return cells.build(
        terms.isPresent() && rate.isPresent(),
        () -> new Swap(side, terms.get(), rate.getAsDouble(), fixing));
  }
}
