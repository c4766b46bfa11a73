package ebbline.data;

import ebbline.instrument.ZeroBond;
import ebbline.time.Moment;
import java.util.Optional;
import java.util.Set;

/** Rows of zero bonds. */
final class ZeroBondRow implements RowKind {

  @Override
  public String name() {
    return "zero-bond";
  }

  @Override
  public Set<String> columns() {
    return Set.of("maturity", "redemption");
  }

  @Override
  public Optional<ZeroBond> read(RowCells cells) {
    return zeroBond(cells);
  }

  static Optional<ZeroBond> zeroBond(RowCells cells) {
    Optional<Moment> maturity = cells.requiredMoment("maturity");
    double redemption = cells.redemption();
    return cells.build(maturity.isPresent(), () -> ZeroBond.of(maturity.get(), redemption));
  }
}
