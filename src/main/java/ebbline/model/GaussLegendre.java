package ebbline.model;

import java.util.function.DoubleUnaryOperator;

/** The Gauss–Legendre rule of n points, exact for polynomials up to degree 2n − 1. Immutable. */
public final class GaussLegendre {
  private final double[] nodes;
  private final double[] weights;

  private GaussLegendre(double[] nodes, double[] weights) {
    this.nodes = nodes;
    this.weights = weights;
  }

  /**
   * Nodes by Newton's method on the three-term recurrence, good to 1e-15.
   *
   * @param points from 1 to 1000
   */
  public static GaussLegendre of(int points) {
    if (!(points >= 1 && points <= 1000)) {
      throw new IllegalArgumentException("a rule has 1 to 1000 points, found " + points);
    }
    double[] nodes = new double[points];
    double[] weights = new double[points];
    for (int i = 0; i < (points + 1) / 2; i++) {
      double x = Math.cos(Math.PI * (i + 0.75) / (points + 0.5));
      double slope = 1;
      for (int iteration = 0; iteration < 8; iteration++) {
        double before = 0;
        double p = 1;
        for (int k = 1; k <= points; k++) {
          double next = ((2 * k - 1) * x * p - (k - 1) * before) / k;
          before = p;
          p = next;
        }
        slope = points * (x * p - before) / (x * x - 1);
        x -= p / slope;
      }
      nodes[i] = -x;
      nodes[points - 1 - i] = x;
      weights[i] = 2 / ((1 - x * x) * slope * slope);
      weights[points - 1 - i] = weights[i];
    }
    if (points % 2 == 1) {
      nodes[points / 2] = 0;
    }
    return new GaussLegendre(nodes, weights);
  }

  public int points() {
    return nodes.length;
  }

  /** On [−1, 1], increasing. */
  public double node(int i) {
    return nodes[i];
  }

  /** On [−1, 1]. */
  public double weight(int i) {
    return weights[i];
  }

  public double integrate(DoubleUnaryOperator function, double from, double to) {
    double half = 0.5 * (to - from);
    double middle = 0.5 * (to + from);
    double sum = 0;
    for (int i = 0; i < nodes.length; i++) {
      sum += weights[i] * function.applyAsDouble(middle + half * nodes[i]);
    }
    return half * sum;
  }
}
