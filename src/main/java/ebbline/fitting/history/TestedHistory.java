package ebbline.fitting.history;

/** What tests of the reversion and of the mean need from a history, given its first rate. */
interface TestedHistory {

  /** Transitions. */
  int transitions();

  /** κ at the maximum; may be negative on even steps. */
  double meanReversion();

  /** (slope − slope of κ)/standard error, or what stands for it on uneven steps. */
  double ratio(double meanReversion);

  /** Twice the gain of a free mean over this one; leaves the best κ for it behind. */
  MeanTest test(double longRunMean);

  /** Twice the gain of reversion over a random walk with drift: the test of a mean at infinity. */
  double againstWalk();

  /**
   * @param likelihood twice the log of the likelihood ratio, at least 0
   * @param meanReversion best κ with the mean held, at least 0
   */
  record MeanTest(double likelihood, double meanReversion) {}

  static TestedHistory of(RateHistory history) {
    return history.isRegular() ? new EvenHistory(history) : new UnevenHistory(history);
  }
}
