package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Optionlet;
import ebbline.instrument.RateBasis;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;
import ebbline.model.MomentSlopes;
import ebbline.model.VolatilitySteps;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Many European options on one curve, priced again and again with their slopes as the model's
 * parameters move: the inside of a calibration.
 *
 * <p>Holds the exercise boundaries of the last evaluation as starts of the next; one thread's only.
 */
public final class OptionSheet {
  /*
   * The curve stands still, so present values of flows are kept; so do the times, and options share them: G is
   * computed once for every length of time and √y once for every expiry. An option of one boundary is then
   * Newton's method on the log of its bond and one normal tail a flow (see CouponOptions); its slopes are sums of
   * the terms of the last step. Everything else goes the general way.
   */
  private static final int MOST_STEPS = 60;
  private static final double DENSITY_AT_0 = 0.3989422804014327;

  private final DiscountCurve curve;
  private final int size;
  private final double[] dates;
  private final double[] lengths;
  private final int[] quoteOf;
  private final int[] dateOf;
  private final int[] side;
  private final int[] from;
  private final double[] cash;
  private final double[] logCash;
  private final double[] weight;
  private final int[] lengthOf;
  private final double[] boundary;
  private final List<Claim> others;
  private final int[] otherQuotes;

  private final double[] g;
  private final double[] gSlope;
  private final double[] shift;
  private final double[] term;

  private OptionSheet(Parts parts, DiscountCurve curve, int size) {
    this.curve = curve;
    this.size = size;
    dates = distinct(parts.decisions);
    lengths = distinct(parts.taus);
    int n = parts.decisions.size();
    quoteOf = ints(parts.quotes);
    side = ints(parts.sides);
    from = ints(parts.starts);
    dateOf = new int[n];
    for (int i = 0; i < n; i++) {
      dateOf[i] = nearest(dates, parts.decisions.get(i));
    }
    cash = doubles(parts.cash);
    logCash = Arrays.stream(cash).map(Math::log).toArray();
    weight = doubles(parts.weights);
    lengthOf = new int[weight.length];
    for (int i = 0; i < lengthOf.length; i++) {
      lengthOf[i] = nearest(lengths, parts.taus.get(i));
    }
    boundary = new double[n];
    others = List.copyOf(parts.others);
    otherQuotes = ints(parts.otherQuotes);
    g = new double[lengths.length];
    gSlope = new double[lengths.length];
    int most = 0;
    for (int i = 0; i < n; i++) {
      most = Math.max(most, from[i + 1] - from[i]);
    }
    shift = new double[most];
    term = new double[most];
  }

  /**
   * @param claims everything fixed, at most one right each
   * @param curve that the model is laid over
   */
  public static OptionSheet of(List<Claim> claims, DiscountCurve curve) {
    Parts parts = new Parts();
    for (int i = 0; i < claims.size(); i++) {
      parts.add(i, claims.get(i), curve);
    }
    parts.starts.add(parts.weights.size());
    return new OptionSheet(parts, curve, claims.size());
  }

  public int size() {
    return size;
  }

  /** Starts the boundaries anew, so that what follows does not depend on what went before. */
  public void forget() {
    Arrays.fill(boundary, 0);
  }

  /**
   * Prices and slopes; figures that no double holds come out as NaN or infinite.
   *
   * @param values per 100 face, one an option
   * @param byReversion ∂value/∂a
   * @param byVolatility ∂value/∂σ, a row a step
   */
  public void evaluate(
      double meanReversion,
      VolatilitySteps volatility,
      double[] values,
      double[] byReversion,
      double[][] byVolatility) {
    GaussianRates rates = new GaussianRates(curve, meanReversion, volatility);
    MomentSlopes slopes = MomentSlopes.of(rates);
    Arrays.fill(values, 0);
    Arrays.fill(byReversion, 0);
    for (double[] row : byVolatility) {
      Arrays.fill(row, 0);
    }
    for (int i = 0; i < lengths.length; i++) {
      g[i] = rates.g(lengths[i]);
      gSlope[i] = slopes.ofG(lengths[i]);
    }
    double[] deviation = new double[dates.length];
    double[] deviationByReversion = new double[dates.length];
    double[][] deviationByVolatility = new double[dates.length][byVolatility.length];
    for (int i = 0; i < dates.length; i++) {
      deviation[i] = Math.sqrt(rates.variance(dates[i]));
      double half = deviation[i] > 0 ? 0.5 / deviation[i] : 0;
      deviationByReversion[i] = slopes.addVariance(dates[i], half, deviationByVolatility[i]);
    }
    for (int p = 0; p < boundary.length; p++) {
      int date = dateOf[p];
      int quote = quoteOf[p];
      double s = deviation[date];
      values[quote] += value(p, s);
      if (s > CouponOptions.CALM) {
        double bySpread = 0;
        double byShape = 0;
        for (int j = from[p], k = 0; j < from[p + 1]; j++, k++) {
          bySpread = Math.fma(term[k], g[lengthOf[j]], bySpread);
          byShape = Math.fma(term[k], gSlope[lengthOf[j]], byShape);
        }
        double density = DENSITY_AT_0 * Math.exp(-0.5 * boundary[p] * boundary[p]);
        bySpread *= density;
        byReversion[quote] += density * s * byShape + bySpread * deviationByReversion[date];
        for (int k = 0; k < byVolatility.length; k++) {
          byVolatility[k][quote] += bySpread * deviationByVolatility[date][k];
        }
      }
    }
    for (int i = 0; i < others.size(); i++) {
      PriceGradient gradient = PriceGradient.of(others.get(i), rates);
      values[otherQuotes[i]] += gradient.value();
      byReversion[otherQuotes[i]] += gradient.byMeanReversion();
      double[] each = gradient.byVolatility();
      for (int k = 0; k < byVolatility.length; k++) {
        byVolatility[k][otherQuotes[i]] += each[k];
      }
    }
  }

