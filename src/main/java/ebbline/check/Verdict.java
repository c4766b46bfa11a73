package ebbline.check;

/** What became of a published case. */
public enum Verdict {
  /** Agrees within half a unit of the last printed digit. */
  MATCHES("matches"),
  /**
   * The printed figure carries rounded intermediate results: exact arithmetic does not give it, and
   * the computation agrees with exact arithmetic.
   */
  SOURCE_ROUNDED("source-rounded"),
  /** Computed and shown beside the figure, but not claimed: no known construction gives it. */
  SHOWN("shown"),
  /** Not computed by this version; the note says why. */
  NOT_COMPUTED("not-computed"),
  /** Disagrees; the command ends with status 1. */
  MISSES("misses");

  private final String label;

  Verdict(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }
}
