package ebbline.bond;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;

class IndexRatioTest {

  /** 31 CFR 356, Appendix B, section I.B.3. */
  @Test
  void theDaysIndexIsInterpolatedTruncatedAndRounded() {
    assertThat(IndexRatio.reference(154.4, 154.9, 15, 30)).isEqualTo(154.63333);
    assertThat(IndexRatio.reference(154.4, 154.9, 16, 30)).isEqualTo(154.65);
    assertThat(IndexRatio.of(154.65, 154.63333)).isEqualTo(1.00011);
  }

  /** 1.0000049 is cut before it is rounded, so a five in the sixth decimal decides alone. */
  @Test
  void theSixthDecimalDecides() {
    assertThat(IndexRatio.of(1.0000049, 1)).isEqualTo(1);
    assertThat(IndexRatio.of(1.0000050, 1)).isEqualTo(1.00001);
    assertThat(IndexRatio.of(1.00000499999, 1)).isEqualTo(1);
  }

  @Test
  void nonsenseIsRefused() {
    assertThatThrownBy(() -> IndexRatio.reference(154, 155, 31, 30)).hasMessageContaining("day 31");
    assertThatThrownBy(() -> IndexRatio.of(-1, 154)).hasMessageContaining("above 0");
  }
}
