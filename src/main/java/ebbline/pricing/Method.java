package ebbline.pricing;

/** How a value was computed; the label is what the user types and reads. */
public enum Method {
  /** From the row's own quote. */
  QUOTED("quoted"),
  /** Flows times discount factors. */
  DISCOUNTING("discounting"),
  /** A formula, or a one-dimensional integral to rounding accuracy. */
  CLOSED_FORM("closed-form"),
  BACKWARD_INDUCTION("backward-induction"),
  TRINOMIAL("trinomial"),
  SIMULATION("simulation");

  private final String label;

  Method(String label) {
    this.label = label;
  }

  public String label() {
    return label;
  }
}
