package ebbline.pricing.simulation;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.IntFunction;
import java.util.function.Supplier;

/** Numbered pieces of work on any number of threads; each result has its place. */
final class Chunks {
  private Chunks() {}

  /**
   * @param worker makes one worker a thread, which owns its scratch arrays
   * @return the result of every chunk, by number
   */
  static double[][] run(int chunks, int threads, Supplier<IntFunction<double[]>> worker) {
    double[][] results = new double[chunks][];
    int used = Math.min(threads, chunks);
    AtomicInteger next = new AtomicInteger();
    Callable<Integer> loop =
        () -> {
          IntFunction<double[]> mine = worker.get();
          int done = 0;
          for (int c = next.getAndIncrement(); c < chunks; c = next.getAndIncrement()) {
            results[c] = mine.apply(c);
            done++;
          }
          return done;
        };
    if (used <= 1) {
      return alone(loop, results);
    }
    ExecutorService pool = Executors.newFixedThreadPool(used);
    try {
      List<Future<Integer>> running = new ArrayList<>();
      for (int t = 0; t < used; t++) {
        running.add(pool.submit(loop));
      }
      for (Future<Integer> each : running) {
        each.get();
      }
      return results;
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new IllegalStateException("the simulation was interrupted", e);
    } catch (ExecutionException e) {
      if (e.getCause() instanceof RuntimeException cause) {
        throw cause;
      }
      throw new IllegalStateException(e.getCause());
    } finally {
      pool.shutdownNow();
    }
  }

  private static double[][] alone(Callable<Integer> loop, double[][] results) {
    try {
      loop.call();
      return results;
    } catch (RuntimeException e) {
      throw e;
    } catch (Exception e) {
      throw new IllegalStateException(e);
    }
  }
}
