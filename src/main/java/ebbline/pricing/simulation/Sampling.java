package ebbline.pricing.simulation;

import java.util.Objects;

/**
 * How many paths are drawn, and how.
 *
 * @param points where the normals come from
 * @param paths at least 2; rounded up to what {@link #BATCHES} equal batches need
 * @param seed of everything random; the same seed gives the same bits
 * @param threads at least 1; the result does not depend on it
 */
public record Sampling(Points points, int paths, long seed, int threads) {
  /** Independent repetitions, from whose spread the standard error comes. */
  public static final int BATCHES = 32;

  /** The most paths that a run may have. */
  public static final int MOST_PATHS = 1 << 28;

  /** Kinds of points. */
  public enum Points {
    /** Sobol points, a scramble and a digital shift of its own for each batch. */
    SOBOL,
    /** Pseudo-random normals, each path beside its mirror image. */
    ANTITHETIC,
    /** Pseudo-random normals and nothing else, to compare with. */
    PSEUDO_RANDOM
  }

  public Sampling {
    Objects.requireNonNull(points, "points");
    if (!(paths >= 2 && paths <= MOST_PATHS)) {
      throw new IllegalArgumentException(
          "a simulation has 2 to " + MOST_PATHS + " paths, found " + paths);
    }
    if (!(threads >= 1)) {
      throw new IllegalArgumentException("at least 1 thread, found " + threads);
    }
  }

  /** Sobol points. */
  public static Sampling of(int paths, long seed, int threads) {
    return new Sampling(Points.SOBOL, paths, seed, threads);
  }

  /** Paths of each batch: even, for mirror images; a power of 2 for Sobol points. */
  public int pathsPerBatch() {
    int least = Math.max(2, (paths + BATCHES - 1) / BATCHES);
    if (points == Points.SOBOL) {
      return Integer.highestOneBit(2 * least - 1);
    }
    return least + (least & 1);
  }

  /** The same points from another seed, for a set of paths that shares nothing with this one. */
  public Sampling apart(int set) {
    return new Sampling(points, paths, Mixing.mixed(seed, ~(long) set), threads);
  }
}
