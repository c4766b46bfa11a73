package ebbline.cli;

import java.io.PrintStream;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.function.Supplier;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;

/** The root command: names the others and says what none of them is. */
@Command(
    name = "ebbline",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Discount curves, the Vasicek and Hull-White short-rate models, bonds and rate options: builds,"
          + " fits, prices, and proves every number against published examples and a second method.",
      ""
    },
    footer = {
      "",
      "A calculation aid, not advice: local rules and your own licensed and independent review"
          + " prevail.",
      "",
      "Examples (from the project's root):",
      "  java -jar target/ebbline.jar price --model hull-white --mean-reversion 0.05 \\",
      "    --volatility 0.9%% --curve curves/saltmere.csv --book examples/book.csv",
      "  java -jar target/ebbline.jar verify --topic Vasicek"
    })
final class Ebbline implements Runnable {
  @Spec private CommandSpec spec;

  private Ebbline() {}

  /** Without a command there is nothing to do, so the help is shown as an answer to a mistake. */
  @Override
  public void run() {
    throw new UsageProblem(
        "a command is missing: one of " + String.join(", ", spec.subcommands().keySet()));
  }

  /**
   * The commands in the order in which help shows them. Reading a command's options costs more time
   * than pricing a row, so where the first word names one, it is the only one read.
   */
  private static void addCommands(CommandLine line, String[] args) {
    Map<String, Supplier<Object>> commands = new LinkedHashMap<>();
    commands.put("curve", CurveCommand::new);
    commands.put("estimate", EstimateCommand::new);
    commands.put("calibrate", CalibrateCommand::new);
    commands.put("price", PriceCommand::new);
    commands.put("simulate", SimulateCommand::new);
    commands.put("verify", VerifyCommand::new);
    commands.put("challenge", ChallengeCommand::new);
    Supplier<Object> named = args.length == 0 ? null : commands.get(args[0]);
    if (named != null) {
      line.addSubcommand(args[0], named.get());
    } else {
      commands.forEach((name, command) -> line.addSubcommand(name, command.get()));
    }
  }

  /**
   * Runs one command line.
   *
   * @param out where results go
   * @param err where everything else goes
   * @return the exit status
   */
  static int run(String[] args, PrintStream out, PrintStream err) {
    CommandLine line = new CommandLine(new Ebbline());
    addCommands(line, args);
    line.setOut(new PrintWriter(out, false, StandardCharsets.UTF_8));
    line.setErr(new PrintWriter(err, true, StandardCharsets.UTF_8));
    line.setCaseInsensitiveEnumValuesAllowed(true);
    line.setAbbreviatedOptionsAllowed(false);
    line.setParameterExceptionHandler(new Complaints());
    line.setExecutionExceptionHandler(new Complaints());
    int status = line.execute(args);
    line.getOut().flush();
    if (out.checkError()) {
      line.getErr().println("ebbline: error: standard output could not be written");
      return ExitStatus.OUTPUT.code();
    }
    return status;
  }
}
