package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;

class DiscountDigitsTest {
  @Test
  void everyLogarithmDownTo1em70ComesBackToTheLastBit() {
    Random random = new Random(5);
    for (int i = 0; i < 3_000; i++) {
      double size = Math.pow(10, 2.8 - (i % 73));
      double log = (random.nextBoolean() ? 1 : -1) * size * (0.1 + 0.9 * random.nextDouble());
      BigDecimal digits = DiscountDigits.discount(log);
      assertThat(DiscountDigits.log(new BigDecimal(digits.toString()))).isEqualTo(log);
      assertThat(digits.toString()).hasSizeLessThan(100);
      assertThat(digits.doubleValue())
          .isCloseTo(Math.exp(log), org.assertj.core.data.Percentage.withPercentage(1e-11));
    }
  }

  @Test
  void discountOneIsOne() {
    assertThat(DiscountDigits.discount(0)).isEqualTo(BigDecimal.ONE);
    assertThat(DiscountDigits.log(BigDecimal.ONE)).isZero();
  }
}
