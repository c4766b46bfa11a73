package ebbline.fitting.history;

import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * The likelihood ratio of mean reversion against a random walk without drift, its p-value by
 * simulated walks: the χ² law does not hold here.
 *
 * @param statistic twice the log of the likelihood ratio, at least 0
 * @param pValue share of simulated walks with a statistic at least as large, the sample counted in
 * @param replications simulated walks
 */
public record NoReversionTest(double statistic, double pValue, int replications) {
  /** Longer walks give the same law, to less than the noise of the share. */
  private static final int MOST = 1000;

  /**
   * Tests a history.
   *
   * @throws IllegalArgumentException in words if it has fewer than four rates, or they do not vary
   */
  public static NoReversionTest of(RateHistory history, Resampling resampling) {
    if (history.size() < Refusals.FEWEST) {
      throw new IllegalArgumentException(
          "a test of mean reversion needs at least 4 rates, found " + history.size());
    }
    TestedHistory tested = TestedHistory.of(history);
    double drift = (history.rate(history.size() - 1) - history.rate(0)) / history.span();
    double walk = 0;
    double withDrift = 0;
    for (int i = 1; i < history.size(); i++) {
      double step = history.isRegular() ? history.step() : history.time(i) - history.time(i - 1);
      double change = history.rate(i) - history.rate(i - 1);
      walk += change * change / step;
      withDrift += (change - drift * step) * (change - drift * step) / step;
    }
    int n = tested.transitions();
    double statistic = tested.againstWalk() + n * Math.log(walk / withDrift);
    if (!Double.isFinite(statistic)) {
      throw new IllegalArgumentException("a test of mean reversion needs rates that vary");
    }
    int steps = Math.min(n, MOST);
    UniformRandomProvider random = RandomSource.XO_SHI_RO_256_PP.create(resampling.seed());
    ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
    double[] path = new double[steps + 1];
    int above = 1;
    for (int k = 0; k < resampling.replications(); k++) {
      double changes = 0;
      for (int i = 1; i <= steps; i++) {
        double change = normal.sample();
        changes += change * change;
        path[i] = path[i - 1] + change;
      }
      if (steps * Math.log(changes / LaggedSums.of(path).residuals()) >= statistic) {
        above++;
      }
    }
    return new NoReversionTest(
        statistic, above / (resampling.replications() + 1.0), resampling.replications());
  }
}
