package ebbline.data;

import ebbline.instrument.OptionKind;
import ebbline.instrument.ZeroBond;
import ebbline.instrument.ZeroOption;
import ebbline.time.Moment;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Rows of options on zero bonds. */
final class ZeroOptionRow implements RowKind {

  @Override
  public String name() {
    return "zero-option";
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(new ZeroBondRow().columns());
    columns.removeAll(TermsCells.QUOTE);
    columns.removeAll(List.of("settle_days", "issue"));
    columns.addAll(List.of("expiry", "kind", "strike"));
    return columns;
  }

  @Override
  public Optional<ZeroOption> read(RowCells cells) {
    Optional<ZeroBond> underlying = ZeroBondRow.zeroBond(cells);
    Optional<Moment> expiry = cells.requiredMoment("expiry");
    Optional<OptionKind> kind = cells.requiredCallOrPut();
    Optional<OptionalDouble> strike = cells.requiredPriceStrike();
    return cells.build(
        underlying.isPresent() && expiry.isPresent() && kind.isPresent() && strike.isPresent(),
        () -> new ZeroOption(kind.get(), expiry.get(), underlying.get(), strike.get()));
  }
}
