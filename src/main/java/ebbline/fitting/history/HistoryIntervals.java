package ebbline.fitting.history;

import ebbline.fitting.history.HistoryEstimate.Reverting;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.function.DoublePredicate;

/**
 * The intervals offered first. They hold every value that a test with simulated critical points
 * does not refuse, so their coverage does not suffer from the bias of κ as percentile intervals'
 * does [Hansen 1999, Review of Economics and Statistics 81].
 *
 * @param meanReversion κ; low end 0 where no reversion is not refused, both absent where every one
 *     is
 * @param longRunMean θ; a side is absent where the sample does not bound it
 * @param volatility σ
 * @param halfLife years; high end absent where the low end of κ is 0
 * @param remark what is unbounded and why; empty where nothing is
 */
public record HistoryIntervals(
    Interval meanReversion,
    Interval longRunMean,
    Interval volatility,
    Interval halfLife,
    String remark) {

  private static final int HALVINGS = 40;

  private static final String RUNS_AWAY =
      "the rates run away from any mean faster than chance explains: every mean reversion of 0 or"
          + " more is refused, and there is no interval for it or the long-run mean";

  /** Reversion × span at which the law of the mean's test is tabulated. */
  private static final double[] GRID = {
    0, 0.2, 0.6, 1.2, 2, 3, 4.5, 7, 10, 15, 25, 40, 70, 120, 250
  };

  /**
   * Intervals by inverting tests on the transitions, whatever the method of the estimate.
   *
   * @param bootstrap of the same estimate; gives the interval of σ
   * @param confidence in (0, 1)
   */
  public static HistoryIntervals of(
      RateHistory history,
      Reverting estimate,
      Bootstrap bootstrap,
      double confidence,
      Resampling resampling) {
    Interval.requireConfidence(confidence);
    TestedHistory tested = TestedHistory.of(history);
    ReversionLaw law = new ReversionLaw(tested.transitions(), resampling);
    Interval kappa = reversion(tested, law, history, confidence);
    Interval theta = mean(tested, law, history, estimate, confidence);
    if (kappa.high().isEmpty()) {
      Interval none = new Interval(OptionalDouble.empty(), OptionalDouble.empty(), confidence);
      return new HistoryIntervals(
          none, none, bootstrap.volatilityByRatio(confidence), none, RUNS_AWAY);
    }
    double low = kappa.low().orElseThrow();
    double high = kappa.high().orElseThrow();
    Interval halfLife =
        new Interval(
            high > 0 ? OptionalDouble.of(Math.log(2) / high) : OptionalDouble.empty(),
            low > 0 ? OptionalDouble.of(Math.log(2) / low) : OptionalDouble.empty(),
            confidence);
    return new HistoryIntervals(
        kappa, theta, bootstrap.volatilityByRatio(confidence), halfLife, remark(low, theta));
  }

  private static String remark(double lowReversion, Interval theta) {
    StringBuilder text = new StringBuilder();
    if (!(lowReversion > 0)) {
      text.append(
          "no mean reversion is not refused at this confidence: the half-life has no upper bound");
    }
    if (theta.low().isEmpty() || theta.high().isEmpty()) {
      text.append(text.isEmpty() ? "" : "; ")
          .append(
              String.format(
                  Locale.ROOT,
                  "the sample does not bound the long-run mean %s",
                  theta.low().isPresent()
                      ? "from above"
                      : theta.high().isPresent() ? "from below" : "on either side"));
    }
    return text.toString();
  }

  /** Whether the interval of κ holds this one. */
  static boolean keepsReversion(
      TestedHistory tested,
      ReversionLaw law,
      double kappa,
      RateHistory history,
      double confidence) {
    double tail = 0.5 * (1 - confidence);
    ReversionLaw.Draws draws = law.at(kappa * history.span());
    double ratio = tested.ratio(kappa);
    return ratio >= draws.ratioQuantile(tail) && ratio <= draws.ratioQuantile(1 - tail);
  }

  /** Whether the interval of θ holds this one. */
  static boolean keepsMean(
      TestedHistory tested,
      ReversionLaw law,
      double theta,
      RateHistory history,
      double confidence) {
    TestedHistory.MeanTest test = tested.test(theta);
    return test.likelihood() <= critical(law, test.meanReversion() * history.span(), confidence);
  }

  private static Interval reversion(
      TestedHistory tested, ReversionLaw law, RateHistory history, double confidence) {
    double tail = 0.5 * (1 - confidence);
    double span = history.span();
    double best = Math.max(tested.meanReversion(), 0);
    // The ratio rises with κ: too small a κ is refused from below, too large a one from above.
    DoublePredicate tooSmall = k -> tested.ratio(k) < law.at(k * span).ratioQuantile(tail);
    DoublePredicate tooLarge = k -> tested.ratio(k) > law.at(k * span).ratioQuantile(1 - tail);
    double top = 20 / history.step();
    double low =
        tooSmall.test(0) ? boundary(tooSmall.negate(), 0, Math.max(best, 1 / span), top) : 0;
    if (tooLarge.test(0)) {
      return new Interval(OptionalDouble.empty(), OptionalDouble.empty(), confidence);
    }
    double high = boundary(tooLarge, 0, Math.max(best, 1 / span), top);
    return Interval.of(low, Math.max(low, high), confidence);
  }

  /** Where {@code beyond} turns true, at or above {@code from}; at most {@code top}. */
  private static double boundary(DoublePredicate beyond, double from, double first, double top) {
    double low = from;
    double high = first;
    while (!beyond.test(high)) {
      if (high >= top) {
        return top;
      }
      low = high;
      high = Math.min(1.5 * high, top);
    }
    for (int i = 0; i < HALVINGS && high - low > 1e-7 * high; i++) {
      double middle = 0.5 * (low + high);
      if (beyond.test(middle)) {
        high = middle;
      } else {
        low = middle;
      }
    }
    return 0.5 * (low + high);
  }

  private static Interval mean(
      TestedHistory tested,
      ReversionLaw law,
      RateHistory history,
      Reverting estimate,
      double confidence) {
    DoublePredicate refused = theta -> !keepsMean(tested, law, theta, history, confidence);
    boolean unbounded = tested.againstWalk() <= law.at(0).likelihoodQuantile(confidence);
    double centre =
        refused.test(estimate.law().longRunMean()) ? history.mean() : estimate.law().longRunMean();
    double scale = Math.max(history.deviation(), 1e-12);
    OptionalDouble low = side(refused, centre, -scale, unbounded);
    OptionalDouble high = side(refused, centre, scale, unbounded);
    return new Interval(low, high, confidence);
  }

  /** First refused mean from the centre outwards; none found within 1000 deviations is none. */
  private static OptionalDouble side(
      DoublePredicate refused, double centre, double scale, boolean unbounded) {
    double inside = 0;
    double outside = 0.05;
    while (!refused.test(centre + outside * scale)) {
      if (outside > 1000) {
        return OptionalDouble.empty();
      }
      inside = outside;
      outside *= 1.25;
    }
    if (unbounded && !refusedFarOut(refused, centre, scale)) {
      return OptionalDouble.empty();
    }
    for (int i = 0; i < HALVINGS; i++) {
      double middle = 0.5 * (inside + outside);
      if (refused.test(centre + middle * scale)) {
        outside = middle;
      } else {
        inside = middle;
      }
    }
    return OptionalDouble.of(centre + 0.5 * (inside + outside) * scale);
  }

  private static boolean refusedFarOut(DoublePredicate refused, double centre, double scale) {
    return refused.test(centre + 1e4 * scale);
  }

  private static double critical(ReversionLaw law, double timesSpan, double confidence) {
    int i = 1;
    while (i < GRID.length - 1 && timesSpan > GRID[i]) {
      i++;
    }
    double share = Math.min(1, (timesSpan - GRID[i - 1]) / (GRID[i] - GRID[i - 1]));
    double left = law.at(GRID[i - 1]).likelihoodQuantile(confidence);
    return left + share * (law.at(GRID[i]).likelihoodQuantile(confidence) - left);
  }
}
