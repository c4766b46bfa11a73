package ebbline.fitting;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.stream.Collectors;

/** What a reader of a Vasicek fit must know, in words. */
final class VasicekWarnings {
  private VasicekWarnings() {}

  static void add(
      List<String> warnings,
      VasicekProblem problem,
      Map<Parameter, Double> found,
      Uncertainty uncertainty,
      VasicekCurveFit.Settings settings) {
    addRange(warnings, problem, found, settings);
    addIdentification(warnings, problem, found, uncertainty, settings);
    if (!problem.free().isEmpty() && problem.size() == problem.free().size()) {
      warnings.add(
          "as many parameters as points: the errors say nothing about the fit, and there are no"
              + " standard errors");
    }
  }

  private static void addRange(
      List<String> warnings,
      VasicekProblem problem,
      Map<Parameter, Double> found,
      VasicekCurveFit.Settings settings) {
    double meanReversion = found.get(Parameter.MEAN_REVERSION);
    if (problem.free().contains(Parameter.MEAN_REVERSION)
        && VasicekCurveFit.atTheEnd(meanReversion, settings)) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "mean reversion ran into the end of its range, %.6g a year: the points do not hold"
                  + " it",
              meanReversion));
    }
    if (meanReversion < 0) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "mean reversion is negative (%.6g a year): the rate is driven away from the long-run"
                  + " mean, and has no limiting law",
              meanReversion));
    }
    double mean = found.get(Parameter.LONG_RUN_MEAN);
    if (problem.free().contains(Parameter.LONG_RUN_MEAN) && Math.abs(mean) > 0.5) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "a long-run mean of %.4g %% is no rate to believe: the points hold the drift"
                  + " mean reversion x (long-run mean - short rate) = %.6g a year only",
              100 * mean,
              meanReversion * (mean - found.get(Parameter.SHORT_RATE))));
    }
  }

  private static void addIdentification(
      List<String> warnings,
      VasicekProblem problem,
      Map<Parameter, Double> found,
      Uncertainty uncertainty,
      VasicekCurveFit.Settings settings) {
    boolean volatilityIsFree = problem.free().contains(Parameter.VOLATILITY);
    if (volatilityIsFree && found.get(Parameter.VOLATILITY) < 1e-7) {
      warnings.add(
          "volatility fell to 0: the points bend the other way than volatility bends a curve; hold"
              + " it at a figure from option prices or from history");
    } else if (volatilityIsFree) {
      warnings.add(
          "volatility is only weakly identified by a curve: it acts through convexity alone; hold"
              + " it at a figure from option prices or from history where there is one");
    }
    List<Parameter> lost =
        problem.free().stream().filter(p -> !uncertainty.identified().contains(p)).toList();
    if (!lost.isEmpty()) {
      String names = lost.stream().map(Parameter::words).collect(Collectors.joining(", "));
      warnings.add(
          "not identified by these points (other values fit as well): "
              + names
              + (isFlat(problem) ? "; the points are flat" : ""));
    }
    if (uncertainty.conditionNumber() > settings.conditionLimit()) {
      warnings.add(conditionWarning(uncertainty, settings));
    }
  }

  private static String conditionWarning(
      Uncertainty uncertainty, VasicekCurveFit.Settings settings) {
    StringBuilder text =
        new StringBuilder(
            String.format(
                Locale.ROOT,
                "the parameters trade off against each other: condition number %.3g, above %.3g",
                uncertainty.conditionNumber(),
                settings.conditionLimit()));
    double strongest = 0;
    String pair = "";
    List<Parameter> known = uncertainty.identified();
    for (int i = 0; i < known.size(); i++) {
      for (int j = i + 1; j < known.size(); j++) {
        OptionalDouble rho = uncertainty.correlation(known.get(i), known.get(j));
        if (rho.isPresent() && Math.abs(rho.getAsDouble()) > Math.abs(strongest)) {
          strongest = rho.getAsDouble();
          pair = known.get(i).words() + " and " + known.get(j).words();
        }
      }
    }
    if (!pair.isEmpty()) {
      text.append(String.format(Locale.ROOT, "; correlation of %s is %.4f", pair, strongest));
    }
    return text.toString();
  }

  private static boolean isFlat(VasicekProblem problem) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int i = 0; i < problem.size(); i++) {
      low = Math.min(low, problem.quote(i));
      high = Math.max(high, problem.quote(i));
    }
    return high - low < 1e-9;
  }
}
