package ebbline.data;

/** An output that could not be written; the command ends with status 4. */
public final class OutputProblem extends RuntimeException {
  private static final long serialVersionUID = 1L;

  public OutputProblem(String path, String reason) {
    super(path + ": could not be written: " + reason);
  }
}
