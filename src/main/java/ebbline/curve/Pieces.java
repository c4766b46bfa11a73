package ebbline.curve;

import java.util.ArrayList;
import java.util.List;

/**
 * ln P as cubics: on the piece that starts at s, ln P(t) = c₀ + c₁ d + c₂ d² + c₃ d³ with d = t −
 * s; the last piece runs on for ever. Every interpolation is one of these.
 */
final class Pieces {
  private final List<Jet> starts = new ArrayList<>();
  private final List<Jet[]> coefficients = new ArrayList<>();

  /** Adds a piece; starts increase. */
  void add(Jet start, Jet c0, Jet c1, Jet c2, Jet c3) {
    starts.add(start);
    coefficients.add(new Jet[] {c0, c1, c2, c3});
  }

  int count() {
    return starts.size();
  }

  double start(int i) {
    return starts.get(i).value();
  }

  /** Value of coefficient {@code power} of piece {@code i}. */
  double value(int i, int power) {
    return coefficients.get(i)[power].value();
  }

  /**
   * Derivative of ln P at distance d into piece {@code i}, in the direction of the jets. A start
   * that moves (inside an interval) changes d; ln P and its slope are continuous there, so only the
   * chain rule through d counts.
   */
  double slope(int i, double d) {
    Jet[] c = coefficients.get(i);
    double direct = c[0].slope() + d * (c[1].slope() + d * (c[2].slope() + d * c[3].slope()));
    double inTime = c[1].value() + d * (2 * c[2].value() + 3 * d * c[3].value());
    return direct - starts.get(i).slope() * inTime;
  }
}
