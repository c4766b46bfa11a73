package ebbline.data;

import ebbline.instrument.BookRow;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;

/** A row of a book: readable, or not with the reason. */
public sealed interface BookEntry {

  /** A row that can be priced. */
  record Good(BookRow row) implements BookEntry {}

  /**
   * A row that cannot be read.
   *
   * @param message everything that is wrong with it, with places
   */
  record Bad(String id, String instrument, String message, Map<String, String> carried)
      implements BookEntry {
    public Bad {
      carried = Collections.unmodifiableMap(new LinkedHashMap<>(carried));
    }
  }
}
