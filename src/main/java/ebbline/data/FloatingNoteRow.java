package ebbline.data;

import ebbline.instrument.BondTerms;
import ebbline.instrument.FloatingNote;
import ebbline.time.DayCount;
import ebbline.time.ScheduleTerms.AccrualDates;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/**
 * Rows of floating notes: {@code coupon} is that of the period that runs today, {@code spread} is
 * over the curve's forward rates.
 */
final class FloatingNoteRow implements RowKind {

  @Override
  public String name() {
    return "floating-note";
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(BondRow.couponColumns());
    columns.removeAll(List.of("yield", "yield_kind", "last_period", "rounding"));
    columns.add("spread");
    return columns;
  }

  @Override
  public Optional<FloatingNote> read(RowCells cells) {
    Optional<BondTerms> terms =
        TermsCells.read(cells, 4, DayCount.ACT_360, AccrualDates.ADJUSTED, "issue");
    OptionalDouble running = cells.rate("coupon");
    double spread = cells.rate("spread").orElse(0);
    return cells.build(terms.isPresent(), () -> new FloatingNote(terms.get(), running, spread));
  }
}
