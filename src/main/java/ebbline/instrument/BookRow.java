package ebbline.instrument;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * A position: an instrument, how much of it, and what the market quotes.
 *
 * @param id unique label
 * @param face money; negative is short
 * @param price quoted clean price per 100, if given
 * @param yield quoted yield, a decimal, if given
 * @param oas quoted option-adjusted spread, a decimal, if given; of rows with rights
 * @param quote what yields mean
 * @param carried the book's own columns {@code x-…}, in order
 */
public record BookRow(
    String id,
    Instrument instrument,
    double face,
    OptionalDouble price,
    OptionalDouble yield,
    OptionalDouble oas,
    QuoteTerms quote,
    Map<String, String> carried) {

  /** A row whose yields are the street's. */
  public BookRow(
      String id,
      Instrument instrument,
      double face,
      OptionalDouble price,
      OptionalDouble yield,
      Map<String, String> carried) {
    this(id, instrument, face, price, yield, OptionalDouble.empty(), QuoteTerms.STANDARD, carried);
  }

  public BookRow {
    Objects.requireNonNull(id, "id");
    Objects.requireNonNull(instrument, "instrument");
    Objects.requireNonNull(quote, "quote");
    if (!Double.isFinite(face)) {
      throw new IllegalArgumentException("face must be finite, found " + face);
    }
    carried = Collections.unmodifiableMap(new LinkedHashMap<>(carried));
  }
}
