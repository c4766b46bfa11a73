package ebbline.fitting;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/**
 * Zero rates minus quotes as a function of free coordinates.
 *
 * <p>The coordinates have no bounds: mean reversion is the middle of its range plus half the range
 * times a sine, volatility is folded at 0, and in place of a free long-run mean stands the drift b
 * = κ(θ − r₀), which stays finite at κ = 0.
 */
final class VasicekProblem implements LeastSquares.Residuals {
  private final double[] times;
  private final double[] quotes;
  private final Map<Parameter, Double> held;
  private final boolean meanAtShortRate;
  private final double middle;
  private final double halfRange;
  private final List<Parameter> free = new ArrayList<>();

  VasicekProblem(
      double[] times,
      double[] quotes,
      Map<Parameter, Double> held,
      boolean meanAtShortRate,
      VasicekCurveFit.Settings settings) {
    this.times = times.clone();
    this.quotes = quotes.clone();
    this.held = held;
    this.meanAtShortRate = meanAtShortRate;
    this.middle = 0.5 * (settings.lowestMeanReversion() + settings.highestMeanReversion());
    this.halfRange = 0.5 * (settings.highestMeanReversion() - settings.lowestMeanReversion());
    for (Parameter parameter : Parameter.values()) {
      if (!held.containsKey(parameter)
          && !(meanAtShortRate && parameter == Parameter.LONG_RUN_MEAN)) {
        free.add(parameter);
      }
    }
  }

  List<Parameter> free() {
    return free;
  }

  int size() {
    return times.length;
  }

  double time(int i) {
    return times[i];
  }

  double quote(int i) {
    return quotes[i];
  }

  Double held(Parameter parameter) {
    return held.get(parameter);
  }

  boolean meanAtShortRate() {
    return meanAtShortRate;
  }

  /** Mean reversions of the range, κ = middle + half range × sine, at {@code share} of it. */
  double meanReversion(double coordinate) {
    return middle + halfRange * Math.sin(coordinate);
  }

  /** The coordinates of a point given by κ, b, σ, r₀. */
  double[] coordinates(double meanReversion, double drift, double volatility, double shortRate) {
    double[] point = new double[free.size()];
    for (int j = 0; j < point.length; j++) {
      point[j] =
          switch (free.get(j)) {
            case MEAN_REVERSION -> Math.asin((meanReversion - middle) / halfRange);
            case LONG_RUN_MEAN -> drift;
            case VOLATILITY -> volatility;
            case SHORT_RATE -> shortRate;
          };
    }
    return point;
  }

  private double natural(Parameter parameter, double[] point) {
    int j = free.indexOf(parameter);
    if (j < 0) {
      return held.getOrDefault(parameter, 0.0);
    }
    return parameter == Parameter.MEAN_REVERSION ? meanReversion(point[j]) : point[j];
  }

  private double drift(double[] point) {
    int j = free.indexOf(Parameter.LONG_RUN_MEAN);
    if (j >= 0) {
      return point[j];
    }
    return meanAtShortRate
        ? 0
        : natural(Parameter.MEAN_REVERSION, point)
            * (held.get(Parameter.LONG_RUN_MEAN) - natural(Parameter.SHORT_RATE, point));
  }

  double[] fitted(double[] point) {
    double meanReversion = natural(Parameter.MEAN_REVERSION, point);
    double drift = drift(point);
    double volatility = natural(Parameter.VOLATILITY, point);
    double shortRate = natural(Parameter.SHORT_RATE, point);
    double[] rates = new double[times.length];
    for (int i = 0; i < rates.length; i++) {
      rates[i] =
          VasicekZero.at(meanReversion * times[i]).rate(times[i], drift, volatility, shortRate);
    }
    return rates;
  }

  @Override
  public void at(double[] point, double[] residual, double[][] jacobian) {
    double meanReversion = natural(Parameter.MEAN_REVERSION, point);
    double drift = drift(point);
    double volatility = natural(Parameter.VOLATILITY, point);
    double shortRate = natural(Parameter.SHORT_RATE, point);
    boolean driftIsFree = free.contains(Parameter.LONG_RUN_MEAN);
    for (int i = 0; i < times.length; i++) {
      double tau = times[i];
      VasicekZero zero = VasicekZero.at(meanReversion * tau);
      residual[i] = zero.rate(tau, drift, volatility, shortRate) - quotes[i];
      // A held mean ties the drift b = κ(θ − r₀) to κ and r₀.
      double tied = driftIsFree || meanAtShortRate ? 0 : zero.byDrift(tau);
      for (int j = 0; j < free.size(); j++) {
        jacobian[i][j] =
            switch (free.get(j)) {
              case MEAN_REVERSION ->
                  (zero.byMeanReversion(tau, drift, volatility) + tied * (mean() - shortRate))
                      * halfRange
                      * Math.cos(point[j]);
              case LONG_RUN_MEAN -> zero.byDrift(tau);
              case VOLATILITY -> zero.byVolatility(tau, volatility);
              case SHORT_RATE -> 1 - tied * meanReversion;
            };
      }
    }
  }

  private double mean() {
    return held.getOrDefault(Parameter.LONG_RUN_MEAN, 0.0);
  }

  /** κ, θ, σ, r₀ at a point, all finite. */
  Map<Parameter, Double> parameters(double[] point) {
    Map<Parameter, Double> result = new EnumMap<>(held);
    for (Parameter parameter : free) {
      result.put(parameter, natural(parameter, point));
    }
    result.computeIfPresent(Parameter.VOLATILITY, (p, sigma) -> Math.abs(sigma));
    double shortRate = result.get(Parameter.SHORT_RATE);
    if (meanAtShortRate) {
      result.put(Parameter.LONG_RUN_MEAN, shortRate);
    } else if (free.contains(Parameter.LONG_RUN_MEAN)) {
      double meanReversion = result.get(Parameter.MEAN_REVERSION);
      if (Math.abs(meanReversion) < 1e-12) {
        // Nothing is seen of κ below 1e-12; a mean needs one that is not 0.
        meanReversion = 1e-12;
        result.put(Parameter.MEAN_REVERSION, meanReversion);
      }
      result.put(Parameter.LONG_RUN_MEAN, shortRate + drift(point) / meanReversion);
    }
    return result;
  }

  /** ∂ zero rate / ∂ free parameter (κ, θ, σ, r₀ themselves), a row a point. */
  double[][] jacobian(Map<Parameter, Double> at) {
    double meanReversion = at.get(Parameter.MEAN_REVERSION);
    double mean = at.get(Parameter.LONG_RUN_MEAN);
    double volatility = at.get(Parameter.VOLATILITY);
    double shortRate = at.get(Parameter.SHORT_RATE);
    double drift = meanReversion * (mean - shortRate);
    double[][] jacobian = new double[times.length][free.size()];
    for (int i = 0; i < times.length; i++) {
      double tau = times[i];
      VasicekZero zero = VasicekZero.at(meanReversion * tau);
      for (int j = 0; j < free.size(); j++) {
        jacobian[i][j] =
            switch (free.get(j)) {
              case MEAN_REVERSION ->
                  zero.byMeanReversion(tau, drift, volatility)
                      + zero.byDrift(tau) * (mean - shortRate);
              case LONG_RUN_MEAN -> zero.byDrift(tau) * meanReversion;
              case VOLATILITY -> zero.byVolatility(tau, volatility);
              case SHORT_RATE -> 1 - (meanAtShortRate ? 0 : zero.byDrift(tau) * meanReversion);
            };
      }
    }
    return jacobian;
  }
}
