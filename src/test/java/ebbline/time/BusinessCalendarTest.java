package ebbline.time;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.Set;
import org.junit.jupiter.api.Test;

class BusinessCalendarTest {
  private static final CalendarRegistry REGISTRY = CalendarRegistry.standard();

  private static LocalDate date(String text) {
    return LocalDate.parse(text);
  }

  private static List<String> weekdaysClosed(BusinessCalendar calendar, int year) {
    List<String> closed = new ArrayList<>();
    for (LocalDate day = LocalDate.of(year, 1, 1); day.getYear() == year; day = day.plusDays(1)) {
      if (BusinessCalendar.WEEKENDS.isBusinessDay(day) && !calendar.isBusinessDay(day)) {
        closed.add(day.toString());
      }
    }
    return closed;
  }

  @Test
  void yearsOfHolidaysAreThoseOfThePublishedLists() {
    List<ReferenceRows.Row> rows = ReferenceRows.read("holidays");
    for (ReferenceRows.Row row : rows) {
      assertThat(weekdaysClosed(REGISTRY.find(row.text("calendar")), row.whole("year")))
          .as(row.text("id"))
          .containsExactly(row.text("dates").split(" "));
    }
    assertThat(rows).hasSize(15);
  }

  @Test
  void oneOffHolidaysBeforeTheListsAreKept() {
    // From memory.
    BusinessCalendar london = REGISTRY.find("england-wales");
    assertThat(weekdaysClosed(london, 1981)).contains("1981-07-29");
    assertThat(weekdaysClosed(london, 1995)).contains("1995-05-08").doesNotContain("1995-05-01");
    assertThat(weekdaysClosed(london, 1999))
        .containsExactly(
            "1999-01-01",
            "1999-04-02",
            "1999-04-05",
            "1999-05-03",
            "1999-05-31",
            "1999-08-30",
            "1999-12-27",
            "1999-12-28",
            "1999-12-31");
    assertThat(weekdaysClosed(london, 2002))
        .contains("2002-06-03", "2002-06-04")
        .doesNotContain("2002-05-27");
    assertThat(weekdaysClosed(london, 2011)).contains("2011-04-29");
    assertThat(weekdaysClosed(london, 2012))
        .contains("2012-06-04", "2012-06-05")
        .doesNotContain("2012-05-28");
    assertThat(weekdaysClosed(london, 2016)).endsWith("2016-12-26", "2016-12-27");
  }

  @Test
  void theFederalReserveIsOpenOnFridaysBeforeSaturdayHolidays() {
    for (ReferenceRows.Row row : ReferenceRows.read("open-days")) {
      assertThat(REGISTRY.find(row.text("calendar")).isBusinessDay(row.date("date")))
          .as(row.text("id"))
          .isEqualTo(row.text("state").equals("open"));
    }
  }

  @Test
  void theNineteenthOfJuneIsAHolidayFrom2021() {
    BusinessCalendar reserve = REGISTRY.find("federal-reserve");
    assertThat(reserve.isBusinessDay(date("2020-06-19"))).isTrue();
    assertThat(reserve.isBusinessDay(date("2022-06-20"))).isFalse(); // 19 June on a Sunday
    assertThat(HolidayRules.federalReserve(2021)).contains(date("2021-06-19"));
    assertThat(HolidayRules.federalReserve(2020)).doesNotContain(date("2020-06-19"));
  }

  @Test
  void easterIsThatOfThePublishedTables() {
    for (ReferenceRows.Row row : ReferenceRows.read("easter")) {
      assertThat(HolidayRules.easter(row.whole("year")))
          .as(row.text("id"))
          .isEqualTo(row.date("date"));
    }
  }

  @Test
  void easterIsAlwaysASundayBetween22MarchAnd25April() {
    for (int year = 1583; year <= 4099; year++) {
      LocalDate easter = HolidayRules.easter(year);
      assertThat(easter.getDayOfWeek()).isEqualTo(java.time.DayOfWeek.SUNDAY);
      assertThat(easter).isBetween(LocalDate.of(year, 3, 22), LocalDate.of(year, 4, 25));
    }
  }

