package ebbline.cli;

import ebbline.data.HistoryFile;
import ebbline.data.HistoryInput;
import ebbline.data.PanelFile;
import ebbline.data.PanelInput;
import ebbline.data.SourceFile;
import ebbline.report.ResultRow;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;

/** Estimates the Vasicek model from a history. */
@Command(
    name = "estimate",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Estimates the Vasicek model (historical measure) from the history of one rate or a panel of"
          + " yields: parameters, standard errors, intervals, bias of the mean reversion, tests of"
          + " the model. A history that holds no estimate is answered in words (exit status 1).",
      "With --curve also the market price of risk that brings the model nearest to that curve."
    },
    footer = {
      "",
      "A calculation aid, not advice.",
      "",
      "Examples (from the project's root):",
      "  java -jar target/ebbline.jar estimate --history examples/saltmere-rates.csv \\",
      "    --step 1M --curve curves/saltmere.csv --save target/saltmere-model.json",
      "  java -jar target/ebbline.jar estimate --history examples/saltmere-panel.csv \\",
      "    --method panel --step 1M --format json"
    })
final class EstimateCommand implements Callable<Integer> {
  @Mixin private EstimateOptions options;
  @Mixin private MarketOptions market;
  @Mixin private OutputOptions output;

  @Override
  public Integer call() {
    output.threads();
    options.confidence();
    for (String option : market.needingCurve()) {
      if (!market.hasCurve()) {
        throw new UsageProblem(option + " needs --curve FILE");
      }
    }
    return options.isPanel() ? panel() : history();
  }

  private int history() {
    if (options.filtered().isPresent()) {
      throw new UsageProblem("--filtered: only --method panel filters a short rate");
    }
    options.method();
    options.horizons();
    if (options.savesRiskNeutral(false) && !market.hasCurve()) {
      throw new UsageProblem(
          "--measure risk-neutral needs --curve FILE: a history of one rate holds no market price"
              + " of risk");
    }
    HistoryInput input = HistoryFile.read(options.file(), options.step(), options.column());
    Optional<LocalDate> last =
        input.history().size() == 0
            ? Optional.empty()
            : input.dateAt(input.history().time(input.history().size() - 1));
    SavedModel saved = SavedModel.of(options, market, output, last);
    HistoryEstimation estimation = new HistoryEstimation(options, output, input, saved);
    ResultRow row = estimation.run();
    write(row, saved, input.file());
    return (estimation.isDetermined() ? ExitStatus.DONE : ExitStatus.CHECK_FAILED).code();
  }

  private int panel() {
    options.refuseForPanel();
    PanelInput input = PanelFile.read(options.file(), options.step());
    Optional<LocalDate> last =
        input.dates().isEmpty()
            ? Optional.empty()
            : Optional.of(input.dates().get(input.dates().size() - 1));
    SavedModel saved = SavedModel.of(options, market, output, last);
    PanelEstimation estimation = new PanelEstimation(options, output, input, saved);
    ResultRow row = estimation.run();
    write(row, saved, input.file());
    return (estimation.isDetermined() ? ExitStatus.DONE : ExitStatus.CHECK_FAILED).code();
  }

  private void write(ResultRow row, SavedModel saved, SourceFile file) {
    List<Optional<SourceFile>> files = new ArrayList<>();
    files.add(Optional.of(file));
    saved.curveFile().ifPresent(f -> files.add(Optional.of(f)));
    TimeAxis axis = saved.axis();
    output.write(Inputs.envelope("estimate", axis, files, List.of()), List.of(row));
  }
}
