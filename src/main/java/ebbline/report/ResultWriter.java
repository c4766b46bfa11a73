package ebbline.report;

import java.io.IOException;
import java.io.Writer;
import java.util.List;

/** Writes results one after another: {@code begin}, any number of {@code row}, {@code end}. */
public interface ResultWriter {

  void begin(Envelope envelope) throws IOException;

  void row(ResultRow row) throws IOException;

  /** Lists and groups that belong to the whole run, not to one result; CSV leaves them out. */
  void beside(ResultRow figures);

  /**
   * @param warnings said in the JSON object; the other formats leave them to standard error
   */
  void end(List<String> warnings) throws IOException;

  static ResultWriter of(OutputFormat format, Writer out) {
    return switch (format) {
      case TABLE -> new TableWriter(out);
      case CSV -> new CsvWriter(out);
      case JSON -> new JsonWriter(out);
    };
  }
}
