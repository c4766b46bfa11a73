package ebbline.cli;

import java.io.PrintStream;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import picocli.CommandLine;
import picocli.CommandLine.Command;

/** The root command. */
@Command(name = "ebbline", mixinStandardHelpOptions = true, version = "ebbline 0.1.0")
final class Ebbline implements Runnable {
  private Ebbline() {}

  @Override
  public void run() {}

  static int run(String[] args, PrintStream out, PrintStream err) {
    CommandLine line = new CommandLine(new Ebbline());
    line.setOut(new PrintWriter(out, true, StandardCharsets.UTF_8));
    line.setErr(new PrintWriter(err, true, StandardCharsets.UTF_8));
    return line.execute(args);
  }
}
