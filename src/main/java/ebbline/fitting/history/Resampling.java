package ebbline.fitting.history;

/**
 * How many simulated histories, from which seed.
 *
 * @param replications at least 99
 * @param seed any; the same seed gives the same figures
 */
public record Resampling(int replications, long seed) {
  public Resampling {
    if (!(replications >= 99 && replications <= 1_000_000)) {
      throw new IllegalArgumentException(
          "simulated histories must number 99 to 1000000, found " + replications);
    }
  }

  /** 1999 histories from the given seed. */
  public static Resampling seeded(long seed) {
    return new Resampling(1999, seed);
  }
}
