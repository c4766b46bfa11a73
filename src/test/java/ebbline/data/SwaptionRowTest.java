package ebbline.data;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import ebbline.time.Tenor;
import org.junit.jupiter.api.Test;

class SwaptionRowTest {

  @Test
  void aTenorMayBeABareNumberOfYearsThatMakesWholeMonths() {
    assertThat(SwaptionRow.tenor("5")).isEqualTo(Tenor.parse("5Y"));
    assertThat(SwaptionRow.tenor("1.5")).isEqualTo(Tenor.parse("18M"));
    assertThat(SwaptionRow.tenor("0.25")).isEqualTo(Tenor.parse("3M"));
    assertThat(SwaptionRow.tenor("10Y")).isEqualTo(new Tenor(120, 0));
  }

  @Test
  void anotherNumberIsNoTenor() {
    assertThatThrownBy(() -> SwaptionRow.tenor("0.3")).hasMessageContaining("expected a tenor");
    assertThatThrownBy(() -> SwaptionRow.tenor("-1")).hasMessageContaining("expected a tenor");
  }
}
