package ebbline.curve;

import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/** How a curve runs between its nodes. */
public enum Interpolation {
  /** Straight lines in ln P: forwards constant between nodes. */
  LOG_LINEAR("log-linear"),
  /** Straight lines in the zero rate. */
  LINEAR_ZERO("linear-zero"),
  /** Natural cubic spline in ln P. */
  CUBIC("cubic"),
  /** Hagan and West's monotone convex forwards. */
  MONOTONE_CONVEX("monotone-convex"),
  /** Smith and Wilson's kernels, which lead to an ultimate forward rate. */
  SMITH_WILSON("smith-wilson");

  private final String label;

  Interpolation(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  /**
   * The interpolation of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static Interpolation of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (Interpolation interpolation : values()) {
      if (interpolation.label.equals(wanted)) {
        return interpolation;
      }
    }
    throw new IllegalArgumentException(
        "expected an interpolation, one of "
            + Arrays.stream(values()).map(Interpolation::label).collect(Collectors.joining(", ")));
  }
}
