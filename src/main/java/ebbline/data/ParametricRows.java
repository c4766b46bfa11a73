package ebbline.data;

import ebbline.curve.SvenssonCurve;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** The rows {@code parameter,value} of a Nelson–Siegel or Svensson curve. */
final class ParametricRows {
  private static final List<String> NELSON_SIEGEL = List.of("beta0", "beta1", "beta2", "tau1");
  private static final List<String> SVENSSON =
      List.of("beta0", "beta1", "beta2", "beta3", "tau1", "tau2");

  private final CsvTable table;
  private final List<InputProblem> problems;

  ParametricRows(CsvTable table, List<InputProblem> problems) {
    this.table = table;
    this.problems = problems;
  }

  SvenssonCurve curve() {
    String form = table.setting("form").orElseThrow().value().toLowerCase(Locale.ROOT);
    List<String> wanted =
        form.equals("svensson") ? SVENSSON : form.equals("nelson-siegel") ? NELSON_SIEGEL : null;
    if (wanted == null) {
      problems.add(table.settingProblem("form", "expected nelson-siegel or svensson"));
    }
    for (String column : List.of("parameter", "value")) {
      if (!table.hasColumn(column)) {
        problems.add(
            table.headerProblem(column, "the column is missing; a formula's file needs it"));
      }
    }
    for (String column : List.of("maturity", "discount", "zero")) {
      if (table.hasColumn(column)) {
        problems.add(
            table.headerProblem(
                column, "this column belongs to a curve of nodes; leave '# form' out"));
      }
    }
    throwIfAny();
    Map<String, Double> values = new LinkedHashMap<>();
    table.forEachRow(problems, row -> parameter(row, wanted, values));
    for (String name : wanted) {
      if (!values.containsKey(name) && problems.isEmpty()) {
        problems.add(
            new InputProblem(
                table.file().path(), 0, "parameter", "", "the parameter " + name + " is missing"));
      }
    }
    throwIfAny();
    try {
      return form.equals("svensson")
          ? SvenssonCurve.of(
              values.get("beta0"),
              values.get("beta1"),
              values.get("beta2"),
              values.get("beta3"),
              values.get("tau1"),
              values.get("tau2"))
          : SvenssonCurve.nelsonSiegel(
              values.get("beta0"), values.get("beta1"), values.get("beta2"), values.get("tau1"));
    } catch (IllegalArgumentException e) {
      throw InputProblems.of(new InputProblem(table.file().path(), 0, "", "", e.getMessage()));
    }
  }

  private void parameter(CsvRow row, List<String> wanted, Map<String, Double> values) {
    Optional<String> name = row.required("parameter", row.text("parameter"));
    if (name.isEmpty()) {
      return;
    }
    if (!wanted.contains(name.get())) {
      row.problem(
          "parameter",
          name.get(),
          "no such parameter of this form; did you mean '"
              + NearestName.of(name.get(), wanted)
              + "'? known: "
              + String.join(", ", wanted));
      return;
    }
    boolean tau = name.get().startsWith("tau");
    Optional<Double> value =
        row.required("value", row.value("value", tau ? ParametricRows::tau : RateText::parse));
    if (value.isPresent() && values.put(name.get(), value.get()) != null) {
      row.problem("parameter", name.get(), "the parameter is given twice");
    }
  }

  private static double tau(String text) {
    double tau = NumberText.parse(text);
    if (tau > 0) {
      return tau;
    }
    throw new IllegalArgumentException("a tau is a number of years above 0");
  }

  private void throwIfAny() {
    if (!problems.isEmpty()) {
      throw InFileOrder.of(problems);
    }
  }
}
