package ebbline.data;

import ebbline.instrument.BondTerms;
import ebbline.instrument.OptionKind;
import ebbline.instrument.RateBasis;
import ebbline.instrument.RateOption;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * Rows of caplets and floorlets: the rate's period runs from {@code expiry} to {@code maturity}.
 */
final class RateOptionRow implements RowKind {
  private final OptionKind option;

  RateOptionRow(OptionKind option) {
    this.option = option;
  }

  @Override
  public String name() {
    return option == OptionKind.CALL ? "caplet" : "floorlet";
  }

  @Override
  public Set<String> columns() {
    return Set.of("expiry", "maturity", "strike", "day_count", "frequency", "rate_basis");
  }

  @Override
  public Optional<RateOption> read(RowCells cells) {
    Optional<Moment> start = cells.requiredMoment("expiry");
    Optional<Moment> end = cells.requiredMoment("maturity");
    Optional<OptionalDouble> strike = cells.requiredRateStrike();
    int frequency = cells.frequency(2);
    DayCount dayCount = cells.dayCount(DayCount.ACT_ACT_ICMA);
    RateBasis basis = cells.value("rate_basis", RateBasis::of).orElse(RateBasis.FORWARD);
    return cells.build(
        start.isPresent() && end.isPresent() && strike.isPresent(),
        () ->
            new RateOption(
                option,
                start.get(),
                BondTerms.of(end.get(), frequency, dayCount),
                strike.get(),
                basis));
  }
}
