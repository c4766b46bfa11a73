package ebbline.fitting.quotes;

import ebbline.curve.SmithWilsonCurve;
import ebbline.fitting.FittedQuote;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Smith and Wilson's curve from quotes: the flows of all quotes carry kernels, and among the curves
 * that reprice every quote the smoothest is taken [EIOPA technical documentation of the risk-free
 * term structure]. Immutable.
 */
public final class SmithWilsonBuilder {
  /** The speed that the regulator's search starts from, per year. */
  public static final double LEAST_SPEED = 0.05;

  private static final double MOST_SPEED = 5;
  private static final double SPEED_STEP = 1e-6;

  private final double ultimateForward;
  private final double convergence;
  private final double tolerance;
  private final double speed;

  private SmithWilsonBuilder(
      double ultimateForward, double convergence, double tolerance, double speed) {
    this.ultimateForward = ultimateForward;
    this.convergence = convergence;
    this.tolerance = tolerance;
    this.speed = speed;
  }

  /**
   * The speed will be searched: the least multiple of 1e-6, from 0.05 on, whose forward at the
   * convergence point is within 1 bp of the ultimate one, as the regulator publishes it.
   *
   * @param ultimateForward annually compounded, decimal per year
   * @param convergence years
   */
  public static SmithWilsonBuilder of(double ultimateForward, double convergence) {
    if (!(ultimateForward > -1 && Double.isFinite(ultimateForward))) {
      throw new IllegalArgumentException(
          "an ultimate forward rate must be above -1, found " + ultimateForward);
    }
    if (!(convergence > 0 && Double.isFinite(convergence))) {
      throw new IllegalArgumentException(
          "a convergence point must be years above 0, found " + convergence);
    }
    return new SmithWilsonBuilder(ultimateForward, convergence, 1e-4, 0);
  }

  /** With another tolerance at the convergence point, continuously compounded. */
  public SmithWilsonBuilder withTolerance(double newTolerance) {
    if (!(newTolerance > 0 && Double.isFinite(newTolerance))) {
      throw new IllegalArgumentException("a tolerance must be above 0, found " + newTolerance);
    }
    return new SmithWilsonBuilder(ultimateForward, convergence, newTolerance, speed);
  }

  /** With a given speed, which is not searched. */
  public SmithWilsonBuilder withSpeed(double newSpeed) {
    if (!(newSpeed > 0 && Double.isFinite(newSpeed))) {
      throw new IllegalArgumentException("a speed must be above 0, found " + newSpeed);
    }
    return new SmithWilsonBuilder(ultimateForward, convergence, tolerance, newSpeed);
  }

  /**
   * The curve; its nodes are the times of all the quotes' flows.
   *
   * @throws IllegalArgumentException if the quotes do not determine a curve with positive discount
   *     factors, one is not linear in discount factors, or no speed up to 5 reaches the tolerance
   */
  public CurveFit build(List<QuoteEquation> quotes) {
    KernelSolution system = new KernelSolution(quotes, ultimateForward);
    double used = speed > 0 ? speed : search(system);
    KernelSolution.Solved solved = system.solve(used);
    SmithWilsonCurve curve = solved.curve();
    List<FittedQuote> fitted = Repricing.reprice(curve, quotes);
    List<String> unmet = Repricing.unmet(fitted);
    List<String> warnings = new ArrayList<>(CurveWarnings.of(curve, quotes, fitted, true));
    if (curve.gap(convergence) > tolerance) {
      warnings.add(
          "the forward at the convergence point is still "
              + curve.gap(convergence)
              + " from the ultimate one");
    }
    String problem = unmet.isEmpty() ? "" : Repricing.describe(fitted);
    return new CurveFit(
        curve,
        fitted,
        unmet,
        List.of(),
        problem,
        1,
        solved.condition(),
        solved.discountByQuote(quotes),
        warnings);
  }

  private double search(KernelSolution system) {
    if (within(system, LEAST_SPEED)) {
      return LEAST_SPEED;
    }
    double low = LEAST_SPEED;
    double high = LEAST_SPEED;
    do {
      low = high;
      high = Math.min(high + 0.025, MOST_SPEED);
      if (low == high) {
        throw new IllegalArgumentException(
            "no speed up to "
                + MOST_SPEED
                + " brings the forward at "
                + convergence
                + " years within "
                + tolerance
                + " of the ultimate one");
      }
    } while (!within(system, high));
    long below = Math.round(low / SPEED_STEP);
    long above = Math.round(high / SPEED_STEP);
    while (above - below > 1) {
      long middle = (above + below) >>> 1;
      if (within(system, middle / 1e6)) {
        above = middle;
      } else {
        below = middle;
      }
    }
    return above / 1e6;
  }

  private boolean within(KernelSolution system, double tried) {
    try {
      return system.solve(tried).curve().gap(convergence) <= tolerance;
    } catch (IllegalArgumentException e) {
      return false; // a discount factor is not positive at this speed: look at faster ones
    }
  }

  /** Times of all flows, increasing, those that are one moment once. */
  static double[] flowTimes(List<QuoteEquation> quotes) {
    double[] all =
        quotes.stream().flatMapToDouble(quote -> Arrays.stream(quote.times())).sorted().toArray();
    int count = 0;
    for (double time : all) {
      if (count == 0 || time - all[count - 1] > CurveBuilder.SAME_TIME) {
        all[count++] = time;
      }
    }
    return Arrays.copyOf(all, count);
  }
}
