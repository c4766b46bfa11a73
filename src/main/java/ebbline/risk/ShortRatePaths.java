package ebbline.risk;

import ebbline.model.GaussianRates;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ForkJoinPool;
import java.util.stream.IntStream;
import org.apache.commons.rng.JumpableUniformRandomProvider;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Exact draws of the short rate at given times: r(t) = mean(t) + u(t), u a Gaussian process without
 * drift whose steps are drawn from their own law, so that the step's length does not matter.
 *
 * <p>Paths are drawn in chunks of fixed size, each from its own stretch of one generator
 * (xoshiro256++, jumps of 2^128), so that the number of threads changes no bit.
 */
public final class ShortRatePaths {
  /** The most figures that one run keeps, paths × times; 160 MB. */
  public static final int MOST_FIGURES = 20_000_000;

  private static final int CHUNK = 1024;

  private final List<HorizonLaw> laws;
  private final double[][] rates;

  private ShortRatePaths(List<HorizonLaw> laws, double[][] rates) {
    this.laws = laws;
    this.rates = rates;
  }

  /**
   * Draws.
   *
   * @param times years, not before today and increasing
   * @param paths at least 100
   * @param seed any; the same seed gives the same bits
   * @param threads at least 1
   * @throws IllegalArgumentException in words if a rule is broken, or the law leaves all bounds
   */
  public static ShortRatePaths draw(
      GaussianRates rates, double[] times, int paths, long seed, int threads) {
    if (!(paths >= 100)) {
      throw new IllegalArgumentException("paths must number at least 100, found " + paths);
    }
    if ((double) paths * times.length > MOST_FIGURES) {
      throw new IllegalArgumentException(
          "paths times points in time must come to at most "
              + MOST_FIGURES
              + ", found "
              + paths
              + " times "
              + times.length);
    }
    for (int k = 1; k < times.length; k++) {
      if (!(times[k] > times[k - 1])) {
        throw new IllegalArgumentException(
            "times of paths must increase, found " + times[k] + " after " + times[k - 1]);
      }
    }
    List<HorizonLaw> laws = HorizonLaw.of(rates, times);
    double[] decay = new double[times.length];
    double[] sd = new double[times.length];
    for (int k = 0; k < times.length; k++) {
      double from = k == 0 ? 0 : times[k - 1];
      decay[k] = Math.exp(-rates.meanReversion() * (times[k] - from));
      sd[k] = Math.sqrt(rates.stateVariance(from, times[k]));
    }
    double[][] drawn = new double[times.length][paths];
    List<UniformRandomProvider> generators = generators((paths + CHUNK - 1) / CHUNK, seed);
    ForkJoinPool pool = new ForkJoinPool(Math.min(threads, generators.size()));
    try {
      pool.submit(
              () ->
                  IntStream.range(0, generators.size())
                      .parallel()
                      .forEach(c -> chunk(generators.get(c), c * CHUNK, laws, decay, sd, drawn)))
          .join();
    } finally {
      pool.shutdown();
    }
    return new ShortRatePaths(laws, drawn);
  }

  private static List<UniformRandomProvider> generators(int count, long seed) {
    JumpableUniformRandomProvider source =
        (JumpableUniformRandomProvider) RandomSource.XO_SHI_RO_256_PP.create(seed);
    List<UniformRandomProvider> generators = new ArrayList<>();
    for (int c = 0; c < count; c++) {
      generators.add(source.jump());
    }
    return generators;
  }

  private static void chunk(
      UniformRandomProvider random,
      int first,
      List<HorizonLaw> laws,
      double[] decay,
      double[] sd,
      double[][] drawn) {
    ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
    int last = laws.isEmpty() ? first : Math.min(first + CHUNK, drawn[0].length);
    for (int i = first; i < last; i++) {
      double u = 0;
      for (int k = 0; k < decay.length; k++) {
        u = decay[k] * u + sd[k] * normal.sample();
        drawn[k][i] = laws.get(k).law().mean() + u;
      }
    }
  }

  /** Paths drawn. */
  public int count() {
    return rates.length == 0 ? 0 : rates[0].length;
  }

  /** The times at which they were drawn, with the exact law there. */
  public List<HorizonLaw> laws() {
    return laws;
  }

  /** The short rate of a path at the {@code k}-th time. */
  public double rate(int path, int k) {
    return rates[k][path];
  }

  /** What the paths say of the law at the {@code k}-th time. */
  public SampleLaw sample(int k) {
    return SampleLaw.of(rates[k].clone(), laws.get(k).law());
  }
}
