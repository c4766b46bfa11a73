package ebbline.fitting.history;

/**
 * The exact Gaussian likelihood of a history, even or uneven, as a function of κ alone: for a given
 * κ the best drift and variance solve in closed form.
 *
 * <p>Holds the drift at the first rate, m = κ(θ − x₀), rather than θ, which has no limit as κ → 0.
 * Domain: κ ≥ 0; κ &gt; 0 where the first rate counts as drawn from the stationary law.
 */
final class ExactLikelihood {
  private final double[] x;
  private final double[] steps;
  private final boolean stationary;

  private final StepSums[] sums;

  /** The point last evaluated. */
  double meanReversion;

  /** κ(θ − x₀), per year². */
  double driftAtFirst;

  /** σ². */
  double variance;

  double logLikelihood;

  /** Of the profile, which is the partial one at the best drift and variance. */
  double slope;

  ExactLikelihood(RateHistory history, boolean stationary) {
    this.x = history.ratesInPlace();
    this.stationary = stationary;
    this.steps = new double[x.length - 1];
    this.sums = StepSums.of(history);
    for (int i = 0; i < steps.length; i++) {
      steps[i] = history.isRegular() ? history.step() : history.time(i + 1) - history.time(i);
    }
  }

  /** Densities that are multiplied: transitions, and the first rate where it counts. */
  int terms() {
    return steps.length + (stationary ? 1 : 0);
  }

  /** Evaluates the profile at κ. */
  void at(double kappa) {
    meanReversion = kappa;
    // Residual of a step: e = δ + κ gΔ x − m gΔ with variance w = Δ g(2κΔ), g as in Decay; x is
    // measured from the first rate, so that the drift is the one there. With the stationary law
    // (x₀ − θ)² 2κ = 2m²/κ.
    double first = stationary ? 2 / kappa : 0;
    double num = 0;
    double den = first;
    for (StepSums group : sums) {
      double reach = Decay.at(kappa * group.step).g * group.step;
      double width = Decay.at(2 * kappa * group.step).g * group.step;
      double gap = group.meanChange + kappa * reach * group.mean;
      num += group.n * gap * reach / width;
      den += group.n * reach * reach / width;
    }
    double m = num / den;
    double squares = first * m * m;
    double logs = stationary ? -Math.log(2 * kappa) : 0;
    double logsSlope = stationary ? -1 / kappa : 0;
    // At the best drift the slope is the same whether θ or m is held; with m nothing divides by κ.
    double squaresSlope = stationary ? -2 * m * m / (kappa * kappa) : 0;
    for (StepSums group : sums) {
      double step = group.step;
      int n = group.n;
      Decay one = Decay.at(kappa * step);
      Decay two = Decay.at(2 * kappa * step);
      double reach = one.g * step;
      double reachSlope = one.slope * step * step;
      double width = two.g * step;
      double widthSlope = 2 * two.slope * step * step;
      double pull = kappa * reach;
      double pullSlope = reach + kappa * reachSlope;
      double off = group.meanChange + pull * group.mean - m * reach;
      double offSlope = pullSlope * group.mean - m * reachSlope;
      double sum = group.squares(pull) + n * off * off;
      double sumSlope =
          2 * pullSlope * (group.cross + pull * group.square) + 2 * n * off * offSlope;
      squares += sum / width;
      squaresSlope += (sumSlope - sum * widthSlope / width) / width;
      logs += n * Math.log(width);
      logsSlope += n * widthSlope / width;
    }
    int terms = terms();
    driftAtFirst = m;
    variance = squares / terms;
    logLikelihood = -0.5 * (terms * (Math.log(2 * Math.PI * variance) + 1) + logs);
    slope = -0.5 * (squaresSlope / variance + logsSlope);
  }

  /** The log-likelihood of a given law, with its constants. */
  double logLikelihood(RateLaw law) {
    double kappa = law.meanReversion();
    double v = law.volatility() * law.volatility();
    double sum = 0;
    if (stationary) {
      double d = x[0] - law.longRunMean();
      sum += 2 * kappa * d * d / v - Math.log(2 * kappa);
    }
    for (int i = 0; i < steps.length; i++) {
      double w = Decay.at(2 * kappa * steps[i]).g * steps[i];
      double e = x[i + 1] - x[i] - Math.expm1(-kappa * steps[i]) * (x[i] - law.longRunMean());
      sum += e * e / (v * w) + Math.log(w);
    }
    return -0.5 * (terms() * Math.log(2 * Math.PI * v) + sum);
  }

  /** The log-likelihood of κ ≥ 0 and θ at the variance that suits them best. */
  double logLikelihood(double kappa, double theta) {
    double squares = 0;
    double logs = 0;
    for (StepSums group : sums) {
      double w = Decay.at(2 * kappa * group.step).g * group.step;
      double pull = -Math.expm1(-kappa * group.step);
      double off = group.meanChange + pull * (group.mean + x[0] - theta);
      squares += (group.squares(pull) + group.n * off * off) / w;
      logs += group.n * Math.log(w);
    }
    int n = steps.length;
    return -0.5 * (n * (Math.log(2 * Math.PI * squares / n) + 1) + logs);
  }

  double longRunMean() {
    return x[0] + driftAtFirst / meanReversion;
  }

  /** Minus the second derivatives of the log-likelihood in (κ, θ, σ) at the maximum. */
  double[][] information() {
    double kappa = meanReversion;
    double theta = longRunMean();
    double v = variance;
    double kk = 0;
    double kt = 0;
    double tt = 0;
    double ks = 0;
    if (stationary) {
      double e = x[0] - theta;
      double w = 1 / (2 * kappa);
      double w1 = -w / kappa;
      double w2 = 1 / (kappa * kappa * kappa);
      kk += w2 / w - w1 * w1 / (w * w) + (2 * w1 * w1 / w - w2) * e * e / (v * w * w);
      kt += 2 * (e * w1) / (v * w * w);
      tt += 1 / (v * w);
      ks += -e * e * w1 / (w * w);
    }
    for (int i = 0; i < steps.length; i++) {
      double step = steps[i];
      Decay two = Decay.at(2 * kappa * step);
      double decay = Math.exp(-kappa * step);
      double w = two.g * step;
      double w1 = 2 * two.slope * step * step;
      double w2 = 4 * two.bend * step * step * step;
      double moved = -Math.expm1(-kappa * step);
      double d = x[i] - theta;
      double e = x[i + 1] - x[i] + moved * d;
      double e1 = step * decay * d;
      double e2 = -step * step * decay * d;
      // Halves of ∂²/∂κ² etc. of log w + e²/(v w), doubled in the end by the ½ of the likelihood.
      kk +=
          w2 / w
              - w1 * w1 / (w * w)
              + (2 * (e1 * e1 + e * e2) / w
                      - 4 * e * e1 * w1 / (w * w)
                      - e * e * w2 / (w * w)
                      + 2 * e * e * w1 * w1 / (w * w * w))
                  / v;
      kt += 2 * ((-e1 * moved - e * step * decay) / w + e * moved * w1 / (w * w)) / v;
      tt += moved * moved / (v * w);
      ks += 2 * e * e1 / w - e * e * w1 / (w * w);
    }
    double sigma = Math.sqrt(v);
    double crossSigma = -ks / (v * sigma);
    return new double[][] {
      {0.5 * kk, 0.5 * kt, crossSigma},
      {0.5 * kt, tt, 0},
      {crossSigma, 0, 2 * terms() / v}
    };
  }
}
