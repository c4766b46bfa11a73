package ebbline.curve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;

class DayTableTest {
  private static final DiscountCurve CURVE =
      InterpolatedCurve.of(
          Interpolation.MONOTONE_CONVEX,
          new double[] {0.5, 2, 10, 30},
          new double[] {-0.01, -0.05, -0.35, -0.9});

  @Test
  void everyDayHoldsTheCurvesOwnFactor() {
    DayTable table = DayTable.of(CURVE, 20_000, 365);
    for (int day = 0; day <= table.lastDay(); day++) {
      assertThat(table.discount(day)).isEqualTo(CURVE.discount(day / 365.0));
    }
    assertThat(table.discounts()).hasSize(20_001).startsWith(1.0);
    assertThat(table.daysPerYear()).isEqualTo(365);
  }

  @Test
  void aBookIsWorthTheSumOfItsDiscountedFlows() {
    Random random = new Random(5);
    DayTable table = DayTable.of(CURVE, 10_950, 365);
    int n = 1003;
    int[] days = new int[n];
    double[] amounts = new double[n];
    for (int i = 0; i < n; i++) {
      days[i] = random.nextInt(10_951);
      amounts[i] = random.nextDouble() - 0.3;
    }
    for (int from : new int[] {0, 1, 2, 3, 998, n}) {
      double plain = 0;
      for (int i = from; i < n; i++) {
        plain += amounts[i] * CURVE.discount(days[i] / 365.0);
      }
      assertThat(table.presentValue(days, amounts, from, n)).isCloseTo(plain, within(1e-12));
    }
  }

  @Test
  void anAnnuityIsAFlowOfOneOnEveryDay() {
    DayTable table = DayTable.of(CURVE, 10_950, 365);
    int[] days = {0, 181, 365, 365, 10_950};
    for (int to = 0; to <= days.length; to++) {
      double plain = 0;
      for (int i = 0; i < to; i++) {
        plain += table.discount(days[i]);
      }
      assertThat(table.annuity(days, 0, to)).isCloseTo(plain, within(1e-15));
    }
  }

  @Test
  void tablesThatCannotBeAreRefused() {
    assertThatThrownBy(() -> DayTable.of(CURVE, -1, 365)).hasMessageContaining("found -1");
    assertThatThrownBy(() -> DayTable.of(CURVE, DayTable.MOST_DAYS + 1, 365))
        .hasMessageContaining("292201");
    assertThatThrownBy(() -> DayTable.of(CURVE, 1, 0)).hasMessageContaining("days per year");
  }
}
