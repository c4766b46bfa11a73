package ebbline.data;

import ebbline.instrument.OptionKind;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;

/** Which columns books have, and which of them a kind of instrument uses. */
final class BookColumns {
  private static final Set<String> EVERY = Set.of("id", "instrument", "face");

  /** Kinds that this version prices: a new kind of instrument is one more line here. */
  private static final List<RowKind> ALL =
      List.of(
          new BondRow(),
          new ZeroBondRow(),
          new BillRow(),
          new FloatingNoteRow(),
          new StepBondRow(),
          new AmortisingBondRow(),
          new CallableBondRow("callable-bond", "calls"),
          new CallableBondRow("putable-bond", "puts"),
          new SwapRow(),
          new ZeroOptionRow(),
          new BondOptionRow(),
          new RateOptionRow(OptionKind.CALL),
          new RateOptionRow(OptionKind.PUT),
          new RateOptionStripRow(OptionKind.CALL),
          new RateOptionStripRow(OptionKind.PUT),
          new SwaptionRow(),
          new BermudanSwaptionRow());

  static final Map<String, RowKind> KINDS =
      ALL.stream().collect(Collectors.toUnmodifiableMap(RowKind::name, kind -> kind));

  static final Layout LAYOUT =
      new Layout(
          "book",
          Set.of(),
          Set.of(
              "id",
              "instrument",
              "face",
              "issue",
              "maturity",
              "frequency",
              "day_count",
              "calendar",
              "roll",
              "eom",
              "first_coupon",
              "last_coupon",
              "redemption",
              "settle_days",
              "ex_days",
              "price",
              "yield_kind",
              "last_period",
              "rounding",
              "calls",
              "puts",
              "notice",
              "kind",
              "expiry",
              "strike",
              "strike_kind",
              "exercise",
              "tenor",
              "start",
              "rate_basis",
              "sinking",
              "steps"),
          Set.of("coupon", "yield", "spread", "fixing", "oas"));

  private BookColumns() {}

  static boolean uses(String kind, String column) {
    return EVERY.contains(column) || KINDS.get(kind).columns().contains(column);
  }

  /** The columns of a kind, for a message. */
  static String list(String kind) {
    Set<String> names = new TreeSet<>(KINDS.get(kind).columns());
    names.addAll(EVERY);
    return String.join(", ", names);
  }
}
