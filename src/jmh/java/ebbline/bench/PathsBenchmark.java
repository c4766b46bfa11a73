package ebbline.bench;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** Time of one step of one path; plain pseudo-random paths stand among the parameters. */
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 2)
@Measurement(iterations = 5, time = 2)
@State(Scope.Benchmark)
public class PathsBenchmark {
  @Param({"plain", "plain-two-threads", "mirrored", "sobol"})
  public String points;

  private final PathWork work = new PathWork();

  @Benchmark
  @OperationsPerInvocation(PathWork.PATHS * PathWork.STEPS)
  public double step() {
    return switch (points) {
      case "mirrored" -> work.mirrored();
      case "sobol" -> work.sobol();
      default -> work.plain(points.equals("plain") ? 1 : 2);
    };
  }
}
