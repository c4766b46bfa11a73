package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.Claim;
import ebbline.instrument.Instrument;
import ebbline.model.GaussianRates;
import ebbline.model.Vasicek;
import ebbline.model.VolatilitySteps;
import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * How sure the parameters of a fitted model are, and what that means for a value: its standard
 * deviation is √(gᵀCg), g the value's gradient in the parameters.
 *
 * @param names {@code mean_reversion}, {@code volatility} ({@code volatility_1} and so on for
 *     steps), {@code short_rate}, {@code long_run_mean}; others move no value
 * @param covariance in that order
 * @param vasicek the model where its curve moves with the parameters too
 */
public record FittedParameters(
    List<String> names, List<List<Double>> covariance, Optional<Vasicek> vasicek) {
  private static final String STEP = "volatility_";

  public FittedParameters {
    names = List.copyOf(names);
    covariance = covariance.stream().map(List::copyOf).toList();
    Objects.requireNonNull(vasicek, "vasicek");
    int n = names.size();
    if (covariance.size() != n || covariance.stream().anyMatch(row -> row.size() != n)) {
      throw new IllegalArgumentException(
          "a covariance has a row and a column a parameter, found " + covariance.size());
    }
  }

  /**
   * Standard deviation of a claim's value, per 100 face.
   *
   * @param instrument whose claim it is on the market's curve
   */
  double deviation(Instrument instrument, Claim claim, Market market) {
    GaussianRates rates = market.rates().orElseThrow();
    double[] gradient =
        ClosedForm.applies(claim) && !movesItsOwnRates(instrument, market.axis())
            ? analytic(claim, rates)
            : differences(instrument, claim, market, rates);
    double variance = 0;
    for (int i = 0; i < gradient.length; i++) {
      for (int j = 0; j < gradient.length; j++) {
        variance += gradient[i] * covariance.get(i).get(j) * gradient[j];
      }
    }
    return Math.sqrt(Math.max(0, variance));
  }

  /** Whether floating interest was fixed from a curve that moves with the parameters. */
  private boolean movesItsOwnRates(Instrument instrument, TimeAxis axis) {
    return vasicek.isPresent() && !instrument.claim(axis).floating().isEmpty();
  }

  private double[] analytic(Claim claim, GaussianRates rates) {
    PriceGradient price = PriceGradient.of(claim, rates);
    double[] byCurve = new double[4];
    if (vasicek.isPresent()) {
      double[] times = price.times();
      double[] byLog = price.byLogDiscount();
      for (int i = 0; i < times.length; i++) {
        vasicek.get().addLogDiscountGradient(times[i], byLog[i], byCurve);
      }
    }
    double[] byStep = price.byVolatility();
    double[] gradient = new double[names.size()];
    for (int i = 0; i < gradient.length; i++) {
      String name = names.get(i);
      int step = step(name);
      gradient[i] =
          switch (name) {
            case "short_rate" -> byCurve[0];
            case "long_run_mean" -> byCurve[1];
            case "mean_reversion" -> price.byMeanReversion() + byCurve[2];
            case "volatility" -> price.byAllVolatility() + byCurve[3];
            default -> step >= 0 && step < byStep.length ? byStep[step] : 0;
          };
    }
    return gradient;
  }

  /** Index of a volatility step, −1 for another parameter. */
  private static int step(String name) {
    boolean is = name.startsWith(STEP) && name.substring(STEP.length()).matches("\\d{1,4}");
    return is ? Integer.parseInt(name.substring(STEP.length())) - 1 : -1;
  }

  /** Central differences over a tenth of each standard error, for claims without a formula. */
  private double[] differences(
      Instrument instrument, Claim claim, Market market, GaussianRates rates) {
    double[] gradient = new double[names.size()];
    for (int i = 0; i < gradient.length; i++) {
      double h = 0.1 * Math.sqrt(Math.max(0, covariance.get(i).get(i)));
      Optional<GaussianRates> up = moved(names.get(i), h, rates);
      Optional<GaussianRates> down = moved(names.get(i), -h, rates);
      if (h > 0 && up.isPresent() && down.isPresent()) {
        gradient[i] =
            (value(instrument, claim, market, up.get())
                    - value(instrument, claim, market, down.get()))
                / (2 * h);
      }
    }
    return gradient;
  }

  private double value(Instrument instrument, Claim claim, Market market, GaussianRates rates) {
    Claim here =
        movesItsOwnRates(instrument, market.axis())
            ? Projection.fixed(
                instrument.claim(market.axis()),
                rates.curve(),
                market.projection().orElse(rates.curve()))
            : claim;
    return BestMethod.value(here, rates).presentValue();
  }

  private Optional<GaussianRates> moved(String name, double h, GaussianRates rates) {
    if (vasicek.isPresent()) {
      Vasicek v = vasicek.get();
      return switch (name) {
        case "short_rate" ->
            Optional.of(of(v.shortRate() + h, v.longRunMean(), v.meanReversion(), v.volatility()));
        case "long_run_mean" ->
            Optional.of(of(v.shortRate(), v.longRunMean() + h, v.meanReversion(), v.volatility()));
        case "mean_reversion" ->
            Optional.of(of(v.shortRate(), v.longRunMean(), v.meanReversion() + h, v.volatility()));
        case "volatility" ->
            Optional.of(
                of(
                    v.shortRate(),
                    v.longRunMean(),
                    v.meanReversion(),
                    Math.max(0, v.volatility() + h)));
        default -> Optional.empty();
      };
    }
    DiscountCurve curve = rates.curve();
    VolatilitySteps steps = rates.volatility();
    if (name.equals("mean_reversion")) {
      return Optional.of(new GaussianRates(curve, rates.meanReversion() + h, steps));
    }
    int step = step(name);
    if (!name.equals("volatility") && (step < 0 || step >= steps.count())) {
      return Optional.empty();
    }
    double[] ends = new double[steps.count() - 1];
    double[] values = new double[steps.count()];
    for (int k = 0; k < values.length; k++) {
      values[k] = Math.max(0, steps.value(k) + (step < 0 || step == k ? h : 0));
      if (k < ends.length) {
        ends[k] = steps.until(k);
      }
    }
    return Optional.of(
        new GaussianRates(curve, rates.meanReversion(), VolatilitySteps.of(ends, values)));
  }

  private static GaussianRates of(double rate, double mean, double reversion, double sigma) {
    return new Vasicek(rate, mean, reversion, sigma).rates();
  }
}
