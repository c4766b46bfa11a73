package ebbline.cli;

import ebbline.data.CurveInput;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The points of a curve that a model is fitted to: its nodes, or a fixed grid where a formula has
 * none.
 */
record FitGrid(List<String> labels, List<Double> years, List<Double> rates) {
  private static final double[] GRID = {0.25, 0.5, 1, 2, 3, 5, 7, 10, 15, 20, 30};

  static FitGrid of(CurveInput input) {
    boolean nodes = !input.labels().isEmpty();
    double[] times = nodes ? input.curve().nodes() : GRID;
    List<String> labels =
        nodes ? input.labels() : Arrays.stream(times).mapToObj(Double::toString).toList();
    List<Double> years = new ArrayList<>();
    List<Double> rates = new ArrayList<>();
    for (double time : times) {
      years.add(time);
      rates.add(input.curve().zero(time));
    }
    return new FitGrid(labels, years, rates);
  }

  double[] times() {
    return years.stream().mapToDouble(Double::doubleValue).toArray();
  }

  double[] zeros() {
    return rates.stream().mapToDouble(Double::doubleValue).toArray();
  }
}
