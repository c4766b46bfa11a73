package ebbline.data;

import ebbline.fitting.options.OptionQuote;
import java.util.List;

/**
 * A sheet of option quotes.
 *
 * @param quotes in the order of the file
 * @param expiryTexts when each expires, as the file writes it
 * @param file where it came from
 */
public record OptionQuotesInput(
    List<OptionQuote> quotes, List<String> expiryTexts, SourceFile file) {

  public OptionQuotesInput {
    quotes = List.copyOf(quotes);
    expiryTexts = List.copyOf(expiryTexts);
  }
}
