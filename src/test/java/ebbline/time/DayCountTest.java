package ebbline.time;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.Set;
import org.assertj.core.api.SoftAssertions;
import org.junit.jupiter.api.Test;

class DayCountTest {
  private static LocalDate date(String text) {
    return LocalDate.parse(text);
  }

  private static CouponPeriod period(LocalDate start, LocalDate end, LocalDate maturity) {
    return CouponPeriod.regular(start, end, Frequency.ANNUAL, maturity);
  }

  private static CouponPeriod period(String start, String end, Frequency frequency) {
    return CouponPeriod.regular(date(start), date(end), frequency, date(end));
  }

  @Test
  void everyThirtyDayRowOfTheIsdaTableIsExact() {
    SoftAssertions soft = new SoftAssertions();
    List<ReferenceRows.Row> rows = ReferenceRows.read("thirty-360-days");
    for (ReferenceRows.Row row : rows) {
      DayCount count = DayCount.of(row.text("day_count"));
      LocalDate start = row.date("start");
      LocalDate end = row.date("end");
      LocalDate maturity = row.text("is_maturity").equals("yes") ? end : end.plusYears(1);
      CouponPeriod period = period(start, end.isAfter(start) ? end : end.plusDays(1), maturity);
      soft.assertThat(count.days(start, end, period))
          .as(row.text("id"))
          .isEqualTo(row.whole("days"));
      soft.assertThat(count.years(start, end, period))
          .as(row.text("id"))
          .isEqualTo(row.whole("days") / 360.0);
    }
    soft.assertAll();
    assertThat(rows).hasSize(105);
  }

  /** The issue and regular dates behind the memo's odd periods. */
  private static CouponPeriod memoPeriod(LocalDate start, LocalDate end, Frequency frequency) {
    ScheduleTerms backwards = ScheduleTerms.regular(end, frequency).withIssue(start);
    return switch (start.toString()) {
      // Long and short final periods count forward from the coupon before them.
      case "2000-01-30" ->
          Schedule.of(backwards.withIssue(date("1999-07-30")).withLastCoupon(start)).at(start);
      case "1999-11-30" ->
          Schedule.of(
                  backwards
                      .withIssue(date("1999-08-31"))
                      .withLastCoupon(start)
                      .withEndOfMonth(true))
              .at(start);
      default -> Schedule.of(backwards.withFirstCoupon(end)).at(start);
    };
  }

  @Test
  void actualOverActualFollowsTheMemo() {
    double worst = 0;
    for (ReferenceRows.Row row : ReferenceRows.read("act-act-years")) {
      LocalDate start = row.date("start");
      LocalDate end = row.date("end");
      CouponPeriod period = memoPeriod(start, end, Frequency.of(row.whole("frequency")));
      double years = DayCount.of(row.text("day_count")).years(start, end, period);
      assertThat(years).as(row.text("id")).isCloseTo(row.number("published"), within(5e-9));
      worst = Math.max(worst, Math.abs(years - row.number("recomputed")) / years);
    }
    assertThat(worst).isLessThanOrEqualTo(4e-15).isGreaterThan(4e-15 / 20);
  }

  @Test
  void longPeriodsAreSummedOverTheirReferencePeriods() {
    // ISDA memo of November 1998, sec. 4, from memory: 153/184 and a whole half-year.
    CouponPeriod longFirst =
        memoPeriod(date("2002-08-15"), date("2003-07-15"), Frequency.SEMI_ANNUAL);
    assertThat(longFirst.reference())
        .containsExactly(date("2002-07-15"), date("2003-01-15"), date("2003-07-15"));
    assertThat(DayCount.ACT_ACT_ICMA.years(date("2002-08-15"), date("2003-07-15"), longFirst))
        .isCloseTo((153 / 184.0 + 1) / 2, within(1e-16));
    // A whole quarter and 61 of 92 days.
    CouponPeriod longLast = memoPeriod(date("1999-11-30"), date("2000-04-30"), Frequency.QUARTERLY);
    assertThat(longLast.reference())
        .containsExactly(date("1999-11-30"), date("2000-02-29"), date("2000-05-31"));
    assertThat(DayCount.ACT_ACT_ICMA.years(date("1999-11-30"), date("2000-04-30"), longLast))
        .isCloseTo((1 + 61 / 92.0) / 4, within(1e-16));
  }

