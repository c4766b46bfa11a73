package ebbline.data;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.function.Predicate;

/**
 * What a kind of file may hold.
 *
 * @param kind what the file is called in messages
 * @param settings keys of the lines before the header
 * @param columns columns that hold texts, numbers or moments
 * @param rates columns that hold rates, which may be headed {@code NAME_pct} or {@code NAME_bp}
 * @param otherRates whether a name that is not listed is such a column too
 */
record Layout(
    String kind,
    Set<String> settings,
    Set<String> columns,
    Set<String> rates,
    Predicate<String> otherRates) {

  Layout(String kind, Set<String> settings, Set<String> columns, Set<String> rates) {
    this(kind, settings, columns, rates, name -> false);
  }

  Layout {
    settings = Set.copyOf(settings);
    columns = Set.copyOf(columns);
    rates = Set.copyOf(rates);
  }

  boolean isRate(String name) {
    return rates.contains(name) || (!columns.contains(name) && otherRates.test(name));
  }

  /** All names a column may have, sorted. */
  List<String> known() {
    List<String> names = new ArrayList<>(columns);
    names.addAll(rates);
    names.sort(null);
    return names;
  }
}
