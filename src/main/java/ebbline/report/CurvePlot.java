package ebbline.report;

import ebbline.curve.DiscountCurve;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/** Zero and forward rates of a curve in plain characters, for a terminal of 80 columns. */
public final class CurvePlot {
  private static final int WIDTH = 68;
  private static final int HEIGHT = 18;
  private static final int MARGIN = 9;
  private static final char ZERO = '*';
  private static final char FORWARD = 'o';

  private CurvePlot() {}

  /**
   * The drawing, lines with an LF at the end of each.
   *
   * @param horizon years, above 0
   */
  public static String draw(DiscountCurve curve, double horizon) {
    RateLines lines = new RateLines(curve, horizon);
    double[] range = lines.range();
    char[][] grid = new char[HEIGHT][WIDTH];
    for (char[] row : grid) {
      Arrays.fill(row, ' ');
    }
    if (range[0] < 0 && range[1] > 0) {
      Arrays.fill(grid[row(0, range)], '-');
    }
    for (int column = 0; column < WIDTH; column++) {
      double t = horizon * (column + 0.5) / WIDTH;
      grid[row(curve.forward(t), range)][column] = FORWARD;
    }
    for (int column = 0; column < WIDTH; column++) {
      double t = horizon * (column + 0.5) / WIDTH;
      grid[row(curve.zero(t), range)][column] = ZERO;
    }
    StringBuilder text = new StringBuilder();
    text.append(" ".repeat(MARGIN + 1))
        .append(ZERO)
        .append(" zero rate (continuous)   ")
        .append(FORWARD)
        .append(" instantaneous forward\n");
    for (int i = 0; i < HEIGHT; i++) {
      text.append(label(i, range)).append(grid[i]).append('\n');
    }
    return axis(text, horizon).toString().replaceAll(" +\n", "\n");
  }

  private static int row(double rate, double[] range) {
    double share = (range[1] - rate) / (range[1] - range[0]);
    return Math.max(0, Math.min(HEIGHT - 1, (int) (share * HEIGHT)));
  }

  /** The rate at the middle of every third row. */
  private static String label(int row, double[] range) {
    if (row % 3 != 1) {
      return " ".repeat(MARGIN) + '|';
    }
    double rate = range[1] - (range[1] - range[0]) * (row + 0.5) / HEIGHT;
    return String.format(Locale.ROOT, "%7.3f%% +", 100 * rate);
  }

  private static StringBuilder axis(StringBuilder text, double horizon) {
    double step = RateLines.step(horizon, 8);
    List<Double> ticks = RateLines.ticks(0, horizon, step);
    char[] line = new char[WIDTH];
    Arrays.fill(line, '-');
    char[] labels = new char[WIDTH + 6];
    Arrays.fill(labels, ' ');
    for (double tick : ticks) {
      int column = Math.min(WIDTH - 1, (int) (tick / horizon * WIDTH));
      line[column] = '+';
      String label = String.format(Locale.ROOT, "%." + RateLines.decimals(step) + "f", tick);
      label.getChars(0, label.length(), labels, Math.min(column, labels.length - label.length()));
    }
    return text.append(" ".repeat(MARGIN))
        .append('+')
        .append(line)
        .append('\n')
        .append(" ".repeat(MARGIN + 1))
        .append(labels)
        .append('\n')
        .append(" ".repeat(MARGIN + WIDTH / 2 - 2))
        .append("years\n");
  }
}
