package ebbline.data;

import ebbline.instrument.BondTerms;
import ebbline.instrument.CallableBond;
import ebbline.instrument.ExerciseTerm;
import ebbline.instrument.FixedLeg;
import ebbline.instrument.Notice;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;

/** Rows of callable and putable bonds; either kind may have both rights, steps and repayments. */
final class CallableBondRow implements RowKind {
  private final String name;
  private final String needed;

  /**
   * @param name of the kind
   * @param needed column that it must have, {@code calls} or {@code puts}
   */
  CallableBondRow(String name, String needed) {
    this.name = name;
    this.needed = needed;
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public Set<String> columns() {
    Set<String> columns = new TreeSet<>(BondRow.couponColumns());
    columns.addAll(List.of("calls", "puts", "notice", "sinking", "steps", "oas"));
    return columns;
  }

  @Override
  public Optional<CallableBond> read(RowCells cells) {
    Optional<BondTerms> terms = BondRow.terms(cells);
    OptionalDouble coupon = cells.requiredRate("coupon");
    double face = cells.face();
    List<FixedLeg.Step> steps = cells.value("steps", DatedList::steps).orElse(List.of());
    List<FixedLeg.Sinking> sinking =
        cells.value("sinking", text -> DatedList.sinking(text, face)).orElse(List.of());
    List<ExerciseTerm> calls = cells.value("calls", ExerciseText::terms).orElse(List.of());
    List<ExerciseTerm> puts = cells.value("puts", ExerciseText::terms).orElse(List.of());
    Notice notice = cells.value("notice", ExerciseText::notice).orElse(Notice.NONE);
    if (!cells.has(needed)) {
      cells.problem(needed, "a " + name + " needs " + needed + ", such as 2029-05-15@100");
    }
    return cells.build(
        terms.isPresent() && coupon.isPresent(),
        () ->
            new CallableBond(
                name,
                new FixedLeg(terms.get(), coupon.getAsDouble(), steps, sinking),
                calls,
                puts,
                notice));
  }
}
