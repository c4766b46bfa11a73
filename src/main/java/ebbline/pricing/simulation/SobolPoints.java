package ebbline.pricing.simulation;

import org.apache.commons.math3.random.SobolSequenceGenerator;

/**
 * Scrambled Sobol points in up to {@link #MOST_DIMENSIONS} dimensions, direction numbers of Joe &
 * Kuo 2008, SIAM J. Sci. Comput. 30(5).
 *
 * <p>Each randomisation multiplies the direction numbers by random lower triangular matrices
 * (Matoušek 1998, J. Complexity 14(4)) and shifts the digits, so that a point's law is uniform and
 * repetitions are independent. Immutable.
 */
final class SobolPoints {
  static final int MOST_DIMENSIONS = 1000;

  /** Binary digits of a coordinate. */
  private static final int DIGITS = 52;

  /** Points of one randomisation are numbered by an int. */
  private static final int COLUMNS = 31;

  private final long[][] directions;

  SobolPoints(int dimensions) {
    directions = directions(dimensions);
  }

  private SobolPoints(long[][] directions) {
    this.directions = directions;
  }

  /*
   * The library keeps its direction numbers to itself. In Gray-code order point 2^k, as it counts them, is V_k xor
   * V_(k−1), so k + 1 points give them back exactly.
   */
  private static long[][] directions(int dimensions) {
    SobolSequenceGenerator generator = new SobolSequenceGenerator(dimensions);
    long[][] v = new long[dimensions][COLUMNS];
    for (int k = 0; k < COLUMNS; k++) {
      double[] point = generator.skipTo(1 << k);
      for (int d = 0; d < dimensions; d++) {
        long digits = (long) (point[d] * 0x1p52);
        v[d][k] = k == 0 ? digits : digits ^ v[d][k - 1];
      }
    }
    return v;
  }

  int dimensions() {
    return directions.length;
  }

  /** The same points, their digits scrambled anew. */
  SobolPoints scrambled(long seed) {
    long[][] v = new long[directions.length][COLUMNS];
    long[] rows = new long[DIGITS];
    for (int d = 0; d < v.length; d++) {
      for (int row = 0; row < DIGITS; row++) {
        // Digit 'row' from the left depends on itself and on those left of it.
        long self = 1L << (DIGITS - 1 - row);
        long left = ((1L << DIGITS) - 1) & -(self << 1);
        rows[row] = self | (Mixing.mixed(seed, (long) d * DIGITS + row) & left);
      }
      for (int k = 0; k < COLUMNS; k++) {
        long digits = 0;
        for (int row = 0; row < DIGITS; row++) {
          digits = digits << 1 | (Long.bitCount(rows[row] & directions[d][k]) & 1);
        }
        v[d][k] = digits;
      }
    }
    return new SobolPoints(v);
  }

  /** The digits of one coordinate of a point, counted from 0 in Gray-code order. */
  long digits(int dimension, int point) {
    long[] v = directions[dimension];
    long digits = 0;
    int gray = point ^ (point >>> 1);
    for (; gray != 0; gray &= gray - 1) {
      digits ^= v[Integer.numberOfTrailingZeros(gray)];
    }
    return digits;
  }

  /**
   * The same coordinate of points {@code first} and after, shifted, as standard normals.
   *
   * @param scratch as long as {@code out}
   */
  void normals(int dimension, int first, long shift, double[] out, double[] scratch, int count) {
    long[] v = directions[dimension];
    long digits = digits(dimension, first) ^ shift;
    for (int i = 0; i < count; i++) {
      scratch[i] = (digits + 0.5) * 0x1p-52 - 0.5;
      digits ^= v[Integer.numberOfTrailingZeros(first + i + 1)];
    }
    NormalQuantile.at(scratch, out, count);
  }

  /** A shift of all digits. */
  static long shift(long seed, int dimension) {
    return Mixing.mixed(seed, dimension) >>> (Long.SIZE - DIGITS);
  }
}
