package ebbline.fitting.history;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What a history says about the Vasicek model: an estimate, or why there is none and what can still
 * be said.
 */
public sealed interface HistoryEstimate {

  Sample sample();

  HistoryMethod method();

  /**
   * The observations in short.
   *
   * @param observations rates that are there
   * @param missing rates that were given as missing
   * @param spanYears from the first to the last
   * @param step mean years between two
   * @param regular whether all steps are equal
   * @param mean of the rates
   * @param deviation root of the mean squared deviation from it
   * @param lowest rate
   * @param highest rate
   * @param last rate
   */
  record Sample(
      int observations,
      int missing,
      double spanYears,
      double step,
      boolean regular,
      double mean,
      double deviation,
      double lowest,
      double highest,
      double last) {}

  /**
   * The regression of each rate on the one before that belongs to the estimate, r(t+Δ) = A + B r(t)
   * + ε; for uneven steps the one over the mean step.
   *
   * @param intercept A
   * @param slope B
   * @param residualSd standard deviation of ε
   * @param interceptError standard error of A
   * @param slopeError standard error of B
   */
  record Regression(
      double intercept,
      double slope,
      double residualSd,
      double interceptError,
      double slopeError) {}

  /**
   * A random walk with drift, the fit that needs no mean reversion.
   *
   * @param drift per year
   * @param driftError standard error of the drift
   * @param volatility per year^(1/2) of rate, from n − 1
   * @param volatilityError standard error of the volatility
   * @param logLikelihood with its constants, at the maximum
   */
  record RandomWalk(
      double drift,
      double driftError,
      double volatility,
      double volatilityError,
      double logLikelihood) {}

  /**
   * An estimate with mean reversion.
   *
   * @param logLikelihood with its constants: of the transitions, for {@code stationary} and {@code
   *     yule-walker} of the first rate too; for {@code ols} the value at its maximum
   * @param warnings in words; may be empty
   */
  record Reverting(
      Sample sample,
      HistoryMethod method,
      RateLaw law,
      Regression regression,
      double logLikelihood,
      Precision precision,
      List<String> warnings)
      implements HistoryEstimate {
    public Reverting {
      warnings = List.copyOf(warnings);
    }

    Reverting with(List<String> said) {
      return new Reverting(sample, method, law, regression, logLikelihood, precision, said);
    }
  }

  /** Why there is no estimate. */
  enum Reason {
    TOO_FEW,
    CONSTANT,
    SINGLE_JUMP,
    WITHOUT_NOISE,
    NO_REVERSION,
    STEP_TOO_LONG
  }

  /**
   * No estimate of the mean reversion.
   *
   * @param explanation what was found and what can still be said, for the user
   * @param slope of each rate on the one before, where there is one
   * @param walk the fit without mean reversion, where there is one
   */
  record Undetermined(
      Sample sample,
      HistoryMethod method,
      Reason reason,
      String explanation,
      OptionalDouble slope,
      Optional<RandomWalk> walk)
      implements HistoryEstimate {}
}
