package ebbline.cli;

import ebbline.curve.Interpolation;
import ebbline.data.CurveFile;
import ebbline.data.CurveInput;
import ebbline.data.KernelSettings;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import ebbline.time.Moment;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import picocli.CommandLine.Option;

/** Today's date and curve; the same options in every command. */
final class MarketOptions {
  @Option(
      names = "--as-of",
      paramLabel = "DATE",
      description = "today, 2026-11-30; overrides the curve file's own date")
  private String asOf;

  @Option(
      names = "--curve",
      paramLabel = "FILE|flat:RATE",
      description = "discount curve: a CSV file, or one continuous rate such as flat:5%%")
  private String curve;

  @Option(
      names = "--interpolation",
      paramLabel = "NAME",
      description =
          "log-linear, linear-zero, cubic, monotone-convex or smith-wilson; overrides the curve"
              + " file's own")
  private String interpolation;

  Optional<LocalDate> asOf() {
    return read(
        "--as-of",
        asOf,
        text -> {
          if (Moment.parse(text) instanceof Moment.OnDate on) {
            return on.date();
          }
          throw new IllegalArgumentException("expected a date such as 2026-11-30");
        });
  }

  /** Options given that mean nothing without a curve. */
  List<String> needingCurve() {
    List<String> given = new ArrayList<>();
    if (interpolation != null) {
      given.add("--interpolation");
    }
    return given;
  }

  /** How the curve is to run between its nodes, where the command line says so. */
  Optional<Interpolation> interpolation() {
    return read("--interpolation", interpolation, Interpolation::of);
  }

  boolean hasCurve() {
    return curve != null;
  }

  /** The curve with what the command line overrides; a command that needs one says so before. */
  CurveInput curve() {
    return curve(KernelSettings.NONE);
  }

  /**
   * As above.
   *
   * @param kernel settings of a smith-wilson curve that override the file's own
   */
  CurveInput curve(KernelSettings kernel) {
    if (curve == null) {
      throw new UsageProblem("--curve FILE is missing: the discount curve to work on");
    }
    Optional<Interpolation> named = interpolation();
    if (curve.startsWith("flat:") && named.isPresent()) {
      throw UsageProblem.of(
          "--interpolation", interpolation, "a flat curve has no nodes to interpolate");
    }
    return read("--curve", curve, named, kernel);
  }

  /** A curve named by an option, for the as-of date of the command line. */
  CurveInput read(String option, String text, Optional<Interpolation> named) {
    return read(option, text, named, KernelSettings.NONE);
  }

  private CurveInput read(
      String option, String text, Optional<Interpolation> named, KernelSettings kernel) {
    try {
      return CurveFile.read(text, asOf(), named, kernel);
    } catch (InputProblems e) {
      if (text.startsWith("flat:")) {
        InputProblem problem = e.problems().get(0);
        throw UsageProblem.of(option + " " + text, problem.value(), problem.expected());
      }
      throw e;
    }
  }

  /** The text of an option turned into something, with the reader's words where it cannot be. */
  static <T> Optional<T> read(String option, String text, Function<String, T> reader) {
    if (text == null) {
      return Optional.empty();
    }
    try {
      return Optional.of(reader.apply(text));
    } catch (IllegalArgumentException e) {
      throw UsageProblem.of(option, text, e.getMessage());
    }
  }
}
