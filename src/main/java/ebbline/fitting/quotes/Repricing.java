package ebbline.fitting.quotes;

import ebbline.curve.DiscountCurve;
import ebbline.fitting.FittedQuote;
import java.util.ArrayList;
import java.util.List;

/** Whether a curve meets its quotes. */
final class Repricing {
  /** Of a rate; of a price per 100, that part of the price. */
  private static final double TOLERANCE = 1e-12;

  private Repricing() {}

  /** The quotes beside the curve's own. */
  static List<FittedQuote> reprice(DiscountCurve curve, List<QuoteEquation> quotes) {
    List<FittedQuote> fitted = new ArrayList<>();
    for (QuoteEquation quote : quotes) {
      double found = quote.fittedQuote(curve);
      if (!Double.isFinite(found)) {
        throw new IllegalArgumentException(
            "the curve through the quotes must give each of them a value, found none for "
                + quote.id());
      }
      fitted.add(new FittedQuote(quote.id(), quote.quote(), found));
    }
    return fitted;
  }

  static List<String> unmet(List<FittedQuote> fitted) {
    return fitted.stream().filter(quote -> !isMet(quote)).map(FittedQuote::id).toList();
  }

  private static boolean isMet(FittedQuote quote) {
    return Math.abs(quote.error()) <= TOLERANCE * Math.max(1, Math.abs(quote.quote()));
  }

  /** The quotes that are not met, in words. */
  static String describe(List<FittedQuote> quotes) {
    StringBuilder text = new StringBuilder("not repriced:");
    int named = 0;
    for (FittedQuote quote : quotes) {
      if (!isMet(quote)) {
        if (named == 5) {
          return text.append(" and others").toString();
        }
        text.append(named++ == 0 ? " " : ", ")
            .append(quote.id())
            .append(" (quote ")
            .append(quote.quote())
            .append(", curve ")
            .append(quote.fitted())
            .append(')');
      }
    }
    return text.toString();
  }
}
