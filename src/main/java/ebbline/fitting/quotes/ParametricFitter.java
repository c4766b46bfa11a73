package ebbline.fitting.quotes;

import ebbline.curve.SvenssonCurve;
import ebbline.fitting.FittedQuote;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Objects;

/**
 * Fits a parametric zero curve by separable least squares: the betas are solved for at every tau,
 * and the taus searched on a grid whose every minimum is refined. Immutable.
 */
public final class ParametricFitter {
  private static final int LINE_CELLS = 228;
  private static final int SQUARE_CELLS = 57;
  private static final int QUOTE_CELLS = 19;

  /** A zero rate moved by less than this by a loading is not moved. */
  private static final double NO_EFFECT = 1e-9;

  private final ParametricForm form;
  private final double leastTau;
  private final double mostTau;

  private ParametricFitter(ParametricForm form, double leastTau, double mostTau) {
    this.form = form;
    this.leastTau = leastTau;
    this.mostTau = mostTau;
  }

  /** With taus between 0.1 and 30 years. */
  public static ParametricFitter of(ParametricForm form) {
    return new ParametricFitter(Objects.requireNonNull(form, "form"), 0.1, 30);
  }

  /**
   * With another range of taus.
   *
   * @param least years, above 0
   * @param most years, above the least
   */
  public ParametricFitter withTaus(double least, double most) {
    if (!(least > 0 && most > least && Double.isFinite(most))) {
      throw new IllegalArgumentException(
          "taus must lie between two increasing positive years, found " + least + " and " + most);
    }
    return new ParametricFitter(form, least, most);
  }

  /**
   * The fit to zero rates.
   *
   * @param times years, positive
   * @param zeros continuously compounded, decimals per year
   * @param weights on the squared errors, positive
   * @throws IllegalArgumentException if there are fewer points than parameters or a rule above is
   *     broken
   */
  public ParametricFit fitZeros(double[] times, double[] zeros, double[] weights) {
    if (times.length != zeros.length || times.length != weights.length) {
      throw new IllegalArgumentException(
          "every time needs a zero rate and a weight, found "
              + times.length
              + ", "
              + zeros.length
              + " and "
              + weights.length);
    }
    requirePoints((int) Arrays.stream(times).distinct().count());
    for (int i = 0; i < times.length; i++) {
      if (!(times[i] > 0 && Double.isFinite(times[i]) && Double.isFinite(zeros[i]))) {
        throw new IllegalArgumentException(
            "zero rates must be finite and at positive times, found "
                + zeros[i]
                + " at "
                + times[i]);
      }
      if (!(weights[i] > 0 && Double.isFinite(weights[i]))) {
        throw new IllegalArgumentException("weights must be positive, found " + weights[i]);
      }
    }
    ZeroProblem problem = new ZeroProblem(form, times, zeros, weights);
    Result result = search(problem, form.taus() == 1 ? LINE_CELLS : SQUARE_CELLS);
    List<FittedQuote> quotes = new ArrayList<>();
    for (int i = 0; i < times.length; i++) {
      quotes.add(
          new FittedQuote(
              String.format(Locale.ROOT, "%s", times[i]), zeros[i], result.curve.zero(times[i])));
    }
    return fit(result, quotes, Arrays.stream(times).max().orElse(0));
  }

  /**
   * The fit to quotes, each weighted by {@link QuoteEquation#weight}; for bond prices the usual
   * weight is 1/(duration × price)², which makes errors of price into errors of yield.
   *
   * @throws IllegalArgumentException if there are fewer quotes than parameters
   */
  public ParametricFit fitQuotes(List<QuoteEquation> quotes) {
    requirePoints((int) quotes.stream().mapToDouble(QuoteEquation::lastTime).distinct().count());
    QuoteProblem problem = new QuoteProblem(form, List.copyOf(quotes));
    Result result = search(problem, form.taus() == 1 ? SQUARE_CELLS : QUOTE_CELLS);
    double last = quotes.stream().mapToDouble(QuoteEquation::lastTime).max().orElse(0);
    return fit(result, Repricing.reprice(result.curve, quotes), last);
  }

  private void requirePoints(int found) {
    int needed = form.betas() + form.taus();
    if (found < needed) {
      throw new IllegalArgumentException(
          form.label() + " needs " + needed + " maturities at least, found " + found);
    }
  }

  private static final class Result {
    final SvenssonCurve curve;
    final TauProblem.Point best;
    final List<TauProblem.Point> minima;
    final TauProblem.Point valley;

    Result(List<TauProblem.Point> minima, TauProblem.Point valley) {
      this.minima = minima;
      this.valley = valley;
      best = minima.isEmpty() ? valley : minima.get(0);
      curve = LoadingCurve.curve(best.betas, best.logTaus);
    }
  }

  private Result search(TauProblem problem, int cells) {
    double[] guess = new double[form.betas()];
    TauSearch search = new TauSearch(problem, Math.log(leastTau), Math.log(mostTau), cells);
    List<TauProblem.Point> minima = search.minima(guess);
    return new Result(minima, form.taus() == 2 ? search.valley(guess) : null);
  }

  private ParametricFit fit(Result result, List<FittedQuote> quotes, double last) {
    List<ParametricFit.Minimum> minima = new ArrayList<>();
    for (TauProblem.Point point : result.minima) {
      double tau1 = Math.exp(point.logTaus[0]);
      double tau2 = point.logTaus.length == 2 ? Math.exp(point.logTaus[1]) : tau1;
      minima.add(new ParametricFit.Minimum(tau1, tau2, point.squares));
    }
    return new ParametricFit(
        form, result.curve, result.best.squares, quotes, problem(result, last), minima);
  }

  private String problem(Result result, double last) {
    double[] betas = result.best.betas;
    double[] taus = result.curve.taus();
    double hump = Math.abs(betas[2]) * reach(taus[0], last);
    if (Math.abs(betas[1]) < NO_EFFECT && hump < NO_EFFECT) {
      return "the curve is flat: slope and hump have no effect, so that tau1 means nothing";
    }
    if (form.taus() == 2) {
      if (Math.abs(betas[3]) * reach(taus[1], last) < NO_EFFECT) {
        return "the second hump has no effect, so that tau2 means nothing";
      }
      if (result.minima.isEmpty() || result.valley.squares < result.best.squares) {
        return String.format(
            Locale.ROOT,
            "no best pair of taus exists: the squares fall to %.6g as both tend to %.4g years and the"
                + " betas to infinity; shown is the best pair that stays apart",
            result.valley.squares,
            Math.exp(result.valley.logTaus[0]));
      }
    }
    for (int k = 0; k < form.taus(); k++) {
      if (!(taus[k] > leastTau * (1 + 1e-9) && taus[k] < mostTau * (1 - 1e-9))) {
        return String.format(
            Locale.ROOT, "tau%d is at the edge of its range, %.4g years", k + 1, taus[k]);
      }
    }
    return "";
  }

  /** The largest value of a hump's loading, up to the last maturity. */
  private static double reach(double tau, double last) {
    return SvenssonCurve.curvatureLoading(Math.min(last, 1.793 * tau), tau);
  }
}
