package ebbline.check;

import ebbline.bond.BillYield;
import ebbline.bond.DiscountMargin;
import ebbline.bond.FirstFraction;
import ebbline.bond.PeriodYield;
import ebbline.instrument.PeriodFlows;
import ebbline.time.DayCount;
import ebbline.time.Frequency;
import ebbline.time.Schedule;
import ebbline.time.ScheduleTerms;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Examples of 31 CFR 356, Appendix B: accruals, prices, floating-rate notes, bills. */
final class TreasuryCases implements BondCases.Computation {
  /** The regulation's own figures of II.F and IV.E carry rounded intermediate results. */
  private static final double ROUNDED_BY_THE_SOURCE = 1e-6;

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all) {
    if (!c.id().startsWith("CFR-") && !c.id().matches("PROP-(par|zero|neg).*")) {
      return Optional.empty();
    }
    CaseInputs base = in.has("as") ? all.get(in.text("as")) : in;
    if (c.id().startsWith("CFR-I-")) {
      return accrual(c, in, base);
    } else if (c.id().startsWith("CFR-II-") || c.id().startsWith("PROP-")) {
      return Optional.of(fixed(c, base));
    } else if (c.id().startsWith("CFR-IV-")) {
      return floating(c, base);
    }
    return c.id().startsWith("CFR-VI-") ? bill(c, in) : Optional.empty();
  }

  /** Interest of a day as the Treasury's tables print it, to nine decimals. */
  private static double daily(double couponPercent, double par, double halfYearDays) {
    double exact = couponPercent / 200 * par / halfYearDays;
    return BigDecimal.valueOf(exact).setScale(9, RoundingMode.HALF_UP).doubleValue();
  }

  private static Optional<CaseResult> accrual(PublishedCase c, CaseInputs in, CaseInputs base) {
    if (c.id().startsWith("CFR-I-T2-")) {
      double exact = in.number("rate_pct") / 200 * in.number("par") / in.number("half_year_days");
      return Optional.of(CaseResult.of(c, "interest of a day", exact));
    } else if (c.id().equals("CFR-I-A1")) {
      return Optional.of(
          CaseResult.of(
              c,
              "half-year's interest",
              in.number("coupon_pct") / 200 * in.number("par"),
              1e-9,
              ""));
    } else if (!c.id().matches("CFR-I-(A3|A4|D1|D2).*")) {
      return Optional.empty();
    }
    double coupon = base.number("coupon_pct");
    double par = base.number("par");
    double interest = 0;
    if (base.has("stub_days")) {
      interest =
          coupon / 200 * par + base.integer("stub_days") * daily(coupon, par, base.number("s"));
    } else if (base.text("days").startsWith("[")) {
      double[] days = base.numbers("days");
      double[] halves = base.numbers("s");
      for (int i = 0; i < days.length; i++) {
        interest += days[i] * daily(coupon, par, halves[i]);
      }
    } else {
      interest = base.number("days") * daily(coupon, par, base.number("s"));
    }
    return Optional.of(
        CaseResult.of(c, "interest accrued", interest * in.number("par", par) / par));
  }

  /**
   * Sections II.A to II.F as one: an odd first flow, n regular ones, simple interest to the first.
   */
  private static CaseResult fixed(PublishedCase c, CaseInputs in) {
    double half = in.number("C") / 2;
    double rate = in.number("i");
    double s = in.number("s");
    double w = in.number("r") / s;
    int n = in.integer("n");
    double first;
    double accrued;
    boolean reopensInLongFirst = in.has("r'") && !in.has("s''");
    if (reopensInLongFirst) {
      first = in.number("r'") / s * half;
      accrued = (in.number("r'") - in.number("r")) / s * half;
    } else if (in.has("r'")) {
      double stub = in.number("r'") / in.number("s''") * half;
      first = stub + half;
      accrued = stub + (1 - w) * half;
    } else if (in.has("accrual_start") || c.id().equals("PROP-par-D")) {
      first = half;
      accrued = (1 - w) * half;
    } else {
      first = w * half;
      accrued = 0;
    }
    double[] amounts = new double[n + 1];
    Arrays.fill(amounts, half);
    amounts[0] = first;
    amounts[n] += 100;
    double dirty =
        new PeriodYield(new PeriodFlows(2, w, amounts), FirstFraction.SIMPLE).price(rate);
    double tolerance = c.id().startsWith("CFR-II-F") ? ROUNDED_BY_THE_SOURCE : tolerance(c);
    return switch (BondCases.part(c)) {
      case "vn" -> CaseResult.of(c, "v^n", powers(rate, n, true), tolerance, "");
      case "an" -> CaseResult.of(c, "a_n", powers(rate, n, false), tolerance, "");
      case "A" ->
          c.id().equals("CFR-II-A")
              ? CaseResult.of(c, "price", dirty - accrued, tolerance, "")
              : CaseResult.of(c, "accrued interest", accrued, tolerance, "");
      case "PA" -> CaseResult.of(c, "price with accrued interest", dirty, tolerance, "");
      default -> CaseResult.of(c, "price", dirty - accrued, tolerance, "");
    };
  }

  private static double tolerance(PublishedCase c) {
    return c.reference().contains(".") ? CaseResult.halfUnit(c.reference()) : 1e-9;
  }

  /** Value of 1 after n half-years, or of 1 at the end of each. */
  private static double powers(double rate, int n, boolean last) {
    double[] amounts = new double[n];
    Arrays.fill(amounts, last ? 0 : 1);
    amounts[n - 1] = 1;
    return new PeriodYield(new PeriodFlows(2, 1, amounts), FirstFraction.COMPOUND).price(rate);
  }

  private static Optional<CaseResult> floating(PublishedCase c, CaseInputs in) {
    if (in.has("discount_rate")) {
      double price = BillYield.priceAtDiscount(in.number("discount_rate"), in.number("days"), 360);
      return Optional.of(
          c.id().contains("billpx")
              ? CaseResult.of(c, "price of the bill", price)
              : CaseResult.of(
                  c,
                  "index rate, per cent",
                  100 * BillYield.simpleYield(price, in.number("days"), 360)));
    }
    DiscountMargin note = new DiscountMargin(in.number("index_rate"), in.number("spread"));
    LocalDate settlement = LocalDate.parse(in.text(in.has("settle") ? "settle" : "issue"));
    double accrued = accrued(in, note, settlement);
    double dirty = note.price(accrued, days(in, settlement), in.number("discount_margin"));
    boolean rounded = c.id().endsWith("-rounded");
    double tolerance =
        rounded || c.id().startsWith("CFR-IV-E") ? ROUNDED_BY_THE_SOURCE : tolerance(c);
    if (rounded) {
      return Optional.of(
          CaseResult.of(
              c,
              "price with accrued interest",
              dirty,
              tolerance,
              "the source rounds on the way; compared at 1e-6"));
    }
    return Optional.of(
        switch (BondCases.part(c)) {
          case "AI" -> CaseResult.of(c, "accrued interest", accrued, tolerance, "");
          case "PC" -> CaseResult.of(c, "price", dirty - accrued, tolerance, "");
          default -> CaseResult.of(c, "price with accrued interest", dirty, tolerance, "");
        });
  }

  private static double accrued(CaseInputs in, DiscountMargin note, LocalDate settlement) {
    if (in.has("accrual_days_rates")) {
      double sum = 0;
      for (Object entry : in.list("accrual_days_rates")) {
        List<?> pair = (List<?>) entry;
        double rate = CaseInputs.asNumber(pair.get(1));
        sum += new DiscountMargin(rate, note.spread()).interest(CaseInputs.asNumber(pair.get(0)));
      }
      return sum;
    }
    LocalDate dated = in.has("dated") ? LocalDate.parse(in.text("dated")) : settlement;
    return note.interest(DayCount.ACT_360.years(dated, settlement) * 360);
  }

  /** Days from settlement to the first quarterly payment, and between payments. */
  private static int[] days(CaseInputs in, LocalDate settlement) {
    LocalDate maturity = LocalDate.parse(in.text("maturity"));
    Schedule schedule =
        Schedule.of(ScheduleTerms.regular(maturity, Frequency.QUARTERLY).withEndOfMonth(true));
    LocalDate[] before = {settlement};
    return schedule.paidAfter(settlement).stream()
        .mapToInt(
            period -> {
              int days = (int) (period.payment().toEpochDay() - before[0].toEpochDay());
              before[0] = period.payment();
              return days;
            })
        .toArray();
  }

  private static Optional<CaseResult> bill(PublishedCase c, CaseInputs in) {
    if (c.id().equals("CFR-VI-B")) {
      return Optional.of(
          CaseResult.of(c, "amount due", in.number("price") * in.number("par") / 100));
    } else if (in.has("d")) {
      return Optional.of(
          CaseResult.of(
              c,
              "price at a discount rate",
              BillYield.priceAtDiscount(in.number("d"), in.number("r"), 360)));
    } else if (c.id().equals("CFR-VI-C")) {
      return Optional.of(
          CaseResult.of(
              c, "discount rate", BillYield.discountRate(in.number("P"), in.number("r"), 360)));
    }
    double rate = BillYield.couponEquivalent(in.number("P"), in.integer("r"), in.integer("y"));
    return Optional.of(
        c.id().endsWith("D1")
            ? CaseResult.of(c, "coupon equivalent, per cent", 100 * rate)
            : CaseResult.of(c, "coupon equivalent", rate));
  }
}
