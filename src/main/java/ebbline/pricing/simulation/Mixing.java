package ebbline.pricing.simulation;

/** Numbers without pattern from a seed and a counter: seeds of generators, bits of scrambles. */
final class Mixing {
  private static final long GOLDEN = 0x9e3779b97f4a7c15L;

  private Mixing() {}

  /** The finaliser of SplitMix64: Steele, Lea & Flood 2014, OOPSLA. */
  static long mixed(long z) {
    long a = (z ^ (z >>> 30)) * 0xbf58476d1ce4e5b9L;
    long b = (a ^ (a >>> 27)) * 0x94d049bb133111ebL;
    return b ^ (b >>> 31);
  }

  static long mixed(long seed, long counter) {
    return mixed(mixed(seed + GOLDEN) + GOLDEN * (counter + 1));
  }
}
