package ebbline.fitting.history;

import org.apache.commons.math3.analysis.solvers.BrentSolver;

/** The highest point of the profile likelihood over the mean reversion. */
final class LikelihoodSearch {
  /** The grid doubles from this share of 1/span ... */
  private static final double LOWEST = 1e-4;

  /** ... to this share of 1/step, where a step forgets all but e^(−30) of the last rate. */
  private static final double HIGHEST = 30;

  private LikelihoodSearch() {}

  /** Where the maximum lies. */
  enum End {
    INSIDE,
    AT_ZERO,
    AT_TOP
  }

  /** Leaves {@code profile} at its maximum. */
  static End maximise(ExactLikelihood profile, RateHistory history) {
    double kappa = LOWEST / history.span();
    double top = HIGHEST / history.step();
    double best = kappa;
    double highest = Double.NEGATIVE_INFINITY;
    for (; kappa < top; kappa *= 2) {
      profile.at(kappa);
      if (profile.logLikelihood > highest) {
        highest = profile.logLikelihood;
        best = kappa;
      }
    }
    double low = best / 2;
    double high = 2 * best;
    if (best <= 1.5 * LOWEST / history.span()) {
      profile.at(low);
      if (!(profile.slope > 0)) {
        return End.AT_ZERO;
      }
    }
    profile.at(high);
    if (profile.slope >= 0) {
      return End.AT_TOP;
    }
    profile.at(low);
    if (profile.slope <= 0) {
      return End.AT_ZERO;
    }
    double root =
        new BrentSolver(1e-15, 1e-18)
            .solve(
                200,
                k -> {
                  profile.at(k);
                  return profile.slope;
                },
                low,
                high);
    profile.at(root);
    // Independent rates have no likelihood for a finite κ: the profile is flat in the top decade.
    return root * history.step() > 0.5 * HIGHEST ? End.AT_TOP : End.INSIDE;
  }
}
