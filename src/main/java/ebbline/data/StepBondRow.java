package ebbline.data;

import ebbline.instrument.BondTerms;
import ebbline.instrument.FixedLeg;
import ebbline.instrument.StepBond;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Rows of bonds whose coupon steps. */
final class StepBondRow implements RowKind {

  @Override
  public String name() {
    return "step-bond";
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(BondRow.couponColumns());
    columns.add("steps");
    return columns;
  }

  @Override
  public Optional<StepBond> read(RowCells cells) {
    Optional<BondTerms> terms = BondRow.terms(cells);
    OptionalDouble coupon = cells.requiredRate("coupon");
    Optional<List<FixedLeg.Step>> steps = cells.required("steps", DatedList::steps);
    return cells.build(
        terms.isPresent() && coupon.isPresent() && steps.isPresent(),
        () ->
            new StepBond(new FixedLeg(terms.get(), coupon.getAsDouble(), steps.get(), List.of())));
  }
}
