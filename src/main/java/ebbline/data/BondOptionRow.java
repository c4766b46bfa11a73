package ebbline.data;

import ebbline.instrument.Bond;
import ebbline.instrument.BondOption;
import ebbline.instrument.OptionKind;
import ebbline.time.Moment;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Rows of European options on coupon bonds. */
final class BondOptionRow implements RowKind {

  @Override
  public String name() {
    return "bond-option";
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(new BondRow().columns());
    columns.removeAll(TermsCells.QUOTE);
    columns.remove("settle_days");
    columns.addAll(List.of("expiry", "kind", "strike", "strike_kind"));
    return columns;
  }

  @Override
  public Optional<BondOption> read(RowCells cells) {
    Optional<Bond> underlying = BondRow.bond(cells);
    Optional<Moment> expiry = cells.requiredMoment("expiry");
    Optional<OptionKind> kind = cells.requiredCallOrPut();
    Optional<OptionalDouble> strike = cells.requiredPriceStrike();
    BondOption.StrikeKind strikeKind =
        cells.value("strike_kind", BondOption.StrikeKind::of).orElse(BondOption.StrikeKind.CLEAN);
    return cells.build(
        underlying.isPresent() && expiry.isPresent() && kind.isPresent() && strike.isPresent(),
        () -> new BondOption(kind.get(), expiry.get(), underlying.get(), strike.get(), strikeKind));
  }
}
