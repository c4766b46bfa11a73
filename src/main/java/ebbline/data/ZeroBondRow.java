package ebbline.data;

import ebbline.instrument.BondTerms;
import ebbline.instrument.ZeroBond;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;

/** Rows of zero bonds. */
final class ZeroBondRow implements RowKind {

  @Override
  public String name() {
    return "zero-bond";
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(BondRow.couponColumns());
    columns.removeAll(List.of("coupon", "first_coupon", "last_coupon", "ex_days"));
    return columns;
  }

  @Override
  public Optional<ZeroBond> read(RowCells cells) {
    return zeroBond(cells);
  }

  static Optional<ZeroBond> zeroBond(RowCells cells) {
    Optional<BondTerms> terms = BondRow.terms(cells);
    return cells.build(terms.isPresent(), () -> new ZeroBond(terms.get()));
  }
}
