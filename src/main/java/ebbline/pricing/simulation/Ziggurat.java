package ebbline.pricing.simulation;

/**
 * Standard normals in blocks: the ziggurat of Marsaglia & Tsang 2000, J. Statistical Software 5(8),
 * with 256 layers and 53 bits, over the generator xoshiro256++ of Blackman & Vigna 2021, ACM TOMS
 * 47(4).
 *
 * <p>Mutable; one for each chunk of paths.
 */
final class Ziggurat {
  private static final int LAYERS = 256;

  /** Where the tail starts, and the area of each layer. */
  private static final double EDGE = 3.654152885361009;

  private static final double AREA = 0.00492867323399;

  private static final double[] WIDTH = new double[LAYERS + 1];
  private static final double[] INSIDE = new double[LAYERS];
  private static final double[] HEIGHT = new double[LAYERS + 1];

  static {
    WIDTH[0] = AREA / Math.exp(-0.5 * EDGE * EDGE);
    WIDTH[1] = EDGE;
    for (int i = 2; i < LAYERS; i++) {
      double x = WIDTH[i - 1];
      WIDTH[i] = Math.sqrt(-2 * Math.log(AREA / x + Math.exp(-0.5 * x * x)));
    }
    for (int i = 0; i < LAYERS; i++) {
      INSIDE[i] = WIDTH[i + 1] / WIDTH[i];
    }
    for (int i = 0; i <= LAYERS; i++) {
      HEIGHT[i] = Math.exp(-0.5 * WIDTH[i] * WIDTH[i]);
    }
  }

  private long s0;
  private long s1;
  private long s2;
  private long s3;

  /** A stream of its own for each counter under one seed. */
  Ziggurat(long seed, long counter) {
    long key = Mixing.mixed(seed, counter);
    s0 = Mixing.mixed(key, 0);
    s1 = Mixing.mixed(key, 1);
    s2 = Mixing.mixed(key, 2);
    s3 = Mixing.mixed(key, 3);
  }

  /** The next {@code count} normals. */
  void fill(double[] out, int count) {
    int i = 0;
    while (i < count) {
      i = run(out, i, count);
      if (i < count) {
        out[i++] = slow();
      }
    }
  }

  private long pending;

  /** Draws that fall inside their layer, 98.8 % of all; ends before one that does not. */
  private int run(double[] out, int from, int count) {
    long a = s0;
    long b = s1;
    long c = s2;
    long d = s3;
    int i = from;
    for (; i < count; i++) {
      long bits = Long.rotateLeft(a + d, 23) + a;
      long t = b << 17;
      c ^= a;
      d ^= b;
      b ^= c;
      a ^= d;
      c ^= t;
      d = Long.rotateLeft(d, 45);
      int layer = (int) bits & (LAYERS - 1);
      double v = (bits >> 11) * 0x1p-52;
      if (Math.abs(v) >= INSIDE[layer]) {
        pending = bits;
        break;
      }
      out[i] = v * WIDTH[layer];
    }
    s0 = a;
    s1 = b;
    s2 = c;
    s3 = d;
    return i;
  }

  private double slow() {
    long bits = pending;
    while (true) {
      int layer = (int) bits & (LAYERS - 1);
      double v = (bits >> 11) * 0x1p-52;
      if (Math.abs(v) < INSIDE[layer]) {
        return v * WIDTH[layer];
      }
      if (layer == 0) {
        return v < 0 ? -tail() : tail();
      }
      double x = v * WIDTH[layer];
      double low = HEIGHT[layer];
      if (low + uniform() * (HEIGHT[layer + 1] - low) < Math.exp(-0.5 * x * x)) {
        return x;
      }
      bits = next();
    }
  }

  /** Beyond the edge, by Marsaglia 1964. */
  private double tail() {
    while (true) {
      double x = -Math.log(uniform()) / EDGE;
      double y = -Math.log(uniform());
      if (y + y >= x * x) {
        return EDGE + x;
      }
    }
  }

  private double uniform() {
    return ((next() >>> 11) + 0.5) * 0x1p-53;
  }

  private long next() {
    long bits = Long.rotateLeft(s0 + s3, 23) + s0;
    long t = s1 << 17;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= t;
    s3 = Long.rotateLeft(s3, 45);
    return bits;
  }
}
