package ebbline.data;

import ebbline.curve.Compounding;
import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import ebbline.time.TimeAxis.TimeBasis;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Collectors;

/** Curve files: nodes of discount factors or zero rates, or the parameters of a formula. */
public final class CurveFile {
  private static final String FLAT = "flat:";

  /** ln 1e300: beyond, figures made of discount factors overflow. */
  private static final double FARTHEST_LOG = 300 * Math.log(10);

  private static final Layout LAYOUT =
      new Layout(
          "curve file",
          Set.of("as-of", "interpolation", "compounding", "day-count", "form"),
          Set.of("maturity", "discount", "parameter", "value"),
          Set.of("zero"));

  private CurveFile() {}

  /**
   * Reads {@code FILE} or {@code flat:RATE}.
   *
   * @param asOf overrides the file's own date
   * @param interpolation overrides the file's own
   * @throws InputProblems with everything that is wrong, in the order of the file
   */
  public static CurveInput read(
      String spec, Optional<LocalDate> asOf, Optional<Interpolation> interpolation) {
    return spec.startsWith(FLAT)
        ? flat(spec, asOf)
        : new Reading(CsvTable.open(SourceFile.read(spec), LAYOUT), asOf, interpolation).curve();
  }

  private static CurveInput flat(String spec, Optional<LocalDate> asOf) {
    String rate = spec.substring(FLAT.length());
    try {
      return new CurveInput(
          FlatCurve.of(RateText.parse(rate)),
          asOf.map(TimeAxis::from).orElse(TimeAxis.undated()),
          List.of(),
          Optional.empty());
    } catch (IllegalArgumentException e) {
      throw InputProblems.of(new InputProblem(spec, 0, "", rate, e.getMessage()));
    }
  }

  /** One file being read. */
  private static final class Reading {
    private final CsvTable table;
    private final Optional<Interpolation> override;
    private final List<InputProblem> problems = new ArrayList<>();
    private final TimeAxis axis;
    private final Compounding compounding;

    Reading(CsvTable table, Optional<LocalDate> asOf, Optional<Interpolation> interpolation) {
      this.table = table;
      this.override = interpolation;
      Optional<LocalDate> own = setting("as-of", Reading::date);
      TimeBasis basis = setting("day-count", Reading::basis).orElse(TimeBasis.ACT_365F);
      axis = asOf.or(() -> own).map(day -> TimeAxis.from(day, basis)).orElse(TimeAxis.undated());
      compounding = setting("compounding", Compounding::of).orElse(Compounding.CONTINUOUS);
    }

    private <T> Optional<T> setting(String key, java.util.function.Function<String, T> reader) {
      try {
        return table.setting(key).map(s -> reader.apply(s.value()));
      } catch (IllegalArgumentException e) {
        problems.add(table.settingProblem(key, e.getMessage()));
        return Optional.empty();
      }
    }

    private static LocalDate date(String text) {
      if (Moment.parse(text) instanceof Moment.OnDate on) {
        return on.date();
      }
      throw new IllegalArgumentException("expected a date such as 2026-11-30");
    }

    private static TimeBasis basis(String text) {
      for (TimeBasis basis : TimeBasis.values()) {
        if (basis.label().equals(text.toLowerCase(Locale.ROOT))) {
          return basis;
        }
      }
      throw new IllegalArgumentException(
          "expected a time basis, one of "
              + Arrays.stream(TimeBasis.values())
                  .map(TimeBasis::label)
                  .collect(Collectors.joining(", ")));
    }

    CurveInput curve() {
      if (table.setting("form").isPresent()) {
        ParametricRows rows = new ParametricRows(table, problems);
        return new CurveInput(rows.curve(), axis, List.of(), Optional.of(table.file()));
      }
      return nodes();
    }

