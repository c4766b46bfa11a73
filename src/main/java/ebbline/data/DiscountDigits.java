package ebbline.data;

import java.math.BigDecimal;
import java.math.MathContext;

/**
 * Discount factors with so many digits that the logarithm of the number read back is the one
 * written, to the last bit.
 *
 * <p>A curve holds ln P. Near ln P = 0 its doubles lie closer together than those of P, so a P of
 * 17 digits would lose some; 36 digits do not. Any reader that takes fewer still has P to its own
 * precision.
 */
final class DiscountDigits {
  private static final int DIGITS = 36;
  private static final MathContext WORK = new MathContext(50);
  private static final int HALVINGS = 12;

  private DiscountDigits() {}

  static BigDecimal discount(double logDiscount) {
    return exp(new BigDecimal(logDiscount)).round(new MathContext(DIGITS));
  }

  /** ln of a positive number, rounded once. */
  static double log(BigDecimal discount) {
    double start = Math.log(discount.doubleValue());
    BigDecimal y = new BigDecimal(start);
    for (int i = 0; i < 2; i++) { // each step squares the error: 1e-16 at the start
      BigDecimal ratio = discount.divide(exp(y), WORK);
      BigDecimal e = ratio.subtract(BigDecimal.ONE);
      BigDecimal half = e.multiply(e, WORK).divide(BigDecimal.valueOf(2), WORK);
      y = y.add(e.subtract(half), WORK);
    }
    return y.doubleValue();
  }

  private static BigDecimal exp(BigDecimal y) {
    BigDecimal x = y.divide(BigDecimal.valueOf(1L << HALVINGS), WORK);
    BigDecimal sum = BigDecimal.ONE;
    BigDecimal term = BigDecimal.ONE;
    for (int k = 1; k <= 60 && term.signum() != 0; k++) {
      term = term.multiply(x, WORK).divide(BigDecimal.valueOf(k), WORK);
      sum = sum.add(term, WORK);
      if (term.abs().compareTo(new BigDecimal("1e-60")) < 0) {
        break;
      }
    }
    for (int i = 0; i < HALVINGS; i++) {
      sum = sum.multiply(sum, WORK);
    }
    return sum;
  }
}
