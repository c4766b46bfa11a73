package ebbline.curve;

import java.util.Objects;

/**
 * Smith and Wilson's curve: through its nodes, and beyond them towards an ultimate forward rate
 * [Smith & Wilson 2001; EIOPA technical documentation of the risk-free term structure].
 *
 * <p>Unlike the curves of {@link InterpolatedCurve} it does not hold the last forward: where it
 * goes is its purpose. Discount factors at the nodes are met to 1e-13.
 */
public final class SmithWilsonCurve implements DiscountCurve {
  /*
   * P(t) = e^(−ωt) N(t), N(t) = 1 + Σⱼ H(t,uⱼ) wⱼ, with the kernel, a = min(t,u), b = max(t,u),
   *   H(t,u) = α a − e^(−αb) sinh(α a).
   * Between two nodes the sums over the nodes before t and after t are two numbers each, kept per interval and
   * scaled by the interval's ends so that no exponential grows: a look-up costs the same for any number of nodes.
   */
  private static final int PROBES = 16;

  private final double ultimateForward;
  private final double omega;
  private final double speed;
  private final double[] times;
  private final double[] weights;
  private final double[] logs;

  /** Made when node sensitivities are first asked for, unless the curve came from its nodes. */
  private volatile KernelSystem system;

  // Of interval i, (uᵢ₋₁, uᵢ]: 1 + Σ α uⱼ wⱼ and Σ sinh(αuⱼ) e^(−αuᵢ₋₁) wⱼ over the nodes before
  // it,
  private final double[] level;
  private final double[] decay;
  // Σ wⱼ and Σ e^(−α(uⱼ − uᵢ)) wⱼ over those at its end and after.
  private final double[] ahead;
  private final double[] growth;

  private SmithWilsonCurve(
      double[] times, double[] weights, double ultimateForward, double speed, KernelSystem system) {
    this.times = times;
    this.weights = weights;
    this.ultimateForward = ultimateForward;
    this.speed = speed;
    this.system = system;
    omega = Math.log1p(ultimateForward);
    int n = times.length;
    level = new double[n + 1];
    decay = new double[n + 1];
    ahead = new double[n + 1];
    growth = new double[n + 1];
    level[0] = 1;
    for (int i = 1; i <= n; i++) {
      double u = times[i - 1];
      double shrink = i == 1 ? 0 : Math.exp(-speed * (u - times[i - 2]));
      level[i] = level[i - 1] + speed * u * weights[i - 1];
      decay[i] = decay[i - 1] * shrink - 0.5 * Math.expm1(-2 * speed * u) * weights[i - 1];
    }
    for (int i = n - 1; i >= 0; i--) {
      double shrink = i == n - 1 ? 0 : Math.exp(-speed * (times[i + 1] - times[i]));
      ahead[i] = ahead[i + 1] + weights[i];
      growth[i] = growth[i + 1] * shrink + weights[i];
    }
    logs = new double[n];
    requirePositive();
    for (int i = 0; i < n; i++) {
      logs[i] = logDiscount(times[i]);
    }
  }

  /**
   * The curve through nodes.
   *
   * @param times years, positive, strictly increasing
   * @param logDiscounts ln P at the times
   * @param ultimateForward annually compounded, decimal per year, above −1
   * @param speed α, per year, above 0: how fast forwards approach the ultimate one
   * @throws IllegalArgumentException if a rule above is broken or a discount factor of the curve
   *     would not be positive
   */
  public static SmithWilsonCurve of(
      double[] times, double[] logDiscounts, double ultimateForward, double speed) {
    NodeRules.check(times, logDiscounts);
    checkSettings(ultimateForward, speed);
    double omega = Math.log1p(ultimateForward);
    KernelSystem system = new KernelSystem(times, speed);
    double[] side = new double[times.length];
    for (int i = 0; i < side.length; i++) {
      side[i] = Math.expm1(logDiscounts[i] + omega * times[i]);
    }
    return new SmithWilsonCurve(times.clone(), system.solve(side), ultimateForward, speed, system);
  }

  /**
   * The curve of given kernel weights, as the solution of quotes leaves them (the vector Qb of the
   * regulator's documents).
   *
   * @param times where the kernels stand: years, positive, strictly increasing
   */
  public static SmithWilsonCurve ofWeights(
      double[] times, double[] weights, double ultimateForward, double speed) {
    NodeRules.check(times, weights);
    checkSettings(ultimateForward, speed);
    return new SmithWilsonCurve(times.clone(), weights.clone(), ultimateForward, speed, null);
  }

