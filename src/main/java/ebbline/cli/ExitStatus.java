package ebbline.cli;

/** What the process tells its caller; the numbers are part of the contract. */
enum ExitStatus {
  DONE(0),
  /** Done, but a row could not be priced, a published case was missed, a fit did not converge. */
  CHECK_FAILED(1),
  /** The command line is wrong. */
  USAGE(2),
  /** An input file cannot be used. */
  INPUT(3),
  /** An output could not be written. */
  OUTPUT(4),
  /** A fault of ours. */
  FAULT(70);

  private final int code;

  ExitStatus(int code) {
    this.code = code;
  }

  int code() {
    return code;
  }
}
