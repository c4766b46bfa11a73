package ebbline.cli;

import ebbline.pricing.simulation.Sampling;
import picocli.CommandLine.Option;

/** How many paths a simulation draws; the same option in every command that simulates prices. */
final class PathsOption {
  @Option(
      names = "--paths",
      paramLabel = "N",
      defaultValue = "65536",
      description =
          "paths of a simulation (default 65536, rounded up to 32 times a power of 2); its"
              + " error_bound is one standard error")
  private int paths;

  Sampling sampling(OutputOptions output) {
    int threads = output.threads();
    try {
      return Sampling.of(paths, output.seed(), threads);
    } catch (IllegalArgumentException e) {
      throw new UsageProblem("--paths: " + e.getMessage());
    }
  }
}
