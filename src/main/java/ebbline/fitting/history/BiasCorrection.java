package ebbline.fitting.history;

import ebbline.fitting.history.HistoryEstimate.Reverting;

/**
 * The estimated mean reversion with its bias taken off, shown beside the raw one. The bias of κ is
 * upwards and of order 4/span, whatever the method.
 *
 * @param kind how the bias was found
 * @param raw the estimate
 * @param bias its estimated bias, per year
 * @param corrected raw less bias; may be 0 or less, and then no reversion is left
 */
public record BiasCorrection(Kind kind, double raw, double bias, double corrected) {

  /** Ways to find the bias; the label is what the user types and reads. */
  public enum Kind {
    /**
     * (e^(2κΔ) + 2e^(κΔ) + 5)/(2T) for an unknown mean [Tang and Chen 2009, J. Econometrics 149; Yu
     * 2012, J. Econometrics 169].
     */
    ANALYTIC("analytic"),
    /** From three consecutive parts [Phillips and Yu 2005, Review of Financial Studies 18]. */
    JACKKNIFE("jackknife"),
    /** Mean over histories drawn from the estimate. */
    BOOTSTRAP("bootstrap");

    private final String label;

    Kind(String label) {
      this.label = label;
    }

    public String label() {
      return label;
    }
  }

  private static final int PARTS = 3;

  private static BiasCorrection of(Kind kind, Reverting estimate, double bias) {
    double raw = estimate.law().meanReversion();
    return new BiasCorrection(kind, raw, bias, raw - bias);
  }

  public static BiasCorrection analytic(Reverting estimate) {
    double grown = Math.exp(estimate.law().meanReversion() * estimate.sample().step());
    double bias = (grown * grown + 2 * grown + 5) / (2 * estimate.sample().spanYears());
    return of(Kind.ANALYTIC, estimate, bias);
  }

  /**
   * From the mean estimate over three consecutive parts, whose bias is three times as large.
   *
   * @throws IllegalArgumentException in words if a part is too short or has no estimate
   */
  public static BiasCorrection jackknife(RateHistory history, Reverting estimate) {
    int transitions = history.size() - 1;
    int length = transitions / PARTS;
    if (length < 3) {
      throw new IllegalArgumentException(
          "the jackknife needs at least 10 rates to part in three, found " + history.size());
    }
    double sum = 0;
    for (int part = 0; part < PARTS; part++) {
      int from = part * length;
      double[] found =
          PlainEstimate.of(history.between(from, from + length + 1), estimate.method());
      if (found.length == 0) {
        throw new IllegalArgumentException(
            "the jackknife finds no mean reversion to average in part "
                + (part + 1)
                + " of 3: the slope there is not above 0, or its rates do not move");
      }
      sum += found[0];
    }
    double raw = estimate.law().meanReversion();
    return of(Kind.JACKKNIFE, estimate, (sum / PARTS - raw) / (PARTS - 1));
  }

  public static BiasCorrection bootstrap(Reverting estimate, Bootstrap bootstrap) {
    return of(Kind.BOOTSTRAP, estimate, bootstrap.meanReversionBias());
  }
}
