package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PlainDecimalTest {
  @Test
  void theDoubleIsTheOneNearestToTheDecimal() {
    Random random = new Random(13);
    for (int i = 0; i < 200_000; i++) {
      int length = 1 + random.nextInt(15);
      StringBuilder text = new StringBuilder();
      for (int k = 0; k < length; k++) {
        text.append((char) ('0' + random.nextInt(10)));
      }
      int point = random.nextInt(length + 2);
      if (point <= length) {
        text.insert(point, '.');
      }
      if (random.nextBoolean()) {
        text.insert(0, '-');
      }
      int shift = random.nextInt(5);
      double expected = new BigDecimal(text.toString()).movePointLeft(shift).doubleValue();
      double found = PlainDecimal.parse(text + "%", text.length(), shift);
      assertThat(found)
          .as(text.toString())
          .isEqualTo(text.charAt(0) == '-' ? minus(expected) : expected);
    }
  }

  /** A decimal has no sign at 0; a double keeps the one that is written. */
  private static double minus(double value) {
    return value == 0 ? -0.0 : value;
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "",
        "-",
        ".",
        "-.",
        "+1",
        "1e3",
        "1,000",
        "1.2.3",
        "1-",
        "--1",
        " 1",
        "١",
        "0x1",
        "NaN",
        "1234567890123456",
        "0.000000000000001"
      })
  void whatIsNotPlainIsLeftToTheGeneralRoutine(String text) {
    assertThat(PlainDecimal.parse(text, text.length(), 0)).isNaN();
  }

  @Test
  void theLongestPlainNumbersAreRead() {
    assertThat(PlainDecimal.parse("123456789012345", 15, 0)).isEqualTo(123456789012345.0);
    assertThat(PlainDecimal.parse(".000000000000001", 16, 4)).isEqualTo(1e-19);
  }
}
