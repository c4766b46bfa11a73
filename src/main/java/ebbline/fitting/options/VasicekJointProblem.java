package ebbline.fitting.options;

import ebbline.fitting.Parameter;
import ebbline.fitting.VasicekZero;
import ebbline.model.GaussianRates;
import ebbline.model.Vasicek;
import ebbline.pricing.PriceGradient;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * Errors of zero rates, then of option quotes, as a function of free coordinates without bounds:
 * mean reversion and volatility as in {@link HullWhiteProblem}, and the drift b = κ(θ − r₀) in
 * place of a free θ, which is smooth where κ is 0.
 */
final class VasicekJointProblem implements MarquardtSearch.Problem {
  private static final double LOWEST_REVERSION = -0.5;
  private static final double HIGHEST_REVERSION = 10;
  private static final double MIDDLE = 0.5 * (LOWEST_REVERSION + HIGHEST_REVERSION);
  private static final double HALF = 0.5 * (HIGHEST_REVERSION - LOWEST_REVERSION);
  private static final double LOWEST = Math.log(CalibrationTerms.LOWEST_VOLATILITY);
  private static final double HIGHEST = Math.log(CalibrationTerms.HIGHEST_VOLATILITY);
  private static final double MIDDLE_LOG = 0.5 * (LOWEST + HIGHEST);
  private static final double HALF_LOG = 0.5 * (HIGHEST - LOWEST);

  /** Rows of slopes: κ with b held, b, σ, r₀. */
  private static final int REVERSION = 0;

  private static final int DRIFT = 1;
  private static final int VOLATILITY = 2;
  private static final int RATE = 3;

  private final double[] times;
  private final double[] zeros;
  private final List<OptionQuote> quotes;
  private final Map<Parameter, Double> held;
  private final QuoteTargets targets;
  private final List<Parameter> free = new ArrayList<>();
  private boolean exact;

  private final double[] zeroRates;
  private final double[] values;
  private final double[][] optionSlopes;
  private final double[][] slopes;
  private double[] lastPremiums;

  VasicekJointProblem(
      double[] times,
      double[] zeros,
      List<OptionQuote> quotes,
      Map<Parameter, Double> held,
      Objective objective) {
    this.times = times.clone();
    this.zeros = zeros.clone();
    this.quotes = List.copyOf(quotes);
    this.held = held;
    this.targets = new QuoteTargets(quotes, objective);
    for (Parameter parameter : Parameter.values()) {
      if (!held.containsKey(parameter)) {
        free.add(parameter);
      }
    }
    zeroRates = new double[times.length];
    values = new double[quotes.size()];
    lastPremiums = new double[quotes.size()];
    optionSlopes = new double[4][quotes.size()];
    slopes = new double[4][times.length + quotes.size()];
  }

  void setExact(boolean exact) {
    this.exact = exact;
  }

  List<Parameter> free() {
    return free;
  }

  double zero(int i) {
    return zeros[i];
  }

  OptionQuote quote(int i) {
    return quotes.get(i);
  }

  /** Of the last evaluation. */
  double[] zeroRates() {
    return zeroRates.clone();
  }

  /** Of the last evaluation. */
  double[] premiums() {
    return lastPremiums.clone();
  }

  int counted() {
    return times.length + CalibrationRules.counted(quotes);
  }

  double weights() {
    return quotes.stream().mapToDouble(OptionQuote::weight).sum();
  }

  @Override
  public int residuals() {
    return times.length + quotes.size();
  }

  @Override
  public int parameters() {
    return free.size();
  }

  double[] coordinates(Vasicek model) {
    double[] point = new double[free.size()];
    for (int j = 0; j < point.length; j++) {
      point[j] =
          switch (free.get(j)) {
            case MEAN_REVERSION -> asin((model.meanReversion() - MIDDLE) / HALF);
            case LONG_RUN_MEAN -> model.meanReversion() * (model.longRunMean() - model.shortRate());
            case VOLATILITY ->
                asin(
                    (Math.log(Math.max(CalibrationTerms.LOWEST_VOLATILITY, model.volatility()))
                            - MIDDLE_LOG)
                        / HALF_LOG);
            case SHORT_RATE -> model.shortRate();
          };
    }
    return point;
  }

  private static double asin(double share) {
    return Math.asin(Math.max(-0.999999, Math.min(0.999999, share)));
  }

  private double natural(Parameter parameter, double[] point) {
    int j = free.indexOf(parameter);
    if (j < 0) {
      return held.get(parameter);
    }
    return switch (parameter) {
      case MEAN_REVERSION -> MIDDLE + HALF * Math.sin(point[j]);
      case VOLATILITY -> Math.exp(MIDDLE_LOG + HALF_LOG * Math.sin(point[j]));
      case LONG_RUN_MEAN, SHORT_RATE -> point[j];
    };
  }

  private double drift(double[] point) {
    int j = free.indexOf(Parameter.LONG_RUN_MEAN);
    return j >= 0
        ? point[j]
        : natural(Parameter.MEAN_REVERSION, point)
            * (held.get(Parameter.LONG_RUN_MEAN) - natural(Parameter.SHORT_RATE, point));
  }

