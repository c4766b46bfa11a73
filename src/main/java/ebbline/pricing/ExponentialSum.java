package ebbline.pricing;

import java.util.Arrays;

/**
 * F(z) = Σ ± exp(lᵢ − bᵢ z) with increasing exponents b, and all its real roots in an interval.
 *
 * <p>Coefficients are held as sign and logarithm, so that neither large exponents nor repeated
 * differentiation overflow. Immutable.
 */
final class ExponentialSum {
  /*
   * F has at most as many roots as its coefficients, in the order of the exponents, have changes of sign
   * (Descartes' rule for real exponents; Laguerre 1883). With β between the two exponents of one change, the derivative of e^(βz) F has
   * the coefficients (β − bᵢ) fᵢ: one change of sign less. Its roots cut the interval into pieces on which e^(βz) F
   * is monotone, so each piece holds at most one root of F, and a change of sign at its ends says whether. A bond
   * against a strike has one change: one monotone piece, no recursion.
   */
  private static final int MOST_STEPS = 200;

  private final double[] logs;
  private final double[] exponents;
  private final boolean[] negative;

  private ExponentialSum(double[] logs, double[] exponents, boolean[] negative) {
    this.logs = logs;
    this.exponents = exponents;
    this.negative = negative;
  }

  /**
   * @param coefficients any sign, none zero
   * @param logFactors added to the logarithms of the coefficients
   * @param exponents strictly increasing
   */
  static ExponentialSum of(double[] coefficients, double[] logFactors, double[] exponents) {
    double[] logs = new double[coefficients.length];
    boolean[] negative = new boolean[coefficients.length];
    for (int i = 0; i < logs.length; i++) {
      logs[i] = Math.log(Math.abs(coefficients[i])) + logFactors[i];
      negative[i] = coefficients[i] < 0;
    }
    return new ExponentialSum(logs, exponents.clone(), negative);
  }

  int signChanges() {
    int changes = 0;
    for (int i = 1; i < logs.length; i++) {
      changes += negative[i] == negative[i - 1] ? 0 : 1;
    }
    return changes;
  }

  /** ln of the positive part over the negative part: it has F's sign and F's roots. */
  double logRatio(double z) {
    return part(z, false) - part(z, true);
  }

  /** All roots in the interval, increasing. */
  double[] roots(double from, double to) {
    int changes = signChanges();
    if (changes == 0) {
      return new double[0];
    }
    double[] cuts = changes == 1 ? new double[0] : derivative().roots(from, to);
    double[] found = new double[cuts.length + 1];
    int count = 0;
    double left = from;
    double valueLeft = logRatio(from);
    for (int i = 0; i <= cuts.length; i++) {
      double right = i < cuts.length ? cuts[i] : to;
      double valueRight = logRatio(right);
      if (valueLeft > 0 != valueRight > 0) {
        found[count++] = root(left, right, valueLeft > 0);
      }
      left = right;
      valueLeft = valueRight;
    }
    return Arrays.copyOf(found, count);
  }

  /** The derivative of e^(βz) F with β inside the first change of sign. */
  private ExponentialSum derivative() {
    int j = 1;
    while (negative[j] == negative[j - 1]) {
      j++;
    }
    double beta = 0.5 * (exponents[j - 1] + exponents[j]);
    double[] newLogs = new double[logs.length];
    boolean[] newNegative = new boolean[logs.length];
    for (int i = 0; i < logs.length; i++) {
      newLogs[i] = logs[i] + Math.log(Math.abs(beta - exponents[i]));
      newNegative[i] = negative[i] == i < j;
    }
    return new ExponentialSum(newLogs, exponents, newNegative);
  }

  /** Newton on the log ratio, which is nearly linear, kept inside a shrinking bracket. */
  private double root(double from, double to, boolean positiveAtFrom) {
    double low = from;
    double high = to;
    double z = 0.5 * (low + high);
    for (int step = 0; step < MOST_STEPS; step++) {
      double value = logRatio(z);
      if (value == 0) {
        return z;
      }
      if (value > 0 == positiveAtFrom) {
        low = z;
      } else {
        high = z;
      }
      double next = z - value / slope(z);
      if (!(next > low && next < high)) {
        next = 0.5 * (low + high);
      }
      if (Math.abs(next - z) <= 4 * Math.ulp(z)) {
        return next;
      }
      z = next;
    }
    return z;
  }

  /** Derivative of the log ratio. */
  private double slope(double z) {
    return meanExponent(z, true) - meanExponent(z, false);
  }

  private double part(double z, boolean which) {
    double top = top(z, which);
    double sum = 0;
    for (int i = 0; i < logs.length; i++) {
      if (negative[i] == which) {
        sum += Math.exp(logs[i] - exponents[i] * z - top);
      }
    }
    return Math.log(sum) + top;
  }

  private double meanExponent(double z, boolean which) {
    double top = top(z, which);
    double sum = 0;
    double weighted = 0;
    for (int i = 0; i < logs.length; i++) {
      if (negative[i] == which) {
        double e = Math.exp(logs[i] - exponents[i] * z - top);
        sum += e;
        weighted += e * exponents[i];
      }
    }
    return weighted / sum;
  }

  private double top(double z, boolean which) {
    double top = Double.NEGATIVE_INFINITY;
    for (int i = 0; i < logs.length; i++) {
      if (negative[i] == which) {
        top = Math.max(top, logs[i] - exponents[i] * z);
      }
    }
    return top;
  }
}
