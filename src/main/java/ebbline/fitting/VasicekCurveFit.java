package ebbline.fitting;

import ebbline.model.Vasicek;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;

/**
 * Vasicek's parameters by least squares in zero rates, any of them held; the pricing measure.
 *
 * <p>Several starts, all of them found from the data and the same on every run; the lowest sum of
 * squares wins. Mean reversion may come out negative; the result then says so.
 */
public final class VasicekCurveFit {
  /** Within this share of the allowed range, mean reversion counts as having run into its end. */
  private static final double AT_THE_END = 1e-6;

  /** Below this volatility its part of a 30-year zero rate is under 0.002 bp. */
  private static final double CREEPS_BELOW = 3e-5;

  private VasicekCurveFit() {}

  /**
   * How to search and when to warn.
   *
   * @param iterations at most, for one start
   * @param conditionLimit condition number of the scaled Jacobian above which the fit warns
   * @param lowestMeanReversion per year
   * @param highestMeanReversion per year
   */
  public record Settings(
      int iterations,
      double conditionLimit,
      double lowestMeanReversion,
      double highestMeanReversion) {

    public Settings {
      if (iterations < 1) {
        throw new IllegalArgumentException("iterations must be at least 1, found " + iterations);
      }
      if (!(conditionLimit >= 1)) {
        throw new IllegalArgumentException(
            "the condition limit must be at least 1, found " + conditionLimit);
      }
      if (!(lowestMeanReversion < highestMeanReversion
          && lowestMeanReversion >= -1
          && highestMeanReversion <= 100)) {
        throw new IllegalArgumentException(
            "mean reversion is sought in a range within -1 to 100, found "
                + lowestMeanReversion
                + " to "
                + highestMeanReversion);
      }
    }

    /** 1000 iterations, condition limit 100, mean reversion from -0.5 to 10. */
    public static Settings standard() {
      return new Settings(1000, 100, -0.5, 10);
    }
  }

  /**
   * Fits the parameters that are not held.
   *
   * @param times years, positive and finite; for a curve its nodes, or a grid of the caller's
   * @param zeroRates continuously compounded, decimals per year
   * @param held values of the parameters that are not fitted; may be empty or hold all
   * @throws IllegalArgumentException in words for the user if there are fewer points than fitted
   *     parameters, or a figure is out of its domain
   */
  public static Fit fit(
      double[] times, double[] zeroRates, Map<Parameter, Double> held, Settings settings) {
    requirePoints(times, zeroRates);
    requireHeld(held);
    Map<Parameter, Double> fixed = new EnumMap<>(Parameter.class);
    fixed.putAll(held);
    List<String> warnings = new ArrayList<>();
    boolean meanIsFree =
        !fixed.containsKey(Parameter.LONG_RUN_MEAN)
            && fixed.getOrDefault(Parameter.MEAN_REVERSION, 1.0) == 0;
    if (meanIsFree) {
      // Without reversion the mean acts on nothing; with it at r₀ the drift is 0 as it must be.
      warnings.add(
          "with mean reversion held at 0 a long-run mean has no effect: it is shown at the short"
              + " rate");
    }
    VasicekProblem problem = new VasicekProblem(times, zeroRates, fixed, meanIsFree, settings);
    requireEnoughPoints(times, problem.free().size());
    LeastSquares.Outcome outcome = search(problem, times.length, settings.iterations());
    return report(problem, outcome, settings, warnings);
  }

  /** The model at a point that {@link #fit} found, under the pricing measure. */
  public static Vasicek model(FitPoint point) {
    return new Vasicek(
        point.value(Parameter.SHORT_RATE),
        point.value(Parameter.LONG_RUN_MEAN),
        point.value(Parameter.MEAN_REVERSION),
        point.value(Parameter.VOLATILITY));
  }

  private static LeastSquares.Outcome search(
      VasicekProblem problem, int observations, int iterations) {
    if (problem.free().isEmpty()) {
      double[] residual = new double[observations];
      problem.at(new double[0], residual, new double[observations][0]);
      return new LeastSquares.Outcome(new double[0], squares(residual), 0, "");
    }
    LeastSquares.Outcome best = null;
    for (double[] start : VasicekStarts.of(problem)) {
      LeastSquares.Outcome outcome =
          LeastSquares.minimise(problem, observations, start, iterations);
      if (best == null || outcome.squares() < best.squares()) {
        best = outcome;
      }
    }
    return atZeroVolatility(problem, observations, iterations, best);
  }