  @Test
  void rollsFollowTheDefinitions() {
    List<ReferenceRows.Row> rows = ReferenceRows.read("rolls");
    for (ReferenceRows.Row row : rows) {
      assertThat(
              Roll.of(row.text("roll"))
                  .apply(row.date("date"), REGISTRY.find(row.text("calendar"))))
          .as(row.text("id"))
          .isEqualTo(row.date("rolled"));
    }
    assertThat(rows).hasSize(10);
    BusinessCalendar weekends = BusinessCalendar.WEEKENDS;
    assertThat(Roll.NONE.apply(date("2026-01-31"), weekends)).isEqualTo(date("2026-01-31"));
    assertThat(Roll.MODIFIED_PRECEDING.apply(date("2026-01-31"), weekends))
        .isEqualTo(date("2026-01-30"));
    assertThat(Roll.MODIFIED_FOLLOWING.apply(date("2026-02-01"), weekends))
        .isEqualTo(date("2026-02-02"));
  }

  @Test
  void everyRollIsReadByItsLabelAndUnknownOnesListAll() {
    for (Roll roll : Roll.values()) {
      assertThat(Roll.of(roll.label().toUpperCase(java.util.Locale.ROOT) + " ")).isEqualTo(roll);
    }
    assertThatThrownBy(() -> Roll.of("nearest"))
        .hasMessage(
            "expected a roll, one of none, following, modified-following, preceding,"
                + " modified-preceding");
  }

  @Test
  void rolledDatesAreBusinessDaysAndBusinessDaysStay() {
    Random random = new Random(7);
    BusinessCalendar calendar = REGISTRY.find("target+england-wales");
    for (int i = 0; i < 3000; i++) {
      LocalDate day = date("2003-01-01").plusDays(random.nextInt(40000));
      for (Roll roll : Roll.values()) {
        LocalDate rolled = roll.apply(day, calendar);
        if (roll == Roll.NONE || calendar.isBusinessDay(day)) {
          assertThat(rolled).isEqualTo(day);
        } else {
          assertThat(calendar.isBusinessDay(rolled)).isTrue();
        }
        if (roll == Roll.MODIFIED_FOLLOWING || roll == Roll.MODIFIED_PRECEDING) {
          assertThat(rolled.getMonth()).isEqualTo(day.getMonth());
        }
      }
    }
  }

  @Test
  void addingAndTakingBusinessDaysUndoEachOther() {
    Random random = new Random(11);
    BusinessCalendar calendar = REGISTRY.find("federal-reserve");
    for (int i = 0; i < 2000; i++) {
      LocalDate day =
          Roll.FOLLOWING.apply(date("1990-01-01").plusDays(random.nextInt(50000)), calendar);
      int n = random.nextInt(60);
      LocalDate later = calendar.plusBusinessDays(day, n);
      assertThat(calendar.plusBusinessDays(later, -n)).isEqualTo(day);
      assertThat(calendar.businessDays(day, later)).isEqualTo(n);
      assertThat(calendar.businessDays(later, day)).isEqualTo(-n);
    }
  }

  @Test
  void settlementFromAWeekendCountsFromTheNextBusinessDay() {
    BusinessCalendar weekends = BusinessCalendar.WEEKENDS;
    LocalDate saturday = date("2026-01-31");
    assertThat(weekends.plusBusinessDays(saturday, 0)).isEqualTo(saturday);
    assertThat(weekends.plusBusinessDays(saturday, 1)).isEqualTo(date("2026-02-02"));
    assertThat(weekends.plusBusinessDays(saturday, -1)).isEqualTo(date("2026-01-30"));
  }

  @Test
  void aGiltGoesExSevenBusinessDaysBefore() {
    // 2 and 3 June 2022 were bank holidays: derived.
    ExDividend gilt = ExDividend.businessDays(7, REGISTRY.find("england-wales"));
    LocalDate coupon = date("2022-06-07");
    assertThat(gilt.dateFor(coupon)).isEqualTo(date("2022-05-25"));
    assertThat(gilt.applies(date("2022-05-24"), coupon)).isFalse();
    assertThat(gilt.applies(date("2022-05-25"), coupon)).isTrue();
    assertThat(gilt.applies(date("2022-06-06"), coupon)).isTrue();
    assertThat(gilt.applies(coupon, coupon)).isFalse();
    ExDividend australian = ExDividend.calendarDays(7);
    assertThat(australian.dateFor(coupon)).isEqualTo(date("2022-05-31"));
    assertThat(ExDividend.never().applies(date("2022-06-06"), coupon)).isFalse();
    assertThatThrownBy(() -> ExDividend.calendarDays(-1))
        .hasMessage("ex_days must be at least 0, found -1");
  }

