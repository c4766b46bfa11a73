package ebbline.fitting;

import java.util.Objects;

/**
 * What a least-squares fit came to. Not converging is a value and not an exception: the best point
 * found is there in both cases.
 */
public sealed interface Fit {

  /** The best point found. */
  FitPoint best();

  default boolean isConverged() {
    return this instanceof Converged;
  }

  /** No further step lowers the errors. */
  record Converged(FitPoint best) implements Fit {
    public Converged {
      Objects.requireNonNull(best, "best");
    }
  }

  /**
   * The search ended before its goal.
   *
   * @param reason what stopped it, in words for the user
   */
  record Stopped(FitPoint best, String reason) implements Fit {
    public Stopped {
      Objects.requireNonNull(best, "best");
      Objects.requireNonNull(reason, "reason");
    }
  }
}
