package ebbline.instrument;

/** When the floating rate of a period is known. */
public enum RateBasis {
  /** Fixed at the start of its period. */
  FORWARD,
  /** Compounded over the period, known at its end. */
  BACKWARD;

  /**
   * @throws IllegalArgumentException for another text than forward or backward
   */
  public static RateBasis of(String text) {
    if (text.equalsIgnoreCase("forward")) {
      return FORWARD;
    } else if (text.equalsIgnoreCase("backward")) {
      return BACKWARD;
    }
    throw new IllegalArgumentException("expected forward or backward");
  }
}
