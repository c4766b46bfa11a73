package ebbline.data;

import ebbline.instrument.OptionKind;
import ebbline.instrument.ZeroBond;
import ebbline.instrument.ZeroOption;
import ebbline.time.Moment;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** Rows of options on zero bonds. */
final class ZeroOptionRow implements RowKind {

  @Override
  public String name() {
    return "zero-option";
  }

  @Override
  public Set<String> columns() {
    return Set.of("maturity", "redemption", "expiry", "kind", "strike");
  }

  @Override
  public Optional<ZeroOption> read(RowCells cells) {
    Optional<ZeroBond> underlying = ZeroBondRow.zeroBond(cells);
    Optional<Moment> expiry = cells.requiredMoment("expiry");
    Optional<OptionKind> kind = cells.requiredCallOrPut();
    OptionalDouble strike = cells.requiredNumber("strike");
    return cells.build(
        underlying.isPresent() && expiry.isPresent() && kind.isPresent() && strike.isPresent(),
        () -> new ZeroOption(kind.get(), expiry.get(), underlying.get(), strike.getAsDouble()));
  }
}
