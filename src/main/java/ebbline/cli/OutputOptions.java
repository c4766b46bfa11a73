package ebbline.cli;

import ebbline.data.AtomicFile;
import ebbline.report.Envelope;
import ebbline.report.OutputFormat;
import ebbline.report.ResultRow;
import ebbline.report.ResultWriter;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.Writer;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;
import picocli.CommandLine.Spec.Target;

/** Where results go and how they look; the same options in every command. */
final class OutputOptions {
  @Spec(Target.MIXEE)
  private CommandSpec command;

  @Option(
      names = "--format",
      paramLabel = "FORMAT",
      defaultValue = "table",
      converter = FormatName.class,
      description = "table (default), csv or json; csv and json give every digit")
  private OutputFormat format;

  @Option(
      names = "--out",
      paramLabel = "FILE",
      description = "write the results to FILE, whole or not at all (default: standard output)")
  private Path out;

  @Option(
      names = "--threads",
      paramLabel = "N",
      description = "threads to use (default: all); the results have the same bits for any number")
  private Integer threads;

  @Option(
      names = "--seed",
      paramLabel = "N",
      defaultValue = "1",
      description = "seed of everything random (default: 1)")
  private long seed;

  @Option(names = "--quiet", description = "no warnings and no counts on standard error")
  private boolean quiet;

  /** Read off the command line by {@link Complaints}, when there may be no command to ask. */
  @SuppressWarnings("unused")
  @Option(
      names = "--debug",
      description = "show the stack trace when the program itself is at fault")
  private boolean debug;

  private final List<String> warnings = new ArrayList<>();

  OutputFormat format() {
    return format;
  }

  int threads() {
    if (threads == null) {
      return Runtime.getRuntime().availableProcessors();
    }
    if (threads >= 1) {
      return threads;
    }
    throw UsageProblem.of("--threads", threads.toString(), "expected a number of at least 1");
  }

  long seed() {
    return seed;
  }

  /** Says something on standard error that the results alone do not show. */
  void warn(String text) {
    warnings.add(text);
    if (!quiet) {
      command.commandLine().getErr().println("ebbline: warning: " + text);
    }
  }

  /** Shows something below the results, on standard output. */
  void show(String text) {
    PrintWriter standard = command.commandLine().getOut();
    standard.print(text);
    standard.flush();
  }

  void note(String text) {
    if (!quiet) {
      command.commandLine().getErr().println("ebbline: " + text);
    }
  }

  /** Writes all results, to standard output or to a file that is whole or absent. */
  void write(Envelope envelope, Iterable<ResultRow> rows) {
    write(envelope, rows, ResultRow.builder().build());
  }

  /**
   * As above.
   *
   * @param beside lists and groups that belong to the whole run
   */
  void write(Envelope envelope, Iterable<ResultRow> rows, ResultRow beside) {
    threads(); // a wrong number is said even where one thread is all that is used
    try {
      if (out == null) {
        PrintWriter standard = command.commandLine().getOut();
        write(standard, envelope, rows, beside);
        standard.flush();
      } else {
        AtomicFile.write(out, file -> write(file, envelope, rows, beside));
      }
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  private void write(Writer writer, Envelope envelope, Iterable<ResultRow> rows, ResultRow beside)
      throws IOException {
    ResultWriter results = ResultWriter.of(format, writer);
    results.begin(envelope);
    for (ResultRow row : rows) {
      results.row(row);
    }
    results.beside(beside);
    results.end(warnings);
  }
}
