package ebbline.data;

import ebbline.instrument.Bill;
import ebbline.instrument.BondTerms;
import ebbline.time.DayCount;
import ebbline.time.ScheduleTerms.AccrualDates;
import java.util.Optional;
import java.util.Set;

/** Rows of bills: the day count is that of a discount or money-market yield, act/360 by default. */
final class BillRow implements RowKind {

  @Override
  public String name() {
    return "bill";
  }

  @Override
  public Set<String> columns() {
    return new ZeroBondRow().columns();
  }

  @Override
  public Optional<Bill> read(RowCells cells) {
    Optional<BondTerms> terms =
        TermsCells.read(cells, 2, DayCount.ACT_360, AccrualDates.UNADJUSTED, "issue");
    return cells.build(terms.isPresent(), () -> new Bill(terms.get()));
  }
}