    private CurveInput nodes() {
      Interpolation named =
          setting("interpolation", Interpolation::of).orElse(Interpolation.LOG_LINEAR);
      if (named == Interpolation.SMITH_WILSON && override.isEmpty()) {
        problems.add(
            table.settingProblem(
                "interpolation",
                "this version reads no smith-wilson curve from nodes; use log-linear, linear-zero,"
                    + " cubic or monotone-convex"));
      }
      for (String other : List.of("parameter", "value")) {
        if (table.hasColumn(other)) {
          problems.add(
              table.headerProblem(
                  other,
                  "this column belongs to a formula; add '# form: nelson-siegel' or '# form:"
                      + " svensson'"));
        }
      }
      boolean discounts = table.hasColumn("discount");
      if (!table.hasColumn("maturity")) {
        problems.add(
            table.headerProblem("maturity", "the column is missing; a curve file needs it"));
      }
      if (discounts == table.hasColumn("zero")) {
        problems.add(
            table.headerProblem(
                discounts ? "zero" : "discount",
                discounts
                    ? "give either discount or zero, not both"
                    : "the column is missing; give discount or zero"));
      }
      throwIfAny();
      List<String> labels = new ArrayList<>();
      List<Double> times = new ArrayList<>();
      List<Double> logs = new ArrayList<>();
      int[] rows = {0};
      table.forEachRow(
          problems,
          row -> {
            rows[0]++;
            node(row, discounts, labels, times, logs);
          });
      if (rows[0] == 0 && problems.isEmpty()) {
        problems.add(
            new InputProblem(table.file().path(), 0, "", "", "there are no rows below the header"));
      }
      if (times.isEmpty() && problems.isEmpty()) {
        problems.add(
            new InputProblem(table.file().path(), 0, "", "", "a curve needs a node after time 0"));
      }
      throwIfAny();
      return new CurveInput(
          curve(
              override.orElse(named),
              times.stream().mapToDouble(Double::doubleValue).toArray(),
              logs.stream().mapToDouble(Double::doubleValue).toArray()),
          axis,
          labels,
          Optional.of(table.file()));
    }

    private DiscountCurve curve(Interpolation interpolation, double[] times, double[] logs) {
      try {
        return InterpolatedCurve.of(interpolation, times, logs);
      } catch (IllegalArgumentException e) {
        throw InputProblems.of(new InputProblem(table.file().path(), 0, "", "", e.getMessage()));
      }
    }

    private void node(
        CsvRow row, boolean discounts, List<String> labels, List<Double> times, List<Double> logs) {
      Optional<Moment> maturity = row.required("maturity", row.moment("maturity"));
      String column = discounts ? "discount" : "zero";
      OptionalDouble value = discounts ? row.number(column) : row.rate(column);
      if (value.isEmpty() && !row.has(column)) {
        row.problem(column, "", "a value is missing");
      }
      if (maturity.isEmpty()) {
        return;
      }
      String label = row.text("maturity").orElseThrow();
      double time;
      try {
        time = axis.years(maturity.get());
      } catch (IllegalArgumentException e) {
        row.problem("maturity", label, e.getMessage());
        return;
      }
      double previous = times.isEmpty() ? 0 : times.get(times.size() - 1);
      if (time == 0
          && times.isEmpty()
          && discounts
          && value.isPresent()
          && value.getAsDouble() == 1) {
        return; // discount 1 today is a knot of every curve
      }
      if (!(time > previous)) {
        row.problem(
            "maturity",
            label,
            times.isEmpty()
                ? "a node must lie after the as-of date"
                : "maturities must increase; the row above has " + labels.get(labels.size() - 1));
        return;
      }
      if (value.isEmpty()) {
        return;
      }
      logDiscount(row, column, value.getAsDouble(), time)
          .ifPresent(
              log -> {
                labels.add(label);
                times.add(time);
                logs.add(log);
              });
    }

    private Optional<Double> logDiscount(CsvRow row, String column, double value, double time) {
      String wrong = "a discount factor must be above 0";
      if (column.equals("zero") || value > 0) {
        try {
          double log =
              column.equals("zero") ? compounding.logDiscount(value, time) : Math.log(value);
          if (Math.abs(log) <= FARTHEST_LOG) {
            return Optional.of(log);
          }
          wrong = "a discount factor must lie between 1e-300 and 1e300; this one does not";
        } catch (IllegalArgumentException e) {
          wrong = e.getMessage();
        }
      }
      row.problem(column, row.text(column).orElseThrow(), wrong);
      return Optional.empty();
    }

    private void throwIfAny() {
      if (!problems.isEmpty()) {
        throw InFileOrder.of(problems);
      }
    }
  }
}
