package ebbline.check;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The published cases of day counts, calendars, and bonds without a model. */
final class BondCases implements CaseFamily {

  /** Computes one case, or leaves it to another. */
  interface Computation {
    /**
     * @param all inputs of every case of the file by id, for those that refer to another's
     */
    Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all);
  }

  private static final List<Computation> COMPUTATIONS =
      List.of(
          new DayCountCases(),
          new CalendarCases(),
          new TreasuryCases(),
          new IndexedCases(),
          new MarketCases(),
          new SpreadsheetCases(),
          new DocumentedFunctionCases(),
          new TextbookBondCases(),
          new BootstrapCases());

  /** Why the cases whose id starts so are not computed. */
  private static final Map<String, String> REASONS =
      Map.of(
          "CAL-US6103", "the calendar of the federal offices is not one of the program's",
          "CAL-ADJ", "this roll is not one of the program's",
          "CAL-IMM", "futures' dates are given to the program, not computed by it",
          "CAL-EASTER", "the calendars that know Easter end before that year",
          "KWF-", "a binomial lattice of the rate's logarithm is not part of the program",
          "KRD-", "bumped zero rates belong to the risk command, not to bond arithmetic",
          "TUCK3-", "the source's own bumped prices or a bond that is missing among the inputs");

  @Override
  public List<CaseResult> run(List<PublishedCase> cases) {
    Map<String, CaseInputs> all = new HashMap<>();
    for (PublishedCase c : PublishedCases.read("bonds")) {
      all.put(c.id(), CaseInputs.parse(c.inputs()));
    }
    List<CaseResult> results = new ArrayList<>();
    for (PublishedCase c : cases) {
      results.add(run(c, all));
    }
    return List.copyOf(results);
  }

  private static CaseResult run(PublishedCase c, Map<String, CaseInputs> all) {
    for (Computation computation : COMPUTATIONS) {
      Optional<CaseResult> result = computation.run(c, all.get(c.id()), all);
      if (result.isPresent()) {
        return result.get();
      }
    }
    for (Map.Entry<String, String> reason : REASONS.entrySet()) {
      if (c.id().startsWith(reason.getKey())) {
        return CaseResult.notComputed(c, reason.getValue());
      }
    }
    return CaseResult.notComputed(c, "no method of this version gives it");
  }

  /** What stands behind the last hyphen of a case's id. */
  static String part(PublishedCase c) {
    return c.id().substring(c.id().lastIndexOf('-') + 1);
  }
}
