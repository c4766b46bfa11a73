package ebbline.model;

import ebbline.curve.FormulaCurve;
import java.util.Objects;

/**
 * The discount curve of Vasicek's formula: P(0,t) = exp(−θ(t − G) − rG + ½σ² ∫₀ᵗ G²).
 *
 * <p>Discount factors are good to 5e-15 relative for κ from −0.05 to 5 through 0, maturities to 50
 * years, r and θ within ±10 %, σ to 3 %.
 *
 * @param model its parameters
 */
public record VasicekCurve(Vasicek model) implements FormulaCurve {
  /*
   * The exponent may reach 20 and, with negative κ, 200: a rounding of its last bit is then 1e-14 in the price. So
   * it is summed in twofold arithmetic, product aτ included, and its low part goes into the exponential.
   */

  public VasicekCurve {
    Objects.requireNonNull(model, "model");
  }

  private Twofold exponent(double t) {
    Twofold x = Twofold.product(model.meanReversion(), t);
    Twofold gone = x.times(Reversion.first(x)).times(t); // t − G
    Twofold g = Twofold.of(t).minus(gone);
    Twofold square = Twofold.product(model.volatility(), model.volatility()).times(0.5);
    Twofold cube = Twofold.product(t, t).times(t);
    return Reversion.second(x)
        .times(cube)
        .times(square)
        .minus(gone.times(model.longRunMean()))
        .minus(g.times(model.shortRate()));
  }

  @Override
  public double logDiscount(double t) {
    return exponent(t).value();
  }

  @Override
  public double discount(double t) {
    return exponent(t).exp();
  }

  @Override
  public double forward(double t) {
    double g = Reversion.g(model.meanReversion(), t);
    double reached = -Math.expm1(-model.meanReversion() * t);
    double sigma = model.volatility();
    return model.shortRate()
        + (model.longRunMean() - model.shortRate()) * reached
        - 0.5 * sigma * sigma * g * g;
  }

  @Override
  public double forwardSlope(double t) {
    double a = model.meanReversion();
    double sigma = model.volatility();
    return Math.exp(-a * t)
        * (a * (model.longRunMean() - model.shortRate()) - sigma * sigma * Reversion.g(a, t));
  }
}
