package ebbline.fitting.quotes;

import java.util.Locale;

/** The parametric zero curves that can be fitted. */
public enum ParametricForm {
  /** Level, slope and one hump: three betas, one tau. */
  NELSON_SIEGEL("nelson-siegel", 3, 1),
  /** A second hump with a tau of its own. */
  SVENSSON("svensson", 4, 2);

  private final String label;
  private final int betas;
  private final int taus;

  ParametricForm(String label, int betas, int taus) {
    this.label = label;
    this.betas = betas;
    this.taus = taus;
  }

  public String label() {
    return label;
  }

  /** Linear parameters. */
  public int betas() {
    return betas;
  }

  /** Parameters inside exponentials. */
  public int taus() {
    return taus;
  }

  /**
   * The form of this label, either case.
   *
   * @throws IllegalArgumentException for another, naming the known ones
   */
  public static ParametricForm of(String label) {
    String wanted = label.strip().toLowerCase(Locale.ROOT);
    for (ParametricForm form : values()) {
      if (form.label.equals(wanted)) {
        return form;
      }
    }
    throw new IllegalArgumentException(
        "expected a parametric form, one of nelson-siegel, svensson");
  }
}
