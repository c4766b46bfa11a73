package ebbline.data;

import ebbline.curve.DiscountCurve;
import ebbline.model.HullWhite;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import ebbline.time.InputProblems;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import ebbline.time.TimeAxis.TimeBasis;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * Reads model files, JSON of the format {@code ebbline-model/1}; {@link ModelWriter} writes them.
 */
public final class ModelFile {
  static final String FORMAT = "ebbline-model/1";
  private static final Set<String> MEMBERS =
      Set.of(
          "format",
          "model",
          "measure",
          "as_of",
          "mean_reversion",
          "volatility",
          "short_rate",
          "long_run_mean",
          "market_price_of_risk",
          "curve",
          "fit");

  private ModelFile() {}

  /**
   * @throws InputProblems with line and column for what is missing, unknown or out of its domain
   */
  public static ModelInput read(String path) {
    SourceFile file = SourceFile.read(path);
    JsonValue root = JsonValue.parse(file).knowing(MEMBERS);
    JsonValue format = root.member("format");
    if (!format.text().equals(FORMAT)) {
      throw format.wrong("expected '" + FORMAT + "'");
    }
    JsonValue kind = root.member("model");
    boolean vasicek = kind.text().equals("vasicek");
    if (!vasicek && !kind.text().equals("hull-white")) {
      throw kind.wrong("expected vasicek or hull-white");
    }
    double meanReversion = root.member("mean_reversion").number();
    JsonValue volatility = root.member("volatility");
    VolatilitySteps steps = volatility(volatility);
    Optional<CurveMember.Read> curve =
        root.has("curve") || !vasicek
            ? Optional.of(CurveMember.read(root.member("curve")))
            : Optional.empty();
    TimeAxis axis = axis(root, curve.map(CurveMember.Read::basis).orElse(TimeBasis.ACT_365F));
    Optional<FitSummary> fit =
        root.has("fit") ? Optional.of(fit(root.member("fit"))) : Optional.empty();
    OptionalDouble risk =
        root.has("market_price_of_risk")
            ? OptionalDouble.of(root.member("market_price_of_risk").number())
            : OptionalDouble.empty();
    if (vasicek && !steps.isConstant()) {
      throw volatility.wrong("Vasicek's volatility is one number");
    }
    if (!vasicek) {
      refuse(root, "short_rate");
      refuse(root, "long_run_mean");
    }
    return new ModelInput(
        measure(root.member("measure")),
        axis,
        vasicek
            ? Optional.of(
                new Vasicek(
                    root.member("short_rate").number(),
                    root.member("long_run_mean").number(),
                    meanReversion,
                    steps.value(0)))
            : Optional.empty(),
        vasicek ? Optional.empty() : Optional.of(new HullWhite(meanReversion, steps)),
        curve.<DiscountCurve>map(CurveMember.Read::curve),
        risk,
        fit,
        Optional.of(file));
  }

  private static void refuse(JsonValue root, String member) {
    if (root.has(member)) {
      throw root.member(member).wrong("a Hull-White model has no such parameter");
    }
  }

  private static ModelInput.Measure measure(JsonValue value) {
    for (ModelInput.Measure measure : ModelInput.Measure.values()) {
      if (measure.label().equals(value.text())) {
        return measure;
      }
    }
    throw value.wrong("expected risk-neutral or historical");
  }

  private static TimeAxis axis(JsonValue root, TimeBasis basis) {
    if (!root.has("as_of")) {
      return TimeAxis.undated();
    }
    JsonValue value = root.member("as_of");
    try {
      if (Moment.parse(value.text()) instanceof Moment.OnDate on) {
        return TimeAxis.from(on.date(), basis);
      }
    } catch (IllegalArgumentException e) {
      throw value.wrong(e.getMessage());
    }
    throw value.wrong("expected a date such as 2026-11-30");
  }

  private static VolatilitySteps volatility(JsonValue value) {
    if (!value.isList()) {
      return steps(value, new double[0], new double[] {value.number()});
    }
    List<JsonValue> items = value.items();
    if (items.isEmpty()) {
      throw value.wrong("expected at least one step");
    }
    double[] ends = new double[items.size() - 1];
    double[] values = new double[items.size()];
    for (int i = 0; i < items.size(); i++) {
      JsonValue item = items.get(i).knowing(Set.of("until", "value"));
      values[i] = item.member("value").number();
      if (i < ends.length) {
        ends[i] = item.member("until").number();
      } else if (item.has("until")) {
        throw item.member("until").wrong("the last step has no end");
      }
    }
    return steps(value, ends, values);
  }

  private static VolatilitySteps steps(JsonValue at, double[] ends, double[] values) {
    try {
      return VolatilitySteps.of(ends, values);
    } catch (IllegalArgumentException e) {
      throw at.wrong(e.getMessage());
    }
  }

  private static FitSummary fit(JsonValue fit) {
    fit.knowing(
        Set.of(
            "objective",
            "rmse",
            "iterations",
            "converged",
            "standard_errors",
            "covariance",
            "quotes"));
    Map<String, Double> errors = new LinkedHashMap<>();
    fit.member("standard_errors").members().forEach((name, e) -> errors.put(name, e.number()));
    List<List<Double>> covariance = new ArrayList<>();
    JsonValue matrix = fit.member("covariance");
    for (JsonValue row : matrix.items()) {
      covariance.add(row.items().stream().map(JsonValue::number).toList());
      if (row.items().size() != errors.size()) {
        throw row.wrong("expected as many numbers as there are standard errors");
      }
    }
    if (covariance.size() != errors.size()) {
      throw matrix.wrong("expected as many rows as there are standard errors");
    }
    List<FitSummary.Quote> quotes = new ArrayList<>();
    for (JsonValue quote : fit.member("quotes").items()) {
      quote.knowing(Set.of("id", "quote", "fitted", "error"));
      quotes.add(
          new FitSummary.Quote(
              quote.member("id").text(),
              quote.member("quote").number(),
              quote.member("fitted").number(),
              quote.member("error").number()));
    }
    return new FitSummary(
        fit.member("objective").text(),
        fit.member("rmse").number(),
        fit.member("iterations").integer(),
        fit.member("converged").flag(),
        errors,
        covariance,
        quotes);
  }
}
