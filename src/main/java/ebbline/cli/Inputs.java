package ebbline.cli;

import ebbline.data.SourceFile;
import ebbline.report.Envelope;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What a run was made from, for the results' envelope. */
final class Inputs {
  private Inputs() {}

  static Envelope envelope(
      String command, TimeAxis axis, List<Optional<SourceFile>> files, List<String> columns) {
    List<Envelope.Fingerprint> inputs = new ArrayList<>();
    for (Optional<SourceFile> file : files) {
      file.ifPresent(f -> inputs.add(new Envelope.Fingerprint(f.path(), f.sha256())));
    }
    return new Envelope(
        Version.number(), command, axis.asOf().map(Object::toString), inputs, columns);
  }
}
