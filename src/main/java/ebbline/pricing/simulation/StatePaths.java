package ebbline.pricing.simulation;

import ebbline.model.GaussianRates;
import ebbline.model.StateStep;
import java.util.Arrays;
import java.util.function.Supplier;

/**
 * Paths of the state x and of ∫x under the risk-neutral measure at given times: exact joint normal
 * steps, so that only the times themselves are steps.
 *
 * <p>Immutable. Paths come in blocks; what is made of a block is added up per batch in an order
 * that hangs on nothing but the number of paths.
 */
public final class StatePaths {
  /** The most paths of a block; even. */
  public static final int BLOCK = 256;

  private static final int CHUNK = 4 * BLOCK;

  private final int steps;
  private final double[] decay;
  private final double[] mean;
  private final double[] deviation;
  private final double[] loading;
  private final double[] integralMean;
  private final double[] shared;
  private final double[] residual;

  /** What is made of a block of paths; one for each thread. */
  public interface Work {
    /**
     * Adds to {@code sums} what the paths give.
     *
     * @param x the state, a row a time
     * @param integral ∫x from today, a row a time
     * @param count paths of the block
     */
    void add(double[][] x, double[][] integral, int count, double[] sums);
  }

  private StatePaths(int steps) {
    this.steps = steps;
    decay = new double[steps];
    mean = new double[steps];
    deviation = new double[steps];
    loading = new double[steps];
    integralMean = new double[steps];
    shared = new double[steps];
    residual = new double[steps];
  }

  /**
   * @param times years from today, not decreasing
   * @throws IllegalArgumentException if the state's moments leave the range of doubles
   */
  public static StatePaths of(GaussianRates rates, double[] times) {
    StatePaths paths = new StatePaths(times.length);
    for (int k = 0; k < times.length; k++) {
      StateStep step = rates.step(k == 0 ? 0 : times[k - 1], times[k]);
      paths.decay[k] = step.decay();
      paths.mean[k] = step.stateMean();
      paths.deviation[k] = Math.sqrt(step.stateVariance());
      paths.loading[k] = step.loading();
      paths.integralMean[k] = step.integralMean();
      paths.shared[k] =
          step.stateVariance() > 0 ? step.covariance() / Math.sqrt(step.stateVariance()) : 0;
      paths.residual[k] = step.residualDeviation();
      double all =
          paths.decay[k]
              + paths.mean[k]
              + paths.deviation[k]
              + paths.integralMean[k]
              + paths.shared[k]
              + paths.residual[k];
      if (!Double.isFinite(all)) {
        throw new IllegalArgumentException(
            "the rate's moments are too large to simulate at time " + (float) times[k]);
      }
    }
    return paths;
  }

  /**
   * The sums of every batch.
   *
   * @param width how many sums
   * @param work makes one worker a thread
   * @return a row a batch
   */
  public double[][] sums(Sampling sampling, int width, Supplier<? extends Work> work) {
    int each = sampling.pathsPerBatch();
    int perBatch = (each + CHUNK - 1) / CHUNK;
    Normals normals = new Normals(sampling, steps);
    double[][] chunks =
        Chunks.run(
            Sampling.BATCHES * perBatch,
            sampling.threads(),
            () -> {
              Work worker = work.get();
              double[][][] rows = new double[4][steps][Math.min(each, BLOCK)];
              return chunk -> {
                int first = chunk % perBatch * CHUNK;
                int count = Math.min(CHUNK, each - first);
                Normals.Cursor cursor =
                    normals.new Cursor(chunk / perBatch, first, Math.min(each, BLOCK));
                double[] sums = new double[width];
                for (int done = 0; done < count; done += BLOCK) {
                  int block = Math.min(BLOCK, count - done);
                  cursor.fill(rows[0], rows[1], block);
                  walk(rows[0], rows[1], rows[2], rows[3], block);
                  worker.add(rows[2], rows[3], block, sums);
                }
                return sums;
              };
            });
    double[][] batches = new double[Sampling.BATCHES][width];
    for (int c = 0; c < chunks.length; c++) {
      for (int w = 0; w < width; w++) {
        batches[c / perBatch][w] += chunks[c][w];
      }
    }
    return batches;
  }

  /** The paths from their normals. */
  private void walk(
      double[][] state, double[][] rest, double[][] x, double[][] integral, int count) {
    for (int k = 0; k < steps; k++) {
      if (k == 0) {
        Arrays.fill(x[0], 0, count, 0);
        Arrays.fill(integral[0], 0, count, 0);
      }
      int before = Math.max(0, k - 1);
      integral(k, x[before], integral[before], state[k], rest[k], integral[k], count);
      state(k, x[before], state[k], x[k], count);
    }
  }

  private void integral(
      int k, double[] x, double[] before, double[] state, double[] rest, double[] out, int count) {
    double g = loading[k];
    double m = integralMean[k];
    double c = shared[k];
    double r = residual[k];
    for (int i = 0; i < count; i++) {
      out[i] = before[i] + m + Math.fma(g, x[i], Math.fma(c, state[i], r * rest[i]));
    }
  }

  private void state(int k, double[] before, double[] normal, double[] out, int count) {
    double d = decay[k];
    double m = mean[k];
    double s = deviation[k];
    for (int i = 0; i < count; i++) {
      out[i] = Math.fma(d, before[i], Math.fma(s, normal[i], m));
    }
  }
}