  Vasicek model(double[] point) {
    double reversion = natural(Parameter.MEAN_REVERSION, point);
    double rate = natural(Parameter.SHORT_RATE, point);
    double mean =
        held.containsKey(Parameter.LONG_RUN_MEAN)
            ? held.get(Parameter.LONG_RUN_MEAN)
            : reversion == 0 ? rate : rate + drift(point) / reversion;
    return new Vasicek(rate, mean, reversion, natural(Parameter.VOLATILITY, point));
  }

  @Override
  public void at(double[] point, double[] residual, double[][] byPoint) {
    double reversion = natural(Parameter.MEAN_REVERSION, point);
    double sigma = natural(Parameter.VOLATILITY, point);
    evaluate(point, residual);
    boolean meanHeld = held.containsKey(Parameter.LONG_RUN_MEAN);
    double gap = meanHeld ? held.get(Parameter.LONG_RUN_MEAN) : 0;
    gap -= meanHeld ? natural(Parameter.SHORT_RATE, point) : 0;
    for (int j = 0; j < free.size(); j++) {
      for (int i = 0; i < residual.length; i++) {
        byPoint[j][i] =
            switch (free.get(j)) {
              case MEAN_REVERSION ->
                  (slopes[REVERSION][i] + gap * slopes[DRIFT][i]) * HALF * Math.cos(point[j]);
              case LONG_RUN_MEAN -> slopes[DRIFT][i];
              case VOLATILITY -> slopes[VOLATILITY][i] * sigma * HALF_LOG * Math.cos(point[j]);
              case SHORT_RATE -> slopes[RATE][i] - (meanHeld ? reversion * slopes[DRIFT][i] : 0);
            };
      }
    }
  }

  /** Slopes of the errors in the free parameters themselves, a row each. */
  double[][] naturalSlopes(double[] point) {
    evaluate(point, new double[residuals()]);
    Vasicek model = model(point);
    double[][] result = new double[free.size()][residuals()];
    for (int j = 0; j < free.size(); j++) {
      for (int i = 0; i < result[j].length; i++) {
        result[j][i] =
            switch (free.get(j)) {
              case MEAN_REVERSION ->
                  slopes[REVERSION][i]
                      + (model.longRunMean() - model.shortRate()) * slopes[DRIFT][i];
              case LONG_RUN_MEAN -> model.meanReversion() * slopes[DRIFT][i];
              case VOLATILITY -> slopes[VOLATILITY][i];
              case SHORT_RATE -> slopes[RATE][i] - model.meanReversion() * slopes[DRIFT][i];
            };
      }
    }
    return result;
  }

  private void evaluate(double[] point, double[] residual) {
    double reversion = natural(Parameter.MEAN_REVERSION, point);
    double sigma = natural(Parameter.VOLATILITY, point);
    double rate = natural(Parameter.SHORT_RATE, point);
    double drift = drift(point);
    int n = times.length;
    for (int i = 0; i < n; i++) {
      VasicekZero zero = VasicekZero.at(reversion * times[i]);
      zeroRates[i] = zero.rate(times[i], drift, sigma, rate);
      residual[i] = zeroRates[i] - zeros[i];
      slopes[REVERSION][i] = zero.byMeanReversion(times[i], drift, sigma);
      slopes[DRIFT][i] = zero.byDrift(times[i]);
      slopes[VOLATILITY][i] = zero.byVolatility(times[i], sigma);
      slopes[RATE][i] = 1;
    }
    double[] errors = new double[values.length];
    try {
      options(model(point).rates(), reversion, drift, sigma);
    } catch (IllegalArgumentException e) {
      java.util.Arrays.fill(values, Double.NaN); // too extreme to count: the search steps back
    }
    lastPremiums = values.clone();
    if (exact) {
      targets.exact(values, optionSlopes, errors);
    } else {
      targets.scaled(values, optionSlopes, errors);
    }
    System.arraycopy(errors, 0, residual, n, errors.length);
    for (int k = 0; k < 4; k++) {
      System.arraycopy(optionSlopes[k], 0, slopes[k], n, errors.length);
    }
  }

  private void options(GaussianRates rates, double reversion, double drift, double sigma) {
    for (int i = 0; i < values.length; i++) {
      PriceGradient gradient = PriceGradient.of(quotes.get(i).claim(), rates);
      values[i] = gradient.value();
      double[] at = gradient.times();
      double[] byLog = gradient.byLogDiscount();
      double[] sum = {gradient.byMeanReversion(), 0, gradient.byAllVolatility(), 0};
      for (int k = 0; k < at.length; k++) {
        // ln P = −τ × zero rate.
        double weight = -at[k] * byLog[k];
        VasicekZero zero = VasicekZero.at(reversion * at[k]);
        sum[REVERSION] += weight * zero.byMeanReversion(at[k], drift, sigma);
        sum[DRIFT] += weight * zero.byDrift(at[k]);
        sum[VOLATILITY] += weight * zero.byVolatility(at[k], sigma);
        sum[RATE] += weight;
      }
      for (int k = 0; k < 4; k++) {
        optionSlopes[k][i] = sum[k];
      }
    }
  }
}
