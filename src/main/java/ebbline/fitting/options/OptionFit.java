package ebbline.fitting.options;

import java.util.List;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * What a calibration to options came to. Not converging is a value: the best point is there in both
 * cases.
 *
 * @param names of all parameters, {@code mean_reversion} first; volatilities of steps are {@code
 *     volatility_1} and so on
 * @param values of the parameters, in that order
 * @param free names of those that were fitted
 * @param uncertainty of the fitted ones
 * @param quotes in the order given
 * @param rmse of the objective over the quotes with a weight
 * @param stopped why the search ended before its goal; empty where it converged
 * @param profile the objective over mean reversion, the rest fitted anew; empty where it is held
 * @param warnings what a reader must know before using the figures
 */
public record OptionFit(
    List<String> names,
    List<Double> values,
    List<String> free,
    FitCovariance uncertainty,
    List<Quote> quotes,
    double rmse,
    int iterations,
    int evaluations,
    String stopped,
    List<ProfilePoint> profile,
    List<String> warnings) {

  /**
   * A quote and its fit, both in the quote's own unit.
   *
   * @param unit label of the unit of both, such as {@code normal-vol} or {@code zero-rate}
   * @param fitted absent where the model's premium has no volatility
   */
  public record Quote(String id, String unit, double quoted, OptionalDouble fitted, double weight) {

    /** Fitted less quoted. */
    public OptionalDouble error() {
      return fitted.isPresent()
          ? OptionalDouble.of(fitted.getAsDouble() - quoted)
          : OptionalDouble.empty();
    }
  }

  /**
   * @param volatility of the first step
   * @param rmse of the objective with mean reversion held here
   */
  public record ProfilePoint(double meanReversion, double volatility, double rmse) {}

  public OptionFit {
    names = List.copyOf(names);
    values = List.copyOf(values);
    free = List.copyOf(free);
    quotes = List.copyOf(quotes);
    profile = List.copyOf(profile);
    warnings = List.copyOf(warnings);
    Objects.requireNonNull(uncertainty, "uncertainty");
    Objects.requireNonNull(stopped, "stopped");
  }

  public boolean isConverged() {
    return stopped.isEmpty();
  }

  /**
   * @throws IllegalArgumentException if there is no parameter of that name
   */
  public double value(String name) {
    int at = names.indexOf(name);
    if (at >= 0) {
      return values.get(at);
    }
    throw new IllegalArgumentException("this model has no parameter " + name);
  }

  /** Standard error of a parameter; absent where it was held or nothing tells it. */
  public OptionalDouble standardError(String name) {
    int at = free.indexOf(name);
    return at < 0 ? OptionalDouble.empty() : uncertainty.standardError(at);
  }

  /** The quote that is missed most, in its own unit. */
  public OptionalDouble largestError() {
    return quotes.stream()
        .filter(q -> q.error().isPresent())
        .mapToDouble(q -> Math.abs(q.error().getAsDouble()))
        .max();
  }
}
