package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.OptionKind;
import ebbline.instrument.Optionlet;
import ebbline.instrument.RateBasis;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.MomentSlopes;
import ebbline.model.StandardNormal;
import java.util.Arrays;

/** Adds up the gradient of a claim part by part. */
final class GradientSum {
  private final GaussianRates rates;
  private final DiscountCurve curve;
  private final MomentSlopes slopes;
  private final double[] times;
  private final double[] byLogDiscount;
  private final double[] byVolatility;
  private int count;
  private double value;
  private double byMeanReversion;
  private double byStrike;

  GradientSum(GaussianRates rates, int size) {
    this.rates = rates;
    this.curve = rates.curve();
    this.slopes = MomentSlopes.of(rates);
    this.times = new double[size];
    this.byLogDiscount = new double[size];
    this.byVolatility = new double[rates.volatility().count()];
  }

  PriceGradient result() {
    return new PriceGradient(
        value,
        Arrays.copyOf(times, count),
        Arrays.copyOf(byLogDiscount, count),
        byMeanReversion,
        byVolatility,
        byStrike);
  }

  /** A part of the value that is proportional to one discount factor. */
  void add(double time, double worth, double slope) {
    value += worth;
    times[count] = time;
    byLogDiscount[count++] = slope;
  }

  void addRight(Claim claim, Right right) {
    double decision = right.decision();
    CashFlows exchanged = ExerciseValue.exchanged(claim, right);
    ExerciseValue worth = ExerciseValue.of(exchanged, decision, rates);
    double sign = right.party() == Right.Party.HOLDER ? 1 : -1;
    double deviation = Math.sqrt(rates.variance(decision));
    double byDeviation = 0;
    value += sign * worth.value();
    for (int i = 0; i < exchanged.size(); i++) {
      double t = exchanged.time(i);
      double tau = Math.max(0, t - decision);
      double g = rates.g(tau);
      double flow = sign * exchanged.amount(i) * curve.discount(t);
      add(t, 0, flow * worth.probability(deviation * g));
      double byShift = flow * worth.density(deviation * g);
      byDeviation += byShift * g;
      byMeanReversion += byShift * deviation * slopes.ofG(tau);
    }
    addVariance(decision, deviation, byDeviation);
    if (right.strike().isPresent()) {
      CashFlows perUnit = right.strike().get().perUnit();
      for (int i = 0; i < perUnit.size(); i++) {
        double t = perUnit.time(i);
        double shift = deviation * rates.g(Math.max(0, t - decision));
        byStrike += perUnit.amount(i) * curve.discount(t) * worth.probability(shift);
      }
    }
  }

  /** From the derivative in √y(t) to those in a and σ. */
  private void addVariance(double t, double deviation, double byDeviation) {
    if (deviation > 0) {
      byMeanReversion += slopes.addVariance(t, byDeviation / (2 * deviation), byVolatility);
    }
  }

  void addOptionlet(Optionlet optionlet) {
    double v = OptionletPricing.deviation(optionlet, rates);
    double grown =
        optionlet.notional() * optionlet.growthOver() * curve.discount(optionlet.start());
    double perStrike = optionlet.notional() * curve.discount(optionlet.end());
    double owed = optionlet.strikeGrowth() * perStrike;
    int side = optionlet.option().sign();
    double up = side;
    double down = side;
    double vega = 0;
    if (!(owed > 0)) {
      up = optionlet.option() == OptionKind.CALL ? 1 : 0;
      down = up;
    } else if (v > 0) {
      double d = OutOfTheMoney.logRatio(grown, owed) / v;
      up = side * StandardNormal.cdf(side * (d + 0.5 * v));
      down = side * StandardNormal.cdf(side * (d - 0.5 * v));
      vega = grown * StandardNormal.density(d + 0.5 * v);
    } else if (!(side * (grown - owed) > 0)) {
      up = 0;
      down = 0;
    }
    value +=
        optionlet.option() == OptionKind.CALL
            ? BlackFormula.call(grown, owed, v)
            : BlackFormula.put(grown, owed, v);
    add(optionlet.start(), 0, grown * up);
    add(optionlet.end(), 0, -owed * down);
    byStrike -= perStrike * optionlet.accrual() * down;
    if (v > 0) {
      addOptionletVariance(optionlet, v, vega);
    }
  }

  private void addOptionletVariance(Optionlet optionlet, double v, double vega) {
    double start = optionlet.start();
    double tau = optionlet.end() - start;
    double g = rates.g(tau);
    double byVariance = vega / (2 * v);
    byMeanReversion += slopes.addVariance(start, byVariance * g * g, byVolatility);
    byMeanReversion += byVariance * rates.variance(start) * 2 * g * slopes.ofG(tau);
    if (optionlet.basis() == RateBasis.BACKWARD) {
      byMeanReversion +=
          slopes.addIntegralVariance(start, optionlet.end(), byVariance, byVolatility);
    }
  }
}
