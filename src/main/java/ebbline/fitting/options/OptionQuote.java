package ebbline.fitting.options;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.Claim;
import ebbline.pricing.VolatilityTerms;
import java.util.Locale;
import java.util.Objects;

/**
 * The market's price of one option.
 *
 * @param id label
 * @param claim the option, everything fixed by the curve
 * @param terms what turns volatilities into premiums and back
 * @param unit of the quote
 * @param quoted in that unit: a decimal volatility per year^½, or money per 100
 * @param shift of Black's forward and strike
 * @param weight of its squared error, at least 0
 */
public record OptionQuote(
    String id,
    Claim claim,
    VolatilityTerms terms,
    QuoteUnit unit,
    double quoted,
    double shift,
    double weight) {

  public OptionQuote {
    Objects.requireNonNull(id, "id");
    Objects.requireNonNull(claim, "claim");
    Objects.requireNonNull(terms, "terms");
    Objects.requireNonNull(unit, "unit");
    if (!(weight >= 0 && Double.isFinite(weight))) {
      throw new IllegalArgumentException("weight must be at least 0, found " + weight);
    }
    if (!(Math.abs(shift) < 10)) {
      throw new IllegalArgumentException("shift must be a rate, found " + shift);
    }
    if (unit != QuoteUnit.PREMIUM && !(quoted > 0 && quoted < 100)) {
      throw new IllegalArgumentException("a volatility must be above 0, found " + quoted);
    }
    double premium = unit.premium(terms, quoted, shift);
    if (!(premium >= 0 && Double.isFinite(premium))) {
      throw new IllegalArgumentException("a premium must be at least 0, found " + quoted);
    }
    if (!(terms.expiry() > 0)) {
      throw new IllegalArgumentException(
          "a quote needs time to its expiry, found " + terms.expiry() + " years");
    }
    if (!(premium < terms.most())) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "a premium of %.9g is not below %.9g, the most the option can be worth",
              premium,
              terms.most()));
    }
    if (!(terms.implied(ebbline.pricing.VolatilityLaw.NORMAL, premium, 0) > 0)) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "the quote holds no volatility: its premium %.9g is the intrinsic value",
              premium));
    }
  }

  /**
   * @throws IllegalArgumentException in words if the figure makes no sense for the option
   */
  public static OptionQuote of(
      String id,
      Claim claim,
      DiscountCurve curve,
      QuoteUnit unit,
      double quoted,
      double shift,
      double weight) {
    return new OptionQuote(
        id, claim, VolatilityTerms.of(claim, curve), unit, quoted, shift, weight);
  }

  /** Money per 100 face. */
  public double premium() {
    return unit.premium(terms, quoted, shift);
  }
}
