package ebbline.fitting.options;

import ebbline.fitting.Fit;
import ebbline.fitting.Parameter;
import ebbline.fitting.VasicekCurveFit;
import ebbline.model.Vasicek;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * Vasicek's four parameters from a curve and option quotes together: least squares over zero rates
 * and volatilities, all of them rates per year.
 *
 * <p>The curve holds the drift, the options hold the volatility that a curve hardly shows.
 */
public final class VasicekJointFit {
  private static final double[] FIRST_VOLATILITIES = {0.004, 0.01, 0.025};

  private VasicekJointFit() {}

  /**
   * @param times of the curve's points, years
   * @param zeros continuously compounded, decimals per year
   * @param labels of the points
   * @param quotes of options, fixed by the same curve
   * @param held values of the parameters that are not fitted
   * @param objective normal or Black's volatilities
   * @param iterations at most, for one start
   * @throws IllegalArgumentException in words if the data cannot carry the fit
   */
  public static OptionFit fit(
      double[] times,
      double[] zeros,
      List<String> labels,
      List<OptionQuote> quotes,
      Map<Parameter, Double> held,
      Objective objective,
      int iterations) {
    if (objective == Objective.PREMIUM) {
      throw new IllegalArgumentException(
          "zero rates and premiums have no unit in common: fit in normal or black volatilities");
    }
    if (CalibrationRules.counted(quotes) == 0) {
      throw new IllegalArgumentException(
          "weight must be above 0 for some quote: with all weights 0 nothing is fitted");
    }
    VasicekJointProblem problem =
        new VasicekJointProblem(times, zeros, quotes, new EnumMap<>(held(held)), objective);
    if (problem.parameters() == 0) {
      throw new IllegalArgumentException("all four parameters are held: nothing is left to fit");
    }
    MarquardtSearch.Outcome best = null;
    int evaluations = 0;
    for (double volatility : FIRST_VOLATILITIES) {
      double[] start = start(problem, times, zeros, held, volatility);
      MarquardtSearch.Outcome outcome = MarquardtSearch.minimise(problem, start, iterations);
      evaluations += outcome.evaluations();
      best = best == null || outcome.squares() < best.squares() ? outcome : best;
    }
    problem.setExact(true);
    MarquardtSearch.Outcome second = MarquardtSearch.minimise(problem, best.point(), iterations);
    List<String> warnings = new ArrayList<>();
    if (second.squares() < Double.POSITIVE_INFINITY) {
      best = second;
    } else {
      problem.setExact(false);
      warnings.add(
          "the model's premium of some quote has no volatility: errors are premium errors over the"
              + " quote's vega");
    }
    evaluations += second.evaluations();
    return report(problem, best, evaluations, labels, warnings);
  }

  private static Map<Parameter, Double> held(Map<Parameter, Double> held) {
    Map<Parameter, Double> copy = new EnumMap<>(Parameter.class);
    copy.putAll(held);
    return copy;
  }

  /** The curve's own best point at this volatility. */
  private static double[] start(
      VasicekJointProblem problem,
      double[] times,
      double[] zeros,
      Map<Parameter, Double> held,
      double volatility) {
    Map<Parameter, Double> all = held(held);
    all.putIfAbsent(Parameter.VOLATILITY, volatility);
    Fit curve = VasicekCurveFit.fit(times, zeros, all, VasicekCurveFit.Settings.standard());
    return problem.coordinates(VasicekCurveFit.model(curve.best()));
  }

  private static OptionFit report(
      VasicekJointProblem problem,
      MarquardtSearch.Outcome best,
      int evaluations,
      List<String> labels,
      List<String> warnings) {
    Vasicek model = problem.model(best.point());
    double[][] slopes = problem.naturalSlopes(best.point());
    FitCovariance covariance = FitCovariance.of(slopes, best.squares(), problem.counted());
    List<OptionFit.Quote> quotes = new ArrayList<>();
    double[] rates = problem.zeroRates();
    for (int i = 0; i < rates.length; i++) {
      quotes.add(
          new OptionFit.Quote(
              labels.get(i), "zero-rate", problem.zero(i), OptionalDouble.of(rates[i]), 1));
    }
    double[] premiums = problem.premiums();
    for (int i = 0; i < premiums.length; i++) {
      quotes.add(HullWhiteCalibration.fitted(problem.quote(i), premiums[i]));
    }
    if (model.meanReversion() < 0) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "mean reversion is negative (%.6g a year): the rate is driven away from the long-run"
                  + " mean",
              model.meanReversion()));
    }
    if (!covariance.isIdentified()) {
      warnings.add("the parameters are not identified: other values fit as well");
    } else if (covariance.conditionNumber() > 1000) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "the parameters trade off against each other: condition number %.3g",
              covariance.conditionNumber()));
    }
    double weights = rates.length + problem.weights();
    return new OptionFit(
        Arrays.stream(Parameter.values()).map(Parameter::label).toList(),
        List.of(model.meanReversion(), model.longRunMean(), model.volatility(), model.shortRate()),
        problem.free().stream().map(Parameter::label).toList(),
        covariance,
        quotes,
        Math.sqrt(best.squares() / weights),
        best.iterations(),
        evaluations,
        best.reason(),
        List.of(),
        warnings);
  }

  /** The model that a fit found, under the pricing measure. */
  public static Vasicek model(OptionFit fit) {
    return new Vasicek(
        fit.value("short_rate"),
        fit.value("long_run_mean"),
        fit.value("mean_reversion"),
        fit.value("volatility"));
  }
}
