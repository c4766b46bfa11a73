package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class StepTest {
  @ParameterizedTest
  @CsvSource({
    "1M, 1, 12, 1",
    "3m, 1, 4, 3",
    "1Y, 1, 1, 12",
    "1D, 1, 365, 0",
    "2W, 14, 365, 0",
    "0.25, 1, 4, 3",
    "1/12, 1, 12, 1",
    "' 1 / 250 ', 1, 250, 0",
    "1.5/12, 1.5, 12, 0",
    "2, 2, 1, 24"
  })
  void stepsAreLengthsInYears(String text, double over, double under, int months) {
    Step step = Step.parse(text);
    assertThat(step.years()).isEqualTo(over / under);
    assertThat(step.months().orElse(0)).isEqualTo(months);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "",
        "0",
        "-1",
        "0D",
        "0/12",
        "1/0",
        "NaN",
        "1/",
        "monthly",
        "2026-01-01",
        "101",
        "1e9",
        "-1M"
      })
  void whatIsNoStepIsRefused(String text) {
    assertThatThrownBy(() -> Step.parse(text))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage("expected a step such as 1M, 1D, 0.25 or 1/12, above 0 and at most 100 years");
  }
}
