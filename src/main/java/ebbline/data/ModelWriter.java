package ebbline.data;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.StreamWriteFeature;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import java.io.IOException;
import java.io.Writer;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;

/** Writes model files so that reading them gives the same bits. */
public final class ModelWriter {
  private ModelWriter() {}

  /**
   * Writes a model file whole or leaves what was there.
   *
   * @throws OutputProblem if it cannot be written
   */
  public static void write(Path path, ModelInput model) {
    AtomicFile.write(path, writer -> write(writer, model));
  }

  private static void write(Writer writer, ModelInput model) throws IOException {
    JsonFactory factory =
        JsonFactory.builder()
            .enable(StreamWriteFeature.USE_FAST_DOUBLE_WRITER)
            .disable(StreamWriteFeature.AUTO_CLOSE_TARGET)
            .build();
    try (JsonGenerator json = factory.createGenerator(writer)) {
      json.setPrettyPrinter(
          new DefaultPrettyPrinter().withObjectIndenter(new DefaultIndenter("  ", "\n")));
      json.writeStartObject();
      json.writeStringField("format", ModelFile.FORMAT);
      json.writeStringField("model", model.vasicek().isPresent() ? "vasicek" : "hull-white");
      json.writeStringField("measure", model.measure().label());
      if (model.axis().asOf().isPresent()) {
        json.writeStringField("as_of", model.axis().asOf().get().toString());
      } else {
        json.writeNullField("as_of");
      }
      parameters(json, model);
      if (model.curve().isPresent()) {
        CurveMember.write(json, model.curve().get(), model.axis().basis());
      }
      if (model.fit().isPresent()) {
        fit(json, model.fit().get());
      }
      json.writeEndObject();
      json.writeRaw('\n');
    }
  }

  private static void parameters(JsonGenerator json, ModelInput model) throws IOException {
    if (model.vasicek().isPresent()) {
      Vasicek vasicek = model.vasicek().get();
      json.writeNumberField("mean_reversion", vasicek.meanReversion());
      json.writeNumberField("volatility", vasicek.volatility());
      json.writeNumberField("short_rate", vasicek.shortRate());
      json.writeNumberField("long_run_mean", vasicek.longRunMean());
    } else {
      json.writeNumberField("mean_reversion", model.hullWhite().orElseThrow().meanReversion());
      volatility(json, model.hullWhite().orElseThrow().volatility());
    }
    if (model.marketPriceOfRisk().isPresent()) {
      json.writeNumberField("market_price_of_risk", model.marketPriceOfRisk().getAsDouble());
    }
  }

  private static void volatility(JsonGenerator json, VolatilitySteps steps) throws IOException {
    if (steps.isConstant()) {
      json.writeNumberField("volatility", steps.value(0));
      return;
    }
    json.writeArrayFieldStart("volatility");
    for (int i = 0; i < steps.count(); i++) {
      json.writeStartObject();
      if (i < steps.count() - 1) {
        json.writeNumberField("until", steps.until(i));
      }
      json.writeNumberField("value", steps.value(i));
      json.writeEndObject();
    }
    json.writeEndArray();
  }

  private static void fit(JsonGenerator json, FitSummary fit) throws IOException {
    json.writeObjectFieldStart("fit");
    json.writeStringField("objective", fit.objective());
    json.writeNumberField("rmse", fit.rmse());
    json.writeNumberField("iterations", fit.iterations());
    json.writeBooleanField("converged", fit.converged());
    json.writeObjectFieldStart("standard_errors");
    for (Map.Entry<String, Double> entry : fit.standardErrors().entrySet()) {
      json.writeNumberField(entry.getKey(), entry.getValue());
    }
    json.writeEndObject();
    json.writeArrayFieldStart("covariance");
    for (List<Double> row : fit.covariance()) {
      json.writeStartArray();
      for (double value : row) {
        json.writeNumber(value);
      }
      json.writeEndArray();
    }
    json.writeEndArray();
    json.writeArrayFieldStart("quotes");
    for (FitSummary.Quote quote : fit.quotes()) {
      json.writeStartObject();
      json.writeStringField("id", quote.id());
      json.writeNumberField("quote", quote.quote());
      json.writeNumberField("fitted", quote.fitted());
      json.writeNumberField("error", quote.error());
      json.writeEndObject();
    }
    json.writeEndArray();
    json.writeEndObject();
  }
}
