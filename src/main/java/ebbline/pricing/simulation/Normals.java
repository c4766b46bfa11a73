package ebbline.pricing.simulation;

/**
 * The independent normals of a set of paths: two a step, one that moves the state and one for what
 * is left of its integral.
 *
 * <p>Immutable; cursors are made for each chunk.
 */
final class Normals {
  private final Sampling sampling;
  private final int steps;
  private final BridgeOrder order;
  private final SobolPoints[] points;

  Normals(Sampling sampling, int steps) {
    this.sampling = sampling;
    this.steps = steps;
    boolean sobol = sampling.points() == Sampling.Points.SOBOL;
    order = new BridgeOrder(sobol ? steps : 0);
    points = new SobolPoints[sobol && steps > 0 ? Sampling.BATCHES : 0];
    if (points.length > 0) {
      SobolPoints plain = new SobolPoints(Math.min(2 * steps, SobolPoints.MOST_DIMENSIONS));
      for (int b = 0; b < points.length; b++) {
        points[b] = plain.scrambled(Mixing.mixed(sampling.seed(), b));
      }
    }
  }

  /** Fills the blocks of one chunk, in order. */
  final class Cursor {
    private final int batch;
    private final long seed;
    private final Ziggurat ziggurat;
    private final double[][] path;
    private final double[] scratch;
    private int next;

    /**
     * @param first the chunk's first path within its batch
     * @param most the largest block
     */
    Cursor(int batch, int first, int most) {
      this.batch = batch;
      this.next = first;
      seed = Mixing.mixed(sampling.seed() ^ 0x5deece66dL, batch);
      ziggurat = new Ziggurat(seed, first);
      path = new double[points.length == 0 ? 0 : steps + 1][most];
      scratch = new double[most];
    }

    /**
     * The next {@code count} paths.
     *
     * @param state normals of the state, a row a step
     * @param rest normals of the rest of the integral
     */
    void fill(double[][] state, double[][] rest, int count) {
      if (sampling.points() == Sampling.Points.PSEUDO_RANDOM) {
        for (int k = 0; k < steps; k++) {
          ziggurat.fill(state[k], count);
          ziggurat.fill(rest[k], count);
        }
      } else if (points.length == 0) {
        mirrored(state, count);
        mirrored(rest, count);
      } else {
        for (int k = 0; k < steps; k++) {
          coordinate(2 * k, state[k], count);
          coordinate(2 * k + 1, rest[k], count);
        }
        order.inTime(state, path, count);
        order.inTime(rest, path, count);
      }
      next += count;
    }

    private void coordinate(int dimension, double[] out, int count) {
      SobolPoints mine = points[batch];
      if (dimension < mine.dimensions()) {
        mine.normals(dimension, next, SobolPoints.shift(seed, dimension), out, scratch, count);
      } else {
        // Beyond the table's dimensions, where points say little anyway.
        ziggurat.fill(out, count);
      }
    }

    private void mirrored(double[][] rows, int count) {
      int half = count / 2;
      for (double[] row : rows) {
        ziggurat.fill(row, half);
        for (int i = 0; i < half; i++) {
          row[half + i] = -row[i];
        }
      }
    }
  }
}
