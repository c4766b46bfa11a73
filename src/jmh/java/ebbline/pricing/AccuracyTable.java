package ebbline.pricing;

import ebbline.curve.FlatCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.DoubleSupplier;

/**
 * Prints error against time of every method on the 30-year bond callable on 50 dates, for
 * docs/validation.md and its picture: method, setting, error per 100, microseconds of processor
 * time (best of fifteen rounds).
 */
public final class AccuracyTable {
  private static final int ROUNDS = 15;
  private static final ThreadMXBean CLOCK = ManagementFactory.getThreadMXBean();

  private AccuracyTable() {}

  public static void main(String[] arguments) {
    GaussianRates rates = new HullWhite(0.1, VolatilitySteps.constant(0.01)).on(FlatCurve.of(0.05));
    Claim claim = claim();
    double straight = Discounting.value(claim.flows(), rates.curve()).presentValue();
    double finest = straight + BackwardInduction.rightsValue(claim, rates, 0.15, 9.5);
    System.out.printf(Locale.ROOT, "finest %.12f%n", finest);
    for (double spacing : new double[] {0.8, 0.7, 0.6, 0.5, 0.45, 0.4, 0.35, 0.3, 0.25, 0.2}) {
      double range = spacing >= 0.6 ? 6 : spacing >= 0.45 ? 6.9 : spacing > 0.3 ? 7.4 : 8.5;
      line(
          "one run",
          spacing,
          finest,
          200,
          () -> straight + BackwardInduction.rightsValue(claim, rates, spacing, range));
    }
    line(
        "backward-induction",
        0.35,
        finest,
        200,
        () -> BackwardInduction.value(claim, rates).presentValue());
    for (int steps : new int[] {118, 236, 472, 944, 1888}) {
      line(
          "trinomial",
          steps,
          finest,
          steps < 500 ? 5 : 1,
          () -> straight + TrinomialPricing.rightsValue(claim, rates, steps));
    }
  }

  private static void line(
      String method, double setting, double finest, int repeats, DoubleSupplier work) {
    double best = Double.POSITIVE_INFINITY;
    double value = 0;
    for (int warm = 0; warm < 10 * repeats; warm++) {
      value = work.getAsDouble();
    }
    for (int round = 0; round < ROUNDS; round++) {
      long start = CLOCK.getCurrentThreadCpuTime();
      for (int i = 0; i < repeats; i++) {
        value = work.getAsDouble();
      }
      best = Math.min(best, (CLOCK.getCurrentThreadCpuTime() - start) / 1e3 / repeats);
    }
    System.out.printf(
        Locale.ROOT, "%s %s %.2e %.1f%n", method, setting, Math.abs(value - finest), best);
  }

  private static Claim claim() {
    double[] times = new double[60];
    double[] amounts = new double[60];
    List<Right> rights = new ArrayList<>();
    for (int i = 1; i <= 60; i++) {
      double t = 0.5 * i;
      times[i - 1] = t;
      amounts[i - 1] = 2.5 + (i == 60 ? 100 : 0);
      if (i >= 10 && i < 60) {
        rights.add(new Right(Right.Party.ISSUER, t, t, CashFlows.single(t, 100)));
      }
    }
    return new Claim(CashFlows.of(times, amounts), rights, 0, 0);
  }
}
