package ebbline.fitting.panel;

import java.util.List;
import java.util.Objects;

/** What the search for the highest likelihood of a panel came to. */
public sealed interface PanelEstimate {

  /** The best point found. */
  Best best();

  /**
   * A point of the likelihood.
   *
   * @param parameters under both measures
   * @param errors standard errors from the observed information
   * @param logLikelihood with its constants
   * @param rates the filtered short rate and the errors of each maturity
   * @param iterations of the climb that found it
   * @param otherMaxima log-likelihoods of lower maxima that other starts ended in, highest first
   * @param warnings in words; may be empty
   */
  record Best(
      PanelParameters parameters,
      PanelErrors errors,
      double logLikelihood,
      FilteredRates rates,
      int iterations,
      List<Double> otherMaxima,
      List<String> warnings) {
    public Best {
      Objects.requireNonNull(parameters, "parameters");
      Objects.requireNonNull(errors, "errors");
      Objects.requireNonNull(rates, "rates");
      otherMaxima = List.copyOf(otherMaxima);
      warnings = List.copyOf(warnings);
    }
  }

  /** The likelihood is highest here. */
  record Converged(Best best) implements PanelEstimate {}

  /**
   * The climb ended before a maximum, or at the edge of what the panel can tell.
   *
   * @param reason in words
   */
  record Stopped(Best best, String reason) implements PanelEstimate {}
}