  @Test
  void treasuryAccrualsInOddPeriodsAreThoseOfTheRegulation() {
    // 31 CFR Part 356, Appendix B, sec. I.D(2), I.A.4 and I.A.3: interest per 1000.
    CouponPeriod reopened =
        Schedule.of(
                ScheduleTerms.regular(date("2005-08-15"), Frequency.SEMI_ANNUAL)
                    .withIssue(date("1985-07-02"))
                    .withFirstCoupon(date("1986-02-15")))
            .at(date("1985-11-04"));
    double accrued =
        107.5 * DayCount.ACT_ACT_ICMA.years(date("1985-07-02"), date("1985-11-04"), reopened);
    assertThat(accrued).isCloseTo(36.72798, within(5e-6));
    CouponPeriod longFirst =
        Schedule.of(
                ScheduleTerms.regular(date("2005-08-15"), Frequency.SEMI_ANNUAL)
                    .withIssue(date("1990-12-03"))
                    .withFirstCoupon(date("1991-08-15")))
            .at(date("1990-12-03"));
    // The regulation rounds the interest of a day to nine decimals and counts 74 days of it.
    assertThat(78.75 * DayCount.ACT_ACT_ICMA.periodYears(longFirst))
        .isCloseTo(55.210597810, within(74 * 5e-10));
  }

  @Test
  void yearFractionsAgreeWithASpreadsheet() {
    double worst = 0;
    for (ReferenceRows.Row row : ReferenceRows.read("year-fractions")) {
      double years = DayCount.of(row.text("day_count")).years(row.date("start"), row.date("end"));
      worst = Math.max(worst, Math.abs(years - row.number("years")));
    }
    assertThat(worst).isLessThanOrEqualTo(1.2e-15);
  }

  private static BusinessCalendar brazil() {
    // National holidays on weekdays, from memory.
    Set<LocalDate> days =
        Set.of(
            date("2003-04-18"),
            date("2003-04-21"),
            date("2003-05-01"),
            date("2003-06-19"),
            date("2006-12-25"),
            date("2007-01-01"),
            date("2007-02-19"),
            date("2007-02-20"),
            date("2007-04-06"),
            date("2007-05-01"),
            date("2007-06-07"),
            date("2007-09-07"),
            date("2007-10-12"),
            date("2007-11-02"),
            date("2007-11-15"),
            date("2007-12-25"),
            date("2008-01-01"),
            date("2008-02-04"),
            date("2008-02-05"),
            date("2008-03-21"),
            date("2008-04-21"),
            date("2008-05-01"),
            date("2008-05-22"),
            date("2008-12-25"));
    return BusinessCalendar.of("brazil", days, 2003, 2009);
  }

  @Test
  void brazilianBillsCountTheirBusinessDays() {
    // Tesouro Nacional, methodology of Tesouro Direto, section on LTN: 134 days, 27.33 %, 879.43;
    // LTN guide: 511 days.
    LocalDate settlement = date("2003-03-21");
    LocalDate maturity = date("2003-10-01");
    CouponPeriod bill =
        new CouponPeriod(
            settlement,
            maturity,
            maturity,
            Frequency.ANNUAL,
            List.of(settlement, maturity),
            maturity,
            brazil());
    assertThat(DayCount.BUS_252.days(settlement, maturity, bill)).isEqualTo(134);
    double years = DayCount.BUS_252.years(settlement, maturity, bill);
    assertThat(years).isEqualTo(134 / 252.0);
    // The source cuts prices to the cent.
    assertThat(Math.floor(100000 * Math.pow(1.2733, -years)) / 100).isEqualTo(879.43);
    assertThat(Math.pow(1000 / 879.43, 1 / years) - 1).isCloseTo(0.2733, within(5e-5));
    assertThat(brazil().businessDays(date("2006-12-20"), date("2009-01-01"))).isEqualTo(511);
  }

  @Test
  void theDenominatorOfAct365LLooksAtThePeriod() {
    DayCount count = DayCount.ACT_365L;
    // Annual: 29 February within (start, end].
    CouponPeriod ends = period("2023-02-28", "2024-02-29", Frequency.ANNUAL);
    assertThat(count.periodYears(ends)).isEqualTo(366 / 366.0);
    CouponPeriod before = period("2023-02-28", "2024-02-28", Frequency.ANNUAL);
    assertThat(count.periodYears(before)).isEqualTo(365 / 365.0);
    CouponPeriod starts = period("2024-02-29", "2025-02-28", Frequency.ANNUAL);
    assertThat(count.periodYears(starts)).isEqualTo(365 / 365.0);
    CouponPeriod dayBefore = period("2024-02-28", "2025-02-28", Frequency.ANNUAL);
    assertThat(count.periodYears(dayBefore)).isEqualTo(366 / 366.0);
    // Others: the year in which the period ends.
    assertThat(count.periodYears(period("2023-07-01", "2024-01-01", Frequency.SEMI_ANNUAL)))
        .isEqualTo(184 / 366.0);
    assertThat(count.periodYears(period("2024-01-01", "2024-07-01", Frequency.SEMI_ANNUAL)))
        .isEqualTo(182 / 366.0);
    assertThat(count.periodYears(period("2024-07-01", "2025-01-01", Frequency.SEMI_ANNUAL)))
        .isEqualTo(184 / 365.0);
  }

