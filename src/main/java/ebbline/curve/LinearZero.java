package ebbline.curve;

/** Straight lines in the zero rate, whose first and last values hold outside the nodes. */
final class LinearZero implements Scheme {
  private final double[] times;
  private final double[] logs;

  LinearZero(double[] times, double[] logs) {
    this.times = times;
    this.logs = logs;
  }

  @Override
  public Pieces pieces() {
    int n = times.length;
    Pieces pieces = new Pieces(n + 1);
    pieces.add(0, 0, logs[0] / times[0], 0, 0);
    for (int i = 0; i + 1 < n; i++) {
      // With ℓ = ln P/t = −z and its slope m: (s + d)(ℓ + m d) = ln P(s) + (ℓ + m s) d + m d².
      double level = logs[i] / times[i];
      double slope = (logs[i + 1] / times[i + 1] - level) / (times[i + 1] - times[i]);
      pieces.add(times[i], logs[i], level + slope * times[i], slope, 0);
    }
    pieces.add(times[n - 1], logs[n - 1], logs[n - 1] / times[n - 1], 0, 0);
    return pieces;
  }

  @Override
  public void addGradient(double t, double weight, double[] gradient) {
    int i = Scheme.interval(times, t);
    int n = times.length;
    if (i == 0 || i == n) {
      int held = i == 0 ? 0 : n - 1;
      gradient[held] += weight * t / times[held];
      return;
    }
    double share = (t - times[i - 1]) / (times[i] - times[i - 1]);
    gradient[i] += weight * share * t / times[i];
    gradient[i - 1] += weight * (1 - share) * t / times[i - 1];
  }

  @Override
  public boolean hasContinuousForward() {
    return times.length == 1;
  }
}
