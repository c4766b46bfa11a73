package ebbline.curve;

/**
 * How the forward of one interval departs from the interval's average: g(x), x from 0 to 1, with
 * g(0) = g₀, g(1) = g₁ and ∫g = 0, in the four shapes of Hagan and West [Applied Math. Finance
 * 13(2), 2006].
 */
final class ForwardShape {
  /*
   * Where g₀ and g₁ have opposite signs and neither is more than twice the other, one parabola does (region i). In
   * the three other regions g falls to a level A at η and leaves it again,
   *   g = A + (g₀ − A) w²,  w = (η − x)/η before η;   g = A + (g₁ − A) v²,  v = (x − η)/(1 − η) after it:
   * region ii has A = g₀ (flat, then a parabola), region iii A = g₁ (a parabola, then flat), region iv, equal signs,
   * A = −g₀g₁/(g₀ + g₁). In all three ∫₀ˣ g = A x + (g₀ − A) η (1 − w³)/3 + (g₁ − A)(1 − η) v³/3.
   * If one of g₀, g₁ is 0 and the other is not, η is 0 or 1 and the forward jumps there: the shape's own limit.
   */
  private static final double NARROW = 1e-9;

  private final double g0;
  private final double g1;
  private final boolean parabola;
  private final double level;
  private final double eta;
  // ∂/∂g₀ and ∂/∂g₁ of the level and of η.
  private final double levelBy0;
  private final double levelBy1;
  private final double etaBy0;
  private final double etaBy1;

  ForwardShape(double g0, double g1) {
    this.g0 = g0;
    this.g1 = g1;
    double a = Math.abs(g0);
    double b = Math.abs(g1);
    boolean opposite = (g0 < 0 && g1 > 0) || (g0 > 0 && g1 < 0);
    parabola = (a == 0 && b == 0) || (opposite && b >= 0.5 * a && b <= 2 * a);
    if (parabola) {
      level = 0;
      eta = 0;
      levelBy0 = 0;
      levelBy1 = 0;
      etaBy0 = 0;
      etaBy1 = 0;
    } else if (opposite) {
      boolean flatFirst = b > 2 * a;
      double span = g1 - g0;
      level = flatFirst ? g0 : g1;
      eta = flatFirst ? (g1 + 2 * g0) / span : 3 * g1 / span;
      levelBy0 = flatFirst ? 1 : 0;
      levelBy1 = flatFirst ? 0 : 1;
      etaBy0 = 3 * g1 / span / span;
      etaBy1 = -3 * g0 / span / span;
    } else {
      double sum = g0 + g1;
      eta = g1 / sum;
      level = -g0 * eta;
      levelBy0 = -eta * eta;
      levelBy1 = -(g0 / sum) * (g0 / sum);
      etaBy0 = -eta / sum;
      etaBy1 = g0 / sum / sum;
    }
  }

  /**
   * Whether g comes to g₀ and g₁ at its ends. A parabola narrower than 1e-9 of the interval is a
   * jump: it comes from averages that are equal but for rounding. The flat part of a shape may be
   * as narrow as it likes.
   */
  boolean isContinuous() {
    boolean falls = level != g0;
    boolean rises = level != g1;
    return parabola || ((!falls || eta > NARROW) && (!rises || eta < 1 - NARROW));
  }

  /**
   * Adds the pieces of ln P for the interval.
   *
   * @param from its start
   * @param to its end
   * @param log ln P at the start
   * @param average of the forward
   */
  void addPieces(Pieces pieces, double from, double to, double log, double average) {
    double h = to - from;
    if (parabola) {
      double linear = -4 * g0 - 2 * g1;
      add(pieces, from, log, average + g0, linear / h, 3 * (g0 + g1) / (h * h));
      return;
    }
    double split = from + eta * h;
    double falling = g0 - level;
    if (split > from) {
      double width = eta * h;
      add(pieces, from, log, average + g0, -2 * falling / width, falling / (width * width));
    }
    if (split < to) {
      double start = Math.max(split, from);
      double reached = log - h * eta * (average + level + falling / 3);
      double width = (1 - eta) * h;
      add(pieces, start, reached, average + level, 0, (g1 - level) / (width * width));
    }
  }

  /** A piece on which the forward is value + linear d + square d². */
  private static void add(
      Pieces pieces, double start, double log, double value, double linear, double square) {
    pieces.add(start, log, -value, -linear / 2, -square / 3);
  }

  /** ∂/∂g₀ of ∫₀ˣ g. */
  double integralBy0(double x) {
    if (parabola) {
      return x * (1 - x) * (1 - x);
    }
    return levelBy0 * integralByLevel(x) + etaBy0 * integralByEta(x) + before(x);
  }

  /** ∂/∂g₁ of ∫₀ˣ g. */
  double integralBy1(double x) {
    if (parabola) {
      return -x * x * (1 - x);
    }
    return levelBy1 * integralByLevel(x) + etaBy1 * integralByEta(x) + after(x);
  }

  private double w(double x) {
    return x < eta ? (eta - x) / eta : 0;
  }

  private double v(double x) {
    return x > eta ? (x - eta) / (1 - eta) : 0;
  }

  private double before(double x) {
    double w = w(x);
    return eta * (1 - w * w * w) / 3;
  }

  private double after(double x) {
    double v = v(x);
    return (1 - eta) * v * v * v / 3;
  }

  private double integralByLevel(double x) {
    return x - before(x) - after(x);
  }

  private double integralByEta(double x) {
    double w = w(x);
    double v = v(x);
    return (g0 - level) / 3 * (1 - w * w * (3 - 2 * w)) - (g1 - level) / 3 * v * v * (3 - 2 * v);
  }
}
