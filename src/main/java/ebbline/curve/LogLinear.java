package ebbline.curve;

/** Straight lines in ln P from 0 at time 0 through the nodes; the last line goes on. */
final class LogLinear implements Scheme {
  private final double[] times;
  private final double[] logs;

  LogLinear(double[] times, double[] logs) {
    this.times = times;
    this.logs = logs;
  }

  @Override
  public Pieces pieces() {
    Pieces pieces = new Pieces(times.length + 1);
    double start = 0;
    double log = 0;
    double slope = 0;
    for (int i = 0; i < times.length; i++) {
      slope = (logs[i] - log) / (times[i] - start);
      pieces.add(start, log, slope, 0, 0);
      start = times[i];
      log = logs[i];
    }
    pieces.add(start, log, slope, 0, 0);
    return pieces;
  }

  @Override
  public void addGradient(double t, double weight, double[] gradient) {
    int i = Math.min(Scheme.interval(times, t), times.length - 1);
    double from = i == 0 ? 0 : times[i - 1];
    double share = (t - from) / (times[i] - from);
    gradient[i] += weight * share;
    if (i > 0) {
      gradient[i - 1] += weight * (1 - share);
    }
  }

  @Override
  public boolean hasContinuousForward() {
    return times.length == 1;
  }
}
