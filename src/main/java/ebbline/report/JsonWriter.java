package ebbline.report;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.StreamWriteFeature;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import java.io.IOException;
import java.io.Writer;
import java.util.List;
import java.util.Map;

/** One JSON object: version, command, as-of date, inputs, results, warnings. */
final class JsonWriter implements ResultWriter {
  private final JsonGenerator json;
  private ResultRow beside = ResultRow.builder().build();

  JsonWriter(Writer out) {
    try {
      json =
          JsonFactory.builder()
              .enable(StreamWriteFeature.USE_FAST_DOUBLE_WRITER)
              .disable(StreamWriteFeature.AUTO_CLOSE_TARGET)
              .build()
              .createGenerator(out);
      json.setPrettyPrinter(
          new DefaultPrettyPrinter().withObjectIndenter(new DefaultIndenter("  ", "\n")));
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  @Override
  public void begin(Envelope envelope) throws IOException {
    json.writeStartObject();
    json.writeStringField("ebbline", envelope.version());
    json.writeStringField("command", envelope.command());
    if (envelope.asOf().isPresent()) {
      json.writeStringField("as_of", envelope.asOf().get());
    } else {
      json.writeNullField("as_of");
    }
    json.writeArrayFieldStart("inputs");
    for (Envelope.Fingerprint input : envelope.inputs()) {
      json.writeStartObject();
      json.writeStringField("path", input.path());
      json.writeStringField("sha256", input.sha256());
      json.writeEndObject();
    }
    json.writeEndArray();
    json.writeArrayFieldStart("results");
  }

  @Override
  public void row(ResultRow row) throws IOException {
    write(row);
  }

  @Override
  public void beside(ResultRow figures) {
    beside = figures;
  }

  @Override
  public void end(List<String> warnings) throws IOException {
    json.writeEndArray();
    members(beside);
    json.writeArrayFieldStart("warnings");
    for (String warning : warnings) {
      json.writeString(warning);
    }
    json.writeEndArray();
    json.writeEndObject();
    json.writeRaw('\n');
    json.flush();
  }

  private void write(ResultRow row) throws IOException {
    json.writeStartObject();
    members(row);
    json.writeEndObject();
  }

  private void members(ResultRow row) throws IOException {
    for (Map.Entry<String, Cell> entry : row.cells().entrySet()) {
      json.writeFieldName(entry.getKey());
      write(entry.getValue());
    }
  }

  private void write(Cell cell) throws IOException {
    if (cell instanceof Cell.Rate rate) {
      json.writeNumber(rate.value());
    } else if (cell instanceof Cell.Amount number) {
      json.writeNumber(number.value());
    } else if (cell instanceof Cell.Magnitude magnitude) {
      json.writeNumber(magnitude.value());
    } else if (cell instanceof Cell.Count count) {
      json.writeNumber(count.value());
    } else if (cell instanceof Cell.Flag flag) {
      json.writeBoolean(flag.value());
    } else if (cell instanceof Cell.Text text) {
      json.writeString(text.value());
    } else if (cell instanceof Cell.Rows rows) {
      json.writeStartArray();
      for (ResultRow row : rows.rows()) {
        write(row);
      }
      json.writeEndArray();
    } else if (cell instanceof Cell.Group group) {
      write(group.row());
    }
  }
}
