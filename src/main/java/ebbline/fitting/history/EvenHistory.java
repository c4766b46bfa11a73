package ebbline.fitting.history;

/** Tests on even steps, in closed form from the lagged sums. */
final class EvenHistory implements TestedHistory {
  private final LaggedSums sums;
  private final double step;
  private final double slopeError;

  EvenHistory(RateHistory history) {
    this.sums = LaggedSums.of(history.ratesInPlace());
    this.step = history.step();
    this.slopeError = Math.sqrt(sums.residuals() / ((sums.n - 2) * sums.square));
  }

  @Override
  public int transitions() {
    return sums.n;
  }

  @Override
  public double meanReversion() {
    return -Math.log1p(Math.max(sums.changeSlope(), -1 + 1e-12)) / step;
  }

  @Override
  public double ratio(double meanReversion) {
    return (sums.changeSlope() - Math.expm1(-meanReversion * step)) / slopeError;
  }

  @Override
  public MeanTest test(double longRunMean) {
    double off = sums.origin + sums.mean - longRunMean;
    double square = sums.square + sums.n * off * off;
    double cross = sums.cross + sums.n * sums.meanChange * off;
    double changes = sums.changes + sums.n * sums.meanChange * sums.meanChange;
    double slope = cross / square;
    double restricted = changes - cross * slope;
    double kappa = slope < 0 ? -Math.log1p(Math.max(slope, -1 + 1e-12)) / step : 0;
    return new MeanTest(sums.n * Math.log(Math.max(1, restricted / sums.residuals())), kappa);
  }

  @Override
  public double againstWalk() {
    return sums.n * Math.log(sums.changes / sums.residuals());
  }
}
