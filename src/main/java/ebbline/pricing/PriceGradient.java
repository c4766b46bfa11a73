package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Optionlet;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import java.util.Arrays;
import java.util.Objects;

/**
 * A value of a closed form with its first derivatives, all from the same evaluation: in the log
 * discount factors, the mean reversion, the volatility of each step and the strike.
 *
 * <p>Exercise boundaries do not enter: there the exchange is worth nothing, so moving them moves no
 * value. Where the state has no variance the derivatives in volatility are those from away from the
 * money, 0.
 */
public final class PriceGradient {
  private final double value;
  private final double[] times;
  private final double[] byLogDiscount;
  private final double byMeanReversion;
  private final double[] byVolatility;
  private final double byStrike;

  PriceGradient(
      double value,
      double[] times,
      double[] byLogDiscount,
      double byMeanReversion,
      double[] byVolatility,
      double byStrike) {
    this.value = value;
    this.times = times;
    this.byLogDiscount = byLogDiscount;
    this.byMeanReversion = byMeanReversion;
    this.byVolatility = byVolatility;
    this.byStrike = byStrike;
  }

  /**
   * @throws IllegalArgumentException if the claim has more than one right
   */
  public static PriceGradient of(Claim claim, GaussianRates rates) {
    Objects.requireNonNull(rates, "rates");
    if (!ClosedForm.applies(claim)) {
      throw new IllegalArgumentException(
          "a closed form exists for one right at most, found " + claim.rights().size());
    }
    GradientSum sum = new GradientSum(rates, size(claim));
    CashFlows flows = claim.flows();
    for (int i = 0; i < flows.size(); i++) {
      double worth = flows.amount(i) * rates.curve().discount(flows.time(i));
      sum.add(flows.time(i), worth, worth);
    }
    for (Right right : claim.rights()) {
      sum.addRight(claim, right);
    }
    for (Optionlet optionlet : claim.optionlets()) {
      sum.addOptionlet(optionlet);
    }
    return sum.result();
  }

  private static int size(Claim claim) {
    int size = claim.flows().size() + 2 * claim.optionlets().size();
    for (Right right : claim.rights()) {
      size += right.received().size() + claim.flows().size();
    }
    return size;
  }

  /** Money per 100 face at the as-of date. */
  public double value() {
    return value;
  }

  /** Times of the discount factors that matter, one an entry; the same time may stand twice. */
  public double[] times() {
    return times.clone();
  }

  /** Derivatives in ln P(0,t) at {@link #times}. */
  public double[] byLogDiscount() {
    return byLogDiscount.clone();
  }

  /** Derivatives in ln P at the nodes of the curve; empty for a curve without nodes. */
  public double[] byNode(DiscountCurve curve) {
    double[] gradient = new double[curve.nodes().length];
    for (int i = 0; i < times.length; i++) {
      curve.addLogDiscountGradient(times[i], byLogDiscount[i], gradient);
    }
    return gradient;
  }

  /** Derivative in a, the curve held. */
  public double byMeanReversion() {
    return byMeanReversion;
  }

  /** Derivatives in σ of each step, the curve held. */
  public double[] byVolatility() {
    return byVolatility.clone();
  }

  /** Derivative in σ where all steps move together. */
  public double byAllVolatility() {
    return Arrays.stream(byVolatility).sum();
  }

  /** Derivative in the strike: per unit of price per 100, or per 1.00 of rate; 0 without one. */
  public double byStrike() {
    return byStrike;
  }
}
