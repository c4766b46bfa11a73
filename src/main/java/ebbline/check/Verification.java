package ebbline.check;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.function.Predicate;

/** Runs the published cases that the program ships. */
public final class Verification {
  private Verification() {}

  /** Topics in the order in which they are shown. */
  public static List<String> topics() {
    Set<String> topics = new LinkedHashSet<>();
    PublishedCases.read("short-rate").forEach(c -> topics.add(c.topic()));
    PublishedCases.read("bonds").forEach(c -> topics.add(c.topic()));
    return List.copyOf(topics);
  }

  /**
   * Computes every case that {@code wanted} accepts.
   *
   * @return one result a case, in the order of the files
   */
  public static List<CaseResult> run(Predicate<PublishedCase> wanted) {
    List<CaseResult> results = new ArrayList<>();
    results.addAll(run(new ShortRateCases(), "short-rate", wanted));
    results.addAll(run(new BondCases(), "bonds", wanted));
    return List.copyOf(results);
  }

  private static List<CaseResult> run(
      CaseFamily family, String name, Predicate<PublishedCase> wanted) {
    return family.run(PublishedCases.read(name).stream().filter(wanted).toList());
  }
}
