package ebbline.cli;

/** The command line is wrong; the message names the option, what was found and the remedy. */
final class UsageProblem extends RuntimeException {
  private static final long serialVersionUID = 1L;

  UsageProblem(String message) {
    super(message);
  }

  static UsageProblem of(String option, String found, String expected) {
    return new UsageProblem(option + ": found '" + found + "': " + expected);
  }
}
