package ebbline.data;

import ebbline.instrument.AmortisingBond;
import ebbline.instrument.BondTerms;
import ebbline.instrument.FixedLeg;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Rows of bonds that repay parts of their face before maturity. */
final class AmortisingBondRow implements RowKind {

  @Override
  public String name() {
    return "amortising-bond";
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(BondRow.couponColumns());
    columns.addAll(List.of("sinking", "steps"));
    return columns;
  }

  @Override
  public Optional<AmortisingBond> read(RowCells cells) {
    Optional<BondTerms> terms = BondRow.terms(cells);
    OptionalDouble coupon = cells.requiredRate("coupon");
    double face = cells.face();
    Optional<List<FixedLeg.Sinking>> sinking =
        cells.required("sinking", text -> DatedList.sinking(text, face));
    List<FixedLeg.Step> steps = cells.value("steps", DatedList::steps).orElse(List.of());
    return cells.build(
        terms.isPresent() && coupon.isPresent() && sinking.isPresent(),
        () ->
            new AmortisingBond(
                new FixedLeg(terms.get(), coupon.getAsDouble(), steps, sinking.get())));
  }
}
