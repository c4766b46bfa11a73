package ebbline.check;

import ebbline.time.BusinessCalendar;
import ebbline.time.CalendarRegistry;
import ebbline.time.ExDividend;
import ebbline.time.Frequency;
import ebbline.time.Roll;
import ebbline.time.Schedule;
import ebbline.time.ScheduleTerms;
import java.time.DayOfWeek;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;

/** Holidays, rolls, ends of months and ex-dividend days. */
final class CalendarCases implements BondCases.Computation {

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all) {
    if (c.id().startsWith("CAL-EASTER-")) {
      return easter(in.integer("year"))
          .map(day -> CaseResult.ofText(c, "Easter Sunday", day.toString()));
    } else if (c.id().matches("CAL-(TARGET|USFED|UKEW)-.*")) {
      return Optional.of(
          CaseResult.ofText(c, "weekdays closed", closed(calendar(c.id()), in.integer("year"))));
    } else if (c.id().startsWith("CAL-USFEDOPEN-")) {
      boolean open = calendar(c.id()).isBusinessDay(LocalDate.parse(in.text("date")));
      return Optional.of(
          CaseResult.ofText(c, "whether the Reserve Banks are open", open ? "open" : "holiday"));
    } else if (c.id().startsWith("CAL-ADJ-")) {
      return roll(in.text("convention"))
          .map(roll -> roll.apply(LocalDate.parse(in.text("date")), find("target")))
          .map(day -> CaseResult.ofText(c, "rolled date", day.toString()));
    } else if (c.id().startsWith("CAL-EOM-")) {
      return Optional.of(CaseResult.ofText(c, "months away", shifted(in).toString()));
    } else if (c.id().startsWith("GILT-XD-")) {
      LocalDate coupon = LocalDate.parse(in.text("coupon_date"));
      return Optional.of(
          CaseResult.ofText(
              c,
              "ex-dividend date",
              ExDividend.businessDays(7, find("england-wales")).dateFor(coupon).toString()));
    }
    return Optional.empty();
  }

  private static BusinessCalendar find(String name) {
    return CalendarRegistry.standard().find(name);
  }

  private static BusinessCalendar calendar(String id) {
    return find(
        id.startsWith("CAL-TARGET")
            ? "target"
            : id.startsWith("CAL-USFED") ? "federal-reserve" : "england-wales");
  }

  private static String closed(BusinessCalendar calendar, int year) {
    LocalDate first = LocalDate.of(year, 1, 1);
    return first
        .datesUntil(first.plusYears(1))
        .filter(day -> day.getDayOfWeek().getValue() <= 5 && !calendar.isBusinessDay(day))
        .map(LocalDate::toString)
        .collect(Collectors.joining(" "));
  }

  /** The Sunday between a Friday and a Monday on which TARGET is closed in spring. */
  private static Optional<LocalDate> easter(int year) {
    BusinessCalendar target = find("target");
    if (year > target.lastYear()) {
      return Optional.empty();
    }
    LocalDate from = LocalDate.of(year, 3, 22);
    return from.datesUntil(LocalDate.of(year, 4, 26))
        .filter(day -> day.getDayOfWeek() == DayOfWeek.SUNDAY)
        .filter(
            day ->
                !target.isBusinessDay(day.minusDays(2)) && !target.isBusinessDay(day.plusDays(1)))
        .findFirst();
  }

  private static Optional<Roll> roll(String name) {
    return switch (name) {
      case "FOLLOWING" -> Optional.of(Roll.FOLLOWING);
      case "MODFOLLOWING" -> Optional.of(Roll.MODIFIED_FOLLOWING);
      case "PRECEDING" -> Optional.of(Roll.PRECEDING);
      case "MODPRECEDING" -> Optional.of(Roll.MODIFIED_PRECEDING);
      default -> Optional.empty();
    };
  }

  /** The neighbouring date of a schedule that has this one among its dates. */
  private static LocalDate shifted(CaseInputs in) {
    LocalDate date = LocalDate.parse(in.text("date"));
    int months = in.integer("months");
    Frequency frequency = Frequency.of(12 / Math.abs(months));
    if (months < 0) {
      Schedule back =
          Schedule.of(ScheduleTerms.regular(date, frequency).withEndOfMonth(in.flag("eom")));
      return back.at(date.minusDays(1)).start();
    }
    Schedule onwards =
        Schedule.of(
            ScheduleTerms.regular(date.plusDays(20), frequency)
                .withLastCoupon(date)
                .withEndOfMonth(in.flag("eom")));
    List<LocalDate> reference = onwards.at(date).reference();
    return reference.get(1);
  }
}