  private static void checkSettings(double ultimateForward, double speed) {
    if (!(ultimateForward > -1 && Double.isFinite(ultimateForward))) {
      throw new IllegalArgumentException(
          "an ultimate forward rate must be above -1, found " + ultimateForward);
    }
    if (!(speed > 0 && Double.isFinite(speed))) {
      throw new IllegalArgumentException("a speed must be above 0, found " + speed);
    }
  }

  /** Beyond the last node N is monotone, between two it is looked at closely. */
  private void requirePositive() {
    double from = 0;
    for (double to : times) {
      for (int k = 1; k <= PROBES; k++) {
        requirePositive(growthAt(from + (to - from) * k / PROBES), to);
      }
      from = to;
    }
    requirePositive(level[times.length], Double.POSITIVE_INFINITY);
  }

  private void requirePositive(double factor, double to) {
    if (!(factor > 0 && Double.isFinite(factor))) {
      throw new IllegalArgumentException(
          "discount factors must stay positive, those before "
              + to
              + " years do not with an ultimate forward rate of "
              + ultimateForward
              + " and a speed of "
              + speed);
    }
  }

  /** H(t,u) of two times and a speed α: what a kernel at u adds to e^(ωt) P(t). */
  public static double kernel(double t, double u, double speed) {
    double a = Math.min(t, u);
    double b = Math.max(t, u);
    return speed * a + 0.5 * Math.exp(-speed * (b - a)) * Math.expm1(-2 * speed * a);
  }

  /** N(t). */
  private double growthAt(double t) {
    int i = Scheme.interval(times, t);
    double sum = level[i] + speed * t * ahead[i];
    if (i > 0) {
      sum -= decay[i] * Math.exp(-speed * (t - times[i - 1]));
    }
    if (i < times.length) {
      double rising = -0.5 * Math.exp(-speed * (times[i] - t)) * Math.expm1(-2 * speed * t);
      sum -= growth[i] * rising;
    }
    return sum;
  }

  /** N′(t). */
  private double growthSlope(double t) {
    int i = Scheme.interval(times, t);
    double sum = speed * ahead[i];
    if (i > 0) {
      sum += speed * decay[i] * Math.exp(-speed * (t - times[i - 1]));
    }
    if (i < times.length) {
      double cosh = 0.5 * Math.exp(-speed * (times[i] - t)) * (1 + Math.exp(-2 * speed * t));
      sum -= speed * growth[i] * cosh;
    }
    return sum;
  }

  /** N″(t). */
  private double growthBend(double t) {
    int i = Scheme.interval(times, t);
    double sum = 0;
    if (i > 0) {
      sum -= decay[i] * Math.exp(-speed * (t - times[i - 1]));
    }
    if (i < times.length) {
      double sinh = -0.5 * Math.exp(-speed * (times[i] - t)) * Math.expm1(-2 * speed * t);
      sum -= growth[i] * sinh;
    }
    return speed * speed * sum;
  }

  @Override
  public double logDiscount(double t) {
    return Math.log(growthAt(t)) - omega * t;
  }

  @Override
  public double forward(double t) {
    return omega - growthSlope(t) / growthAt(t);
  }

  @Override
  public double forwardSlope(double t) {
    double growth = growthAt(t);
    double slope = growthSlope(t) / growth;
    return slope * slope - growthBend(t) / growth;
  }

  @Override
  public double[] nodes() {
    return times.clone();
  }

  /** ln P at the nodes. A fresh array. */
  public double[] nodeLogDiscounts() {
    return logs.clone();
  }

  /** The weights of the kernels. A fresh array. */
  public double[] weights() {
    return weights.clone();
  }

  /** Annually compounded, decimal per year. */
  public double ultimateForward() {
    return ultimateForward;
  }

  /** α, per year. */
  public double speed() {
    return speed;
  }

  /** How far the forward still is from the ultimate one at t, continuously compounded, per year. */
  public double gap(double t) {
    return Math.abs(growthSlope(t) / growthAt(t));
  }

  @Override
  public void addLogDiscountGradient(double t, double weight, double[] gradient) {
    Objects.requireNonNull(gradient, "gradient");
    double[] kernels = new double[times.length];
    for (int j = 0; j < times.length; j++) {
      kernels[j] = kernel(t, times[j], speed);
    }
    KernelSystem solved = system;
    if (solved == null) {
      solved = new KernelSystem(times, speed);
      system = solved; // two threads may both make it: the same figures
    }
    double[] share = solved.solve(kernels);
    double scale = weight / growthAt(t);
    for (int j = 0; j < times.length; j++) {
      gradient[j] += scale * share[j] * growthAt(times[j]);
    }
  }

  @Override
  public double[] breaks() {
    double[] breaks = new double[times.length + 1];
    System.arraycopy(times, 0, breaks, 1, times.length);
    return breaks;
  }

  @Override
  public boolean hasContinuousForward() {
    return true;
  }
}
