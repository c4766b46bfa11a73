package ebbline.pricing;

/**
 * A mean over independent batches with its standard error.
 *
 * @param mean of all paths
 * @param standardError from the spread of the batches; at least 0
 */
public record Estimate(double mean, double standardError) {

  public Estimate {
    if (!(Double.isFinite(mean) && standardError >= 0 && Double.isFinite(standardError))) {
      throw new IllegalArgumentException(
          "the paths' values are too large to add up under these parameters");
    }
  }

  /** From sums of equal batches. */
  static Estimate of(double[] sums, int pathsPerBatch) {
    double total = 0;
    for (double sum : sums) {
      total += sum / pathsPerBatch;
    }
    double mean = total / sums.length;
    double squares = 0;
    for (double sum : sums) {
      double off = sum / pathsPerBatch - mean;
      squares += off * off;
    }
    return new Estimate(mean, Math.sqrt(squares / (sums.length - 1.0) / sums.length));
  }

  Estimate plus(double certain) {
    return new Estimate(mean + certain, standardError);
  }
}