  /**
   * Volatility acts by its square, so near 0 the search creeps: where 0 itself does as well, it is
   * taken.
   */
  private static LeastSquares.Outcome atZeroVolatility(
      VasicekProblem problem, int observations, int iterations, LeastSquares.Outcome best) {
    int sigma = problem.free().indexOf(Parameter.VOLATILITY);
    if (sigma < 0 || !(Math.abs(best.point()[sigma]) < CREEPS_BELOW)) {
      return best;
    }
    double[] start = best.point().clone();
    start[sigma] = 0;
    // At σ = 0 its column of slopes is 0, so it stays there and the others move.
    LeastSquares.Outcome still = LeastSquares.minimise(problem, observations, start, iterations);
    return still.squares() <= best.squares() * (1 + 1e-6) + 1e-30 * observations ? still : best;
  }

  private static Fit report(
      VasicekProblem problem,
      LeastSquares.Outcome outcome,
      Settings settings,
      List<String> warnings) {
    Map<Parameter, Double> found = problem.parameters(outcome.point());
    double[] fitted = problem.fitted(outcome.point());
    List<FittedQuote> quotes = new ArrayList<>();
    for (int i = 0; i < fitted.length; i++) {
      quotes.add(new FittedQuote(label(problem.time(i)), problem.quote(i), fitted[i]));
    }
    Uncertainty uncertainty =
        Uncertainty.of(problem.free(), problem.jacobian(found), outcome.squares());
    VasicekWarnings.add(warnings, problem, found, uncertainty, settings);
    FitPoint point = new FitPoint(found, uncertainty, quotes, outcome.iterations(), warnings);
    return outcome.converged()
        ? new Fit.Converged(point)
        : new Fit.Stopped(point, outcome.reason());
  }

  /** Whether a mean reversion sits at an end of the range in which it was sought. */
  static boolean atTheEnd(double meanReversion, Settings settings) {
    double margin = AT_THE_END * (settings.highestMeanReversion() - settings.lowestMeanReversion());
    return meanReversion < settings.lowestMeanReversion() + margin
        || meanReversion > settings.highestMeanReversion() - margin;
  }

  static String label(double time) {
    return time == Math.rint(time) && time < 1e6
        ? String.format(Locale.ROOT, "%.0f", time)
        : Double.toString(time);
  }

  private static double squares(double[] residual) {
    double sum = 0;
    for (double r : residual) {
      sum += r * r;
    }
    return sum;
  }

  static void requirePoints(double[] times, double[] zeroRates) {
    if (times.length != zeroRates.length || times.length == 0) {
      throw new IllegalArgumentException(
          "a fit needs as many zero rates as times and at least one, found "
              + zeroRates.length
              + " and "
              + times.length);
    }
    for (int i = 0; i < times.length; i++) {
      if (!(times[i] > 0 && times[i] <= 200)) {
        throw new IllegalArgumentException(
            "times of a fit must be above 0 and at most 200 years, found " + times[i]);
      }
      if (!(Math.abs(zeroRates[i]) < 10)) {
        throw new IllegalArgumentException(
            "zero rates must lie within 1000 % either side of 0, found " + zeroRates[i]);
      }
    }
  }

  private static void requireHeld(Map<Parameter, Double> held) {
    Map<Parameter, Double> inOrder = new TreeMap<>(held);
    for (Map.Entry<Parameter, Double> entry : inOrder.entrySet()) {
      double value = entry.getValue();
      if (!(Math.abs(value) <= 100)) {
        throw new IllegalArgumentException(
            entry.getKey().label() + " must lie between -100 and 100, found " + value);
      }
      if (entry.getKey() == Parameter.VOLATILITY && !(value >= 0)) {
        throw new IllegalArgumentException("volatility must be at least 0, found " + value);
      }
      if (entry.getKey() == Parameter.MEAN_REVERSION && !(value >= -1)) {
        throw new IllegalArgumentException(
            "mean reversion must be at least -1 a year, found " + value);
      }
    }
  }

  private static void requireEnoughPoints(double[] times, int free) {
    long distinct = Arrays.stream(times).distinct().count();
    if (distinct < free) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "%d parameters cannot be fitted to %d %s: hold at least %d of them",
              free,
              distinct,
              distinct == 1 ? "point" : "points",
              free - distinct));
    }
  }
}
