package ebbline.fitting.options;

import ebbline.curve.DiscountCurve;
import ebbline.model.HullWhite;
import ebbline.model.VolatilitySteps;
import ebbline.pricing.OptionSheet;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Hull and White's mean reversion and volatility from the prices of options, by least squares in
 * volatilities or premiums; the pricing measure.
 *
 * <p>The search runs on premium errors over vega, from several starts that are the same on every
 * run, and ends on the errors of the objective itself; all slopes are analytic. One thread's only.
 */
public final class HullWhiteCalibration {
  /** Mean reversions and volatilities from which the search sets out. */
  private static final double[][] STARTS = {{0.05, 0.01}, {0.6, 0.02}, {-0.05, 0.004}};

  /** A root of the mean square this far below a basis point is rounding: nothing beats it. */
  private static final double EXACT = 1e-11;

  private final List<OptionQuote> quotes;
  private final DiscountCurve curve;
  private final CalibrationTerms terms;
  private final OptionSheet sheet;
  private final QuoteTargets targets;

  private HullWhiteCalibration(
      List<OptionQuote> quotes, DiscountCurve curve, CalibrationTerms terms) {
    this.quotes = List.copyOf(quotes);
    this.curve = curve;
    this.terms = terms;
    CalibrationRules.check(quotes, terms);
    sheet = OptionSheet.of(quotes.stream().map(OptionQuote::claim).toList(), curve);
    targets = new QuoteTargets(quotes, terms.objective());
  }

  /**
   * @throws IllegalArgumentException in words if the quotes cannot carry the fit
   */
  public static HullWhiteCalibration of(
      List<OptionQuote> quotes, DiscountCurve curve, CalibrationTerms terms) {
    return new HullWhiteCalibration(quotes, curve, terms);
  }

  /** Where one search from one start ends: the first stage alone, as the fit uses it. */
  public HullWhite search(double meanReversion, double volatility) {
    HullWhiteProblem problem = problem();
    MarquardtSearch.Outcome outcome = search(problem, meanReversion, volatility);
    return new HullWhite(
        problem.meanReversion(outcome.point()),
        VolatilitySteps.of(terms.stepEnds(), problem.volatility(outcome.point())));
  }

  /** The model that a fit found. */
  public static HullWhite model(OptionFit fit, CalibrationTerms terms) {
    double[] sigma = new double[terms.steps()];
    for (int k = 0; k < sigma.length; k++) {
      sigma[k] = fit.value(CalibrationRules.volatilityName(terms, k));
    }
    return new HullWhite(fit.value("mean_reversion"), VolatilitySteps.of(terms.stepEnds(), sigma));
  }

  public OptionFit fit() {
    return terms.bootstrap() ? bootstrapped() : together();
  }

  private HullWhiteProblem problem() {
    return problem(terms.meanReversion(), ones(terms.steps(), 0.01), 0, terms.steps());
  }

  private HullWhiteProblem problem(
      OptionalDouble reversion, double[] sigma, int firstFree, int freeSteps) {
    return new HullWhiteProblem(
        sheet,
        targets,
        terms,
        reversion.orElse(0),
        reversion.isEmpty(),
        sigma,
        firstFree,
        freeSteps);
  }

  private MarquardtSearch.Outcome search(
      HullWhiteProblem problem, double meanReversion, double volatility) {
    sheet.forget();
    double[] start = problem.coordinates(meanReversion, ones(terms.steps(), volatility));
    return MarquardtSearch.minimise(problem, start, terms.iterations());
  }

  private static double[] ones(int count, double value) {
    double[] all = new double[count];
    Arrays.fill(all, value);
    return all;
  }

  private OptionFit together() {
    HullWhiteProblem problem = problem();
    MarquardtSearch.Outcome best = null;
    int evaluations = 0;
    for (double[] start : STARTS) {
      MarquardtSearch.Outcome outcome = search(problem, start[0], start[1]);
      evaluations += outcome.evaluations();
      if (best == null || outcome.squares() < best.squares()) {
        best = outcome;
      }
      if (Math.sqrt(best.squares() / targets.size()) < EXACT) {
        break;
      }
    }
    List<String> warnings = new ArrayList<>();
    Optional<MarquardtSearch.Outcome> second = finished(problem, best, warnings);
    MarquardtSearch.Outcome last = second.orElse(best);
    return report(
        problem,
        last.point(),
        best.iterations() + second.map(MarquardtSearch.Outcome::iterations).orElse(0),
        evaluations + second.map(MarquardtSearch.Outcome::evaluations).orElse(0),
        last.reason(),
        warnings);
  }

  /** The second stage: errors of the objective itself; empty where the first is the end. */
  private Optional<MarquardtSearch.Outcome> finished(
      HullWhiteProblem problem, MarquardtSearch.Outcome first, List<String> warnings) {
    if (targets.isLinear() || Math.sqrt(first.squares() / targets.size()) < EXACT) {
      return Optional.empty();
    }
    problem.setExact(true);
    MarquardtSearch.Outcome second =
        MarquardtSearch.minimise(problem, first.point(), terms.iterations());
    if (second.squares() < Double.POSITIVE_INFINITY) {
      return Optional.of(second);
    }
    problem.setExact(false);
    warnings.add(
        "the model's premium of some quote has no volatility: errors are premium errors over the"
            + " quote's vega");
    return Optional.empty();
  }

