package ebbline.fitting.quotes;

import java.util.Arrays;
import java.util.List;

/** Quotes of any kind: the betas come from Gauss–Newton steps, each a linear system. */
final class QuoteProblem implements TauProblem {
  private static final int MOST_STEPS = 40;
  private static final int MOST_HALVINGS = 20;

  /** Of a beta, relative to the largest: the squares no longer tell shorter moves apart. */
  private static final double LEAST_MOVE = 1e-12;

  private final ParametricForm form;
  private final List<QuoteEquation> quotes;

  QuoteProblem(ParametricForm form, List<QuoteEquation> quotes) {
    this.form = form;
    this.quotes = quotes;
  }

  @Override
  public int taus() {
    return form.taus();
  }

  @Override
  public Point at(double[] logTaus, double[] guess) {
    double[] betas = guess.clone();
    State state = new State(betas, logTaus);
    for (int step = 0; step < MOST_STEPS; step++) {
      double[] move = new OrthogonalFactors(state.jacobian, form.betas()).solve(state.residual);
      double largest = Arrays.stream(move).map(Math::abs).max().orElse(0);
      double least = LEAST_MOVE * Arrays.stream(betas).map(Math::abs).max().orElse(0);
      State next = null;
      double scale = 1;
      for (int halving = 0; halving < MOST_HALVINGS && scale * largest > least; halving++) {
        double[] tried = new double[betas.length];
        for (int k = 0; k < tried.length; k++) {
          tried[k] = betas[k] - scale * move[k];
        }
        State candidate = new State(tried, logTaus);
        if (candidate.squares < state.squares) {
          next = candidate;
          betas = tried;
          break;
        }
        scale *= 0.5;
      }
      if (next == null) {
        break;
      }
      boolean settled = largest < 1e-12 || state.squares - next.squares <= 1e-15 * state.squares;
      state = next;
      if (settled) {
        break;
      }
    }
    return new Point(logTaus.clone(), betas, state.squares, state.gradient());
  }

  private final class State {
    final double[] residual;
    final double[][] jacobian;
    final double squares;

    State(double[] betas, double[] logTaus) {
      LoadingCurve curve = new LoadingCurve(betas, logTaus);
      int n = quotes.size();
      residual = new double[n];
      jacobian = new double[n][form.betas() + form.taus()];
      double sum = 0;
      for (int i = 0; i < n; i++) {
        QuoteEquation quote = quotes.get(i);
        double root = Math.sqrt(quote.weight());
        QuoteEquation.Reading reading = quote.new Reading(curve);
        residual[i] = root * (reading.fitted - quote.quote());
        reading.addNodeGradient(root, jacobian[i]);
        sum += residual[i] * residual[i];
      }
      squares = sum < Double.MAX_VALUE ? sum : Double.MAX_VALUE;
    }

    double[] gradient() {
      double[] gradient = new double[form.taus()];
      for (int i = 0; i < residual.length; i++) {
        for (int k = 0; k < gradient.length; k++) {
          gradient[k] += 2 * residual[i] * jacobian[i][form.betas() + k];
        }
      }
      return gradient;
    }
  }
}