  /** The value of one part; its terms at the boundary are left in {@code term}. */
  private double value(int p, double s) {
    int first = from[p];
    int n = from[p + 1] - first;
    double z = s > CouponOptions.CALM ? boundary(p, s, first, n) : 0;
    if (!(s > CouponOptions.CALM)) {
      double bond = -cash[p];
      for (int j = 0; j < n; j++) {
        bond += weight[first + j];
      }
      return Math.max(0, side[p] * bond);
    }
    boundary[p] = Double.isFinite(z) ? z : 0;
    double density = Math.exp(-0.5 * z * z);
    int sign = side[p];
    double value = 0;
    for (int j = 0; j < n; j++) {
      double x = z + shift[j];
      value +=
          ZeroOptions.sided(sign * x, weight[first + j], density * term[j] * FastNormal.ratio(x));
    }
    value -= ZeroOptions.sided(sign * z, cash[p], density * cash[p] * FastNormal.ratio(z));
    return sign * value;
  }

  private double boundary(int p, double s, int first, int n) {
    double z = boundary[p];
    double largest = 0;
    for (int j = 0; j < n; j++) {
      double b = s * g[lengthOf[first + j]];
      shift[j] = b;
      largest = Math.max(largest, b);
      term[j] = weight[first + j] * FastExp.exp(-b * (z + 0.5 * b));
    }
    for (int step = 0; step < MOST_STEPS; step++) {
      double f = 0;
      double slope = 0;
      for (int j = 0; j < n; j++) {
        f += term[j];
        slope = Math.fma(shift[j], term[j], slope);
      }
      double move = (Math.log(f) - logCash[p]) * f / slope;
      if (!(Math.abs(move) < 1e6)) {
        return Double.NaN;
      }
      z += move;
      if (largest * move * move < CouponOptions.STOP) {
        for (int j = 0; j < n; j++) {
          // What is left out of e^(−x) is below x³/6, x² at most 1e-8 times the largest shift.
          double x = shift[j] * move;
          term[j] *= 1 - x * (1 - 0.5 * x);
        }
        return z;
      }
      for (int j = 0; j < n; j++) {
        term[j] *= FastExp.exp(-shift[j] * move);
      }
    }
    return z;
  }

  private static double[] distinct(List<Double> values) {
    double[] sorted = values.stream().mapToDouble(Double::doubleValue).sorted().toArray();
    int n = 0;
    for (double each : sorted) {
      if (n == 0 || each - sorted[n - 1] > 1e-13 * Math.max(1, each)) {
        sorted[n++] = each;
      }
    }
    return Arrays.copyOf(sorted, n);
  }

  private static int nearest(double[] sorted, double value) {
    int at = Arrays.binarySearch(sorted, value);
    if (at >= 0) {
      return at;
    }
    int right = -at - 1;
    boolean left =
        right == sorted.length || (right > 0 && value - sorted[right - 1] <= sorted[right] - value);
    return left ? right - 1 : right;
  }

  private static int[] ints(List<Integer> values) {
    return values.stream().mapToInt(Integer::intValue).toArray();
  }

  private static double[] doubles(List<Double> values) {
    return values.stream().mapToDouble(Double::doubleValue).toArray();
  }

  /** The options taken apart into those of one boundary, and the others. */
  private static final class Parts {
    private final List<Integer> quotes = new ArrayList<>();
    private final List<Integer> sides = new ArrayList<>();
    private final List<Integer> starts = new ArrayList<>();
    private final List<Double> decisions = new ArrayList<>();
    private final List<Double> cash = new ArrayList<>();
    private final List<Double> weights = new ArrayList<>();
    private final List<Double> taus = new ArrayList<>();
    private final List<Claim> others = new ArrayList<>();
    private final List<Integer> otherQuotes = new ArrayList<>();

    void add(int quote, Claim claim, DiscountCurve curve) {
      boolean simple = claim.flows().isEmpty();
      for (Right right : claim.rights()) {
        simple &= right.party() == Right.Party.HOLDER && hasOneBoundary(right.received().merged());
        simple &= startsAt(right.received().merged(), right.decision());
      }
      for (Optionlet each : claim.optionlets()) {
        simple &= each.basis() == RateBasis.FORWARD && each.strikeGrowth() > 0;
      }
      if (!simple) {
        others.add(claim);
        otherQuotes.add(quote);
        return;
      }
      for (Right right : claim.rights()) {
        add(quote, right.received().merged(), right.decision(), curve);
      }
      for (Optionlet each : claim.optionlets()) {
        add(quote, each.exchanged(), each.start(), curve);
      }
    }

    /** Cash of one sign at first, flows of the other after it. */
    private static boolean hasOneBoundary(CashFlows flows) {
      if (flows.size() < 2) {
        return false;
      }
      for (int i = 1; i < flows.size(); i++) {
        if (!(flows.amount(i) * flows.amount(0) < 0)) {
          return false;
        }
      }
      return true;
    }

    private static boolean startsAt(CashFlows flows, double decision) {
      return flows.time(0) == decision && flows.time(1) > decision;
    }

    private void add(int quote, CashFlows flows, double decision, DiscountCurve curve) {
      quotes.add(quote);
      sides.add(flows.amount(0) < 0 ? 1 : -1);
      starts.add(weights.size());
      decisions.add(decision);
      cash.add(Math.abs(flows.amount(0)) * curve.discount(flows.time(0)));
      for (int i = 1; i < flows.size(); i++) {
        weights.add(Math.abs(flows.amount(i)) * curve.discount(flows.time(i)));
        taus.add(flows.time(i) - decision);
      }
    }
  }
}
