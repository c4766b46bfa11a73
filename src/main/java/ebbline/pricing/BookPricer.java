package ebbline.pricing;

import ebbline.instrument.BookRow;

/** Prices one row of a book at a time. */
public interface BookPricer {

  /** The row's figures; a row that makes no sense comes back failed and never throws. */
  PricedRow price(BookRow row);
}
