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
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** Curve files: nodes of discount factors or zero rates, or the parameters of a formula. */
public final class CurveFile {
  private static final String FLAT = "flat:";

  /** ln 1e300: beyond, figures made of discount factors overflow. */
  private static final double FARTHEST_LOG = 300 * Math.log(10);

  private static final Layout LAYOUT =
      new Layout(
          "curve file",
          Set.of(
              "as-of",
              "interpolation",
              "compounding",
              "day-count",
              "form",
              "ultimate-forward",
              "convergence",
              "speed",
              "tolerance"),
          Set.of("maturity", "discount", "kernel", "parameter", "value"),
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
    return read(spec, asOf, interpolation, KernelSettings.NONE);
  }

  /**
   * As above.
   *
   * @param kernel overrides the file's own settings of Smith and Wilson's curve
   */
  public static CurveInput read(
      String spec,
      Optional<LocalDate> asOf,
      Optional<Interpolation> interpolation,
      KernelSettings kernel) {
    return spec.startsWith(FLAT)
        ? flat(spec, asOf)
        : new Reading(CsvTable.open(SourceFile.read(spec), LAYOUT), asOf, interpolation, kernel)
            .curve();
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
    private final SettingReader settings;
    private final TimeAxis axis;
    private final Compounding compounding;
    private final KernelSettings kernel;

    Reading(
        CsvTable table,
        Optional<LocalDate> asOf,
        Optional<Interpolation> interpolation,
        KernelSettings overrides) {
      this.table = table;
      this.override = interpolation;
      this.settings = new SettingReader(table, problems);
      Optional<LocalDate> own = settings.read("as-of", SettingReader::date);
      TimeBasis basis = settings.read("day-count", SettingReader::basis).orElse(TimeBasis.ACT_365F);
      axis = asOf.or(() -> own).map(day -> TimeAxis.from(day, basis)).orElse(TimeAxis.undated());
      compounding = settings.read("compounding", Compounding::of).orElse(Compounding.CONTINUOUS);
      kernel = overrides.or(settings.kernel());
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
          override.orElse(
              settings.read("interpolation", Interpolation::of).orElse(Interpolation.LOG_LINEAR));
      boolean smithWilson = named == Interpolation.SMITH_WILSON;
      if (smithWilson) {
        KernelNodes.requireSettings(kernel, table, problems);
      } else if (table.hasColumn("kernel") && override.isEmpty()) {
        problems.add(
            table.headerProblem(
                "kernel", "this column belongs to '# interpolation: smith-wilson'"));
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
      KernelNodes kernels = new KernelNodes(kernel, smithWilson && table.hasColumn("kernel"));
      int[] rows = {0};
      table.forEachRow(
          problems,
          row -> {
            rows[0]++;
            if (node(row, discounts, labels, times, logs)) {
              kernels.add(row);
            }
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
              named,
              kernels,
              times.stream().mapToDouble(Double::doubleValue).toArray(),
              logs.stream().mapToDouble(Double::doubleValue).toArray()),
          axis,
          labels,
          Optional.of(table.file()));
    }

    private DiscountCurve curve(
        Interpolation interpolation, KernelNodes kernels, double[] times, double[] logs) {
      try {
        return interpolation == Interpolation.SMITH_WILSON
            ? kernels.curve(times, logs)
            : InterpolatedCurve.of(interpolation, times, logs);
      } catch (IllegalArgumentException e) {
        throw InputProblems.of(new InputProblem(table.file().path(), 0, "", "", e.getMessage()));
      }
    }

    /** Adds the row's node; whether there is one to add. */
    private boolean node(
        CsvRow row, boolean discounts, List<String> labels, List<Double> times, List<Double> logs) {
      Optional<Moment> maturity = row.required("maturity", row.moment("maturity"));
      String column = discounts ? "discount" : "zero";
      OptionalDouble value = discounts ? row.number(column) : row.rate(column);
      if (value.isEmpty() && !row.has(column)) {
        row.problem(column, "", "a value is missing");
      }
      if (maturity.isEmpty()) {
        return false;
      }
      String label = row.text("maturity").orElseThrow();
      double time;
      try {
        time = axis.years(maturity.get());
      } catch (IllegalArgumentException e) {
        row.problem("maturity", label, e.getMessage());
        return false;
      }
      double previous = times.isEmpty() ? 0 : times.get(times.size() - 1);
      if (time == 0
          && times.isEmpty()
          && discounts
          && value.isPresent()
          && value.getAsDouble() == 1) {
        return false; // discount 1 today is a knot of every curve
      }
      if (!(time > previous)) {
        row.problem(
            "maturity",
            label,
            times.isEmpty()
                ? "a node must lie after the as-of date"
                : "maturities must increase; the row above has " + labels.get(labels.size() - 1));
        return false;
      }
      if (value.isEmpty()) {
        return false;
      }
      Optional<Double> log = logDiscount(row, column, value.getAsDouble(), time);
      log.ifPresent(
          number -> {
            labels.add(label);
            times.add(time);
            logs.add(number);
          });
      return log.isPresent();
    }

    private Optional<Double> logDiscount(CsvRow row, String column, double value, double time) {
      String wrong = "a discount factor must be above 0";
      if (column.equals("zero") || value > 0) {
        try {
          double log =
              column.equals("zero")
                  ? compounding.logDiscount(value, time)
                  : DiscountDigits.log(row.text(column).orElseThrow(), value);
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
