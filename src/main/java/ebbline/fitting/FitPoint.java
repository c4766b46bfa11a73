package ebbline.fitting;

import java.util.Collections;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * A fitted point: the parameters, how sure they are, and how far each quote is missed.
 *
 * @param parameters every parameter of the model, fitted or held
 * @param uncertainty of the fitted ones
 * @param quotes in the order given
 * @param iterations of the search that found the point
 * @param warnings what a reader must know before using the figures, in words; may be empty
 */
public record FitPoint(
    Map<Parameter, Double> parameters,
    Uncertainty uncertainty,
    List<FittedQuote> quotes,
    int iterations,
    List<String> warnings) {

  public FitPoint {
    Objects.requireNonNull(uncertainty, "uncertainty");
    parameters = Collections.unmodifiableMap(new EnumMap<>(parameters));
    quotes = List.copyOf(quotes);
    warnings = List.copyOf(warnings);
    for (Map.Entry<Parameter, Double> entry : parameters.entrySet()) {
      if (!Double.isFinite(entry.getValue())) {
        throw new IllegalArgumentException(
            entry.getKey().label() + " must be finite, found " + entry.getValue());
      }
    }
  }

  /**
   * The value of a parameter of this model.
   *
   * @throws IllegalArgumentException if the model has no such parameter
   */
  public double value(Parameter parameter) {
    Double value = parameters.get(parameter);
    if (value != null) {
      return value;
    }
    throw new IllegalArgumentException("this model has no parameter " + parameter.label());
  }

  /** Root of the mean squared error over the quotes, in their unit. */
  public double rmse() {
    double sum = 0;
    for (FittedQuote quote : quotes) {
      sum += quote.error() * quote.error();
    }
    return quotes.isEmpty() ? 0 : Math.sqrt(sum / quotes.size());
  }

  /** The largest absolute error over the quotes, in their unit. */
  public double largestError() {
    double largest = 0;
    for (FittedQuote quote : quotes) {
      largest = Math.max(largest, Math.abs(quote.error()));
    }
    return largest;
  }
}
