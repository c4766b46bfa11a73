package ebbline.check;

/** What a second method says about a row's value. */
public enum ChallengeVerdict {
  /** The most accurate method, which the others are held against. */
  REFERENCE("reference"),
  /** The difference lies within what both methods claim of their errors. */
  EXPLAINED("explained"),
  /** It does not: one of the two is wrong, or claims too much. */
  UNEXPLAINED("unexplained"),
  /** The method does not price this row; the message says why. */
  NOT_APPLICABLE("not-applicable"),
  /** No method prices this row. */
  FAILED("failed");

  private final String label;

  ChallengeVerdict(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }
}
