package ebbline.data;

import java.util.List;
import java.util.Map;

/**
 * How a model's parameters were found, as a model file keeps it.
 *
 * @param objective what was made small, in words
 * @param rmse root of the mean squared error over the quotes, in their unit
 * @param iterations of the search
 * @param converged whether it ended where nothing gets better
 * @param standardErrors by parameter, in the order of the covariance
 * @param covariance of the parameters in that order
 * @param quotes the observations and their fit
 */
public record FitSummary(
    String objective,
    double rmse,
    int iterations,
    boolean converged,
    Map<String, Double> standardErrors,
    List<List<Double>> covariance,
    List<Quote> quotes) {

  /**
   * @param error fitted minus quote
   */
  public record Quote(String id, double quote, double fitted, double error) {}

  public FitSummary {
    standardErrors =
        java.util.Collections.unmodifiableMap(new java.util.LinkedHashMap<>(standardErrors));
    covariance = covariance.stream().map(List::copyOf).toList();
    quotes = List.copyOf(quotes);
  }
}
