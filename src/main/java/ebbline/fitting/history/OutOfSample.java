package ebbline.fitting.history;

import ebbline.model.NormalLaw;
import java.util.Arrays;
import org.apache.commons.statistics.distribution.NormalDistribution;

/**
 * Forecasts of the later part of a history, each from an estimate on the rates before it only.
 *
 * <p>Where the rates so far show no mean reversion the forecast is the random walk's. The
 * parameters are taken as known, so a right model still covers a little less than it should.
 *
 * @param oneStep coverage of the intervals one step ahead
 * @param farther coverage several steps ahead; its forecasts overlap, so it varies more than as
 *     many independent ones
 * @param stepsAhead of {@code farther}
 * @param uniformityDistance largest distance between the distribution of the one-step probability
 *     integral transforms and a uniform one
 * @param uniformityPValue of that distance if the forecasts are right (Kolmogorov)
 */
public record OutOfSample(
    Coverage oneStep,
    Coverage farther,
    int stepsAhead,
    double uniformityDistance,
    double uniformityPValue) {

  /**
   * @param confidence nominal
   * @param forecasts made
   * @param covered those whose interval held the rate
   */
  public record Coverage(double confidence, int forecasts, int covered) {
    public double share() {
      return forecasts == 0 ? 0 : covered / (double) forecasts;
    }
  }

  /** Estimates are renewed at most this often: on long histories one more rate changes nothing. */
  private static final int RENEWALS = 400;

  /** ... and on uneven steps, where one estimate is a search. */
  private static final int SEARCHES = 60;

  private static final int FEWEST = 8;

  /**
   * Forecasts every rate after the first half.
   *
   * @param stepsAhead of the farther forecasts, at least 1
   * @param confidence in (0, 1)
   * @throws IllegalArgumentException in words if there are too few rates, or the first half does
   *     not vary
   */
  public static OutOfSample of(RateHistory history, int stepsAhead, double confidence) {
    Interval.requireConfidence(confidence);
    int size = history.size();
    int start = size / 2;
    if (!(start >= FEWEST && stepsAhead >= 1)) {
      throw new IllegalArgumentException(
          "forecasts out of sample need at least " + 2 * FEWEST + " rates, found " + size);
    }
    NormalDistribution standard = NormalDistribution.of(0, 1);
    double reach = standard.inverseSurvivalProbability(0.5 * (1 - confidence));
    double[] transforms = new double[size - start];
    int every = Math.max(1, (size - start) / (history.isRegular() ? RENEWALS : SEARCHES));
    Forecaster forecaster = null;
    int near = 0;
    int far = 0;
    int farForecasts = 0;
    for (int next = start; next < size; next++) {
      int last = next - 1;
      if (forecaster == null || (next - start) % every == 0) {
        forecaster = Forecaster.from(history.between(0, next));
      }
      double z = forecaster.standardised(history, last, next);
      near += Math.abs(z) <= reach ? 1 : 0;
      transforms[next - start] = standard.cumulativeProbability(z);
      int ahead = last + stepsAhead;
      if (ahead < size) {
        farForecasts++;
        far += Math.abs(forecaster.standardised(history, last, ahead)) <= reach ? 1 : 0;
      }
    }
    double distance = distance(transforms);
    return new OutOfSample(
        new Coverage(confidence, transforms.length, near),
        new Coverage(confidence, farForecasts, far),
        stepsAhead,
        distance,
        kolmogorov(distance, transforms.length));
  }

  /** The law of the rates so far. */
  private record Forecaster(double drift, double volatility, RateLaw law) {
    static Forecaster from(RateHistory past) {
      HistoryEstimate estimate = HistoryEstimator.estimate(past, HistoryMethod.EXACT);
      if (estimate instanceof HistoryEstimate.Reverting found) {
        return new Forecaster(0, 0, found.law());
      }
      HistoryEstimate.RandomWalk walk = Refusals.walk(past);
      if (!(walk.volatility() > 0)) {
        throw new IllegalArgumentException(
            "forecasts out of sample need rates that vary in the first half of the history");
      }
      return new Forecaster(walk.drift(), walk.volatility(), null);
    }

    double standardised(RateHistory history, int from, int to) {
      double horizon = history.time(to) - history.time(from);
      double rate = history.rate(from);
      if (law == null) {
        return (history.rate(to) - rate - drift * horizon) / (volatility * Math.sqrt(horizon));
      }
      NormalLaw ahead = law.conditional(rate, horizon);
      return (history.rate(to) - ahead.mean()) / ahead.standardDeviation();
    }
  }

  private static double distance(double[] transforms) {
    double[] sorted = transforms.clone();
    Arrays.sort(sorted);
    double largest = 0;
    int n = sorted.length;
    for (int i = 0; i < n; i++) {
      largest = Math.max(largest, (i + 1.0) / n - sorted[i]);
      largest = Math.max(largest, sorted[i] - (double) i / n);
    }
    return largest;
  }

  /**
   * Chance of a distance at least as large from n uniform numbers: Kolmogorov's series with
   * Stephens' correction for n [Stephens 1970, J. Royal Statistical Society B 32]; error below
   * 0.01.
   */
  static double kolmogorov(double distance, int n) {
    double root = Math.sqrt(n);
    double x = (root + 0.12 + 0.11 / root) * distance;
    if (x < 0.2) {
      return 1;
    }
    double sum = 0;
    for (int j = 1; j <= 100; j++) {
      double term = Math.exp(-2.0 * j * j * x * x);
      sum += j % 2 == 1 ? term : -term;
    }
    return Math.max(0, Math.min(1, 2 * sum));
  }
}
