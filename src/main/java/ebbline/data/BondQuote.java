package ebbline.data;

import ebbline.bond.BondYield;
import ebbline.fitting.quotes.MarketQuotes;
import ebbline.fitting.quotes.QuoteEquation;
import ebbline.instrument.Bond;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.QuoteTerms;
import ebbline.time.TimeAxis;

/** A bond as a quote: all that a curve asks of one, so that bonds are met in this place alone. */
final class BondQuote {
  /** 100 % a year: a price that means more was meant as a yield. */
  private static final double HIGHEST_YIELD = 1;

  private final Claim claim;
  private final BondYield yields;

  /**
   * @throws IllegalArgumentException in words if the bond makes no sense on this axis, or has no
   *     yield of this kind
   */
  BondQuote(Bond bond, TimeAxis axis, QuoteTerms quote) {
    claim = bond.claim(axis);
    yields = BondYield.of(bond.leg().on(axis).yieldTerms(), quote);
  }

  double settlement() {
    return claim.settlement();
  }

  double end() {
    CashFlows flows = claim.flows();
    return flows.time(flows.size() - 1);
  }

  /** By its clean price per 100. */
  QuoteEquation quotedPrice(String id, double clean) {
    double dirty = clean + claim.accrued();
    if (!(clean > 0 && dirty > 0)) {
      throw new IllegalArgumentException("a bond's price is above 0");
    }
    double yield = yields.yieldOf(dirty);
    if (!(yield < HIGHEST_YIELD)) {
      throw new IllegalArgumentException(
          "as a price per 100 this is a yield above 100 %; write a yield as 4.25% or 0.0425");
    }
    QuoteEquation equation =
        MarketQuotes.bondPrice(
            id,
            claim.flows().times(),
            claim.flows().amounts(),
            claim.settlement(),
            claim.accrued(),
            clean);
    double perYield = yields.modifiedDuration(yield) * dirty;
    return equation.withWeight(1 / (perYield * perYield));
  }

  /** By its yield. */
  QuoteEquation quotedYield(String id, double yield) {
    yields.price(yield); // refuses a yield that no price has
    return MarketQuotes.bondYield(
        id,
        claim.flows().times(),
        claim.flows().amounts(),
        claim.settlement(),
        new AtYield(yields),
        yield);
  }

  /** The dirty price at a yield; no number where the yield has none, as a search may try. */
  private record AtYield(BondYield yields) implements QuoteEquation.QuotedValue {
    @Override
    public double value(double quote) {
      try {
        return yields.price(quote);
      } catch (IllegalArgumentException e) {
        return Double.NaN;
      }
    }

    @Override
    public double slope(double quote) {
      try {
        return -yields.modifiedDuration(quote) * yields.price(quote);
      } catch (IllegalArgumentException e) {
        return Double.NaN;
      }
    }
  }
}
