package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.curve.SpreadCurve;
import ebbline.instrument.Claim;
import ebbline.model.GaussianRates;
import ebbline.model.VolatilitySteps;
import java.util.Objects;

/**
 * A claim with rights seen at a constant spread over the model's curve: price from spread, spread
 * from price, and how the price moves with the curve and the volatility at that spread.
 *
 * <p>Prices are dirty, at settlement, per 100 face; spreads continuously compounded, decimals per
 * year. The rate's volatility and mean reversion stay as they are whatever the spread.
 *
 * @param claim with or without rights
 * @param rates the model without spread
 */
public record OptionAdjusted(Claim claim, GaussianRates rates) {
  /** Half-width of the parallel shift for duration and convexity: 10 basis points. */
  private static final double SHIFT = 0.001;

  /** Relative change of a volatility for its vega. */
  private static final double NUDGE = 0.002;

  private static final double SMALLEST_NUDGE = 1e-6;
  private static final double BASIS_POINT = 1e-4;
  private static final double WIDEST = 2;
  private static final int MOST_STEPS = 60;

  public OptionAdjusted {
    Objects.requireNonNull(claim, "claim");
    Objects.requireNonNull(rates, "rates");
  }

  private GaussianRates at(double spread, VolatilitySteps volatility) {
    return new GaussianRates(
        new SpreadCurve(rates.curve(), spread), rates.meanReversion(), volatility);
  }

  /** The dirty price at a spread, with the bound of its error. */
  public Valuation dirtyPrice(double spread) {
    return dirtyPrice(at(spread, rates.volatility()));
  }

  private Valuation dirtyPrice(GaussianRates shifted) {
    Valuation now = BestMethod.value(claim, shifted);
    DiscountCurve curve = shifted.curve();
    double growth = Math.exp(-curve.logDiscount(claim.settlement()));
    return new Valuation(now.presentValue() * growth, now.method(), now.errorBound() * growth);
  }

  private double price(double spread) {
    return price(at(spread, rates.volatility()));
  }

  private double price(GaussianRates shifted) {
    double growth = Math.exp(-shifted.curve().logDiscount(claim.settlement()));
    return BestMethod.presentValue(claim, shifted) * growth;
  }

  /**
   * The option-adjusted spread: the one at which the claim is worth a price. Good to 1e-10, or the
   * price's own error over its slope.
   *
   * @param dirty price at settlement, per 100
   * @throws IllegalArgumentException if no spread from −200 % to 200 % gives the price
   */
  public double spread(double dirty) {
    if (!Double.isFinite(dirty)) {
      throw new IllegalArgumentException("a price must be finite, found " + dirty);
    }
    double a = 0;
    double fa = price(a) - dirty;
    if (fa == 0) {
      return 0;
    }
    double direction = fa > 0 ? 1 : -1;
    double b = direction * 0.01;
    double fb = price(b) - dirty;
    while (fb > 0 == fa > 0) {
      if (Math.abs(b) >= WIDEST) {
        throw new IllegalArgumentException(
            "no spread from -200% to 200% gives this price, found " + dirty);
      }
      a = b;
      fa = fb;
      b = Math.max(-WIDEST, Math.min(WIDEST, 2 * b));
      fb = price(b) - dirty;
    }
    // Regula falsi with halved weights (Illinois).
    double last = a;
    for (int i = 0; i < MOST_STEPS; i++) {
      double next = b - fb * (b - a) / (fb - fa);
      double f = price(next) - dirty;
      if (f == 0 || Math.abs(next - last) < 1e-11) {
        return next;
      }
      last = next;
      if (f > 0 != fb > 0) {
        a = b;
        fa = fb;
      } else {
        fa *= 0.5;
      }
      b = next;
      fb = f;
    }
    return last;
  }

  /** What the rights add to the present value at a spread; negative for a callable bond. */
  public Valuation rightsValue(double spread) {
    return BestMethod.rightsValue(claim, at(spread, rates.volatility()));
  }

  /** −P′/P under a parallel shift of the curve by 10 basis points either way, years. */
  public double effectiveDuration(double spread) {
    return (price(spread - SHIFT) - price(spread + SHIFT)) / (2 * SHIFT * price(spread));
  }

  /** P″/P under the same shifts, years². */
  public double effectiveConvexity(double spread) {
    double middle = price(spread);
    return (price(spread - SHIFT) - 2 * middle + price(spread + SHIFT)) / (SHIFT * SHIFT * middle);
  }

  /** Change of the dirty price for one basis point more of each volatility step. */
  public double[] vega(double spread) {
    VolatilitySteps steps = rates.volatility();
    double[] vega = new double[steps.count()];
    double[] ends = new double[steps.count() - 1];
    double[] values = new double[steps.count()];
    for (int i = 0; i < values.length; i++) {
      values[i] = steps.value(i);
      if (i < ends.length) {
        ends[i] = steps.until(i);
      }
    }
    for (int i = 0; i < values.length; i++) {
      double kept = values[i];
      double up = kept + Math.max(SMALLEST_NUDGE, NUDGE * kept);
      double down = Math.max(0, kept - Math.max(SMALLEST_NUDGE, NUDGE * kept));
      values[i] = up;
      double high = price(at(spread, VolatilitySteps.of(ends, values)));
      values[i] = down;
      double low = price(at(spread, VolatilitySteps.of(ends, values)));
      values[i] = kept;
      vega[i] = (high - low) / (up - down) * BASIS_POINT;
    }
    return vega;
  }
}
