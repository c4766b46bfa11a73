package ebbline.bench;

import ebbline.curve.DayTable;
import ebbline.curve.DiscountCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.Interpolation;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import ebbline.pricing.CouponOptions;
import ebbline.pricing.LevelBonds;
import ebbline.pricing.ZeroOptions;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;

/**
 * The work that is timed: bonds on a 30-node log-linear curve, options on zero bonds, on coupon
 * bonds of 20 flows, and 10 x 10 swaptions, under a = 0.05 and σ = 1.2 %.
 *
 * <p>Data: a folder with curve.txt (time, discount), bonds.txt (maturity, coupon per 100, price),
 * zbo.txt (expiry, maturity, strike) and cbo.txt (expiry, coupon, strike).
 */
final class Workload {
  static final int FLOWS = 20;
  private static final double DAYS_PER_YEAR = 365.25;
  private static final int LAST_DAY = 10_959;
  private static final int SWAPTIONS = 2000;

  final DiscountCurve curve;
  final double[] bondValues;
  final double[] zeroValues;
  final double[] couponValues;
  final double[] swaptionValues = new double[SWAPTIONS];
  final long bondFlows;

  final double[] bondYields;

  private final LevelBonds levelBonds = new LevelBonds();
  private final LevelBonds.Bonds level;
  private final LevelBonds.Figures levelFigures;
  private final ZeroOptions zeroOptions;
  private final CouponOptions couponOptions;
  private final double[] firstFlow;
  private final double[] halfCoupon;
  private final int[] flowCounts;
  private final int[] offsets;
  private final int[] flowDays;
  private final double[][] zeros;
  private final double[] expiry;
  private final double[] strike;
  private final double[] half;
  private final double[][] times;
  private final double[][] amounts;
  private final double[] flowTimes = new double[FLOWS];
  private final double[] flowAmounts = new double[FLOWS];
  private final CouponOptions.Work work = new CouponOptions.Work(FLOWS);

  Workload(Path folder) {
    double[][] nodes = columns(folder.resolve("curve.txt"), 2);
    double[] logs = new double[nodes[0].length];
    for (int i = 0; i < logs.length; i++) {
      logs[i] = Math.log(nodes[1][i]);
    }
    curve = InterpolatedCurve.of(Interpolation.LOG_LINEAR, nodes[0], logs);
    GaussianRates rates = new HullWhite(0.05, VolatilitySteps.constant(0.012)).on(curve);
    zeroOptions = ZeroOptions.under(rates);
    couponOptions = CouponOptions.under(rates);

    double[][] bonds = columns(folder.resolve("bonds.txt"), 3);
    int n = bonds[0].length;
    bondValues = new double[n];
    firstFlow = new double[n];
    halfCoupon = new double[n];
    flowCounts = new int[n];
    offsets = new int[n + 1];
    long flows = 0;
    for (int i = 0; i < n; i++) {
      flowCounts[i] = (int) Math.ceil(2 * bonds[0][i]);
      firstFlow[i] = bonds[0][i] - 0.5 * (flowCounts[i] - 1);
      halfCoupon[i] = 0.5 * bonds[1][i];
      offsets[i] = (int) flows;
      flows += flowCounts[i];
    }
    offsets[n] = (int) flows;
    bondFlows = flows;
    double[] toFirst = new double[n];
    double[] payments = new double[n];
    double[] redemption = new double[n];
    for (int i = 0; i < n; i++) {
      toFirst[i] = 2 * firstFlow[i];
      payments[i] = flowCounts[i];
      redemption[i] = 100;
    }
    level = new LevelBonds.Bonds(2, halfCoupon, redemption, payments, toFirst, bonds[2]);
    levelFigures = new LevelBonds.Figures(n);
    bondYields = levelFigures.yield;
    flowDays = new int[(int) flows];
    for (int i = 0, q = 0; i < n; i++) {
      int last = (int) (bonds[0][i] * DAYS_PER_YEAR);
      for (int k = flowCounts[i] - 1; k >= 0; k--) {
        flowDays[q++] = Math.max(0, last - (int) (k * DAYS_PER_YEAR / 2 + 0.5));
      }
    }

    zeros = columns(folder.resolve("zbo.txt"), 3);
    zeroValues = new double[zeros[0].length];
    double[][] coupons = columns(folder.resolve("cbo.txt"), 3);
    expiry = coupons[0];
    strike = coupons[2];
    couponValues = new double[expiry.length];
    half = new double[expiry.length];
    times = new double[FLOWS][expiry.length];
    amounts = new double[FLOWS][expiry.length];
    for (int i = 0; i < expiry.length; i++) {
      half[i] = 0.5 * coupons[1][i];
      for (int j = 0; j < FLOWS; j++) {
        times[j][i] = expiry[i] + 0.5 * (j + 1);
        amounts[j][i] = half[i] + (j == FLOWS - 1 ? 100 : 0);
      }
    }
  }

