package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/**
 * Seeded claims with several rights: callable, putable and both, step prices, notice, irregular
 * dates, under constant and stepped volatility with mean reversion from −5 % to 200 %.
 */
record RandomRights(Claim claim, GaussianRates rates) {

  static RandomRights draw(SplittableRandom random) {
    return draw(random, random.nextInt(3), 60);
  }

  /**
   * @param kind 0 callable, 1 putable, 2 a call or a put on each date
   */
  static RandomRights draw(SplittableRandom random, int kind, int most) {
    GaussianRates rates = rates(random);
    int frequency = random.nextInt(3) == 0 ? 1 : 2;
    int n = 2 + random.nextInt(most - 1);
    double stub = random.nextBoolean() ? 1.0 / frequency : random.nextDouble(0.01, 1.0 / frequency);
    double coupon = random.nextDouble(0, 8);
    double[] times = new double[n];
    double[] amounts = new double[n];
    for (int i = 0; i < n; i++) {
      times[i] = stub + (double) i / frequency;
      amounts[i] = coupon / frequency + (i == n - 1 ? 100 : 0);
    }
    int first = random.nextInt(n - 1);
    double notice = random.nextInt(3) == 0 ? random.nextDouble(0, Math.min(0.3, times[first])) : 0;
    double price = random.nextDouble(95, 108);
    double slope = random.nextBoolean() ? 0 : random.nextDouble(-0.3, 0.3);
    double kept = random.nextBoolean() ? 1 : random.nextDouble(0.2, 1);
    List<Right> rights = new ArrayList<>();
    for (int i = first; i < n - 1; i++) {
      if (random.nextDouble() < kept) {
        boolean put = kind == 1 || (kind == 2 && random.nextBoolean());
        double strike = price + slope * (i - first) - (kind == 2 && put ? 6 : 0);
        rights.add(
            new Right(
                put ? Right.Party.HOLDER : Right.Party.ISSUER,
                times[i] - notice,
                times[i],
                CashFlows.single(times[i], strike)));
      }
    }
    return new RandomRights(new Claim(CashFlows.of(times, amounts), rights, 0, 0), rates);
  }

  private static GaussianRates rates(SplittableRandom random) {
    double a =
        switch (random.nextInt(6)) {
          case 0 -> 0;
          case 1 -> random.nextDouble(-0.05, 0);
          case 2 -> Math.pow(10, random.nextDouble(-12, -2));
          case 3 -> random.nextDouble(0.2, 2);
          default -> random.nextDouble(0, 0.2);
        };
    double sigma = random.nextInt(8) == 0 ? 1e-4 : random.nextDouble(0.002, 0.02);
    if (a > 0.2) {
      sigma *= 3;
    }
    VolatilitySteps steps =
        random.nextBoolean()
            ? VolatilitySteps.constant(sigma)
            : VolatilitySteps.of(
                new double[] {1.3, 4, 9},
                new double[] {
                  sigma * random.nextDouble(0.5, 2),
                  random.nextInt(6) == 0 ? 0 : sigma,
                  sigma * random.nextDouble(0.5, 2),
                  sigma
                });
    DiscountCurve curve =
        random.nextBoolean()
            ? FlatCurve.of(random.nextDouble(-0.01, 0.09))
            : new Vasicek(random.nextDouble(-0.01, 0.1), random.nextDouble(0, 0.08), 0.3, 0.01)
                .rates()
                .curve();
    return new HullWhite(a, steps).on(curve);
  }
}
