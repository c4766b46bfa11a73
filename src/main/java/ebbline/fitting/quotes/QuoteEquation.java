package ebbline.fitting.quotes;

import ebbline.curve.DiscountCurve;
import java.util.Objects;

/**
 * What a quote q says about discount factors: Σ (aₖ + q bₖ) Dₖ = value(q) P(at), each Dₖ one
 * discount factor P(paid) or, for interest that is paid later than it stops to accrue, P(paid)
 * P(from)/P(to).
 *
 * <p>{@link MarketQuotes} makes them for the instruments of the market. Immutable.
 */
public final class QuoteEquation {
  private static final int MOST_STEPS = 50;

  /** A right-hand side that is not linear in its quote, such as a bond's price at a yield. */
  public interface QuotedValue {
    double value(double quote);

    /** ∂value/∂quote. */
    double slope(double quote);
  }

  private static final QuotedValue NOTHING =
      new QuotedValue() {
        @Override
        public double value(double quote) {
          return 0;
        }

        @Override
        public double slope(double quote) {
          return 0;
        }
      };

  private final String id;
  private final double quote;
  private final double weight;
  private final Terms terms;
  private final QuotedValue value;
  private final double valuedAt;

  private QuoteEquation(
      String id, double quote, double weight, Terms terms, QuotedValue value, double valuedAt) {
    this.id = id;
    this.quote = quote;
    this.weight = weight;
    this.terms = terms;
    this.value = value;
    this.valuedAt = valuedAt;
  }

  static QuoteEquation of(String id, double quote, Terms terms) {
    return of(id, quote, terms, NOTHING, 0);
  }

  static QuoteEquation of(
      String id, double quote, Terms terms, QuotedValue value, double valuedAt) {
    Objects.requireNonNull(id, "id");
    if (!Double.isFinite(quote)) {
      throw new IllegalArgumentException("a quote must be finite, found " + quote + " for " + id);
    }
    QuoteEquation equation = new QuoteEquation(id, quote, 1, terms, value, valuedAt);
    if (!(equation.lastTime() > 0)) {
      throw new IllegalArgumentException(
          "a quote must reach beyond today, found " + id + " ending at " + equation.lastTime());
    }
    return equation;
  }

  /**
   * The same quote with another weight in a least-squares fit.
   *
   * @param newWeight on the squared error of the quote; above 0
   */
  public QuoteEquation withWeight(double newWeight) {
    if (!(newWeight > 0 && Double.isFinite(newWeight))) {
      throw new IllegalArgumentException(
          "a weight must be above 0, found " + newWeight + " for " + id);
    }
    return new QuoteEquation(id, quote, newWeight, terms, value, valuedAt);
  }

  /** The same equation with another quote. */
  public QuoteEquation withQuote(double newQuote) {
    return of(id, newQuote, terms, value, valuedAt).withWeight(weight);
  }

  public String id() {
    return id;
  }

  /** As the market gives it: a decimal rate, or a price per 100. */
  public double quote() {
    return quote;
  }

  public double weight() {
    return weight;
  }

  /** The last moment that the equation looks at, years. */
  public double lastTime() {
    return Math.max(valuedAt, terms.lastTime());
  }

  /** Whether every term is one discount factor. */
  public boolean isLinear() {
    return terms.isLinear();
  }

  /**
   * The quote that the curve would give, by Newton's method: one step where the quote is linear.
   * Not a number where the curve gives none.
   */
  public double fittedQuote(DiscountCurve curve) {
    return new Reading(curve).fitted;
  }

  /** ∂(left-hand less right-hand side)/∂quote at the given quote. */
  double gapSlope(DiscountCurve curve) {
    return terms.slope(terms.factors(curve)) - value.slope(quote) * curve.discount(valuedAt);
  }

  /** The equation on one curve: what that curve would quote, and how it depends on the nodes. */
  final class Reading {
    final double fitted;
    private final DiscountCurve curve;
    private final double[] factors;
    private final double valued;

    Reading(DiscountCurve curve) {
      this.curve = curve;
      factors = terms.factors(curve);
      valued = valuedAt > 0 ? curve.discount(valuedAt) : 1;
      double found = quote;
      double last = Double.POSITIVE_INFINITY;
      for (int i = 0; i < (value == NOTHING ? 1 : MOST_STEPS); i++) {
        double step = (terms.sum(factors, found) - value.value(found) * valued) / slope(found);
        if (Math.abs(step) >= last) {
          break;
        }
        found -= step;
        last = Math.abs(step);
        if (!(last > 0)) {
          break; // settled, or not a number
        }
      }
      fitted = found;
    }

    private double slope(double at) {
      return terms.slope(factors) - value.slope(at) * valued;
    }

    /** Adds scale × ∂fitted/∂ ln P(node) to the gradient. */
    void addNodeGradient(double scale, double[] gradient) {
      double through = -scale / slope(fitted);
      terms.addNodeGradient(curve, factors, fitted, through, gradient);
      if (valuedAt > 0 && value != NOTHING) {
        double part = through * value.value(fitted) * valued;
        curve.addLogDiscountGradient(valuedAt, -part, gradient);
      }
    }
  }

  /** Fills one row of a linear system over the times of a curve; the right-hand side. */
  double fillRow(double[] times, double[] row) {
    double side = terms.fillRow(times, quote, row);
    double there = value.value(quote);
    if (valuedAt > 0) {
      row[Terms.index(times, valuedAt)] -= there;
      return side;
    }
    return side + there;
  }

  /** ∂row/∂quote of {@link #fillRow}. */
  double[] rowSlope(double[] times) {
    double[] row = new double[times.length];
    terms.fillSlope(times, row);
    if (valuedAt > 0) {
      row[Terms.index(times, valuedAt)] -= value.slope(quote);
    }
    return row;
  }

  /** Every moment above 0 that the equation looks at, repeats included. */
  double[] times() {
    return terms.times(valuedAt);
  }
}
