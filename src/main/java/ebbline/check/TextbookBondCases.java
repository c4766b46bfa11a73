package ebbline.check;

import ebbline.bond.AssetSwap;
import ebbline.bond.FirstFraction;
import ebbline.bond.PeriodYield;
import ebbline.bond.ZSpread;
import ebbline.curve.Compounding;
import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.instrument.CashFlows;
import ebbline.instrument.PeriodFlows;
import java.util.Arrays;
import java.util.Map;
import java.util.Optional;

/** Textbook bonds: price, duration and convexity at a yield, and on given zero rates. */
final class TextbookBondCases implements BondCases.Computation {

  @Override
  public Optional<CaseResult> run(PublishedCase c, CaseInputs in, Map<String, CaseInputs> all) {
    if (c.id().startsWith("FAB-") || c.id().startsWith("FABEFF-") || c.id().startsWith("MUNI-")) {
      return Optional.of(atYield(c, in));
    } else if (c.id().equals("HULL-CF-1") || c.id().equals("HULL-CF-2")) {
      return Optional.of(conversion(c, in));
    } else if (c.id().startsWith("HULL-DUR-")) {
      return Optional.of(continuous(c, in));
    } else if (c.id().equals("HULL-FWD")) {
      return Optional.of(CaseResult.of(c, "forward price", forward(in)));
    } else if (c.id().startsWith("HULL-") || c.id().equals("ASW-par")) {
      return Optional.of(onZeroRates(c, in));
    }
    return Optional.empty();
  }

  private static PeriodYield bond(double coupon, int frequency, int count, double toFirst) {
    double[] amounts = new double[count];
    Arrays.fill(amounts, coupon / frequency);
    amounts[count - 1] += 100;
    return new PeriodYield(new PeriodFlows(frequency, toFirst, amounts), FirstFraction.COMPOUND);
  }

  private static CaseResult atYield(PublishedCase c, CaseInputs in) {
    int f = in.integer("f");
    double y = in.number("y");
    PeriodYield bond = bond(in.number("coupon"), f, f * in.integer("years"), 1);
    double step = in.number("dy", 0.01);
    return switch (BondCases.part(c)) {
      case "P", "P0" -> CaseResult.of(c, "price at a yield", bond.price(y));
      case "Pdown", "P09" -> CaseResult.of(c, "price at a lower yield", bond.price(y - step));
      case "Pup", "P11" -> CaseResult.of(c, "price at a higher yield", bond.price(y + step));
      case "mac" -> CaseResult.of(c, "Macaulay duration", bond.macaulayDuration(y));
      case "mod" -> CaseResult.of(c, "modified duration", bond.modifiedDuration(y));
      case "dd" ->
          CaseResult.of(
              c, "dollar duration, per 1", bond.modifiedDuration(y) * bond.price(y) / 100);
      case "half" -> CaseResult.of(c, "half the effective convexity", halfConvexity(bond, y, step));
      default -> CaseResult.of(c, "convexity", bond.convexity(y));
    };
  }

  private static double halfConvexity(PeriodYield bond, double y, double step) {
    double price = bond.price(y);
    double change = bond.price(y + step) + bond.price(y - step) - 2 * price;
    return change / (2 * price * step * step);
  }

  /** Per 100 face; the second case is counted to the quarter, less the quarter's interest. */
  private static CaseResult conversion(PublishedCase c, CaseInputs in) {
    double coupon = in.number("coupon");
    double y = in.number("y");
    double price =
        c.id().endsWith("1")
            ? bond(coupon, 2, 2 * in.integer("years"), 1).price(y)
            : bond(coupon, 2, 37, 0.5).price(y) - coupon / 4;
    return CaseResult.of(c, "conversion factor times 100", price);
  }

  private static CaseResult continuous(PublishedCase c, CaseInputs in) {
    int f = in.integer("f");
    int n = f * in.integer("years");
    DiscountCurve curve = FlatCurve.of(in.number("y_cc"));
    double price = 0;
    double weighted = 0;
    for (int k = 1; k <= n; k++) {
      double t = (double) k / f;
      double value = (in.number("coupon") / f + (k == n ? 100 : 0)) * curve.discount(t);
      price += value;
      weighted += t * value;
    }
    return BondCases.part(c).equals("P")
        ? CaseResult.of(c, "price at a continuous yield", price)
        : CaseResult.of(c, "duration at a continuous yield", weighted / price);
  }

  private static double fraction(String text) {
    String[] parts = text.split("/", -1);
    return Double.parseDouble(parts[0]) / Double.parseDouble(parts[1]);
  }

  private static double forward(CaseInputs in) {
    double income = FlatCurve.of(in.number("r4m_cc")).discount(fraction(in.text("t_income")));
    double end = FlatCurve.of(in.number("r9m_cc")).discount(fraction(in.text("T")));
    return (in.number("spot") - in.number("income") * income) / end;
  }

  private static CaseResult onZeroRates(PublishedCase c, CaseInputs in) {
    double[] zeros = in.numbers(in.has("zero_cc_pct") ? "zero_cc_pct" : "dfs_from_cc_zero_pct");
    double[] times = in.numbers("t");
    double[] logs = new double[zeros.length];
    for (int i = 0; i < logs.length; i++) {
      logs[i] = Compounding.CONTINUOUS.logDiscount(zeros[i] / 100, times[i]);
    }
    InterpolatedCurve curve = InterpolatedCurve.of(Interpolation.LINEAR_ZERO, times, logs);
    double f = in.number("f");
    double[] amounts = new double[times.length];
    Arrays.fill(amounts, in.number("coupon") / f);
    amounts[times.length - 1] += 100;
    CashFlows flows = CashFlows.of(times, amounts);
    double price = 0;
    double annuity = 0;
    for (int i = 0; i < times.length; i++) {
      price += amounts[i] * curve.discount(times[i]);
      annuity += curve.discount(times[i]) / f;
    }
    double last = curve.discount(times[times.length - 1]);
    return switch (BondCases.part(c)) {
      case "P" -> CaseResult.of(c, "price on zero rates", price);
      case "y" ->
          CaseResult.of(
              c,
              "its continuous yield, per cent",
              // the source solves from its own rounded price
              100 * ZSpread.of(flows, FlatCurve.of(0), 0, 98.39));
      case "par" ->
          c.id().startsWith("ASW")
              ? CaseResult.of(
                  c,
                  "par-par asset-swap spread, basis points",
                  1e4 * AssetSwap.spread(flows, curve, 0, times, in.number("dirty_price")))
              : CaseResult.of(c, "par yield, per cent", 100 * (1 - last) / annuity);
      default -> throw new IllegalArgumentException("no figure of " + c.id());
    };
  }
}
