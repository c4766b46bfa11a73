package ebbline.report;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * What is said around the results.
 *
 * @param version the program's version
 * @param command the command that ran
 * @param asOf the as-of date, ISO; empty where the run has none
 * @param inputs every file that was read, in the order of reading
 * @param columns all columns that the command's results can have, in order, so that CSV output has
 *     the same header whatever the rows; empty: those of the first result
 */
public record Envelope(
    String version,
    String command,
    Optional<String> asOf,
    List<Fingerprint> inputs,
    List<String> columns) {

  /**
   * A file that was read.
   *
   * @param path as the user gave it
   * @param sha256 of its bytes, hexadecimal
   */
  public record Fingerprint(String path, String sha256) {}

  public Envelope {
    Objects.requireNonNull(version, "version");
    Objects.requireNonNull(command, "command");
    Objects.requireNonNull(asOf, "asOf");
    inputs = List.copyOf(inputs);
    columns = List.copyOf(columns);
  }
}
