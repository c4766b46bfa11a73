package ebbline.instrument;

import java.util.Objects;

/**
 * What a row's yields mean.
 *
 * @param kind of the quoted yield and of every yield shown
 * @param lastPeriod how the last payment is discounted once it is the only one
 * @param rounding of prices, where a standard has one
 */
public record QuoteTerms(YieldKind kind, LastPeriodRule lastPeriod, PriceRounding rounding) {
  /** Street, simple in the last period, nothing rounded. */
  public static final QuoteTerms STANDARD =
      new QuoteTerms(YieldKind.STREET, LastPeriodRule.SIMPLE, PriceRounding.NONE);

  public QuoteTerms {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(lastPeriod, "lastPeriod");
    Objects.requireNonNull(rounding, "rounding");
  }
}
