package ebbline.fitting;

import java.util.Objects;

/**
 * One observation and what the fitted model makes of it, in the quote's own unit.
 *
 * @param id label of the quote; for a point of a curve its time in years
 * @param quote as observed
 * @param fitted by the model
 */
public record FittedQuote(String id, double quote, double fitted) {

  public FittedQuote {
    Objects.requireNonNull(id, "id");
    if (!(Double.isFinite(quote) && Double.isFinite(fitted))) {
      throw new IllegalArgumentException(
          "a quote and its fit must be finite, found " + quote + " and " + fitted);
    }
  }

  /** Fitted minus quoted. */
  public double error() {
    return fitted - quote;
  }
}
