package ebbline.check;

import ebbline.bond.BillYield;
import ebbline.bond.FirstFraction;
import ebbline.bond.PeriodYield;
import ebbline.instrument.PeriodFlows;
import java.time.LocalDate;
import java.util.Arrays;
import java.util.Map;
import java.util.Optional;

/** The examples with which ECMA-376 documents its bond functions. */
final class DocumentedFunctionCases implements BondCases.Computation {

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all) {
    String function = c.id().substring(c.id().indexOf('-') + 1);
    if (c.id().startsWith("WIKI-YEARFRAC")) {
      return Optional.of(
          CaseResult.of(c, "YEARFRAC", SheetBond.years(date(in, "start"), date(in, "end"), 0)));
    }
    boolean documented = c.id().startsWith("DOC-") || c.id().matches("WIKI-PRICE|PROP-last-simple");
    if (!documented || !in.has("maturity")) {
      return Optional.empty();
    }
    return switch (function) {
      case "COUPNCD" ->
          Optional.of(CaseResult.ofText(c, function, bond(in).current().end().toString()));
      case "COUPPCD" ->
          Optional.of(CaseResult.ofText(c, function, bond(in).current().start().toString()));
      default -> Optional.of(CaseResult.of(c, function, value(function, in), tolerance(c), ""));
    };
  }

  private static double tolerance(PublishedCase c) {
    // The source iterates: its digits differ from exact arithmetic by up to 6e-13.
    if (c.id().endsWith("YIELD")) {
      return 1e-11;
    }
    // All digits of a double are printed, and the last is the source's rounding.
    return Math.max(CaseResult.halfUnit(c.reference()), 2e-15 * Math.abs(number(c)));
  }

  private static double number(PublishedCase c) {
    return Double.parseDouble(c.reference());
  }

  private static double value(String function, CaseInputs in) {
    return switch (function) {
      case "PRICE", "last-simple" ->
          bond(in).price(in.number("rate"), in.number("yld"), in.number("redemption", 100));
      case "YIELD" -> bond(in).yieldOf(in.number("rate"), in.number("price"), 100);
      case "DURATION" -> bond(in).duration(in.number("rate"), in.number("yld"));
      case "MDURATION" -> bond(in).modifiedDuration(in.number("rate"), in.number("yld"));
      case "COUPDAYSNC" -> bond(in).daysToNext();
      case "COUPNUM" -> bond(in).count();
      case "ODDFYIELD" -> oddFirstYield(in);
      case "ODDLPRICE", "ODDLYIELD" -> oddLast(function, in);
      case "PRICEMAT", "YIELDMAT" -> interestAtMaturity(function, in);
      case "ACCRINTM" -> in.number("par") * in.number("rate") * years(in, "issue", "maturity");
      case "RECEIVED" ->
          in.number("inv") / (1 - in.number("discount") * years(in, "settle", "maturity"));
      case "PRICEDISC" ->
          BillYield.priceAtDiscount(in.number("discount"), days(in), SheetBond.yearDays(2));
      case "YIELDDISC", "TBILLYIELD" ->
          BillYield.simpleYield(in.number("price"), days(in), SheetBond.yearDays(2));
      case "TBILLPRICE" -> BillYield.priceAtDiscount(in.number("discount"), days(in), 360);
      case "TBILLEQ" ->
          BillYield.simpleYield(
              BillYield.priceAtDiscount(in.number("discount"), days(in), 360), days(in), 365);
      default -> throw new IllegalArgumentException("no function '" + function + "'");
    };
  }

  private static LocalDate date(CaseInputs in, String name) {
    return LocalDate.parse(in.text(name));
  }

  private static double days(CaseInputs in) {
    return SheetBond.days(date(in, "settle"), date(in, "maturity"), 1);
  }

  private static double years(CaseInputs in, String from, String to) {
    return SheetBond.years(date(in, from), date(in, to), in.integer("basis"));
  }

  private static SheetBond bond(CaseInputs in) {
    int basis = in.has("basis") ? in.integer("basis") : 0;
    return SheetBond.of(date(in, "settle"), date(in, "maturity"), in.integer("f"), basis);
  }

  /** A short first coupon of DFC over E days, then N − 1 regular ones. */
  private static double oddFirstYield(CaseInputs in) {
    int f = in.integer("f");
    double coupon = 100 * in.number("rate") / f;
    double period = in.number("E");
    double[] amounts = new double[in.integer("N")];
    Arrays.fill(amounts, coupon);
    amounts[0] = coupon * in.number("DFC") / period;
    amounts[amounts.length - 1] += 100;
    PeriodFlows flows = new PeriodFlows(f, in.number("DSC") / period, amounts);
    return new PeriodYield(flows, FirstFraction.COMPOUND)
        .yieldOf(in.number("price") + coupon * in.number("A") / period);
  }

  /** Simple interest over an odd last period, counted in thirty-day months. */
  private static double oddLast(String function, CaseInputs in) {
    int f = in.integer("f");
    double coupon = 100 * in.number("rate") / f;
    double whole = f * years(in, "last_interest", "maturity");
    double accrued = coupon * f * years(in, "last_interest", "settle");
    double rest = f * years(in, "settle", "maturity");
    PeriodYield flows =
        new PeriodYield(
            new PeriodFlows(f, rest, new double[] {100 + coupon * whole}), FirstFraction.SIMPLE);
    return function.equals("ODDLPRICE")
        ? flows.price(in.number("yld")) - accrued
        : flows.yieldOf(in.number("price") + accrued);
  }

  private static double interestAtMaturity(String function, CaseInputs in) {
    double rate = 100 * in.number("rate");
    double accrued = rate * years(in, "issue", "settle");
    double rest = years(in, "settle", "maturity");
    PeriodYield flows =
        new PeriodYield(
            new PeriodFlows(1, rest, new double[] {100 + rate * years(in, "issue", "maturity")}),
            FirstFraction.SIMPLE);
    return function.equals("PRICEMAT")
        ? flows.price(in.number("yld")) - accrued
        : flows.yieldOf(in.number("price") + accrued);
  }
}
