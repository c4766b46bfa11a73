package ebbline.pricing;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import java.util.List;
import java.util.SplittableRandom;

/**
 * A seeded option on a zero or coupon bond under either model: κ from 1e-9 to 2, σ to 5 %, expiry
 * to 20 years, maturity to 50, strike within five standard deviations.
 */
record RandomOption(GaussianRates rates, double expiry, CashFlows received, double face) {

  static RandomOption draw(SplittableRandom random, boolean coupons) {
    double kappa =
        random.nextBoolean()
            ? Math.pow(10, random.nextDouble(-9, 0.3))
            : random.nextDouble(1e-9, 2);
    double sigma = random.nextInt(20) == 0 ? 0 : random.nextDouble(0, 0.05);
    double r = random.nextDouble(-0.01, 0.08);
    double mean = random.nextDouble(-0.01, 0.08);
    GaussianRates rates =
        random.nextBoolean()
            ? new Vasicek(r, mean, kappa, sigma).rates()
            : new HullWhite(
                    kappa,
                    VolatilitySteps.of(
                        new double[] {1, 5}, new double[] {sigma, 0.5 * sigma, 0.8 * sigma}))
                .on(new Vasicek(r, mean, 0.4, 0.01).rates().curve());
    double expiry = random.nextInt(20) == 0 ? 0 : random.nextDouble(0, 20);
    double maturity = random.nextDouble(expiry + 0.01, 50);
    int n = coupons ? (int) Math.ceil(2 * (maturity - expiry)) : 1;
    double[] times = new double[n + 1];
    double[] amounts = new double[n + 1];
    times[0] = expiry;
    double coupon = random.nextDouble(0, 6);
    double deviation = Math.sqrt(rates.variance(expiry));
    double x = random.nextDouble(-5, 5) * deviation;
    for (int i = 1; i <= n; i++) {
      times[i] = maturity - 0.5 * (n - i);
      amounts[i] = (n > 1 ? coupon / 2 : 0) + (i == n ? 100 : 0);
      amounts[0] -= amounts[i] * Math.exp(rates.logBond(expiry, times[i], x));
    }
    double face = Math.max(100, -amounts[0]);
    return new RandomOption(rates, expiry, CashFlows.of(times, amounts), face);
  }

  /** The call for side 1, the put for side −1. */
  Claim claim(int side) {
    return new Claim(
        CashFlows.NONE,
        List.of(new Right(Right.Party.HOLDER, expiry, expiry, received.times(side))),
        0,
        0);
  }
}
