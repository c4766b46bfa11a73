package ebbline.cli;

import ebbline.curve.Compounding;
import ebbline.curve.Interpolation;
import ebbline.data.CurveInput;
import ebbline.data.KernelSettings;
import ebbline.data.QuoteOverrides;
import ebbline.data.QuotesFile;
import ebbline.data.QuotesInput;
import ebbline.data.SourceFile;
import ebbline.fitting.quotes.CurveBuilder;
import ebbline.fitting.quotes.CurveFit;
import ebbline.fitting.quotes.ParametricFit;
import ebbline.fitting.quotes.ParametricFitter;
import ebbline.fitting.quotes.ParametricForm;
import ebbline.fitting.quotes.QuoteEquation;
import ebbline.fitting.quotes.QuoteKind;
import ebbline.fitting.quotes.QuoteOverlaps;
import ebbline.fitting.quotes.SheetQuote;
import ebbline.report.QuoteReport;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** A curve made from quotes, or a formula fitted to quotes or to another curve. */
final class QuoteOptions {
  /** Growth of a quote's error in the zero rates that is worth a word. */
  private static final double HIGH_CONDITION = 1e6;

  @Option(
      names = "--quotes",
      paramLabel = "FILE",
      description = "build the curve from this sheet of market quotes")
  private String quotes;

  @Option(
      names = "--nodes",
      paramLabel = "MATURITY",
      split = ",",
      description =
          "nodes of the curve, joined by commas; with more quotes than nodes by least squares"
              + " (default: one at the end of each quote)")
  private List<String> nodes = List.of();

  @Option(
      names = "--robust",
      description = "least squares with weights that fall for quotes far from the curve")
  private boolean robust;

  @Option(
      names = "--fit",
      paramLabel = "FORM",
      description =
          "fit a formula instead, nelson-siegel or svensson, to --quotes or to the zero rates of"
              + " --curve at its nodes")
  private String form;

  @Mixin private KernelOptions kernel;
  @Mixin private ConvexityOptions convexity;
  @Mixin private HolidayOptions holidays;

  KernelSettings kernel() {
    return kernel.settings();
  }

  /** The curve; empty where none is to be made. */
  Optional<BuiltCurve> build(MarketOptions market) {
    Optional<ParametricForm> wanted = MarketOptions.read("--fit", form, ParametricForm::of);
    if (quotes == null) {
      if (!nodes.isEmpty() || robust) {
        throw new UsageProblem((robust ? "--robust" : "--nodes") + " needs --quotes FILE");
      }
      return wanted.map(f -> fitted(f, market.curve(kernel())));
    }
    if (market.hasCurve()) {
      throw new UsageProblem("--curve: the curve is made from --quotes; leave one of them out");
    }
    if (wanted.isPresent() && (!nodes.isEmpty() || robust)) {
      throw new UsageProblem(
          (robust ? "--robust" : "--nodes") + ": a formula has neither nodes nor robust weights");
    }
    ConvexityOptions.Convexity moves = convexity.read();
    QuotesInput sheet =
        QuotesFile.read(
            quotes,
            new QuoteOverrides(
                market.asOf(), moves.meanReversion(), moves.volatility(), holidays.calendars()));
    List<SourceFile> files = new ArrayList<>(List.of(sheet.file()));
    moves.file().ifPresent(files::add);
    try {
      return Optional.of(
          wanted.isPresent()
              ? fitted(wanted.get(), sheet, files)
              : through(sheet, market.interpolation(), files));
    } catch (IllegalArgumentException e) {
      throw InputProblems.of(new InputProblem(quotes, 0, "", "", e.getMessage()));
    }
  }

  private static BuiltCurve fitted(ParametricForm form, CurveInput input) {
    FitGrid grid = FitGrid.of(input);
    double[] weights = new double[grid.times().length];
    Arrays.fill(weights, 1);
    ParametricFit fit;
    try {
      fit = ParametricFitter.of(form).fitZeros(grid.times(), grid.zeros(), weights);
    } catch (IllegalArgumentException e) {
      throw new UsageProblem("--fit: " + e.getMessage());
    }
    return new BuiltCurve(
        fit.curve(),
        input.axis(),
        grid.years(),
        QuoteReport.zeros(grid.labels(), fit.quotes()),
        QuoteReport.fit(fit),
        List.of(),
        fit.problem(),
        input.file().map(List::of).orElse(List.of()));
  }

