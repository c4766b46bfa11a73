package ebbline.curve;

/**
 * Today's value of one unit paid at time t, P(0,t), t in years from today.
 *
 * <p>Implementations are immutable and safe to share between threads. Times below 0 are refused by
 * none of the methods for speed; callers never pass them.
 */
public interface DiscountCurve {

  /** ln P(0,t); 0 at t = 0. */
  double logDiscount(double t);

  /** P(0,t). */
  default double discount(double t) {
    return Math.exp(logDiscount(t));
  }

  /** Instantaneous forward rate −∂ ln P(0,t)/∂t, per year; the right-hand one where it jumps. */
  double forward(double t);

  /** ∂f(0,t)/∂t, per year²; the right-hand one where it jumps. */
  double forwardSlope(double t);

  /** Continuously compounded zero rate −ln P(0,t)/t; its limit, the short rate, at t = 0. */
  default double zero(double t) {
    return t == 0 ? forward(0) : -logDiscount(t) / t;
  }

  /**
   * Times of the nodes, strictly increasing, all positive; empty for a curve that comes from a
   * formula. A fresh array.
   */
  double[] nodes();

  /**
   * Adds {@code weight} × ∂ ln P(0,t)/∂ ln P(0,nodeᵢ) to {@code gradient[i]} for every node.
   *
   * @param gradient one entry a node
   */
  void addLogDiscountGradient(double t, double weight, double[] gradient);

  /**
   * Times at which the forward rate or one of its derivatives may jump, strictly increasing, from
   * 0; between two of them the forward is analytic, so a Gauss rule converges fast. A fresh array.
   */
  double[] breaks();

  /** Whether the forward rate itself is continuous, so that a drift θ(t) exists everywhere. */
  boolean hasContinuousForward();
}
