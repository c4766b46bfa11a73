package ebbline.fitting.quotes;

import ebbline.curve.SmithWilsonCurve;
import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleFunction;

/** The linear equations of quotes, ready to be solved for Smith and Wilson's kernels. */
final class KernelSolution {
  /*
   * With P(u) = d(u) (1 + Σ H(u,uⱼ) wⱼ), d(u) = e^(−ωu), and rows A of the quotes over the flow times, the smoothest
   * curve has w = (A D)ᵀ b where (A D) H (A D)ᵀ b = side − A d.
   */
  private final double ultimateForward;
  private final double[] times;
  private final double[][] scaled;
  private final double[] side;

  KernelSolution(List<QuoteEquation> quotes, double ultimateForward) {
    this.ultimateForward = ultimateForward;
    if (quotes.isEmpty()) {
      throw new IllegalArgumentException("a curve needs at least one quote, found none");
    }
    for (QuoteEquation quote : quotes) {
      if (!quote.isLinear()) {
        throw new IllegalArgumentException(
            "smith-wilson takes quotes without payment lag, found " + quote.id());
      }
    }
    times = SmithWilsonBuilder.flowTimes(quotes);
    int n = quotes.size();
    double omega = Math.log1p(ultimateForward);
    scaled = new double[n][times.length];
    side = new double[n];
    for (int i = 0; i < n; i++) {
      side[i] = quotes.get(i).fillRow(times, scaled[i]);
      for (int k = 0; k < times.length; k++) {
        scaled[i][k] *= Math.exp(-omega * times[k]);
        side[i] -= scaled[i][k];
      }
    }
  }

  /** The curve at one speed, and the system it solves. */
  final class Solved {
    private final SmithWilsonCurve curve;
    private final double[][] kernel;
    private final double[][] matrix;
    private final OrthogonalFactors factors;

    private Solved(
        SmithWilsonCurve curve, double[][] kernel, double[][] matrix, OrthogonalFactors factors) {
      this.curve = curve;
      this.kernel = kernel;
      this.matrix = matrix;
      this.factors = factors;
    }

    SmithWilsonCurve curve() {
      return curve;
    }

    double condition() {
      return largestRow(matrix) * largestRow(factors.inverse());
    }

    /** ∂P(t)/∂quote as a function of t: a quote moves its own side and its own row. */
    DoubleFunction<double[]> discountByQuote(List<QuoteEquation> quotes) {
      double omega = Math.log1p(ultimateForward);
      double[][] moves = new double[quotes.size()][];
      double[] multipliers = factors.solve(side);
      for (int i = 0; i < moves.length; i++) {
        moves[i] = weightsByQuote(quotes.get(i), i, multipliers[i]);
      }
      return t -> {
        double[] byQuote = new double[moves.length];
        for (int k = 0; k < times.length; k++) {
          double value = Math.exp(-omega * t) * SmithWilsonCurve.kernel(t, times[k], curve.speed());
          for (int i = 0; i < moves.length; i++) {
            byQuote[i] += value * moves[i][k];
          }
        }
        return byQuote;
      };
    }

    /*
     * With Q = A D, w = Qᵀ b: row i of Q moves by q′, and the growth H dw that this brings must leave every other
     * equation as it is and make up for the gap's own slope in equation i.
     */
    private double[] weightsByQuote(QuoteEquation quote, int i, double multiplier) {
      double omega = Math.log1p(ultimateForward);
      double[] move = quote.rowSlope(times);
      for (int k = 0; k < move.length; k++) {
        move[k] *= Math.exp(-omega * times[k]) * multiplier;
      }
      double[] direct = kernelTimes(move);
      double[] rest = new double[scaled.length];
      for (int r = 0; r < rest.length; r++) {
        for (int k = 0; k < direct.length; k++) {
          rest[r] -= scaled[r][k] * direct[k];
        }
      }
      rest[i] -= quote.gapSlope(curve);
      double[] b = factors.solve(rest);
      for (int k = 0; k < move.length; k++) {
        for (int r = 0; r < b.length; r++) {
          move[k] += scaled[r][k] * b[r];
        }
      }
      return move;
    }

    private double[] kernelTimes(double[] vector) {
      double[] product = new double[vector.length];
      for (int i = 0; i < product.length; i++) {
        for (int j = 0; j < product.length; j++) {
          product[i] += kernel[i][j] * vector[j];
        }
      }
      return product;
    }
  }

  Solved solve(double speed) {
    int n = scaled.length;
    int m = times.length;
    double[][] kernel = new double[m][m];
    for (int i = 0; i < m; i++) {
      for (int j = 0; j <= i; j++) {
        kernel[i][j] = SmithWilsonCurve.kernel(times[i], times[j], speed);
        kernel[j][i] = kernel[i][j];
      }
    }
    double[][] half = product(scaled, kernel);
    double[][] matrix = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        for (int k = 0; k < m; k++) {
          matrix[i][j] += half[i][k] * scaled[j][k];
        }
      }
    }
    OrthogonalFactors factors = new OrthogonalFactors(matrix, n);
    if (!(factors.independence() > 1e-14)) {
      throw new IllegalArgumentException("quotes must be independent, these are not");
    }
    double[] b = factors.solve(side);
    double[] weights = new double[m];
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < m; k++) {
        weights[k] += scaled[i][k] * b[i];
      }
    }
    return new Solved(
        SmithWilsonCurve.ofWeights(times, weights, ultimateForward, speed),
        kernel,
        matrix,
        factors);
  }

  private static double[][] product(double[][] left, double[][] right) {
    double[][] product = new double[left.length][right.length];
    for (int i = 0; i < left.length; i++) {
      for (int k = 0; k < right.length; k++) {
        for (int j = 0; j < right.length; j++) {
          product[i][j] += left[i][k] * right[k][j];
        }
      }
    }
    return product;
  }

  private static double largestRow(double[][] matrix) {
    return Arrays.stream(matrix)
        .mapToDouble(row -> Arrays.stream(row).map(Math::abs).sum())
        .max()
        .orElse(0);
  }
}
