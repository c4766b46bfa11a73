package ebbline.data;

import com.fasterxml.jackson.core.JsonGenerator;
import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.curve.SmithWilsonCurve;
import ebbline.curve.SvenssonCurve;
import ebbline.time.TimeAxis.TimeBasis;
import java.io.IOException;
import java.math.BigDecimal;
import java.util.List;
import java.util.Set;

/** The member {@code curve} of a model file: nodes, or the parameters of a form. */
final class CurveMember {
  private static final Set<String> MEMBERS =
      Set.of(
          "interpolation",
          "nodes",
          "form",
          "day_count",
          "ultimate_forward",
          "speed",
          "rate",
          "beta0",
          "beta1",
          "beta2",
          "beta3",
          "tau1",
          "tau2");

  private static final Set<String> NODE = Set.of("time", "discount");
  private static final Set<String> KERNEL_NODE = Set.of("time", "discount", "kernel");

  private CurveMember() {}

  /** A curve and how its years are counted. */
  record Read(DiscountCurve curve, TimeBasis basis) {}

  static Read read(JsonValue value) {
    value.knowing(MEMBERS);
    try {
      DiscountCurve curve = value.has("form") ? formula(value) : nodes(value);
      return new Read(curve, basis(value));
    } catch (IllegalArgumentException e) {
      throw value.wrong(e.getMessage());
    }
  }

  private static TimeBasis basis(JsonValue value) {
    if (!value.has("day_count")) {
      return TimeBasis.ACT_365F;
    }
    for (TimeBasis basis : TimeBasis.values()) {
      if (basis.label().equals(value.member("day_count").text())) {
        return basis;
      }
    }
    throw value.member("day_count").wrong("expected act/365f, act/360 or act/365.25");
  }

  private static DiscountCurve formula(JsonValue value) {
    JsonValue form = value.member("form");
    return switch (form.text()) {
      case "flat" -> FlatCurve.of(value.member("rate").number());
      case "nelson-siegel" ->
          SvenssonCurve.nelsonSiegel(
              value.member("beta0").number(),
              value.member("beta1").number(),
              value.member("beta2").number(),
              value.member("tau1").number());
      case "svensson" ->
          SvenssonCurve.of(
              value.member("beta0").number(),
              value.member("beta1").number(),
              value.member("beta2").number(),
              value.member("beta3").number(),
              value.member("tau1").number(),
              value.member("tau2").number());
      default -> throw form.wrong("expected nelson-siegel, svensson or flat");
    };
  }

  private static DiscountCurve nodes(JsonValue value) {
    JsonValue name = value.member("interpolation");
    Interpolation interpolation;
    try {
      interpolation = Interpolation.of(name.text());
    } catch (IllegalArgumentException e) {
      throw name.wrong(e.getMessage());
    }
    boolean kernels = interpolation == Interpolation.SMITH_WILSON;
    List<JsonValue> nodes = value.member("nodes").items();
    double[] times = new double[nodes.size()];
    double[] logs = new double[nodes.size()];
    double[] weights = new double[nodes.size()];
    for (int i = 0; i < times.length; i++) {
      JsonValue node = nodes.get(i).knowing(kernels ? KERNEL_NODE : NODE);
      JsonValue time = node.member("time");
      JsonValue discount = node.member("discount");
      times[i] = time.number();
      if (!(times[i] > (i == 0 ? 0 : times[i - 1]))) {
        throw time.wrong("times must be positive and increase");
      }
      if (!(discount.number() > 0)) {
        throw discount.wrong("a discount factor must be above 0");
      }
      logs[i] = DiscountDigits.log(discount.decimal());
      weights[i] = kernels ? node.member("kernel").number() : 0;
    }
    if (kernels) {
      // The weights are the curve; the discount factors beside them are for other readers.
      return SmithWilsonCurve.ofWeights(
          times,
          weights,
          value.member("ultimate_forward").number(),
          value.member("speed").number());
    }
    return InterpolatedCurve.of(interpolation, times, logs);
  }

  static void write(JsonGenerator json, DiscountCurve curve, TimeBasis basis) throws IOException {
    json.writeObjectFieldStart("curve");
    if (curve instanceof FlatCurve flat) {
      json.writeStringField("form", "flat");
      json.writeNumberField("rate", flat.rate());
    } else if (curve instanceof SvenssonCurve formula) {
      json.writeStringField("form", "svensson");
      for (int i = 0; i < 4; i++) {
        json.writeNumberField("beta" + i, formula.betas()[i]);
      }
      json.writeNumberField("tau1", formula.taus()[0]);
      json.writeNumberField("tau2", formula.taus()[1]);
    } else if (curve instanceof InterpolatedCurve nodes) {
      json.writeStringField("interpolation", nodes.interpolation().label());
      nodes(json, nodes.nodes(), nodes.nodeLogDiscounts(), new double[0]);
    } else if (curve instanceof SmithWilsonCurve kernels) {
      json.writeStringField("interpolation", Interpolation.SMITH_WILSON.label());
      json.writeNumberField("ultimate_forward", kernels.ultimateForward());
      json.writeNumberField("speed", kernels.speed());
      nodes(json, kernels.nodes(), kernels.nodeLogDiscounts(), kernels.weights());
    } else {
      throw new IllegalStateException("no form for a curve of " + curve.getClass());
    }
    if (basis != TimeBasis.ACT_365F) {
      json.writeStringField("day_count", basis.label());
    }
    json.writeEndObject();
  }

  /**
   * @param weights of kernels, one a node, or none
   */
  private static void nodes(JsonGenerator json, double[] times, double[] logs, double[] weights)
      throws IOException {
    json.writeArrayFieldStart("nodes");
    for (int i = 0; i < times.length; i++) {
      json.writeStartObject();
      json.writeNumberField("time", times[i]);
      BigDecimal discount = DiscountDigits.discount(logs[i]);
      json.writeFieldName("discount");
      json.writeNumber(discount);
      if (weights.length > 0) {
        json.writeNumberField("kernel", weights[i]);
      }
      json.writeEndObject();
    }
    json.writeEndArray();
  }
}
