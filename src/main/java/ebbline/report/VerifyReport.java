package ebbline.report;

import ebbline.check.CaseResult;
import ebbline.check.PublishedCase;
import ebbline.check.Verdict;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Published cases with their verdicts as results. */
public final class VerifyReport {
  private VerifyReport() {}

  public static List<String> columns() {
    return List.of(
        "id",
        "topic",
        "quantity",
        "published",
        "computed",
        "difference",
        "tolerance",
        "verdict",
        "provenance",
        "source",
        "note");
  }

  /** One row a case. */
  public static ResultRow result(CaseResult result) {
    PublishedCase c = result.published();
    ResultRow.Builder row = ResultRow.builder();
    row.text("id", c.id()).text("topic", c.topic()).text("quantity", result.quantity());
    if (c.isPublished()) {
      row.text("published", c.published());
    }
    if (result.computed().isPresent()) {
      row.put("computed", new Cell.Amount(result.computed().getAsDouble(), 10));
    } else if (!result.computedText().isEmpty()) {
      row.text("computed", result.computedText());
    }
    if (result.verdict() != Verdict.NOT_COMPUTED) {
      row.magnitude("difference", result.difference());
      row.magnitude("tolerance", result.tolerance());
    }
    row.text("verdict", result.verdict().label());
    row.text("provenance", c.provenance());
    row.text("source", c.source());
    if (!result.note().isEmpty()) {
      row.text("note", result.note());
    }
    return row.build();
  }

  /** One row a topic: how many cases met which verdict. */
  public static List<ResultRow> summary(List<CaseResult> results) {
    Map<String, Map<Verdict, Integer>> counts = new LinkedHashMap<>();
    for (CaseResult result : results) {
      counts
          .computeIfAbsent(result.published().topic(), t -> new LinkedHashMap<>())
          .merge(result.verdict(), 1, Integer::sum);
    }
    List<ResultRow> rows = new ArrayList<>();
    counts.forEach(
        (topic, verdicts) -> {
          ResultRow.Builder row = ResultRow.builder().text("topic", topic);
          row.count("cases", verdicts.values().stream().mapToInt(Integer::intValue).sum());
          for (Verdict verdict : Verdict.values()) {
            row.count(verdict.label(), verdicts.getOrDefault(verdict, 0));
          }
          rows.add(row.build());
        });
    return rows;
  }
}
