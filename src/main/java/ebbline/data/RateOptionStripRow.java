package ebbline.data;

import ebbline.instrument.BondTerms;
import ebbline.instrument.OptionKind;
import ebbline.instrument.RateBasis;
import ebbline.instrument.RateOptionStrip;
import ebbline.time.DayCount;
import ebbline.time.ScheduleTerms.AccrualDates;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Rows of caps and floors; the first period starts at {@code start}. */
final class RateOptionStripRow implements RowKind {
  private final OptionKind option;

  RateOptionStripRow(OptionKind option) {
    this.option = option;
  }

  @Override
  public String name() {
    return option == OptionKind.CALL ? "cap" : "floor";
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(TermsCells.SCHEDULE);
    columns.remove("issue");
    columns.addAll(List.of("start", "strike", "rate_basis"));
    return columns;
  }

  @Override
  public Optional<RateOptionStrip> read(RowCells cells) {
    Optional<BondTerms> terms =
        TermsCells.read(cells, 2, DayCount.ACT_ACT_ICMA, AccrualDates.ADJUSTED, "start");
    Optional<OptionalDouble> strike = cells.requiredRateStrike();
    RateBasis basis = cells.value("rate_basis", RateBasis::of).orElse(RateBasis.FORWARD);
    return cells.build(
        terms.isPresent() && strike.isPresent(),
        () -> new RateOptionStrip(option, terms.get(), strike.get(), basis));
  }
}