  @Test
  void aCalendarAnswersForItsYearsOnly() {
    for (String name : List.of("target", "federal-reserve", "england-wales")) {
      BusinessCalendar calendar = REGISTRY.find(name);
      int first = calendar.firstYear();
      int last = calendar.lastYear();
      assertThat(calendar.isBusinessDay(LocalDate.of(first, 1, 1))).isFalse();
      calendar.isBusinessDay(LocalDate.of(last, 12, 31));
      for (LocalDate out : List.of(LocalDate.of(first - 1, 12, 31), LocalDate.of(last + 1, 1, 1))) {
        assertThatThrownBy(() -> calendar.isBusinessDay(out))
            .isInstanceOf(IllegalArgumentException.class)
            .hasMessage(
                "the calendar '%s' knows the years %d to %d, found %s", name, first, last, out);
      }
    }
    assertThat(REGISTRY.find("target").firstYear()).isEqualTo(2002);
    assertThat(REGISTRY.find("federal-reserve").firstYear()).isEqualTo(1986);
    assertThat(REGISTRY.find("england-wales").firstYear()).isEqualTo(1978);
    assertThat(REGISTRY.find("target").lastYear()).isEqualTo(2199);
  }

  @Test
  void joinedCalendarsAreClosedWhenEitherIs() {
    BusinessCalendar joined = REGISTRY.find(" Target + FEDERAL-reserve ");
    assertThat(joined.name()).isEqualTo("target+federal-reserve");
    assertThat(joined.isBusinessDay(date("2025-05-01"))).isFalse(); // TARGET
    assertThat(joined.isBusinessDay(date("2025-07-04"))).isFalse(); // Federal Reserve
    assertThat(joined.isBusinessDay(date("2025-07-03"))).isTrue();
    assertThat(joined.firstYear()).isEqualTo(2002);
    assertThat(joined.lastYear()).isEqualTo(2199);
    BusinessCalendar target = REGISTRY.find("target");
    BusinessCalendar reserve = REGISTRY.find("federal-reserve");
    for (LocalDate day = date("2002-01-01"); day.getYear() < 2030; day = day.plusDays(1)) {
      assertThat(joined.isBusinessDay(day))
          .isEqualTo(target.isBusinessDay(day) && reserve.isBusinessDay(day));
    }
  }

  @Test
  void aUsersHolidaysMakeACalendarOfTheirOwn() {
    BusinessCalendar own = BusinessCalendar.of("My-Bank", Set.of(date("2026-03-02")), 2026, 2026);
    assertThat(own.name()).isEqualTo("my-bank");
    assertThat(own.isBusinessDay(date("2026-03-02"))).isFalse();
    assertThat(own.isBusinessDay(date("2026-03-03"))).isTrue();
    CalendarRegistry more = REGISTRY.with(own);
    assertThat(more.find("MY-BANK+target").isBusinessDay(date("2026-03-02"))).isFalse();
    assertThatThrownBy(() -> more.with(own)).hasMessageContaining("must be new, found 'my-bank'");
    assertThatThrownBy(() -> REGISTRY.find("my-bank"))
        .hasMessage(
            "expected calendars joined with +, each one of england-wales, federal-reserve, target,"
                + " weekends");
    assertThatThrownBy(() -> REGISTRY.find("target+")).isInstanceOf(IllegalArgumentException.class);
    BusinessCalendar old = BusinessCalendar.of("old", Set.of(), 1900, 2001);
    assertThatThrownBy(() -> old.join(REGISTRY.find("target")))
        .hasMessage(
            "calendars must know a year in common, found 'old' of 1900 to 2001 and 'target' of 2002"
                + " to 2199");
  }

  @Test
  void whatCannotBeACalendarIsRefusedInWords() {
    Set<LocalDate> none = Set.of();
    assertThatThrownBy(() -> BusinessCalendar.of("a+b", none, 2000, 2001))
        .hasMessage("a calendar's name must be letters, digits and hyphens, found 'a+b'");
    assertThatThrownBy(() -> BusinessCalendar.of("", none, 2000, 2001))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> BusinessCalendar.of("a", none, 2001, 2000))
        .hasMessage("a calendar's years must run upwards within 1 to 9999, found 2001 to 2000");
    assertThatThrownBy(() -> BusinessCalendar.of("a", none, 0, 2000))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> BusinessCalendar.of("a", none, 2000, 10000))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> BusinessCalendar.of("a", Set.of(date("1999-12-31")), 2000, 2001))
        .hasMessage("a holiday must lie in the calendar's years 2000 to 2001, found 1999-12-31");
    assertThatThrownBy(() -> BusinessCalendar.of("a", Set.of(date("2002-01-01")), 2000, 2001))
        .isInstanceOf(IllegalArgumentException.class);
    assertThat(
            BusinessCalendar.of("a", Set.of(date("2001-12-31")), 2000, 2001)
                .isBusinessDay(date("2001-12-31")))
        .isFalse();
  }
}
