package ebbline.data;

import ebbline.instrument.Bond;
import ebbline.time.DayCount;
import ebbline.time.Moment;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** Rows of bonds with a fixed coupon. */
final class BondRow implements RowKind {

  @Override
  public String name() {
    return "bond";
  }

  @Override
  public Set<String> columns() {
    return Set.of(
        "maturity",
        "coupon",
        "frequency",
        "day_count",
        "redemption",
        "settle_days",
        "price",
        "yield",
        "yield_kind");
  }

  @Override
  public Optional<Bond> read(RowCells cells) {
    return bond(cells);
  }

  static Optional<Bond> bond(RowCells cells) {
    Optional<Moment> maturity = cells.requiredMoment("maturity");
    OptionalDouble coupon = cells.requiredRate("coupon");
    int frequency = cells.frequency(2);
    DayCount dayCount = cells.dayCount(DayCount.ACT_ACT_ICMA);
    double redemption = cells.redemption();
    int settleDays = cells.settleDays();
    return cells.build(
        maturity.isPresent() && coupon.isPresent(),
        () ->
            Bond.of(
                maturity.get(), coupon.getAsDouble(), frequency, dayCount, redemption, settleDays));
  }
}
