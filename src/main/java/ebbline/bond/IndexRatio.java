package ebbline.bond;

import java.math.BigDecimal;
import java.math.RoundingMode;

/**
 * Indexation of inflation-protected Treasury securities and their interest strips, with the
 * regulation's truncation to six decimals and rounding to five [31 CFR 356, Appendix B, sections
 * I.B and V].
 */
public final class IndexRatio {
  private IndexRatio() {}

  /**
   * The reference index of a day, between those of the first days of its month and the next.
   *
   * @param thisMonth index of the first day of the month
   * @param nextMonth index of the first day of the next
   * @param dayOfMonth 1 to {@code daysInMonth}
   */
  public static double reference(
      double thisMonth, double nextMonth, int dayOfMonth, int daysInMonth) {
    if (!(dayOfMonth >= 1 && dayOfMonth <= daysInMonth && daysInMonth <= 31)) {
      throw new IllegalArgumentException(
          "a day lies in its month, found day " + dayOfMonth + " of " + daysInMonth);
    }
    return rounded(thisMonth + (dayOfMonth - 1.0) / daysInMonth * (nextMonth - thisMonth));
  }

  /** The index ratio: the reference index of a day over that of the issue. */
  public static double of(double reference, double atIssue) {
    if (!(reference > 0 && atIssue > 0 && Double.isFinite(reference / atIssue))) {
      throw new IllegalArgumentException(
          "indices must be above 0, found " + reference + " and " + atIssue);
    }
    return rounded(reference / atIssue);
  }

  /** Half a year's interest on the inflation-adjusted face, in money to the cent. */
  public static double interest(double face, double couponRate, double ratio) {
    return cents(face * ratio * couponRate / 2);
  }

  /** Value of an interest strip at an index of 100, in money to the cent. */
  public static double adjustedValue(double face, double couponRate, double atIssue) {
    return cents(face * couponRate / 2 * 100 / atIssue);
  }

  /** What a strip pays: its adjusted value at the index of the day, in money to the cent. */
  public static double payment(double adjustedValue, double reference) {
    return cents(adjustedValue * reference / 100);
  }

  /** Truncated to six decimals, then rounded half up to five. */
  private static double rounded(double exact) {
    return decimal(exact)
        .setScale(6, RoundingMode.DOWN)
        .setScale(5, RoundingMode.HALF_UP)
        .doubleValue();
  }

  private static double cents(double money) {
    return decimal(money).setScale(2, RoundingMode.HALF_UP).doubleValue();
  }

  /** To fourteen significant digits, so that binary dust does not decide a truncation. */
  private static BigDecimal decimal(double value) {
    return new BigDecimal(value, new java.math.MathContext(14));
  }
}
