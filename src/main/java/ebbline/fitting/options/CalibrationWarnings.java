package ebbline.fitting.options;

import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;

/** What a reader of a Hull–White fit must know, in words. */
final class CalibrationWarnings {
  private static final double CONDITION_LIMIT = 100;
  private static final double AT_THE_END = 1e-4;

  private CalibrationWarnings() {}

  static void add(
      List<String> warnings,
      CalibrationTerms terms,
      double a,
      double[] sigma,
      FitCovariance covariance) {
    boolean free = terms.meanReversion().isEmpty();
    if (a < 0) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "mean reversion is negative (%.6g a year): rates run away from the curve",
              a));
    }
    if (free) {
      addReversion(warnings, terms, a, covariance);
    }
    for (int k = 0; k < sigma.length; k++) {
      if (sigma[k] < CalibrationTerms.LOWEST_VOLATILITY * (1 + 1e-2)
          || sigma[k] > CalibrationTerms.HIGHEST_VOLATILITY * (1 - 1e-2)) {
        warnings.add(
            String.format(
                Locale.ROOT,
                "%s ran into the end of its range, %.6g: earlier steps, or mean reversion, leave it"
                    + " no room",
                CalibrationRules.volatilityName(terms, k).replace('_', ' '),
                sigma[k]));
      }
    }
    if (covariance.degreesOfFreedom() == 0) {
      warnings.add(
          "as many parameters as quotes: the errors say nothing about the fit, and there are no"
              + " standard errors");
    }
  }

  private static void addReversion(
      List<String> warnings, CalibrationTerms terms, double a, FitCovariance covariance) {
    double range = terms.highestMeanReversion() - terms.lowestMeanReversion();
    boolean atTheEnd =
        a < terms.lowestMeanReversion() + AT_THE_END * range
            || a > terms.highestMeanReversion() - AT_THE_END * range;
    if (atTheEnd) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "mean reversion ran into the end of its range, %.6g a year: the quotes do not hold it",
              a));
    }
    OptionalDouble error = covariance.standardError(0);
    if (!covariance.isIdentified()
        || (error.isPresent() && 1.96 * error.getAsDouble() > Math.max(Math.abs(a), 0.02))) {
      warnings.add(
          error.isPresent()
              ? String.format(
                  Locale.ROOT,
                  "mean reversion is not identified by these quotes: %.4g a year with a standard"
                      + " error of %.2g",
                  a,
                  error.getAsDouble())
              : "mean reversion is not identified by these quotes: other values fit as well");
    }
    if (covariance.isIdentified() && covariance.conditionNumber() > CONDITION_LIMIT) {
      OptionalDouble correlation = covariance.correlation(0, 1);
      warnings.add(
          String.format(
              Locale.ROOT,
              "mean reversion and volatility trade off against each other: condition number %.3g%s",
              covariance.conditionNumber(),
              correlation.isPresent()
                  ? String.format(Locale.ROOT, ", correlation %.4f", correlation.getAsDouble())
                  : ""));
    }
  }
}
