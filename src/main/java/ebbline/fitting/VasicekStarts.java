package ebbline.fitting;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Starts of the search. For a given mean reversion the zero rates are linear in (b, σ², r₀), so the
 * sum of squares is profiled over a grid of mean reversions; its lowest local minima are the
 * starts.
 */
final class VasicekStarts {
  /*
   * The profile may have several minima a sixth of κ apart (exact rates of κ = 0.083, σ = 0.9 % have
   * a second one at 0.106, 0.01 bp high): steps of 3 % of κ keep them apart.
   */
  private static final int GRID = 301;
  private static final int MOST = 8;

  /** Where the best σ² is negative: 1 bp, so that the search can still move off 0. */
  private static final double SMALL_VOLATILITY = 1e-4;

  private VasicekStarts() {}

  /** A point of the profile. */
  @SuppressWarnings("ArrayRecordComponent")
  private record Profiled(double[] point, double squares) {}

  static List<double[]> of(VasicekProblem problem) {
    List<Profiled> profile = new ArrayList<>();
    for (double meanReversion : grid(problem)) {
      profile.add(solve(problem, meanReversion));
    }
    List<Profiled> minima = new ArrayList<>();
    for (int i = 0; i < profile.size(); i++) {
      double here = profile.get(i).squares();
      boolean lowerThanLeft = i == 0 || here <= profile.get(i - 1).squares();
      boolean lowerThanRight = i == profile.size() - 1 || here < profile.get(i + 1).squares();
      if (lowerThanLeft && lowerThanRight) {
        minima.add(profile.get(i));
      }
    }
    minima.sort(Comparator.comparingDouble(Profiled::squares));
    return minima.stream().limit(MOST).map(Profiled::point).toList();
  }

  private static double[] grid(VasicekProblem problem) {
    Double held = problem.held(Parameter.MEAN_REVERSION);
    if (held != null) {
      return new double[] {held};
    }
    double lowest = problem.meanReversion(-Math.PI / 2);
    double highest = problem.meanReversion(Math.PI / 2);
    double[] grid = new double[GRID];
    for (int i = 0; i < GRID; i++) {
      // Dense around 0, strictly inside the range: equal steps of asinh(κ/0.05).
      double share = (i + 0.5) / GRID;
      double low = asinh(lowest / 0.05);
      grid[i] = 0.05 * Math.sinh(low + share * (asinh(highest / 0.05) - low));
    }
    return grid;
  }

  private static double asinh(double x) {
    return Math.signum(x) * Math.log(Math.abs(x) + Math.hypot(x, 1));
  }

  private static Profiled solve(VasicekProblem problem, double meanReversion) {
    double volatility = 0;
    double[] best = linear(problem, meanReversion, problem.held(Parameter.VOLATILITY));
    Double heldVolatility = problem.held(Parameter.VOLATILITY);
    if (heldVolatility != null) {
      volatility = heldVolatility;
    } else if (best[1] > 0) {
      volatility = Math.sqrt(best[1]);
    } else {
      best = linear(problem, meanReversion, SMALL_VOLATILITY);
      volatility = SMALL_VOLATILITY;
    }
    double[] point = problem.coordinates(meanReversion, best[0], volatility, best[2]);
    double[] fitted = problem.fitted(point);
    double squares = 0;
    for (int i = 0; i < fitted.length; i++) {
      double miss = fitted[i] - problem.quote(i);
      squares += miss * miss;
    }
    return new Profiled(point, squares);
  }

  /** The least-squares (b, σ², r₀) at this mean reversion; σ given where it is held. */
  private static double[] linear(VasicekProblem problem, double meanReversion, Double volatility) {
    Double heldMean = problem.held(Parameter.LONG_RUN_MEAN);
    Double heldRate = problem.held(Parameter.SHORT_RATE);
    boolean driftIsFree = heldMean == null && !problem.meanAtShortRate();
    int n = problem.size();
    int columns = (driftIsFree ? 1 : 0) + (volatility == null ? 1 : 0) + (heldRate == null ? 1 : 0);
    double[] right = new double[n];
    double[][] matrix = new double[columns][n];
    for (int i = 0; i < n; i++) {
      double tau = problem.time(i);
      VasicekZero zero = VasicekZero.at(meanReversion * tau);
      double byDrift = zero.byDrift(tau);
      double byVariance = -0.5 * tau * tau * zero.h;
      double byRate = 1;
      right[i] = problem.quote(i);
      if (heldMean != null) {
        right[i] -= meanReversion * heldMean * byDrift;
        byRate -= meanReversion * byDrift;
      }
      int j = 0;
      if (driftIsFree) {
        matrix[j++][i] = byDrift;
      }
      if (volatility == null) {
        matrix[j++][i] = byVariance;
      } else {
        right[i] -= volatility * volatility * byVariance;
      }
      if (heldRate == null) {
        matrix[j][i] = byRate;
      } else {
        right[i] -= heldRate * byRate;
      }
    }
    double[] solution = solve(matrix, right);
    int j = 0;
    double drift = driftIsFree ? solution[j++] : 0;
    double variance = volatility == null ? solution[j++] : volatility * volatility;
    double rate = heldRate == null ? solution[j] : heldRate;
    return new double[] {drift, variance, rate};
  }

  /**
   * Least squares over at most three columns by modified Gram-Schmidt; a column that the ones
   * before make up gets 0. Overwrites both.
   */
  private static double[] solve(double[][] columns, double[] right) {
    int count = columns.length;
    double[][] upper = new double[count][count + 1];
    for (int j = 0; j < count; j++) {
      double before = dot(columns[j], columns[j]);
      for (int k = 0; k < j; k++) {
        upper[k][j] = dot(columns[k], columns[j]);
        subtract(columns[j], columns[k], upper[k][j]);
      }
      double length = Math.sqrt(dot(columns[j], columns[j]));
      boolean counts = length > 1e-12 * Math.sqrt(before);
      upper[j][j] = counts ? length : 0;
      for (int i = 0; i < right.length; i++) {
        columns[j][i] = counts ? columns[j][i] / length : 0;
      }
      upper[j][count] = dot(columns[j], right);
      subtract(right, columns[j], upper[j][count]);
    }
    double[] solution = new double[count];
    for (int j = count - 1; j >= 0; j--) {
      double rest = upper[j][count];
      for (int k = j + 1; k < count; k++) {
        rest -= upper[j][k] * solution[k];
      }
      solution[j] = upper[j][j] > 0 ? rest / upper[j][j] : 0;
    }
    return solution;
  }

  private static double dot(double[] one, double[] other) {
    double sum = 0;
    for (int i = 0; i < one.length; i++) {
      sum += one[i] * other[i];
    }
    return sum;
  }

  private static void subtract(double[] from, double[] direction, double share) {
    for (int i = 0; i < from.length; i++) {
      from[i] -= share * direction[i];
    }
  }
}
