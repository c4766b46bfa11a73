package ebbline.bench;

import java.nio.file.Path;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * Whole passes over each kind of work; the plain road ({@code alone}, {@code walk}) stands among
 * the parameters. The data folder is the system property {@code bench.data}.
 */
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 2)
@Measurement(iterations = 5, time = 2)
@State(Scope.Benchmark)
public class OptionsBenchmark {
  @Param({"plain", "fast"})
  public String road;

  private Workload load;

  @Setup
  public void read() {
    load = new Workload(Path.of(System.getProperty("bench.data")));
  }

  @Benchmark
  public double bonds() {
    return road.equals("plain") ? load.bondsByWalking() : load.bondsByDay();
  }

  @Benchmark
  public double zeroOptions() {
    return road.equals("plain") ? load.zeroOptionsAlone() : load.zeroOptionsInBlocks();
  }

  @Benchmark
  public double couponOptions() {
    return road.equals("plain") ? load.couponOptionsAlone() : load.couponOptionsInBlocks();
  }

  @Benchmark
  public double swaptions() {
    return load.swaptions();
  }
}