  private static BuiltCurve fitted(ParametricForm form, QuotesInput sheet, List<SourceFile> files) {
    ParametricFitter fitter = ParametricFitter.of(form);
    boolean zeros = sheet.quotes().stream().allMatch(QuoteOptions::isContinuousZero);
    ParametricFit fit =
        zeros
            ? fitter.fitZeros(
                doubles(sheet, SheetQuote::end),
                doubles(sheet, q -> q.equation().quote()),
                doubles(sheet, q -> q.equation().weight()))
            : fitter.fitQuotes(equations(sheet));
    return new BuiltCurve(
        fit.curve(),
        sheet.axis(),
        list(QuoteOverlaps.nodes(equations(sheet))),
        QuoteReport.quotes(sheet.quotes(), fit.quotes()),
        QuoteReport.fit(fit),
        sheet.remarks(),
        fit.problem(),
        files);
  }

  /** A continuously compounded zero rate is linear in the betas. */
  private static boolean isContinuousZero(SheetQuote quote) {
    return quote.kind() == QuoteKind.ZERO
        && Compounding.CONTINUOUS.logDiscount(quote.equation().quote(), quote.end())
            == -quote.equation().quote() * quote.end();
  }

  private static double[] doubles(
      QuotesInput sheet, java.util.function.ToDoubleFunction<SheetQuote> what) {
    return sheet.quotes().stream().mapToDouble(what).toArray();
  }

  private static List<Double> list(double[] times) {
    return Arrays.stream(times).boxed().toList();
  }

  private static List<QuoteEquation> equations(QuotesInput sheet) {
    return sheet.quotes().stream().map(SheetQuote::equation).toList();
  }

  private BuiltCurve through(
      QuotesInput sheet, Optional<Interpolation> named, List<SourceFile> files) {
    Interpolation interpolation = named.or(sheet::interpolation).orElse(Interpolation.LOG_LINEAR);
    List<QuoteEquation> equations = equations(sheet);
    List<String> warnings = new ArrayList<>(sheet.remarks());
    double[] ends = QuoteOverlaps.nodes(equations);
    boolean exact;
    CurveFit fit;
    if (interpolation == Interpolation.SMITH_WILSON) {
      if (!nodes.isEmpty() || robust) {
        throw new UsageProblem(
            (robust ? "--robust" : "--nodes")
                + ": smith-wilson meets every quote at its own flows");
      }
      KernelSettings settings = kernel().or(sheet.kernel());
      if (!settings.isComplete()) {
        throw new IllegalArgumentException(KernelSettings.NEEDED);
      }
      warnings.addAll(QuoteOverlaps.describe(sheet.quotes()));
      fit = settings.builder().build(equations);
      exact = true;
    } else {
      double[] times = nodes.isEmpty() ? ends : nodeTimes(sheet.axis(), equations.size());
      exact = nodes.isEmpty();
      if (exact) {
        warnings.addAll(QuoteOverlaps.describe(sheet.quotes()));
      }
      CurveBuilder builder = CurveBuilder.of(interpolation).withNodes(times);
      if (robust && times.length == equations.size()) {
        warnings.add("--robust has no effect: there are as many nodes as quotes");
      }
      fit = (robust ? builder.withRobustWeights() : builder).build(equations);
    }
    warnings.addAll(fit.warnings());
    if (!fit.outliers().isEmpty()) {
      warnings.add(
          "far from the curve that the other quotes make: " + String.join(", ", fit.outliers()));
    }
    if (interpolation != Interpolation.SMITH_WILSON && fit.condition() > HIGH_CONDITION) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "the condition number is %.1e: zero rates may move by so many times an error of a"
                  + " quote",
              fit.condition()));
    }
    boolean met = fit.unmet().isEmpty();
    String problem = fit.problem();
    if (problem.isEmpty() && exact && !met) {
      problem = "not repriced, for others end at the same time: " + String.join(", ", fit.unmet());
    }
    boolean squares = fit.curve().nodes().length < equations.size();
    return new BuiltCurve(
        fit.curve(),
        sheet.axis(),
        list(interpolation == Interpolation.SMITH_WILSON ? ends : fit.curve().nodes()),
        QuoteReport.quotes(sheet.quotes(), fit.quotes()),
        QuoteReport.fit(
            fit,
            sheet.quotes(),
            squares ? (robust ? "robust-least-squares" : "least-squares") : "exact",
            interpolation.label()),
        warnings,
        problem,
        files);
  }

  private double[] nodeTimes(TimeAxis axis, int quotes) {
    double[] times = new double[nodes.size()];
    for (int i = 0; i < times.length; i++) {
      String text = nodes.get(i).strip();
      times[i] =
          MarketOptions.read("--nodes", text, node -> axis.years(Moment.parse(node))).orElseThrow();
      if (!(times[i] > (i == 0 ? 0 : times[i - 1]))) {
        throw UsageProblem.of("--nodes", text, "nodes lie after today and increase");
      }
    }
    if (times.length > quotes) {
      throw UsageProblem.of(
          "--nodes", String.join(",", nodes), "there are only " + quotes + " quotes to find them");
    }
    return times;
  }
}
