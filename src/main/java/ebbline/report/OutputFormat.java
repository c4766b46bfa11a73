package ebbline.report;

/** How results are written. */
public enum OutputFormat {
  /** For a person: aligned columns, rates in per cent. */
  TABLE("table"),
  /** For a spreadsheet or a script: RFC 4180, all digits, the results alone. */
  CSV("csv"),
  /** For a program: one object with the inputs' fingerprints and the warnings. */
  JSON("json");

  private final String label;

  OutputFormat(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }

  @Override
  public String toString() {
    return label;
  }
}