  /** Bonds by walking over the flows, one discount factor each. */
  double bondsByWalking() {
    for (int i = 0; i < bondValues.length; i++) {
      int n = flowCounts[i];
      double t = firstFlow[i];
      double sum = 0;
      double last = 0;
      for (int k = 0; k < n; k++) {
        last = curve.discount(t);
        sum += last;
        t += 0.5;
      }
      bondValues[i] = halfCoupon[i] * sum + 100 * last;
    }
    return sum(bondValues);
  }

  /** Bonds from a table of discount factors a day, the table included. */
  double bondsByDay() {
    DayTable table = DayTable.of(curve, LAST_DAY, DAYS_PER_YEAR);
    for (int i = 0; i < bondValues.length; i++) {
      int end = offsets[i + 1];
      bondValues[i] =
          halfCoupon[i] * table.annuity(flowDays, offsets[i], end)
              + 100 * table.discount(flowDays[end - 1]);
    }
    return sum(bondValues);
  }

  /** Present values from the day table, and yields, durations, convexities, dv01 of the prices. */
  double bondMeasures() {
    levelBonds.measure(level, levelFigures);
    return bondsByDay()
        + sum(levelFigures.yield)
        + sum(levelFigures.modifiedDuration)
        + sum(levelFigures.convexity)
        + sum(levelFigures.dv01);
  }

  double zeroOptionsAlone() {
    for (int i = 0; i < zeroValues.length; i++) {
      zeroValues[i] = zeroOptions.call(zeros[0][i], zeros[1][i], zeros[2][i]);
    }
    return sum(zeroValues);
  }

  double zeroOptionsInBlocks() {
    zeroOptions.calls(zeros[0], zeros[1], zeros[2], zeroValues);
    return sum(zeroValues);
  }

  double couponOptionsAlone() {
    for (int i = 0; i < couponValues.length; i++) {
      couponValues[i] = couponOption(expiry[i], half[i], strike[i]);
    }
    return sum(couponValues);
  }

  double couponOptionsInBlocks() {
    couponOptions.calls(expiry, strike, times, amounts, couponValues);
    return sum(couponValues);
  }

  double swaptions() {
    for (int i = 0; i < SWAPTIONS; i++) {
      swaptionValues[i] = couponOption(10, 0.5 * (2 + 0.002 * i), 100);
    }
    return sum(swaptionValues);
  }

  private double couponOption(double start, double coupon, double price) {
    for (int j = 0; j < FLOWS; j++) {
      flowTimes[j] = start + 0.5 * (j + 1);
      flowAmounts[j] = coupon;
    }
    flowAmounts[FLOWS - 1] += 100;
    return couponOptions.call(start, price, flowTimes, flowAmounts, FLOWS, work);
  }

  /** Four chains, so that the check sum costs nothing beside the work. */
  static double sum(double[] values) {
    double a = 0;
    double b = 0;
    double c = 0;
    double d = 0;
    int i = 0;
    for (; i + 4 <= values.length; i += 4) {
      a += values[i];
      b += values[i + 1];
      c += values[i + 2];
      d += values[i + 3];
    }
    for (; i < values.length; i++) {
      a += values[i];
    }
    return a + b + c + d;
  }

  private static double[][] columns(Path file, int count) {
    try {
      List<String> lines = Files.readAllLines(file);
      double[][] columns = new double[count][lines.size()];
      for (int i = 0; i < lines.size(); i++) {
        String[] parts = lines.get(i).strip().split("\\s+");
        for (int k = 0; k < count; k++) {
          columns[k][i] = Double.parseDouble(parts[k]);
        }
      }
      return columns;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
