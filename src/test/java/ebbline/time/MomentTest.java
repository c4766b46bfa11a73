package ebbline.time;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.LocalDate;
import java.util.List;
import org.junit.jupiter.api.Test;

class MomentTest {
  private static final LocalDate TODAY = LocalDate.parse("2026-01-31");

  @Test
  void theThreeFormsAreToldApart() {
    assertThat(Moment.parse(" 2031-11-15 "))
        .isEqualTo(Moment.of(LocalDate.of(2031, 11, 15)))
        .hasToString("2031-11-15");
    assertThat(Moment.parse("1y6m")).isEqualTo(Moment.of(new Tenor(18, 0))).hasToString("1Y6M");
    assertThat(Moment.parse("0.25")).isEqualTo(Moment.ofYears(0.25)).hasToString("0.25");
  }

  @Test
  void numbersOfYearsAreReadInEveryPlainForm() {
    assertThat(Moment.parse("10")).isEqualTo(Moment.ofYears(10));
    assertThat(Moment.parse("+.5")).isEqualTo(Moment.ofYears(0.5));
    assertThat(Moment.parse("-1.")).isEqualTo(Moment.ofYears(-1));
    assertThat(Moment.parse("2.5e-1")).isEqualTo(Moment.ofYears(0.25));
    assertThat(Moment.parse("007")).isEqualTo(Moment.ofYears(7));
  }

  @Test
  void numbersOfYearsAreBoundedSoThatABareDateIsNotOne() {
    assertThat(Moment.parse("1000")).isEqualTo(Moment.ofYears(1000));
    assertThat(Moment.parse("-1000")).isEqualTo(Moment.ofYears(-1000));
    for (String text : List.of("20311115", "1000.0000001", "-1000.0000001", "1e400")) {
      assertThatThrownBy(() -> Moment.parse(text))
          .as(text)
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessage(
              "a number of years must lie within -1000 to 1000; a date is written 2031-11-15");
    }
  }

  @Test
  void whatIsNoMomentSaysWhatOneIs() {
    for (String text :
        List.of("", " ", "tomorrow", "-1M", "15/11/2031", "2031-1-5", "NaN", "Infinity", "0x1p3")) {
      assertThatThrownBy(() -> Moment.parse(text))
          .as(text)
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessage(
              "expected a date 2031-11-15, a tenor such as 3M, 10Y or 1Y6M, or a number of years"
                  + " such as 0.25");
    }
    for (String text : List.of("2031-02-29", "2031-13-01", "2031-04-31", "2031-00-10")) {
      assertThatThrownBy(() -> Moment.parse(text)).hasMessage("no such day in the calendar");
    }
    assertThat(Moment.parse("2032-02-29")).hasToString("2032-02-29");
  }

  @Test
  void yearsAreFinite() {
    for (double years : new double[] {Double.NaN, Double.POSITIVE_INFINITY}) {
      assertThatThrownBy(() -> Moment.ofYears(years))
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessage("years must be finite, found " + years);
    }
  }

  @Test
  void aDatedAxisCountsDaysFromItsDate() {
    TimeAxis axis = TimeAxis.from(TODAY);
    assertThat(axis.years(Moment.parse("2027-01-31"))).isEqualTo(1);
    assertThat(axis.years(Moment.parse("2026-01-30"))).isEqualTo(-1 / 365.0);
    assertThat(axis.years(Moment.parse("1M"))).isEqualTo(28 / 365.0);
    assertThat(axis.years(Moment.parse("0.25"))).isEqualTo(0.25);
    assertThat(axis.date(Moment.parse("1M"))).isEqualTo("2026-02-28");
    assertThat(axis.date(Moment.parse("2027-01-31"))).isEqualTo("2027-01-31");
    assertThat(axis.isDated(Moment.parse("1M"))).isTrue();
    assertThat(axis.isDated(Moment.parse("0.25"))).isFalse();
    assertThat(axis.asOf()).contains(TODAY);
    assertThat(axis.basis()).isEqualTo(TimeAxis.TimeBasis.ACT_365F);
    assertThatThrownBy(() -> axis.date(Moment.parse("0.25")))
        .hasMessage("expected a date, or a tenor with an as-of date to count from");
  }

  @Test
  void anUndatedAxisHasExactLengthsAndNoDates() {
    TimeAxis axis = TimeAxis.undated();
    assertThat(axis.years(Moment.parse("1M"))).isEqualTo(1 / 12.0);
    assertThat(axis.years(Moment.parse("0.25"))).isEqualTo(0.25);
    assertThat(axis.asOf()).isEmpty();
    assertThat(axis.isDated(Moment.parse("1M"))).isFalse();
    assertThat(axis.isDated(Moment.parse("2027-01-31"))).isTrue();
    assertThatThrownBy(() -> axis.years(Moment.parse("2027-01-31")))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageStartingWith("a date needs an as-of date to count from: give --as-of DATE");
    assertThatThrownBy(() -> axis.date(Moment.parse("1M")))
        .isInstanceOf(IllegalArgumentException.class);
    assertThat(axis.date(Moment.parse("2027-01-31"))).isEqualTo("2027-01-31");
  }

  @Test
  void everyBasisHasItsOwnYear() {
    LocalDate later = TODAY.plusDays(1461);
    assertThat(TimeAxis.from(TODAY, TimeAxis.TimeBasis.ACT_360).years(later))
        .isEqualTo(1461 / 360.0);
    assertThat(TimeAxis.from(TODAY, TimeAxis.TimeBasis.ACT_36525).years(later)).isEqualTo(4);
    assertThat(TimeAxis.from(TODAY).years(later)).isEqualTo(1461 / 365.0);
    assertThat(TimeAxis.TimeBasis.ACT_36525.label()).isEqualTo("act/365.25");
    assertThat(TimeAxis.TimeBasis.ACT_360.label()).isEqualTo("act/360");
    assertThat(TimeAxis.TimeBasis.ACT_365F.label()).isEqualTo("act/365f");
  }

  @Test
  void aProblemSaysItsPlaceWhatWasFoundAndWhatWasExpected() {
    assertThat(new InputProblem("a.csv", 3, "coupon", "4.25", "write 4.25%").message())
        .isEqualTo("a.csv:3: column 'coupon': found '4.25': write 4.25%");
    assertThat(new InputProblem("--as-of", 0, "", "", "a value is missing").message())
        .isEqualTo("--as-of: a value is missing");
    assertThat(new InputProblem("a.csv", 1, "", "x", "no such column").message())
        .isEqualTo("a.csv:1: found 'x': no such column");
    assertThat(new InputProblem("m.json", 4, "17", "", "no such member").message())
        .isEqualTo("m.json:4:17: no such member");
  }

  @Test
  void problemsAreTheirMessagesInTheirOrderAndNeverNone() {
    InputProblem one = new InputProblem("a.csv", 2, "", "", "first");
    InputProblem two = new InputProblem("a.csv", 1, "", "", "second");
    InputProblems both = new InputProblems(List.of(one, two));
    assertThat(both).hasMessage("a.csv:2: first\na.csv:1: second");
    assertThat(both.problems()).containsExactly(one, two);
    assertThat(InputProblems.of(one).problems()).containsExactly(one);
    List<InputProblem> none = List.of();
    assertThatThrownBy(() -> new InputProblems(none))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage("an unusable input must have a problem, found none");
  }
}
