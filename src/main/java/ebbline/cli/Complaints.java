package ebbline.cli;

import ebbline.data.OutputProblem;
import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.io.PrintWriter;
import java.util.List;
import picocli.CommandLine;
import picocli.CommandLine.IExecutionExceptionHandler;
import picocli.CommandLine.IParameterExceptionHandler;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.UnmatchedArgumentException;

/** Turns what went wrong into a message that can be acted on, and the exit status. */
final class Complaints implements IParameterExceptionHandler, IExecutionExceptionHandler {
  private static final int MOST_PROBLEMS = 20;

  @Override
  public int handleParseException(ParameterException problem, String[] args) {
    CommandLine command = problem.getCommandLine();
    PrintWriter err = command.getErr();
    if (problem instanceof UnmatchedArgumentException unmatched
        && command.getParent() == null
        && !unmatched.isUnknownOption()) {
      err.println("ebbline: error: there is no command '" + unmatched.getUnmatched().get(0) + "'");
    } else {
      err.println("ebbline: error: " + firstLine(problem.getMessage()));
    }
    if (problem instanceof UnmatchedArgumentException unmatched) {
      List<String> nearest = unmatched.getSuggestions();
      if (!nearest.isEmpty()) {
        err.println("  did you mean " + String.join(" or ", nearest) + "?");
      }
    }
    err.println("  see: " + command.getCommandSpec().qualifiedName() + " --help");
    return ExitStatus.USAGE.code();
  }

  @Override
  public int handleExecutionException(Exception problem, CommandLine command, ParseResult parsed) {
    PrintWriter err = command.getErr();
    if (problem instanceof UsageProblem) {
      err.println("ebbline: error: " + problem.getMessage());
      err.println("  see: " + command.getCommandSpec().qualifiedName() + " --help");
      return ExitStatus.USAGE.code();
    } else if (problem instanceof InputProblems inputs) {
      for (InputProblem each : inputs.problems().stream().limit(MOST_PROBLEMS).toList()) {
        err.println("ebbline: error: " + each.message());
      }
      int more = inputs.problems().size() - MOST_PROBLEMS;
      if (more > 0) {
        err.println("ebbline: error: and " + more + " more of these");
      }
      return ExitStatus.INPUT.code();
    } else if (problem instanceof OutputProblem) {
      err.println("ebbline: error: " + problem.getMessage());
      return ExitStatus.OUTPUT.code();
    }
    err.println("ebbline: a fault of ours: " + problem);
    err.println(
        "  please report it with the command line and the input files; --debug adds the stack trace");
    if (parsed.expandedArgs().contains("--debug")) {
      problem.printStackTrace(err);
    }
    return ExitStatus.FAULT.code();
  }

  private static String firstLine(String text) {
    return text.lines().findFirst().orElse(text);
  }
}
