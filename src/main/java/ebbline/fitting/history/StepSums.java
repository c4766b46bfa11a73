package ebbline.fitting.history;

/**
 * What a likelihood needs of all steps of one length: moments of the rate before and the change.
 */
final class StepSums {
  final double step;
  final int n;

  /** Mean of the rates before, measured from the history's first rate. */
  double mean;

  double meanChange;

  /** Sums of squares and products about these means. */
  double changes;

  double cross;
  double square;

  private StepSums(double step, int n) {
    this.step = step;
    this.n = n;
  }

  /** One for each length. */
  static StepSums[] of(RateHistory history) {
    return history.isRegular() ? even(history) : uneven(history);
  }

  private static StepSums[] even(RateHistory history) {
    LaggedSums lagged = LaggedSums.of(history.ratesInPlace());
    StepSums sums = new StepSums(history.step(), lagged.n);
    sums.mean = lagged.mean + (lagged.origin - history.rate(0));
    sums.meanChange = lagged.meanChange;
    sums.changes = lagged.changes;
    sums.cross = lagged.cross;
    sums.square = lagged.square;
    return new StepSums[] {sums};
  }

  private static StepSums[] uneven(RateHistory history) {
    StepGroups groups = history.groups();
    double[] x = history.ratesInPlace();
    StepSums[] sums = new StepSums[groups.count()];
    for (int g = 0; g < sums.length; g++) {
      sums[g] = new StepSums(groups.length(g), groups.size(g));
    }
    for (int i = 0; i + 1 < x.length; i++) {
      StepSums sum = sums[groups.of(i)];
      sum.mean += x[i] - x[0];
      sum.meanChange += x[i + 1] - x[i];
    }
    for (StepSums sum : sums) {
      sum.mean /= sum.n;
      sum.meanChange /= sum.n;
    }
    for (int i = 0; i + 1 < x.length; i++) {
      StepSums sum = sums[groups.of(i)];
      double d = x[i] - x[0] - sum.mean;
      double change = x[i + 1] - x[i] - sum.meanChange;
      sum.square += d * d;
      sum.cross += d * change;
      sum.changes += change * change;
    }
    return sums;
  }

  /** Sum of the squares of change + pull × rate before about their means. */
  double squares(double pull) {
    return changes + 2 * pull * cross + pull * pull * square;
  }
}
