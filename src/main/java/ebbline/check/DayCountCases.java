package ebbline.check;

import ebbline.time.CouponPeriod;
import ebbline.time.DayCount;
import ebbline.time.Frequency;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Days and years between two dates. */
final class DayCountCases implements BondCases.Computation {
  private static final double WHOLE_DAYS = 1e-9;

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all) {
    if (!c.topic().equals("day count")) {
      return Optional.empty();
    }
    LocalDate start = LocalDate.parse(in.text("start"));
    LocalDate end = LocalDate.parse(in.text("end"));
    if (c.id().startsWith("DC-ACTACT-")) {
      return Optional.of(years(c, in, start, end));
    }
    if (c.id().equals("DC-NASD-order-MS")) {
      return Optional.of(
          CaseResult.notComputed(c, "this order of the rules is not one of the program's"));
    }
    DayCount dayCount =
        in.has("rule") ? DayCount.THIRTY_U_360 : thirtyDayCount(in.text("convention"));
    boolean termination = in.has("end_is_termination") && in.flag("end_is_termination");
    LocalDate last = end.isAfter(start) ? end : end.plusDays(1);
    CouponPeriod period =
        CouponPeriod.regular(start, last, Frequency.ANNUAL, termination ? end : last.plusYears(1));
    return Optional.of(
        CaseResult.of(
            c,
            "days by " + dayCount.label(),
            (double) dayCount.days(start, end, period),
            WHOLE_DAYS,
            ""));
  }

  private static DayCount thirtyDayCount(String convention) {
    return switch (convention) {
      case "30/360 bond basis", "30/360" -> DayCount.THIRTY_360;
      case "30E/360" -> DayCount.THIRTY_E_360;
      case "30E/360 (ISDA)", "30E/360 ISDA" -> DayCount.THIRTY_E_360_ISDA;
      default -> throw new IllegalArgumentException("no day count '" + convention + "'");
    };
  }

  private static CaseResult years(PublishedCase c, CaseInputs in, LocalDate start, LocalDate end) {
    return switch (BondCases.part(c)) {
      case "ISDA" ->
          CaseResult.of(c, "years by act/act-isda", DayCount.ACT_ACT_ISDA.years(start, end));
      case "ICMA" ->
          CaseResult.of(
              c,
              "years by act/act-icma",
              DayCount.ACT_ACT_ICMA.years(start, end, period(c, in, start, end)));
      default -> CaseResult.notComputed(c, "this day count is not one of the program's");
    };
  }

  /** Quasi-periods go on from the start of a last period and back from the end of any other. */
  private static CouponPeriod period(
      PublishedCase c, CaseInputs in, LocalDate start, LocalDate end) {
    Frequency frequency = Frequency.of(in.integer("f"));
    List<LocalDate> reference = new ArrayList<>();
    if (c.id().contains("-final")) {
      LocalDate date = start;
      for (int k = 1; date.isBefore(end); k++) {
        reference.add(date);
        date = start.plusMonths((long) k * frequency.months());
      }
      reference.add(date);
    } else {
      LocalDate date = end;
      for (int k = 1; date.isAfter(start); k++) {
        reference.add(date);
        date = end.minusMonths((long) k * frequency.months());
      }
      reference.add(date);
      Collections.reverse(reference);
    }
    CouponPeriod plain = CouponPeriod.regular(start, end, frequency, end);
    return new CouponPeriod(
        start, end, end, frequency, reference, end.plusYears(1), plain.calendar());
  }
}
