package ebbline.data;

import ebbline.time.InputProblem;
import ebbline.time.InputProblems;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Problems in the order of their lines; those of the file as a whole come last. */
final class InFileOrder {
  private InFileOrder() {}

  static InputProblems of(List<InputProblem> problems) {
    List<InputProblem> sorted = new ArrayList<>(problems);
    sorted.sort(Comparator.comparingInt(p -> p.line() == 0 ? Integer.MAX_VALUE : p.line()));
    return new InputProblems(sorted);
  }
}
