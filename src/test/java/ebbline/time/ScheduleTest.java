package ebbline.time;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class ScheduleTest {
  private static LocalDate date(String text) {
    return LocalDate.parse(text);
  }

  private static ScheduleTerms terms(String maturity, int frequency) {
    return ScheduleTerms.regular(date(maturity), Frequency.of(frequency));
  }

  private static List<String> ends(Schedule schedule, String after) {
    return schedule.endingAfter(date(after)).stream().map(p -> p.end().toString()).toList();
  }

  @Test
  void monthStepsKeepToTheirDayOrToTheEndOfTheMonth() {
    for (ReferenceRows.Row row : ReferenceRows.read("month-steps")) {
      boolean endOfMonth = row.text("end_of_month").equals("yes");
      assertThat(MonthCycle.of(row.date("date"), endOfMonth).date(row.whole("months")))
          .as(row.text("id"))
          .isEqualTo(row.date("result"));
    }
  }

  @Test
  void couponDatesAndDaysAgreeWithASpreadsheet() {
    List<ReferenceRows.Row> rows = ReferenceRows.read("coupon-dates");
    for (ReferenceRows.Row row : rows) {
      LocalDate settlement = row.date("settlement");
      Schedule schedule =
          Schedule.of(
              ScheduleTerms.regular(row.date("maturity"), Frequency.of(row.whole("frequency")))
                  .withEndOfMonth(true));
      CouponPeriod period = schedule.at(settlement);
      DayCount count = DayCount.of(row.text("day_count"));
      Object found =
          switch (row.text("function")) {
            case "COUPPCD" -> period.start();
            case "COUPNCD" -> period.end();
            case "COUPNUM" -> schedule.endingAfter(settlement).size();
            case "COUPDAYBS" -> count.days(period.start(), settlement, period);
            case "COUPDAYS" -> count.periodDays(period);
            case "COUPDAYSNC" -> count.days(settlement, period.end(), period);
            default -> throw new IllegalStateException(row.text("function"));
          };
      assertThat(found).as(row.text("id")).hasToString(row.text("value"));
    }
    assertThat(rows).hasSize(16);
  }

  @Test
  void shortMonthsDoNotShortenTheOthers() {
    assertThat(ends(Schedule.of(terms("2024-05-31", 12)), "2023-12-31"))
        .containsExactly("2024-01-31", "2024-02-29", "2024-03-31", "2024-04-30", "2024-05-31");
    assertThat(ends(Schedule.of(terms("2028-02-29", 1)), "2023-12-31"))
        .containsExactly("2024-02-29", "2025-02-28", "2026-02-28", "2027-02-28", "2028-02-29");
    assertThat(ends(Schedule.of(terms("2024-02-29", 2)), "2022-12-31"))
        .containsExactly("2023-02-28", "2023-08-29", "2024-02-29");
    assertThat(ends(Schedule.of(terms("2024-02-29", 2).withEndOfMonth(true)), "2022-12-31"))
        .containsExactly("2023-02-28", "2023-08-31", "2024-02-29");
    assertThat(ends(Schedule.of(terms("2024-02-28", 2).withEndOfMonth(true)), "2022-12-31"))
        .containsExactly("2023-02-28", "2023-08-28", "2024-02-28");
  }

  @Test
  void theFirstCouponShowsTheDayThatAShortMonthHides() {
    Schedule schedule =
        Schedule.of(
            terms("2026-02-28", 2)
                .withIssue(date("2024-06-10"))
                .withFirstCoupon(date("2024-08-31")));
    assertThat(ends(schedule, "2024-01-01"))
        .containsExactly("2024-08-31", "2025-02-28", "2025-08-31", "2026-02-28");
  }

  @Test
  void anIssueBetweenRegularDatesMakesAShortFirstPeriod() {
    Schedule schedule = Schedule.of(terms("2026-03-15", 2).withIssue(date("2025-01-20")));
    CouponPeriod first = schedule.all().get(0);
    assertThat(first.start()).isEqualTo(date("2025-01-20"));
    assertThat(first.end()).isEqualTo(date("2025-03-15"));
    assertThat(first.reference()).containsExactly(date("2024-09-15"), date("2025-03-15"));
    assertThat(first.isRegular()).isFalse();
    assertThat(schedule.all().get(1).isRegular()).isTrue();
    assertThat(schedule.all()).hasSize(3);
    // An issue on a regular date makes none.
    List<CouponPeriod> whole =
        Schedule.of(terms("2026-03-15", 2).withIssue(date("2025-03-15"))).all();
    assertThat(whole).hasSize(2).allMatch(CouponPeriod::isRegular);
  }

  @Test
  void aFirstCouponMakesALongFirstPeriod() {
    Schedule schedule =
        Schedule.of(
            terms("2005-08-15", 2)
                .withIssue(date("1985-07-02"))
                .withFirstCoupon(date("1986-02-15")));
    CouponPeriod first = schedule.all().get(0);
    assertThat(first.end()).isEqualTo(date("1986-02-15"));
    assertThat(first.reference())
        .containsExactly(date("1985-02-15"), date("1985-08-15"), date("1986-02-15"));
    assertThat(schedule.all()).hasSize(40);
  }

  @Test
  void aLastCouponMakesAnOddLastPeriod() {
    Schedule longLast =
        Schedule.of(
            terms("2026-05-10", 4)
                .withIssue(date("2025-01-15"))
                .withLastCoupon(date("2026-01-15")));
    CouponPeriod last = longLast.at(date("2026-05-09"));
    assertThat(last.start()).isEqualTo(date("2026-01-15"));
    assertThat(last.reference())
        .containsExactly(date("2026-01-15"), date("2026-04-15"), date("2026-07-15"));
    assertThat(ends(longLast, "2025-01-01"))
        .containsExactly("2025-04-15", "2025-07-15", "2025-10-15", "2026-01-15", "2026-05-10");
    Schedule shortLast = Schedule.of(terms("2026-03-01", 4).withLastCoupon(date("2026-01-15")));
    assertThat(shortLast.at(date("2026-02-01")).reference())
        .containsExactly(date("2026-01-15"), date("2026-04-15"));
    Schedule whole = Schedule.of(terms("2026-04-15", 4).withLastCoupon(date("2026-01-15")));
    assertThat(whole.at(date("2026-02-01")).isRegular()).isTrue();
  }

  @Test
  void paymentsRollAndAccrualRollsOnlyWhereTheTermsSaySo() {
    BusinessCalendar target = CalendarRegistry.standard().find("target");
    ScheduleTerms terms = terms("2025-11-30", 2); // a Sunday
    LocalDate day = date("2025-06-15");
    CouponPeriod still =
        Schedule.of(terms.withRoll(target, Roll.FOLLOWING, ScheduleTerms.AccrualDates.UNADJUSTED))
            .at(day);
    assertThat(still.end()).isEqualTo(date("2025-11-30"));
    assertThat(still.payment()).isEqualTo(date("2025-12-01"));
    CouponPeriod moved =
        Schedule.of(terms.withRoll(target, Roll.FOLLOWING, ScheduleTerms.AccrualDates.ADJUSTED))
            .at(day);
    assertThat(moved.start()).isEqualTo(date("2025-05-30"));
    assertThat(moved.end()).isEqualTo(date("2025-12-01"));
    assertThat(moved.maturity()).isEqualTo(date("2025-12-01"));
    assertThat(moved.isRegular()).isTrue();
  }

  @Test
  void aCouponPaidLateIsStillDueAfterItsPeriod() {
    Schedule schedule =
        Schedule.of(
            terms("2025-11-30", 2)
                .withRoll(
                    BusinessCalendar.WEEKENDS,
                    Roll.FOLLOWING,
                    ScheduleTerms.AccrualDates.UNADJUSTED));
    assertThat(schedule.paidAfter(date("2025-11-30"))).hasSize(1);
    assertThat(schedule.paidAfter(date("2025-12-01"))).isEmpty();
    assertThat(schedule.endingAfter(date("2025-11-30"))).isEmpty();
    assertThat(schedule.paidAfter(date("2025-05-29"))).hasSize(2);
    assertThat(schedule.paidAfter(date("2025-05-30"))).hasSize(1);
  }

  @Test
  void periodsTileTheBondsLife() {
    long seed = 31;
    Random random = new Random(seed);
    BusinessCalendar target = CalendarRegistry.standard().find("target");
    for (int i = 0; i < 600; i++) {
      Frequency frequency = Frequency.of(List.of(1, 2, 4, 12).get(random.nextInt(4)));
      LocalDate issue = date("2003-01-01").plusDays(random.nextInt(9000));
      LocalDate maturity = issue.plusDays(400 + random.nextInt(9000));
      ScheduleTerms terms =
          ScheduleTerms.regular(maturity, frequency)
              .withIssue(issue)
              .withEndOfMonth(random.nextBoolean());
      if (random.nextBoolean()) {
        terms = terms.withLastCoupon(maturity.minusDays(1 + random.nextInt(390)));
      }
      if (random.nextBoolean()) {
        terms =
            terms.withRoll(target, Roll.MODIFIED_FOLLOWING, ScheduleTerms.AccrualDates.UNADJUSTED);
      }
      List<CouponPeriod> all = Schedule.of(terms).all();
      String context = terms + " seed " + seed;
      assertThat(all.get(0).start()).as(context).isEqualTo(issue);
      assertThat(all.get(all.size() - 1).end()).as(context).isEqualTo(maturity);
      for (int k = 0; k < all.size(); k++) {
        CouponPeriod period = all.get(k);
        if (k > 0) {
          assertThat(period.start()).as(context).isEqualTo(all.get(k - 1).end());
        }
        boolean odd = k == 0 || k == all.size() - 1;
        assertThat(odd || period.isRegular()).as(context).isTrue();
        assertThat(ChronoUnit.DAYS.between(period.end(), period.payment()))
            .as(context)
            .isBetween(-5L, 5L);
        LocalDate inside =
            period
                .start()
                .plusDays(
                    random.nextInt((int) ChronoUnit.DAYS.between(period.start(), period.end())));
        assertThat(Schedule.of(terms).at(inside)).as(context).isEqualTo(period);
        assertThat(Schedule.of(terms).endingAfter(inside)).as(context).hasSize(all.size() - k);
      }
    }
  }

  @Test
  void datesThatContradictEachOtherAreRefusedInWords() {
    ScheduleTerms terms = terms("2030-06-15", 2);
    assertThatThrownBy(() -> Schedule.of(terms.withIssue(date("2030-06-15"))))
        .hasMessage("issue must lie before maturity 2030-06-15, found 2030-06-15");
    assertThatThrownBy(() -> Schedule.of(terms.withLastCoupon(date("2030-06-15"))))
        .hasMessage("last_coupon must lie before maturity 2030-06-15, found 2030-06-15");
    assertThatThrownBy(() -> Schedule.of(terms.withFirstCoupon(date("2029-06-15"))))
        .hasMessage("first_coupon needs an issue date to accrue from, found none");
    ScheduleTerms issued = terms.withIssue(date("2029-02-01"));
    assertThatThrownBy(() -> Schedule.of(issued.withFirstCoupon(date("2029-02-01"))))
        .hasMessage("issue must lie before first_coupon 2029-02-01, found 2029-02-01");
    assertThatThrownBy(() -> Schedule.of(issued.withFirstCoupon(date("2030-06-16"))))
        .hasMessage("first_coupon must not lie after maturity, found 2030-06-16");
    assertThatThrownBy(
            () ->
                Schedule.of(
                    issued.withLastCoupon(date("2030-01-15")).withFirstCoupon(date("2030-02-15"))))
        .hasMessage("first_coupon must not lie after last_coupon, found 2030-02-15");
    assertThatThrownBy(() -> Schedule.of(issued.withLastCoupon(date("2029-02-01"))))
        .hasMessage("issue must lie before last_coupon 2029-02-01, found 2029-02-01");
    assertThatThrownBy(() -> Schedule.of(issued.withFirstCoupon(date("2029-06-16"))))
        .hasMessage(
            "first_coupon must be a whole number of periods before maturity (or give"
                + " last_coupon), such as 2029-06-15, found 2029-06-16");
    assertThat(Schedule.of(issued.withFirstCoupon(date("2030-06-15"))).all()).hasSize(1);
  }

  @Test
  void aDateOutsideTheBondsLifeHasNoPeriod() {
    Schedule schedule = Schedule.of(terms("2030-06-15", 2).withIssue(date("2029-02-01")));
    assertThat(schedule.at(date("2029-02-01")).end()).isEqualTo(date("2029-06-15"));
    assertThat(schedule.at(date("2030-06-14")).end()).isEqualTo(date("2030-06-15"));
    assertThatThrownBy(() -> schedule.at(date("2029-01-31")))
        .hasMessage("interest accrues from the issue 2029-02-01 on, found 2029-01-31");
    assertThatThrownBy(() -> schedule.at(date("2030-06-15")))
        .hasMessage("interest accrues before maturity 2030-06-15 only, found 2030-06-15");
    assertThatThrownBy(() -> Schedule.of(terms("2030-06-15", 2)).all())
        .hasMessage("all periods need an issue date to start from, found none");
  }

  @Test
  void twoHundredYearsAreTheLongestLife() {
    Schedule schedule = Schedule.of(terms("2200-06-15", 1));
    assertThat(schedule.endingAfter(date("2000-06-15"))).hasSize(200);
    assertThatThrownBy(() -> schedule.paidAfter(date("2000-06-14")))
        .hasMessage("maturity must lie within 200 years of 2000-06-14, found 2200-06-15");
  }

  @Test
  void frequenciesAreFour() {
    for (Frequency frequency : Frequency.values()) {
      assertThat(Frequency.of(frequency.perYear())).isEqualTo(frequency);
      assertThat(Frequency.parse(" " + frequency.perYear() + " ")).isEqualTo(frequency);
      assertThat(frequency.months() * frequency.perYear()).isEqualTo(12);
    }
    assertThatThrownBy(() -> Frequency.of(3))
        .hasMessage("frequency must be 1, 2, 4 or 12, found 3");
    assertThatThrownBy(() -> Frequency.parse("02"))
        .hasMessage("expected 1, 2, 4 or 12 payments a year");
  }

  @Test
  void aPeriodMustHoldTogether() {
    LocalDate start = date("2026-01-15");
    LocalDate end = date("2026-07-15");
    assertThatThrownBy(() -> CouponPeriod.regular(end, end, Frequency.SEMI_ANNUAL, end))
        .hasMessage("a period must start before it ends, found 2026-07-15 to 2026-07-15");
    for (List<LocalDate> reference :
        List.of(
            List.of(start),
            List.of(start.plusDays(1), end),
            List.of(start, end.minusDays(1)),
            List.of(start, start, end))) {
      assertThatThrownBy(
              () ->
                  new CouponPeriod(
                      start,
                      end,
                      end,
                      Frequency.SEMI_ANNUAL,
                      reference,
                      end,
                      BusinessCalendar.WEEKENDS))
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessageContaining("reference dates must");
    }
  }
}