  @Test
  void aRegularPeriodIsWorthItsShareOfTheYear() {
    for (Frequency frequency : Frequency.values()) {
      Schedule schedule = Schedule.of(ScheduleTerms.regular(date("2030-08-31"), frequency));
      for (CouponPeriod period : schedule.endingAfter(date("2020-01-15"))) {
        assertThat(DayCount.ACT_ACT_ICMA.periodYears(period)).isEqualTo(1.0 / frequency.perYear());
        for (DayCount count : thirties()) {
          assertThat(count.periodDays(period)).isEqualTo(360 / frequency.perYear());
          assertThat(count.periodYears(period)).isEqualTo(1.0 / frequency.perYear());
        }
      }
    }
  }

  private static List<DayCount> thirties() {
    return List.of(
        DayCount.THIRTY_360,
        DayCount.THIRTY_U_360,
        DayCount.THIRTY_E_360,
        DayCount.THIRTY_E_360_ISDA);
  }

  @Test
  void actualCountsAddUpOverAnyDivisionOfAPeriod() {
    long seed = 20261201;
    Random random = new Random(seed);
    for (int i = 0; i < 2000; i++) {
      LocalDate start = date("1990-01-01").plusDays(random.nextInt(20000));
      LocalDate end = start.plusDays(2 + random.nextInt(1500));
      LocalDate middle =
          start.plusDays(random.nextInt((int) ChronoUnit.DAYS.between(start, end) + 1));
      CouponPeriod period =
          Schedule.of(
                  ScheduleTerms.regular(end, Frequency.QUARTERLY)
                      .withIssue(start)
                      .withFirstCoupon(end))
              .at(start);
      for (DayCount count : DayCount.values()) {
        if (!thirties().contains(count)) {
          double whole = count.years(start, end, period);
          double parts = count.years(start, middle, period) + count.years(middle, end, period);
          assertThat(parts)
              .as("%s %s %s %s, seed %s", count, start, middle, end, seed)
              .isCloseTo(whole, within(4e-15));
        }
      }
    }
  }

  @Test
  void noDaysAreNoYears() {
    CouponPeriod period = period("2024-02-28", "2025-02-28", Frequency.ANNUAL);
    for (DayCount count : DayCount.values()) {
      assertThat(count.years(date("2024-02-29"), date("2024-02-29"), period)).isZero();
    }
  }

  @Test
  void everyLabelIsReadInEitherCaseAndUnknownOnesListAll() {
    List<String> labels = new ArrayList<>();
    for (DayCount count : DayCount.values()) {
      assertThat(DayCount.of(" " + count.label().toUpperCase(java.util.Locale.ROOT)))
          .isEqualTo(count);
      labels.add(count.label());
    }
    assertThat(labels)
        .containsExactly(
            "act/act-icma",
            "act/act-isda",
            "act/365f",
            "act/360",
            "act/365l",
            "30/360",
            "30u/360",
            "30e/360",
            "30e/360-isda",
            "bus/252");
    assertThatThrownBy(() -> DayCount.of("act/364"))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage("expected a day count, one of " + String.join(", ", labels));
  }

  @Test
  void fourCountsAskForThePeriodAndTheOthersDoNot() {
    LocalDate from = date("2024-01-31");
    LocalDate to = date("2024-03-31");
    for (DayCount count : DayCount.values()) {
      if (count.needsPeriod()) {
        assertThatThrownBy(() -> count.years(from, to))
            .isInstanceOf(IllegalArgumentException.class)
            .hasMessage(
                count.label() + " must know the coupon period that the dates lie in, found none");
      } else {
        CouponPeriod period = period("2024-01-31", "2024-03-31", Frequency.ANNUAL);
        assertThat(count.years(from, to)).isEqualTo(count.years(from, to, period)).isPositive();
      }
    }
  }

  @Test
  void datesOutsideThePeriodOrOutOfOrderAreRefused() {
    CouponPeriod period = period("2024-01-15", "2024-07-15", Frequency.SEMI_ANNUAL);
    DayCount count = DayCount.ACT_ACT_ICMA;
    assertThat(count.years(period.start(), period.end(), period)).isEqualTo(0.5);
    assertThatThrownBy(() -> count.years(date("2024-01-14"), date("2024-02-01"), period))
        .hasMessage(
            "dates must lie in the coupon period 2024-01-15 to 2024-07-15, found 2024-01-14 to"
                + " 2024-02-01");
    assertThatThrownBy(() -> count.days(date("2024-02-01"), date("2024-07-16"), period))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> DayCount.ACT_360.years(date("2024-02-02"), date("2024-02-01")))
        .hasMessage("dates must be in order, found 2024-02-02 to 2024-02-01");
  }
}
