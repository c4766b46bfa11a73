package ebbline.time;

import java.util.List;
import java.util.stream.Collectors;

/** An input that cannot be used, with every problem found in it; the command ends with status 3. */
public final class InputProblems extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final transient List<InputProblem> problems;

  /**
   * @param problems at least one problem, in the order of the file
   */
  public InputProblems(List<InputProblem> problems) {
    super(problems.stream().map(InputProblem::message).collect(Collectors.joining("\n")));
    this.problems = List.copyOf(problems);
    if (problems.isEmpty()) {
      throw new IllegalArgumentException("an unusable input must have a problem, found none");
    }
  }

  public static InputProblems of(InputProblem problem) {
    return new InputProblems(List.of(problem));
  }

  public List<InputProblem> problems() {
    return problems;
  }
}
