package ebbline.curve;

import java.util.Objects;

/**
 * A curve whose zero rates all lie a spread above another's: P(0,t) e^(−st).
 *
 * @param under the other curve
 * @param spread s, continuously compounded, decimal per year; finite
 */
public record SpreadCurve(DiscountCurve under, double spread) implements DiscountCurve {

  public SpreadCurve {
    Objects.requireNonNull(under, "under");
    if (!Double.isFinite(spread)) {
      throw new IllegalArgumentException("a spread must be finite, found " + spread);
    }
  }

  @Override
  public double logDiscount(double t) {
    return under.logDiscount(t) - spread * t;
  }

  @Override
  public double forward(double t) {
    return under.forward(t) + spread;
  }

  @Override
  public double forwardSlope(double t) {
    return under.forwardSlope(t);
  }

  @Override
  public double[] nodes() {
    return under.nodes();
  }

  @Override
  public void addLogDiscountGradient(double t, double weight, double[] gradient) {
    // At a fixed spread the log discounts move one for one with those under it where the
    // gradient is taken in the latter.
    under.addLogDiscountGradient(t, weight, gradient);
  }

  @Override
  public double[] breaks() {
    return under.breaks();
  }

  @Override
  public boolean hasContinuousForward() {
    return under.hasContinuousForward();
  }
}
