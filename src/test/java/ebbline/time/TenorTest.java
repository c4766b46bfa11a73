package ebbline.time;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.LocalDate;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class TenorTest {
  @Test
  void tenorsAreReadInEitherCaseWithBlanksAroundAndLeadingZeros() {
    assertThat(Tenor.parse("1D")).isEqualTo(new Tenor(0, 1));
    assertThat(Tenor.parse("2w")).isEqualTo(new Tenor(0, 14));
    assertThat(Tenor.parse("6M")).isEqualTo(new Tenor(6, 0));
    assertThat(Tenor.parse("18m")).isEqualTo(new Tenor(18, 0));
    assertThat(Tenor.parse("10Y")).isEqualTo(new Tenor(120, 0));
    assertThat(Tenor.parse("\t1y6m ")).isEqualTo(new Tenor(18, 0));
    assertThat(Tenor.parse("001Y02M03W04D")).isEqualTo(new Tenor(14, 25));
    assertThat(Tenor.parse("0D")).isEqualTo(new Tenor(0, 0));
  }

  @Test
  void anythingElseIsRefusedInWords() {
    for (String text :
        List.of("", " ", "M", "6", "-6M", "+6M", "6M1Y", "1Y 6M", "1.5Y", "6MM", "1000Y", "6Q")) {
      assertThatThrownBy(() -> Tenor.parse(text))
          .as(text)
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessage("expected a tenor such as 1D, 2W, 6M, 10Y or 1Y6M");
    }
  }

  @Test
  void lengthsAreBoundedOnBothSides() {
    assertThat(new Tenor(11_999, 99_999)).hasToString("999Y11M99999D");
    assertThat(Tenor.parse("999Y11M")).isEqualTo(new Tenor(11_999, 0));
    assertThat(Tenor.parse("9999M")).hasToString("833Y3M");
    for (Runnable bad :
        List.<Runnable>of(
            () -> new Tenor(12_000, 0),
            () -> new Tenor(0, 100_000),
            () -> new Tenor(-1, 0),
            () -> new Tenor(0, -1),
            () -> Tenor.parse("999Y12M"),
            () -> Tenor.parse("9999W99999D"))) {
      assertThatThrownBy(bad::run)
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessageStartingWith("a tenor must be 0 to 11999 months and 0 to 99999 days, found ");
    }
    assertThatThrownBy(() -> new Tenor(-1, 2)).hasMessageEndingWith("-1 months and 2 days");
  }

  @Test
  void whatIsWrittenIsReadBackTheSame() {
    Random random = new Random(5);
    for (int i = 0; i < 2000; i++) {
      Tenor tenor = new Tenor(random.nextInt(12_000), random.nextInt(3) * random.nextInt(50_000));
      assertThat(Tenor.parse(tenor.toString())).isEqualTo(tenor);
    }
    assertThat(new Tenor(12, 0)).hasToString("1Y");
    assertThat(new Tenor(11, 0)).hasToString("11M");
    assertThat(new Tenor(0, 0)).hasToString("0D");
    assertThat(new Tenor(18, 3)).hasToString("1Y6M3D");
  }

  @Test
  void monthsKeepTheDayWhereTheMonthHasIt() {
    LocalDate january = LocalDate.parse("2026-01-31");
    assertThat(Tenor.parse("1M").after(january)).isEqualTo("2026-02-28");
    assertThat(Tenor.parse("2M").after(january)).isEqualTo("2026-03-31");
    assertThat(Tenor.parse("25M").after(january)).isEqualTo("2028-02-29");
    assertThat(Tenor.parse("1M1D").after(january)).isEqualTo("2026-03-01");
    assertThat(Tenor.parse("1Y").after(LocalDate.parse("2024-02-29"))).isEqualTo("2025-02-28");
  }

  @Test
  void withoutACalendarLengthsAreExact() {
    assertThat(Tenor.parse("1M").years()).isEqualTo(1 / 12.0);
    assertThat(Tenor.parse("3M").years()).isEqualTo(0.25);
    assertThat(Tenor.parse("1D").years()).isEqualTo(1 / 365.0);
    assertThat(Tenor.parse("1W").years()).isEqualTo(7 / 365.0);
    assertThat(Tenor.parse("1Y6M").years()).isEqualTo(1.5);
    assertThat(Tenor.parse("1Y1D").years()).isEqualTo(1 + 1 / 365.0);
  }
}
