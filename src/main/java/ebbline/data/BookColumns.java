package ebbline.data;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;

/** Which columns books have, and which of them a kind of instrument uses. */
final class BookColumns {
  private static final Set<String> EVERY = Set.of("id", "instrument", "face");
  private static final Set<String> BOND =
      Set.of(
          "maturity",
          "coupon",
          "frequency",
          "day_count",
          "redemption",
          "settle_days",
          "price",
          "yield",
          "yield_kind");

  /** Kinds that this version prices, with their own columns. */
  static final Map<String, Set<String>> KINDS = kinds();

  /** Kinds of the book format that this version reads and does not price. */
  static final Set<String> LATER =
      Set.of(
          "bill",
          "floating-note",
          "amortising-bond",
          "step-bond",
          "callable-bond",
          "putable-bond",
          "caplet",
          "floorlet",
          "cap",
          "floor",
          "swap",
          "swaption",
          "bermudan-swaption");

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
          Set.of("coupon", "yield"));

  private BookColumns() {}

  private static Map<String, Set<String>> kinds() {
    Map<String, Set<String>> kinds = new LinkedHashMap<>();
    kinds.put("bond", BOND);
    kinds.put("zero-bond", Set.of("maturity", "redemption"));
    kinds.put("zero-option", Set.of("maturity", "redemption", "expiry", "kind", "strike"));
    Set<String> option = new TreeSet<>(BOND);
    option.addAll(List.of("expiry", "kind", "strike", "strike_kind"));
    option.removeAll(List.of("price", "yield", "yield_kind", "settle_days"));
    kinds.put("bond-option", Set.copyOf(option));
    return Map.copyOf(kinds);
  }

  static boolean uses(String kind, String column) {
    return EVERY.contains(column) || KINDS.get(kind).contains(column);
  }

  /** The columns of a kind, for a message. */
  static String list(String kind) {
    Set<String> names = new TreeSet<>(KINDS.get(kind));
    names.addAll(EVERY);
    return String.join(", ", names);
  }
}
