package ebbline.cli;

import ebbline.check.Challenge;
import ebbline.check.ChallengeFigure;
import ebbline.check.ChallengeVerdict;
import ebbline.data.BookEntry;
import ebbline.data.BookFile;
import ebbline.data.CurveInput;
import ebbline.data.ModelInput;
import ebbline.data.RowText;
import ebbline.data.SourceFile;
import ebbline.pricing.Market;
import ebbline.report.ChallengeReport;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** Prices a book by every method that can. */
@Command(
    name = "challenge",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Prices every row of a book by every method that can, and says whether the methods' own error"
          + " bounds explain their differences (exit status 1 where they do not). The most accurate"
          + " method comes first and is the reference."
    },
    footer = {
      "",
      "A calculation aid, not advice: local rules and your own licensed and independent review"
          + " prevail.",
      "",
      "Examples (from the project's root):",
      "  java -jar target/ebbline.jar challenge --model hull-white \\",
      "    --mean-reversion 0.05 --volatility 0.9%% --curve curves/saltmere.csv \\",
      "    --book examples/book.csv --paths 16384",
      "  java -jar target/ebbline.jar challenge --model hull-white \\",
      "    --mean-reversion 0.1 --volatility 1%% --curve flat:5%% --row \\",
      "    'instrument=callable-bond maturity=10 coupon=5%% calls=5..9.5@100'"
    })
final class ChallengeCommand implements Callable<Integer> {
  @Mixin private MarketOptions market;
  @Mixin private ProjectionOption projection;
  @Mixin private ModelOptions model;

  @Option(names = "--book", paramLabel = "FILE", description = "the book, one instrument a row")
  private String book;

  @Option(
      names = "--row",
      paramLabel = "'KEY=VALUE …'",
      description = "one row typed here, with the book's columns as keys; repeatable")
  private List<String> rows = List.of();

  @Option(
      names = "--steps",
      paramLabel = "N",
      defaultValue = "500",
      description = "steps of the trinomial tree (default 500)")
  private int steps;

  @Mixin private PathsOption paths;

  @Mixin private HolidayOptions holidays;
  @Mixin private OutputOptions output;

  @Override
  public Integer call() {
    if (book == null && rows.isEmpty()) {
      throw new UsageProblem("nothing to challenge: give --book FILE or --row 'KEY=VALUE …'");
    }
    List<Optional<SourceFile>> files = new ArrayList<>();
    Challenge challenge = challenge(files);
    List<ChallengeFigure> figures = new ArrayList<>();
    if (book != null) {
      BookFile file = BookFile.open(book, holidays.calendars());
      files.add(Optional.of(file.file()));
      file.forEach(entry -> figures.addAll(figures(entry, challenge)));
    }
    int number = (int) figures.stream().map(ChallengeFigure::id).distinct().count();
    for (String row : rows) {
      figures.addAll(figures(entry(row, ++number), challenge));
    }
    output.write(
        Inputs.envelope("challenge", challenge.market().axis(), files, ChallengeReport.columns()),
        figures.stream().map(ChallengeReport::result).toList());
    return (summed(figures) ? ExitStatus.CHECK_FAILED : ExitStatus.DONE).code();
  }

  private BookEntry entry(String row, int number) {
    try {
      return RowText.parse(row, "--row", number, holidays.calendars());
    } catch (IllegalArgumentException e) {
      throw new UsageProblem("--row: " + e.getMessage());
    }
  }

  private static List<ChallengeFigure> figures(BookEntry entry, Challenge challenge) {
    if (entry instanceof BookEntry.Bad bad) {
      return List.of(ChallengeFigure.failed(bad.id(), bad.message()));
    }
    return challenge.of(((BookEntry.Good) entry).row());
  }

  private Challenge challenge(List<Optional<SourceFile>> files) {
    Optional<ModelInput> named = model.model(market);
    if (named.isEmpty()) {
      throw new UsageProblem(
          "a challenge needs a model: give --model FILE, or --model vasicek or hull-white with its"
              + " parameters");
    }
    files.add(named.get().file());
    Market priced = Market.of(named.get().axis(), named.get().rates());
    Optional<CurveInput> forwards = projection.curve(market, priced.axis());
    if (forwards.isPresent()) {
      files.add(forwards.get().file());
      priced = priced.withProjection(forwards.get().curve());
    }
    return new Challenge(priced, steps(), paths.sampling(output));
  }

  private int steps() {
    if (steps >= 4 && steps <= 20_000) {
      return steps;
    }
    throw UsageProblem.of("--steps", Integer.toString(steps), "expected 4 to 20000");
  }

  /** Says how it went; whether anything failed. */
  private boolean summed(List<ChallengeFigure> figures) {
    long compared = 0;
    long unexplained = 0;
    long failed = 0;
    for (ChallengeFigure figure : figures) {
      compared += figure.verdict() == ChallengeVerdict.EXPLAINED ? 1 : 0;
      unexplained += figure.verdict() == ChallengeVerdict.UNEXPLAINED ? 1 : 0;
      failed += figure.verdict() == ChallengeVerdict.FAILED ? 1 : 0;
    }
    output.note(
        String.format(
            Locale.ROOT,
            "%d rows, %d comparisons: %d differences not explained by the error bounds, %d rows"
                + " without a value",
            figures.stream().map(ChallengeFigure::id).distinct().count(),
            compared + unexplained,
            unexplained,
            failed));
    return figures.stream().anyMatch(ChallengeFigure::fails);
  }
}
