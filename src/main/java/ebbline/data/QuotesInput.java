package ebbline.data;

import ebbline.curve.Interpolation;
import ebbline.fitting.quotes.SheetQuote;
import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Optional;

/**
 * A quote sheet ready to build a curve from.
 *
 * @param axis its as-of date, if it has one, and how years are counted on it
 * @param quotes in the order of the file, repeats left out
 * @param interpolation that the file asks for
 * @param kernel settings of Smith and Wilson's curve
 * @param remarks what was noticed while reading that is no error
 * @param file where it came from
 */
public record QuotesInput(
    TimeAxis axis,
    List<SheetQuote> quotes,
    Optional<Interpolation> interpolation,
    KernelSettings kernel,
    List<String> remarks,
    SourceFile file) {

  public QuotesInput {
    quotes = List.copyOf(quotes);
    remarks = List.copyOf(remarks);
  }
}
