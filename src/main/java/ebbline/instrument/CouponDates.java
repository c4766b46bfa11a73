package ebbline.instrument;

import java.time.LocalDate;

/**
 * Regular coupon dates, each counted from maturity and never from its neighbour, so that a short
 * month does not shorten the ones before it.
 *
 * @param maturity last coupon date
 * @param monthsApart length of a period
 */
record CouponDates(LocalDate maturity, int monthsApart) {

  /** The coupon date {@code k} periods before maturity. */
  LocalDate before(int k) {
    return maturity.minusMonths((long) k * monthsApart);
  }

  /** How many coupon dates lie after {@code date}. */
  int countAfter(LocalDate date) {
    int k = 0;
    while (before(k).isAfter(date)) {
      k++;
    }
    return k;
  }
}
