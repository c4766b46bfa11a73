package ebbline.data;

import ebbline.instrument.Conventions;
import ebbline.instrument.SwapSide;
import ebbline.instrument.Swaption;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.ScheduleTerms.AccrualDates;
import ebbline.time.Tenor;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** Rows of European swaptions: the swap runs for {@code tenor} from {@code expiry}. */
final class SwaptionRow implements RowKind {

  @Override
  public String name() {
    return "swaption";
  }

  @Override
  public Set<String> columns() {
    return Set.of(
        "expiry", "tenor", "kind", "strike", "frequency", "day_count", "calendar", "roll", "eom");
  }

  @Override
  public Optional<Swaption> read(RowCells cells) {
    Optional<Moment> expiry = cells.requiredMoment("expiry");
    Optional<Tenor> tenor = cells.required("tenor", SwaptionRow::tenor);
    Optional<SwapSide> side = cells.required("kind", SwapSide::of);
    Optional<OptionalDouble> strike = cells.requiredRateStrike();
    int frequency = cells.frequency(2);
    Conventions conventions =
        TermsCells.conventions(cells, DayCount.ACT_ACT_ICMA, AccrualDates.ADJUSTED);
    return cells.build(
        expiry.isPresent() && tenor.isPresent() && side.isPresent() && strike.isPresent(),
        () ->
            new Swaption(
                side.get(), expiry.get(), tenor.get(), frequency, conventions, strike.get()));
  }

  /** A tenor, or a bare number of years that makes whole months. */
  static Tenor tenor(String text) {
    if (text.matches("\\d{1,3}(\\.\\d{1,6})?")) {
      double months = 12 * Double.parseDouble(text);
      if (Math.abs(months - Math.rint(months)) < 1e-4) {
        return new Tenor((int) Math.rint(months), 0);
      }
    }
    return Tenor.parse(text);
  }
}
