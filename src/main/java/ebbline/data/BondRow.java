package ebbline.data;

import ebbline.instrument.Bond;
import ebbline.instrument.BondTerms;
import ebbline.time.DayCount;
import ebbline.time.ScheduleTerms.AccrualDates;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Rows of bonds with a fixed coupon. */
final class BondRow implements RowKind {

  @Override
  public String name() {
    return "bond";
  }

  @Override
  public Set<String> columns() {
    return couponColumns();
  }

  /** The columns of every kind with fixed coupons. */
  static Set<String> couponColumns() {
    Set<String> columns = new TreeSet<>(TermsCells.SCHEDULE);
    columns.addAll(TermsCells.SETTLING);
    columns.addAll(TermsCells.QUOTE);
    columns.add("coupon");
    return columns;
  }

  @Override
  public Optional<Bond> read(RowCells cells) {
    return bond(cells);
  }

  static Optional<BondTerms> terms(RowCells cells) {
    return TermsCells.read(cells, 2, DayCount.ACT_ACT_ICMA, AccrualDates.UNADJUSTED, "issue");
  }

  static Optional<Bond> bond(RowCells cells) {
    Optional<BondTerms> terms = terms(cells);
    OptionalDouble coupon = cells.requiredRate("coupon");
    return cells.build(
        terms.isPresent() && coupon.isPresent(), () -> Bond.of(terms.get(), coupon.getAsDouble()));
  }
}
