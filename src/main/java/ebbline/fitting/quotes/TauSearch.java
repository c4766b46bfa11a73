package ebbline.fitting.quotes;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** The minima of a tau problem: those of a grid in ln τ, each refined by Newton's method. */
final class TauSearch {
  /*
   * Two taus that come together leave a flat valley in which the betas run to ±∞ and no minimum exists. So points
   * with taus closer than MERGED do not count as minima, and the valley's own floor is measured apart.
   */
  static final double MERGED = 0.05;

  private static final double VALLEY = 1e-3;
  private static final double DIFFERENCE = 1e-5;
  private static final int MOST_STEPS = 200;
  private static final int MOST_REFINED = 24;

  private final TauProblem problem;
  private final double low;
  private final double high;
  private final int cells;

  /**
   * @param low least ln τ
   * @param high largest ln τ
   * @param cells of the grid in each direction
   */
  TauSearch(TauProblem problem, double low, double high, int cells) {
    this.problem = problem;
    this.low = low;
    this.high = high;
    this.cells = cells;
  }

  private double node(int i) {
    return i == cells ? high : low + (high - low) * i / cells;
  }

  /** Minima, the lowest first; taus apart by {@link #MERGED} at least. */
  List<TauProblem.Point> minima(double[] guess) {
    List<TauProblem.Point> starts = problem.taus() == 1 ? alongLine(guess) : overSquare(guess);
    starts.sort(Comparator.comparingDouble(point -> point.squares));
    List<TauProblem.Point> minima = new ArrayList<>();
    for (TauProblem.Point start : starts.subList(0, Math.min(MOST_REFINED, starts.size()))) {
      TauProblem.Point found = refine(start);
      if (!isMerged(found.logTaus)
          && minima.stream().noneMatch(other -> distance(other, found) < 1e-4)) {
        minima.add(found);
      }
    }
    minima.sort(Comparator.comparingDouble(point -> point.squares));
    return minima;
  }

  /** The least squares with the two taus (all but) equal. */
  TauProblem.Point valley(double[] guess) {
    TauProblem.Point best = null;
    double[] betas = guess;
    for (int i = 0; i <= 4 * cells; i++) {
      double middle = low + (high - low) * i / (4 * cells);
      TauProblem.Point point = together(middle, betas);
      if (best == null || point.squares < best.squares) {
        best = point;
      }
    }
    double width = (high - low) / (4 * cells);
    double left = middle(best) - width;
    double right = middle(best) + width;
    for (int i = 0; i < 60; i++) { // thirds: the valley has one floor within two cells
      TauProblem.Point one = together(left + (right - left) / 3, betas);
      TauProblem.Point other = together(right - (right - left) / 3, betas);
      if (one.squares < other.squares) {
        right = middle(other);
      } else {
        left = middle(one);
      }
      TauProblem.Point lower = one.squares < other.squares ? one : other;
      best = lower.squares < best.squares ? lower : best;
    }
    return best;
  }

  private static double middle(TauProblem.Point point) {
    return 0.5 * (point.logTaus[0] + point.logTaus[1]);
  }

  private TauProblem.Point together(double middle, double[] betas) {
    return problem.at(new double[] {middle + 0.5 * VALLEY, middle - 0.5 * VALLEY}, betas);
  }

  private List<TauProblem.Point> alongLine(double[] guess) {
    TauProblem.Point[] points = new TauProblem.Point[cells + 1];
    double[] betas = guess;
    for (int i = 0; i <= cells; i++) {
      points[i] = problem.at(new double[] {node(i)}, betas);
      betas = points[i].betas;
    }
    List<TauProblem.Point> lowest = new ArrayList<>();
    for (int i = 0; i <= cells; i++) {
      boolean lower = i == 0 || points[i].squares <= points[i - 1].squares;
      if (lower && (i == cells || points[i].squares <= points[i + 1].squares)) {
        lowest.add(points[i]);
      }
    }
    return lowest;
  }

  private List<TauProblem.Point> overSquare(double[] guess) {
    TauProblem.Point[][] points = new TauProblem.Point[cells + 1][cells + 1];
    for (int i = 0; i <= cells; i++) {
      double[] betas = guess;
      for (int j = 0; j <= cells; j++) {
        if (i != j) {
          points[i][j] = problem.at(new double[] {node(i), node(j)}, betas);
        }
      }
    }
    List<TauProblem.Point> lowest = new ArrayList<>();
    for (int i = 0; i <= cells; i++) {
      for (int j = 0; j <= cells; j++) {
        if (i != j && isLowest(points, i, j)) {
          lowest.add(points[i][j]);
        }
      }
    }
    return lowest;
  }

  private boolean isLowest(TauProblem.Point[][] points, int i, int j) {
    for (int a = Math.max(0, i - 1); a <= Math.min(cells, i + 1); a++) {
      for (int b = Math.max(0, j - 1); b <= Math.min(cells, j + 1); b++) {
        if (a != b && points[a][b].squares < points[i][j].squares) {
          return false;
        }
      }
    }
    return true;
  }

  /**
   * Newton on the gradient, its slope by differences; steps are shortened until the squares fall.
   */
  private TauProblem.Point refine(TauProblem.Point start) {
    TauProblem.Point point = start;
    for (int step = 0; step < MOST_STEPS; step++) {
      double[] move = TauStep.newton(problem, point, low, high, DIFFERENCE);
      double length = 0;
      for (double part : move) {
        length = Math.max(length, Math.abs(part));
      }
      if (!(length > 1e-14)) {
        return point;
      }
      double scale = Math.min(1, 0.3 / length);
      TauProblem.Point next = null;
      for (int halving = 0; halving < 40 && next == null; halving++, scale *= 0.5) {
        double[] tried = new double[move.length];
        for (int k = 0; k < tried.length; k++) {
          tried[k] = Math.min(high, Math.max(low, point.logTaus[k] + scale * move[k]));
        }
        TauProblem.Point candidate = problem.at(tried, point.betas);
        boolean lower = candidate.squares < point.squares;
        // Near the minimum the squares no longer tell: there the gradient does.
        boolean level =
            candidate.squares <= point.squares * (1 + 1e-14)
                && size(candidate.gradient) < 0.5 * size(point.gradient);
        if (lower || level) {
          next = candidate;
        }
      }
      if (next == null) {
        return point;
      }
      point = next;
      if (isMerged(point.logTaus)) {
        return point;
      }
    }
    return point;
  }

  private static double size(double[] vector) {
    double size = 0;
    for (double part : vector) {
      size = Math.max(size, Math.abs(part));
    }
    return size;
  }

  private static boolean isMerged(double[] logTaus) {
    return logTaus.length == 2 && Math.abs(logTaus[0] - logTaus[1]) < MERGED;
  }

  private static double distance(TauProblem.Point one, TauProblem.Point other) {
    double distance = 0;
    for (int k = 0; k < one.logTaus.length; k++) {
      distance = Math.max(distance, Math.abs(one.logTaus[k] - other.logTaus[k]));
    }
    return distance;
  }
}
