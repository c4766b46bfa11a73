package ebbline.model;

/**
 * Vasicek's short rate, dr = κ (θ − r) dt + σ dW. Vasicek 1977, J. Fin. Econ. 5.
 *
 * <p>Time in years, rates as decimals per year (0.03 is 3 %); rates may be negative.
 *
 * @param shortRate r today, per year; finite
 * @param longRunMean θ, per year; finite
 * @param meanReversion κ, per year; finite, may be 0 (no reversion) or negative
 * @param volatility σ, per year^(3/2); at least 0
 */
public record Vasicek(
    double shortRate, double longRunMean, double meanReversion, double volatility) {

  public Vasicek {
    requireFinite("short rate", shortRate);
    requireFinite("long-run mean", longRunMean);
    requireFinite("mean reversion", meanReversion);
    if (!(volatility >= 0 && Double.isFinite(volatility))) {
      throw new IllegalArgumentException("volatility must be at least 0, found " + volatility);
    }
  }

  /** The model as a state on its own curve, read as a law under the pricing measure. */
  public GaussianRates rates() {
    return new GaussianRates(
        new VasicekCurve(this), meanReversion, VolatilitySteps.constant(volatility));
  }

  /**
   * Adds {@code weight} × the derivatives of ln P(0,t) in the short rate, the long-run mean, the
   * mean reversion and the volatility, in this order.
   *
   * @param t years, at least 0
   * @param gradient four entries
   */
  public void addLogDiscountGradient(double t, double weight, double[] gradient) {
    double a = meanReversion;
    double integral = Reversion.integralOfG(a, t);
    double square = Reversion.integralOfSquare(a, t);
    gradient[0] -= weight * Reversion.g(a, t);
    gradient[1] -= weight * a * integral;
    gradient[2] +=
        weight
            * (-longRunMean * (integral + a * Reversion.slopeOfIntegral(a, t))
                - shortRate * Reversion.slopeOfG(a, t)
                + 0.5 * volatility * volatility * Reversion.slopeOfSquare(a, t));
    gradient[3] += weight * volatility * square;
  }

  /**
   * The law of the rate after {@code years}, given {@code rate} now.
   *
   * @param years at least 0
   */
  public NormalLaw after(double years, double rate) {
    if (!(years >= 0 && Double.isFinite(years))) {
      throw new IllegalArgumentException("a horizon is not before today, found " + years);
    }
    double reached = -Math.expm1(-meanReversion * years);
    double variance = volatility * volatility * Reversion.g(2 * meanReversion, years);
    return new NormalLaw(rate + (longRunMean - rate) * reached, Math.sqrt(variance));
  }

  /**
   * The law of the rate in the far future: mean θ, variance σ²/2κ.
   *
   * @throws IllegalArgumentException if κ is not positive
   */
  public NormalLaw limitingLaw() {
    requireReversion("a limiting law");
    return new NormalLaw(longRunMean, volatility / Math.sqrt(2 * meanReversion));
  }

  /**
   * Years until half of the way to the mean is gone, ln 2/κ.
   *
   * @throws IllegalArgumentException if κ is not positive
   */
  public double halfLife() {
    requireReversion("a half-life");
    return Math.log(2) / meanReversion;
  }

  /**
   * From the historical to the pricing measure: κ and σ stay, the long-run mean becomes θ − λσ/κ.
   *
   * @param marketPriceOfRisk λ, constant
   * @throws IllegalArgumentException if κ is 0, where the shift is in the drift and no mean exists
   */
  public Vasicek riskNeutral(double marketPriceOfRisk) {
    return withMeanShiftedBy(-marketPriceOfRisk);
  }

  /** From the pricing to the historical measure, the inverse of {@link #riskNeutral}. */
  public Vasicek historical(double marketPriceOfRisk) {
    return withMeanShiftedBy(marketPriceOfRisk);
  }

  private Vasicek withMeanShiftedBy(double risk) {
    requireFinite("market price of risk", risk);
    if (meanReversion == 0) {
      throw new IllegalArgumentException(
          "a change of measure moves the long-run mean only with mean reversion, found 0");
    }
    return new Vasicek(
        shortRate, longRunMean + risk * volatility / meanReversion, meanReversion, volatility);
  }

  private void requireReversion(String what) {
    if (!(meanReversion > 0)) {
      throw new IllegalArgumentException(
          what + " exists only with a positive mean reversion, found " + meanReversion);
    }
  }

  private static void requireFinite(String name, double value) {
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException(name + " must be finite, found " + value);
    }
  }
}
