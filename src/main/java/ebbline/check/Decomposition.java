package ebbline.check;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.pricing.ClosedForm;
import java.util.Arrays;
import java.util.List;

/**
 * An option on a coupon bond with the intermediate figures that textbooks print: the state at which
 * the bond is worth the strike, found here by bisection, and the strike and put of every part.
 */
final class Decomposition {
  private final GaussianRates rates;
  private final double expiry;
  private final double strike;
  private final double[] times;
  private final double[] amounts;

  private Decomposition(
      GaussianRates rates, double expiry, double strike, double[] times, double[] amounts) {
    this.rates = rates;
    this.expiry = expiry;
    this.strike = strike;
    this.times = times;
    this.amounts = amounts;
  }

  /** From inputs {@code T}, {@code K}, {@code coupon_times} and {@code cashflows}. */
  static Decomposition of(GaussianRates rates, CaseInputs in) {
    return new Decomposition(
        rates, in.number("T"), in.number("K"), in.numbers("coupon_times"), in.numbers("cashflows"));
  }

  /** From inputs {@code T}, {@code K} and {@code cashflows} as an object of times. */
  static Decomposition ofDatedFlows(GaussianRates rates, CaseInputs in) {
    CaseInputs flows = in.object("cashflows");
    double[] times = flows.names().stream().mapToDouble(Double::parseDouble).toArray();
    double[] amounts = flows.names().stream().mapToDouble(flows::number).toArray();
    return new Decomposition(rates, in.number("T"), in.number("K"), times, amounts);
  }

  GaussianRates rates() {
    return rates;
  }

  /** B(expiry, maturity). */
  double b(double maturity) {
    return rates.g(maturity - expiry);
  }

  /** A(expiry, maturity) of P = A e^(−B r). */
  double a(double maturity) {
    return Math.exp(
        rates.logBond(expiry, maturity, 0) + b(maturity) * rates.curve().forward(expiry));
  }

  /** x at which the bond is worth the strike. */
  double boundary() {
    double low = -2;
    double high = 2;
    for (int i = 0; i < 200; i++) {
      double middle = 0.5 * (low + high);
      if (bond(middle) > strike) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return 0.5 * (low + high);
  }

  private double bond(double x) {
    double value = 0;
    for (int i = 0; i < times.length; i++) {
      value += amounts[i] * Math.exp(rates.logBond(expiry, times[i], x));
    }
    return value;
  }

  /** The short rate at the boundary. */
  double boundaryRate() {
    return rates.curve().forward(expiry) + boundary();
  }

  /** Strike of the option on flow {@code i}. */
  double strike(int i) {
    return amounts[i] * Math.exp(rates.logBond(expiry, times[i], boundary()));
  }

  double put(int i) {
    return VasicekCases.option(rates, -1, expiry, times[i], amounts[i], strike(i));
  }

  double volatility(int i) {
    return Math.sqrt(rates.variance(expiry)) * b(times[i]);
  }

  /** The whole option: call for sign 1, put for sign −1. */
  double bondOption(int sign) {
    double[] t = new double[times.length + 1];
    double[] c = new double[t.length];
    t[0] = expiry;
    c[0] = -sign * strike;
    for (int i = 0; i < times.length; i++) {
      t[i + 1] = times[i];
      c[i + 1] = sign * amounts[i];
    }
    Right right = new Right(Right.Party.HOLDER, expiry, expiry, CashFlows.of(t, c));
    return ClosedForm.value(new Claim(CashFlows.NONE, List.of(right), 0, 0), rates).presentValue();
  }

  @Override
  public String toString() {
    return "option on " + Arrays.toString(amounts) + " at " + Arrays.toString(times);
  }
}
