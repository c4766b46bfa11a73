package ebbline.fitting.history;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * Whether the model suits the history, in one report. A test that cannot be made on these rates is
 * absent, and a note says why.
 *
 * @param dickeyFuller with 0, 1 and 4 lags, those that could be made
 * @param ljungBox over 10 lags
 * @param outOfSample one and twelve steps ahead, at 95 %
 */
public record Diagnostics(
    List<DickeyFuller> dickeyFuller,
    Optional<ResidualTest> ljungBox,
    Optional<ResidualTest> jarqueBera,
    Optional<ResidualTest> arch,
    Optional<NoReversionTest> noReversion,
    Optional<OutOfSample> outOfSample,
    List<String> notes) {

  private static final int[] LAGS = {0, 1, 4};
  private static final int CORRELATIONS = 10;
  private static final int FARTHER = 12;
  private static final double CONFIDENCE = 0.95;

  public Diagnostics {
    dickeyFuller = List.copyOf(dickeyFuller);
    notes = List.copyOf(notes);
  }

  /**
   * All tests of an estimate on its history; where no reversion was found, of the random walk in
   * its place.
   */
  public static Diagnostics of(
      RateHistory history, HistoryEstimate estimate, Resampling resampling) {
    List<String> notes = new ArrayList<>();
    List<DickeyFuller> roots = new ArrayList<>();
    for (int lags : LAGS) {
      attempt(notes, () -> DickeyFuller.of(history, lags)).ifPresent(roots::add);
    }
    double[] residuals = Residuals.of(history, estimate);
    return new Diagnostics(
        roots,
        attempt(notes, () -> ResidualTest.ljungBox(residuals, CORRELATIONS)),
        attempt(notes, () -> ResidualTest.jarqueBera(residuals)),
        attempt(notes, () -> ResidualTest.arch(residuals)),
        attempt(notes, () -> NoReversionTest.of(history, resampling)),
        attempt(notes, () -> OutOfSample.of(history, FARTHER, CONFIDENCE)),
        notes);
  }

  private static <T> Optional<T> attempt(List<String> notes, Supplier<T> test) {
    try {
      return Optional.of(test.get());
    } catch (IllegalArgumentException e) {
      if (!notes.contains(e.getMessage())) {
        notes.add(e.getMessage());
      }
      return Optional.empty();
    }
  }
}
