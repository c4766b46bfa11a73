package ebbline.curve;

import java.util.Arrays;

/**
 * ln P as cubics: on the piece that starts at s, ln P(t) = c₀ + c₁ d + c₂ d² + c₃ d³ with d = t −
 * s; the last piece runs on for ever. Every interpolation through nodes is one of these.
 */
final class Pieces {
  /** Numbers a piece takes: its start and its four coefficients. */
  static final int WIDTH = 5;

  private double[] numbers;
  private int count;

  Pieces(int most) {
    numbers = new double[WIDTH * most];
  }

  /** Adds a piece; starts increase strictly. */
  void add(double start, double c0, double c1, double c2, double c3) {
    int at = WIDTH * count++;
    numbers[at] = start;
    numbers[at + 1] = c0;
    numbers[at + 2] = c1;
    numbers[at + 3] = c2;
    numbers[at + 4] = c3;
  }

  /** Start and coefficients, piece after piece. */
  double[] numbers() {
    return Arrays.copyOf(numbers, WIDTH * count);
  }
}
