package ebbline.fitting.quotes;

import ebbline.curve.DiscountCurve;
import java.util.Arrays;
import java.util.stream.DoubleStream;

/** Σ (aₖ + q bₖ) P(paidₖ) P(fromₖ)/P(toₖ); most terms have from = to, one discount factor. */
final class Terms {
  private final double[] fixed;
  private final double[] perQuote;
  private final double[] paid;
  private final double[] from;
  private final double[] to;

  private Terms(double[] fixed, double[] perQuote, double[] paid, double[] from, double[] to) {
    this.fixed = fixed;
    this.perQuote = perQuote;
    this.paid = paid;
    this.from = from;
    this.to = to;
  }

  /** Collects terms. */
  static final class Builder {
    private double[] numbers = new double[5 * 8];
    private int count;

    /** (amount + q perQuote) P(paid). */
    Builder add(double paid, double amount, double perQuote) {
      return add(paid, 0, 0, amount, perQuote);
    }

    /** (amount + q perQuote) P(paid) P(from)/P(to). */
    Builder add(double paid, double from, double to, double amount, double perQuote) {
      for (double time : new double[] {paid, from, to}) {
        if (!(time >= 0 && Double.isFinite(time))) {
          throw new IllegalArgumentException(
              "times of a quote must be years from today, found " + time);
        }
      }
      if (!(Double.isFinite(amount) && Double.isFinite(perQuote))) {
        throw new IllegalArgumentException(
            "amounts of a quote must be finite, found " + amount + " and " + perQuote);
      }
      if (5 * count == numbers.length) {
        numbers = Arrays.copyOf(numbers, 2 * numbers.length);
      }
      double[] term = {amount, perQuote, paid, from, to};
      System.arraycopy(term, 0, numbers, 5 * count++, 5);
      return this;
    }

    Terms build() {
      double[][] columns = new double[5][count];
      for (int i = 0; i < count; i++) {
        for (int k = 0; k < 5; k++) {
          columns[k][i] = numbers[5 * i + k];
        }
      }
      return new Terms(columns[0], columns[1], columns[2], columns[3], columns[4]);
    }
  }

  /** The Dₖ. */
  double[] factors(DiscountCurve curve) {
    double[] factors = new double[paid.length];
    for (int k = 0; k < factors.length; k++) {
      double log = curve.logDiscount(paid[k]);
      if (from[k] != to[k]) {
        log += curve.logDiscount(from[k]) - curve.logDiscount(to[k]);
      }
      factors[k] = Math.exp(log);
    }
    return factors;
  }

  double sum(double[] factors, double quote) {
    double sum = 0;
    for (int k = 0; k < factors.length; k++) {
      sum += (fixed[k] + quote * perQuote[k]) * factors[k];
    }
    return sum;
  }

  double slope(double[] factors) {
    double sum = 0;
    for (int k = 0; k < factors.length; k++) {
      sum += perQuote[k] * factors[k];
    }
    return sum;
  }

  void addNodeGradient(
      DiscountCurve curve, double[] factors, double quote, double scale, double[] gradient) {
    for (int k = 0; k < paid.length; k++) {
      double part = scale * (fixed[k] + quote * perQuote[k]) * factors[k];
      if (paid[k] > 0) {
        curve.addLogDiscountGradient(paid[k], part, gradient);
      }
      if (from[k] != to[k]) {
        curve.addLogDiscountGradient(from[k], part, gradient);
        curve.addLogDiscountGradient(to[k], -part, gradient);
      }
    }
  }

  double lastTime() {
    return DoubleStream.concat(Arrays.stream(paid), Arrays.stream(to)).max().orElse(0);
  }

  boolean isLinear() {
    return Arrays.equals(from, to);
  }

  double[] times(double other) {
    return DoubleStream.concat(Arrays.stream(paid), DoubleStream.of(other))
        .filter(t -> t > 0)
        .toArray();
  }

  /** Adds the coefficients at the times to the row; what stands at time 0 goes to the right. */
  double fillRow(double[] times, double quote, double[] row) {
    double side = 0;
    for (int k = 0; k < paid.length; k++) {
      double amount = fixed[k] + quote * perQuote[k];
      if (paid[k] > 0) {
        row[index(times, paid[k])] += amount;
      } else {
        side -= amount;
      }
    }
    return side;
  }

  void fillSlope(double[] times, double[] row) {
    for (int k = 0; k < paid.length; k++) {
      if (paid[k] > 0) {
        row[index(times, paid[k])] += perQuote[k];
      }
    }
  }

  /** Which of the times is this moment. */
  static int index(double[] times, double time) {
    int found = Arrays.binarySearch(times, time);
    int at = found >= 0 ? found : -found - 1;
    if (at < times.length && times[at] - time <= CurveBuilder.SAME_TIME) {
      return at;
    }
    if (at > 0 && time - times[at - 1] <= CurveBuilder.SAME_TIME) {
      return at - 1;
    }
    throw new IllegalArgumentException("a quote's time must be among the curve's, found " + time);
  }
}
