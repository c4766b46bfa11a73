package ebbline.check;

import ebbline.bond.BillYield;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Bond functions as a general-purpose spreadsheet evaluated them. */
final class SpreadsheetCases implements BondCases.Computation {
  private static final double RELATIVE = 1e-9;
  private static final Pattern ARGUMENT =
      Pattern.compile("DATE\\((\\d+),(\\d+),(\\d+)\\)|-?[0-9.]+");

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all) {
    if (!c.id().startsWith("SS-")) {
      return Optional.empty();
    }
    String formula = in.text("formula");
    String name = formula.substring(0, formula.indexOf('('));
    double value = value(name, new Arguments(formula.substring(name.length() + 1)));
    double tolerance = RELATIVE * Math.max(1e-3, Math.abs(value));
    return Optional.of(
        CaseResult.of(c, formula, value, tolerance, "figure of a general-purpose spreadsheet"));
  }

  private static double value(String name, Arguments a) {
    return switch (name) {
      case "PRICE" ->
          SheetBond.of(a.date(0), a.date(1), a.whole(5), a.whole(6))
              .price(a.number(2), a.number(3), a.number(4));
      case "YIELD" ->
          SheetBond.of(a.date(0), a.date(1), a.whole(5), a.whole(6))
              .yieldOf(a.number(2), a.number(3), a.number(4));
      case "DURATION" ->
          SheetBond.of(a.date(0), a.date(1), a.whole(4), a.whole(5))
              .duration(a.number(2), a.number(3));
      case "MDURATION" ->
          SheetBond.of(a.date(0), a.date(1), a.whole(4), a.whole(5))
              .modifiedDuration(a.number(2), a.number(3));
      case "COUPDAYBS" -> a.bond().daysAccrued();
      case "COUPDAYS" -> a.bond().days();
      case "COUPDAYSNC" -> a.bond().daysToNext();
      case "COUPNUM" -> a.bond().count();
      case "YEARFRAC" -> SheetBond.years(a.date(0), a.date(1), a.whole(2));
      case "ACCRINT" ->
          a.number(3) * a.number(4) * SheetBond.years(a.date(0), a.date(2), a.whole(6));
      case "TBILLPRICE" -> BillYield.priceAtDiscount(a.number(2), a.days(), 360);
      case "TBILLEQ" ->
          BillYield.simpleYield(
              BillYield.priceAtDiscount(a.number(2), a.days(), 360), a.days(), 365);
      default -> throw new IllegalArgumentException("no function '" + name + "'");
    };
  }

  /** Dates and numbers of a formula, in order. */
  private static final class Arguments {
    private final List<Object> values = new ArrayList<>();

    Arguments(String text) {
      Matcher matcher = ARGUMENT.matcher(text);
      while (matcher.find()) {
        values.add(
            matcher.group(1) == null
                ? (Object) Double.valueOf(matcher.group())
                : LocalDate.of(part(matcher, 1), part(matcher, 2), part(matcher, 3)));
      }
    }

    private static int part(Matcher matcher, int group) {
      return Integer.parseInt(matcher.group(group));
    }

    LocalDate date(int i) {
      return (LocalDate) values.get(i);
    }

    double number(int i) {
      return (Double) values.get(i);
    }

    int whole(int i) {
      return (int) Math.rint(number(i));
    }

    double days() {
      return SheetBond.days(date(0), date(1), 1);
    }

    SheetBond bond() {
      return SheetBond.of(date(0), date(1), whole(2), whole(3));
    }
  }
}
