package ebbline.cli;

import ebbline.check.CaseResult;
import ebbline.check.PublishedCase;
import ebbline.check.Verdict;
import ebbline.check.Verification;
import ebbline.report.Envelope;
import ebbline.report.ResultRow;
import ebbline.report.VerifyReport;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Reproduces the published worked examples. */
@Command(
    name = "verify",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Reproduces the published worked examples that the program ships and says how far off it is.",
      "Verdicts: matches (half a unit of the last printed digit), source-rounded (the source rounds on"
          + " the way; the figure agrees with exact arithmetic), shown (not claimed), not-computed,"
          + " misses (exit status 1)."
    },
    footer = {
      "",
      "A calculation aid, not advice.",
      "",
      "Examples (from the project's root):",
      "  java -jar target/ebbline.jar verify --summary",
      "  java -jar target/ebbline.jar verify --topic Hull-White --format csv"
    })
final class VerifyCommand implements Callable<Integer> {
  @Mixin private OutputOptions output;

  @Option(
      names = "--topic",
      paramLabel = "TOPIC",
      description = "only the cases of this topic (repeatable)")
  private List<String> topics = List.of();

  @Option(
      names = "--id",
      paramLabel = "ID",
      description = "only the cases whose id starts with this (repeatable)")
  private List<String> ids = List.of();

  @Option(names = "--summary", description = "one line a topic, and the cases that missed")
  private boolean summary;

  @Override
  public Integer call() {
    checkTopics();
    List<CaseResult> results = Verification.run(this::isWanted);
    if (results.isEmpty()) {
      throw UsageProblem.of(
          "--id", String.join(", ", ids), "no published case has an id that starts so");
    }
    List<CaseResult> missed = results.stream().filter(r -> r.verdict() == Verdict.MISSES).toList();
    List<ResultRow> rows =
        summary
            ? VerifyReport.summary(results)
            : results.stream().map(VerifyReport::result).toList();
    output.write(
        new Envelope(
            Version.number(),
            "verify",
            Optional.empty(),
            List.of(),
            summary ? List.of() : VerifyReport.columns()),
        rows);
    missed.forEach(
        m ->
            output.warn(
                "missed: "
                    + m.published().id()
                    + ", published "
                    + m.published().published()
                    + ", computed "
                    + m.computedText()));
    output.note(
        String.format(
            Locale.ROOT,
            "%d cases: %d computed, %d missed",
            results.size(),
            results.stream().filter(r -> r.verdict() != Verdict.NOT_COMPUTED).count(),
            missed.size()));
    return (missed.isEmpty() ? ExitStatus.DONE : ExitStatus.CHECK_FAILED).code();
  }

  private boolean isWanted(PublishedCase c) {
    return (topics.isEmpty() || topics.stream().anyMatch(c.topic()::equalsIgnoreCase))
        && (ids.isEmpty() || ids.stream().anyMatch(c.id()::startsWith));
  }

  private void checkTopics() {
    List<String> known = Verification.topics();
    for (String topic : topics) {
      if (known.stream().noneMatch(topic::equalsIgnoreCase)) {
        throw UsageProblem.of("--topic", topic, "expected one of " + String.join(", ", known));
      }
    }
  }
}
