package ebbline.model;

import ebbline.curve.DiscountCurve;
import java.util.Objects;

/**
 * Hull and White's model: the Gaussian short rate fitted to a curve by its drift. Hull and White
 * 1990, Rev. Fin. Studies 3(4).
 *
 * @param meanReversion a, per year; finite, may be 0 (Ho and Lee's model) or negative
 * @param volatility σ(·), per year^(3/2)
 */
public record HullWhite(double meanReversion, VolatilitySteps volatility) {

  public HullWhite {
    Objects.requireNonNull(volatility, "volatility");
    if (!Double.isFinite(meanReversion)) {
      throw new IllegalArgumentException("mean reversion must be finite, found " + meanReversion);
    }
  }

  /** The model on a curve, which it reprices exactly. */
  public GaussianRates on(DiscountCurve curve) {
    return new GaussianRates(curve, meanReversion, volatility);
  }
}
