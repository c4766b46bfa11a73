package ebbline.data;

import java.math.BigDecimal;
import java.math.MathContext;

/**
 * Discount factors with so many digits that the logarithm of the number read back is the one
 * written, to the last bit.
 *
 * <p>A curve holds ln P. Near ln P = 0 its doubles lie closer together than those of P: of a P with
 * n digits after the point, ln P keeps n less as many as it has zeros there. So P gets 20 digits
 * more than those zeros, down to |ln P| = 1e-70. Any reader that takes fewer still has P to its own
 * precision.
 */
final class DiscountDigits {
  private static final int DIGITS = 20;
  private static final int MOST_DIGITS = 90; // a model file's numbers have at most 100
  private static final MathContext WORK = new MathContext(110);
  private static final int HALVINGS = 12;

  /** Each takes the error to its third power: 1e-13 at the start, 1e-110 after two. */
  private static final int STEPS = 2;

  private static final BigDecimal SMALL = new BigDecimal("1e-120");

  private DiscountDigits() {}

  static BigDecimal discount(double logDiscount) {
    int zeros = (int) Math.ceil(Math.max(0, -Math.log10(Math.abs(logDiscount))));
    int digits = logDiscount == 0 ? DIGITS : Math.min(MOST_DIGITS, DIGITS + zeros);
    return exp(new BigDecimal(logDiscount)).round(new MathContext(digits));
  }

  /**
   * ln of a discount factor as a file has it: by all its digits where it has more than a double
   * holds, which are those of a curve that was written.
   *
   * @param value the text as a double, above 0
   */
  static double log(String text, double value) {
    return text.length() < DIGITS || text.length() > MOST_DIGITS + DIGITS
        ? Math.log(value)
        : log(new BigDecimal(text));
  }

  /** ln of a positive number, rounded once. */
  static double log(BigDecimal discount) {
    BigDecimal y = new BigDecimal(Math.log(discount.doubleValue()));
    for (int i = 0; i < STEPS; i++) {
      BigDecimal e = discount.divide(exp(y), WORK).subtract(BigDecimal.ONE);
      BigDecimal half = e.multiply(e, WORK).divide(BigDecimal.valueOf(2), WORK);
      y = y.add(e.subtract(half), WORK);
    }
    return y.doubleValue();
  }

  private static BigDecimal exp(BigDecimal y) {
    BigDecimal x = y.divide(BigDecimal.valueOf(1L << HALVINGS), WORK);
    BigDecimal sum = BigDecimal.ONE;
    BigDecimal term = BigDecimal.ONE;
    for (int k = 1; term.abs().compareTo(SMALL) > 0; k++) {
      term = term.multiply(x, WORK).divide(BigDecimal.valueOf(k), WORK);
      sum = sum.add(term, WORK);
    }
    for (int i = 0; i < HALVINGS; i++) {
      sum = sum.multiply(sum, WORK);
    }
    return sum;
  }
}
