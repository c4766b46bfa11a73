package ebbline.data;

import ebbline.curve.Compounding;
import ebbline.curve.DiscountCurve;
import ebbline.curve.SmithWilsonCurve;
import ebbline.fitting.quotes.MarketQuotes;
import ebbline.fitting.quotes.QuoteEquation;
import ebbline.time.InputProblem;
import java.util.ArrayList;
import java.util.List;

/**
 * Smith and Wilson's curve in a file: through its nodes, or, where the column {@code kernel}
 * stands, from the very weights that a saved curve had.
 */
final class KernelNodes {
  /** By how much discount factors beside kernel weights may differ from what those give. */
  private static final double SAME_DISCOUNT = 1e-9;

  private final KernelSettings settings;
  private final boolean weighted;
  private final List<Double> weights = new ArrayList<>();

  KernelNodes(KernelSettings settings, boolean weighted) {
    this.settings = settings;
    this.weighted = weighted;
  }

  static void requireSettings(
      KernelSettings settings, CsvTable table, List<InputProblem> problems) {
    if (!settings.isComplete()) {
      problems.add(new InputProblem(table.file().path(), 0, "", "", KernelSettings.NEEDED));
    }
  }

  /** Reads the weight of a row's node. */
  void add(CsvRow row) {
    if (weighted) {
      double weight = row.number("kernel").orElse(Double.NaN);
      if (!row.has("kernel")) {
        row.problem("kernel", "", "a value is missing");
      }
      weights.add(weight);
    }
  }

  /**
   * @throws IllegalArgumentException in words if there is no such curve
   */
  DiscountCurve curve(double[] times, double[] logs) {
    double forward = settings.ultimateForward().orElseThrow();
    if (!weighted) {
      return settings.speed().isPresent()
          ? SmithWilsonCurve.of(times, logs, forward, settings.speed().getAsDouble())
          : searched(times, logs);
    }
    if (settings.speed().isEmpty()) {
      throw new IllegalArgumentException("kernel weights belong to a speed: '# speed: NUMBER'");
    }
    SmithWilsonCurve curve =
        SmithWilsonCurve.ofWeights(
            times,
            weights.stream().mapToDouble(Double::doubleValue).toArray(),
            forward,
            settings.speed().getAsDouble());
    for (int i = 0; i < times.length; i++) {
      if (!(Math.abs(curve.logDiscount(times[i]) - logs[i]) <= SAME_DISCOUNT)) {
        throw new IllegalArgumentException(
            "the kernel weights give another discount factor at "
                + times[i]
                + " years than the file; leave the column kernel out to go by the discount factors");
      }
    }
    return curve;
  }

  private DiscountCurve searched(double[] times, double[] logs) {
    List<QuoteEquation> quotes = new ArrayList<>();
    for (int i = 0; i < times.length; i++) {
      quotes.add(
          MarketQuotes.zero(
              "node " + (i + 1), times[i], Compounding.CONTINUOUS, -logs[i] / times[i]));
    }
    return settings.builder().build(quotes).curve();
  }
}
