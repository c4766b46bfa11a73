package ebbline.fitting.history;

/** Tests on uneven steps, by the profile likelihood. */
final class UnevenHistory implements TestedHistory {
  private static final int REFINEMENTS = 60;

  private final RateHistory history;
  private final ExactLikelihood profile;
  private final double best;
  private final double top;

  UnevenHistory(RateHistory history) {
    this.history = history;
    this.profile = new ExactLikelihood(history, false);
    LikelihoodSearch.End end = LikelihoodSearch.maximise(profile, history);
    if (end == LikelihoodSearch.End.AT_ZERO) {
      profile.at(0);
    }
    this.best = profile.meanReversion;
    this.top = profile.logLikelihood;
  }

  @Override
  public int transitions() {
    return history.size() - 1;
  }

  @Override
  public double meanReversion() {
    return best;
  }

  @Override
  public double ratio(double meanReversion) {
    profile.at(meanReversion);
    double likelihood = Math.max(0, 2 * (top - profile.logLikelihood));
    // On even steps n ln(1 + t²/(n − 2)) is the likelihood ratio exactly.
    double n = transitions();
    double size = Math.sqrt((n - 2) * Math.expm1(likelihood / n));
    return meanReversion < best ? -size : size;
  }

  @Override
  public MeanTest test(double longRunMean) {
    double low = 1e-4 / history.span();
    double kappa = low;
    double highest = Double.NEGATIVE_INFINITY;
    for (double k = low; k < 30 / history.step(); k *= 2) {
      double value = profile.logLikelihood(k, longRunMean);
      if (value > highest) {
        highest = value;
        kappa = k;
      }
    }
    // Golden section on the doubling interval around the best grid point.
    double golden = 0.5 * (Math.sqrt(5) - 1);
    double left = kappa / 2;
    double right = 2 * kappa;
    double a = right - golden * (right - left);
    double b = left + golden * (right - left);
    double atA = profile.logLikelihood(a, longRunMean);
    double atB = profile.logLikelihood(b, longRunMean);
    for (int i = 0; i < REFINEMENTS && right - left > 1e-9 * kappa; i++) {
      if (atA > atB) {
        right = b;
        b = a;
        atB = atA;
        a = right - golden * (right - left);
        atA = profile.logLikelihood(a, longRunMean);
      } else {
        left = a;
        a = b;
        atA = atB;
        b = left + golden * (right - left);
        atB = profile.logLikelihood(b, longRunMean);
      }
    }
    double found = Math.max(highest, Math.max(atA, atB));
    return new MeanTest(Math.max(0, 2 * (top - found)), 0.5 * (left + right));
  }

  @Override
  public double againstWalk() {
    return Math.max(0, 2 * (top - Refusals.walk(history).logLikelihood()));
  }
}
