package ebbline.fitting.quotes;

import java.util.Objects;

/**
 * One line of a quote sheet: the equation, and what a person has to know of it.
 *
 * @param kind of instrument
 * @param equation what the quote says about discount factors, with its weight in a fit
 * @param start of the period that the quote speaks of, years from today
 * @param end of that period
 * @param priced whether the quote is per 100, not a rate
 */
public record SheetQuote(
    QuoteKind kind, QuoteEquation equation, double start, double end, boolean priced) {

  public SheetQuote {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(equation, "equation");
  }

  public String id() {
    return equation.id();
  }
}