  private OptionFit bootstrapped() {
    double[] ends = terms.stepEnds();
    double[] sigma = ones(terms.steps(), 0.01);
    double reversion = terms.meanReversion().orElseThrow();
    int evaluations = 0;
    int iterations = 0;
    String reason = "";
    List<String> warnings = new ArrayList<>();
    for (int k = 0; k < sigma.length; k++) {
      double from = k == 0 ? 0 : ends[k - 1];
      double to = k < ends.length ? ends[k] : Double.POSITIVE_INFINITY;
      List<OptionQuote> inside =
          quotes.stream()
              .filter(q -> q.weight() > 0)
              .filter(q -> q.terms().lastExpiry() > from + CalibrationRules.SAME)
              .filter(q -> q.terms().lastExpiry() <= to + CalibrationRules.SAME)
              .toList();
      OptionSheet part = OptionSheet.of(inside.stream().map(OptionQuote::claim).toList(), curve);
      HullWhiteProblem problem =
          new HullWhiteProblem(
              part,
              new QuoteTargets(inside, terms.objective()),
              terms,
              reversion,
              false,
              sigma,
              k,
              1);
      MarquardtSearch.Outcome outcome =
          MarquardtSearch.minimise(
              problem, problem.coordinates(reversion, sigma), terms.iterations());
      outcome = finished(problem, outcome, warnings).orElse(outcome);
      sigma = problem.volatility(outcome.point());
      evaluations += outcome.evaluations();
      iterations += outcome.iterations();
      if (!outcome.converged()) {
        reason = "volatility step " + (k + 1) + ": " + outcome.reason();
      }
    }
    HullWhiteProblem all = problem(terms.meanReversion(), sigma, 0, sigma.length);
    all.setExact(!targets.isLinear());
    return report(
        all, all.coordinates(reversion, sigma), iterations, evaluations, reason, warnings);
  }

  private OptionFit report(
      HullWhiteProblem problem,
      double[] point,
      int iterations,
      int evaluations,
      String reason,
      List<String> warnings) {
    double a = problem.meanReversion(point);
    double[] sigma = problem.volatility(point);
    double[] residual = new double[targets.size()];
    problem.natural(a, sigma, residual);
    double squares = MarquardtSearch.squares(residual);
    if (!(squares < Double.POSITIVE_INFINITY)) {
      problem.setExact(false);
      problem.natural(a, sigma, residual);
      squares = MarquardtSearch.squares(residual);
    }
    boolean free = terms.meanReversion().isEmpty();
    double[][] slopes = problem.naturalSlopes();
    double[] values = problem.values();
    FitCovariance covariance =
        FitCovariance.of(
            free ? slopes : Arrays.copyOfRange(slopes, 1, slopes.length),
            squares,
            CalibrationRules.counted(quotes));
    List<String> names = new ArrayList<>(List.of("mean_reversion"));
    List<Double> found = new ArrayList<>(List.of(a));
    for (int k = 0; k < sigma.length; k++) {
      names.add(CalibrationRules.volatilityName(terms, k));
      found.add(sigma[k]);
    }
    List<OptionFit.Quote> fitted = new ArrayList<>();
    for (int i = 0; i < values.length; i++) {
      fitted.add(fitted(quotes.get(i), values[i]));
    }
    CalibrationWarnings.add(warnings, terms, a, sigma, covariance);
    List<OptionFit.ProfilePoint> profile =
        free ? profile(a, sigma, covariance.standardError(0)) : List.of();
    return new OptionFit(
        names,
        found,
        free ? names : names.subList(1, names.size()),
        covariance,
        fitted,
        rmse(squares),
        iterations,
        evaluations,
        reason,
        profile,
        warnings);
  }

  static OptionFit.Quote fitted(OptionQuote quote, double premium) {
    OptionalDouble figure;
    try {
      figure = OptionalDouble.of(quote.unit().figure(quote.terms(), premium, quote.shift()));
    } catch (IllegalArgumentException e) {
      figure = OptionalDouble.empty();
    }
    return new OptionFit.Quote(
        quote.id(), quote.unit().label(), quote.quoted(), figure, quote.weight());
  }

  private double rmse(double squares) {
    double weights = quotes.stream().mapToDouble(OptionQuote::weight).sum();
    return Math.sqrt(squares / weights);
  }

  /** The objective on both sides of the fitted mean reversion, volatility fitted anew. */
  private List<OptionFit.ProfilePoint> profile(
      double a, double[] sigma, OptionalDouble standardError) {
    double step = Math.max(0.02 * Math.max(Math.abs(a), 0.05), 0.4 * standardError.orElse(0));
    step = Math.min(step, 0.2);
    List<OptionFit.ProfilePoint> profile = new ArrayList<>();
    for (int k = -10; k <= 10; k++) {
      double at = a + k * step;
      HullWhiteProblem problem = problem(OptionalDouble.of(at), sigma, 0, sigma.length);
      MarquardtSearch.Outcome outcome =
          MarquardtSearch.minimise(problem, problem.coordinates(at, sigma), terms.iterations());
      if (outcome.squares() < Double.POSITIVE_INFINITY) {
        profile.add(
            new OptionFit.ProfilePoint(
                at, problem.volatility(outcome.point())[0], rmse(outcome.squares())));
      }
    }
    return profile;
  }
}
