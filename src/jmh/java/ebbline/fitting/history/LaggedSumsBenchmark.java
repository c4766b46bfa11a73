package ebbline.fitting.history;

import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** Least squares of a history of 1,000,000 rates, per rate; beside it the plain loop. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@OperationsPerInvocation(LaggedSumsBenchmark.RATES)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 7, time = 1)
@Fork(1)
public class LaggedSumsBenchmark {
  static final int RATES = 1_000_000;

  private double[] rates;
  private RateHistory history;

  @Setup
  public void draw() {
    SplittableRandom random = new SplittableRandom(1);
    rates = new double[RATES];
    for (int i = 1; i < RATES; i++) {
      rates[i] = 0.999 * rates[i - 1] + 0.001 * (random.nextDouble() - 0.5);
    }
    history = RateHistory.ofStep(1.0 / 250, rates);
  }

  @Benchmark
  public double sums() {
    return LaggedSums.of(rates).changeSlope();
  }

  @Benchmark
  public HistoryEstimate wholeEstimate() {
    return HistoryEstimator.estimate(history, HistoryMethod.OLS);
  }

  /** One running sum of each kind. */
  @Benchmark
  public double plainLoop() {
    double sum = 0;
    double square = 0;
    double cross = 0;
    for (int i = 0; i + 1 < RATES; i++) {
      double d = rates[i] - rates[0];
      sum += d;
      square += d * d;
      cross += d * (rates[i + 1] - rates[0]);
    }
    double n = RATES - 1;
    double later = sum + rates[RATES - 1] - rates[0];
    return (cross - sum * later / n) / (square - sum * sum / n);
  }
}
