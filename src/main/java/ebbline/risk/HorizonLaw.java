package ebbline.risk;

import ebbline.model.GaussianRates;
import ebbline.model.NormalLaw;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * The exact law of the short rate at a horizon, seen from today: a normal law.
 *
 * @param time years from today, at least 0
 * @param law of the short rate, decimals per year
 */
public record HorizonLaw(double time, NormalLaw law) {
  /** Standard normal quantiles at 95 and 99 in 100. */
  private static final double AT_95 = 1.6448536269514722;

  private static final double AT_99 = 2.3263478740408408;

  /** Shares of the quantiles that a distribution is shown by. */
  static final double[] SHARES = {0.01, 0.05, 0.5, 0.95, 0.99};

  private static final double[] DEVIATIONS = {-AT_99, -AT_95, 0, AT_95, AT_99};

  /**
   * The laws at horizons, under the measure that the model's parameters belong to.
   *
   * @throws IllegalArgumentException in words for a time before today, or where a mean or a
   *     variance leaves the range of numbers, as a negative reversion has it in time
   */
  public static List<HorizonLaw> of(GaussianRates rates, double[] times) {
    List<HorizonLaw> laws = new ArrayList<>();
    for (double time : times) {
      if (!(time >= 0 && Double.isFinite(time))) {
        throw new IllegalArgumentException("a horizon is not before today, found " + time);
      }
      double mean = rates.expectedShortRate(time);
      double sd = Math.sqrt(rates.variance(time));
      if (!(Math.abs(mean) < 1e6 && sd < 1e6)) {
        throw new IllegalArgumentException(
            String.format(
                Locale.ROOT,
                "the short rate runs away: at %.6g years its law leaves all bounds; take a nearer"
                    + " horizon or a higher mean reversion",
                time));
      }
      laws.add(new HorizonLaw(time, new NormalLaw(mean, sd)));
    }
    return List.copyOf(laws);
  }

  /** The figures that a distribution is shown by. */
  public Distribution distribution() {
    double[] quantiles = new double[SHARES.length];
    for (int i = 0; i < quantiles.length; i++) {
      quantiles[i] = law.mean() + DEVIATIONS[i] * law.standardDeviation();
    }
    return new Distribution(
        law.mean(),
        law.standardDeviation(),
        quantiles[0],
        quantiles[1],
        quantiles[2],
        quantiles[3],
        quantiles[4],
        law.probabilityBelow(0));
  }
}
