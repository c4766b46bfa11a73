package ebbline.report;

import ebbline.curve.DiscountCurve;
import java.util.List;
import java.util.Locale;

/**
 * Zero and forward rates of a curve as a picture for a paper: lines that a printer without colour
 * keeps apart, figures at the axes, nothing else. The same curve gives the same bytes.
 */
public final class CurveSvg {
  private static final double WIDTH = 720;
  private static final double HEIGHT = 450;
  private static final double LEFT = 72;
  private static final double RIGHT = 18;
  private static final double TOP = 40;
  private static final double BOTTOM = 52;
  private static final int MOST_MARKS = 80;

  private final DiscountCurve curve;
  private final RateLines lines;
  private final double[] range;
  private final StringBuilder text = new StringBuilder();

  private CurveSvg(DiscountCurve curve, double horizon) {
    this.curve = curve;
    lines = new RateLines(curve, horizon);
    range = lines.range();
  }

  /**
   * The picture.
   *
   * @param horizon years, above 0
   * @param marks times at which the zero rate is marked, such as nodes; left out where there are
   *     too many to tell apart
   * @param title said above the lines
   */
  public static String draw(DiscountCurve curve, double horizon, List<Double> marks, String title) {
    return new CurveSvg(curve, horizon).picture(marks, title);
  }

  private String picture(List<Double> marks, String title) {
    add(
        "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"%.0f\" height=\"%.0f\""
            + " viewBox=\"0 0 %.0f %.0f\" font-family=\"Helvetica, Arial, sans-serif\""
            + " font-size=\"13\">\n",
        WIDTH, HEIGHT, WIDTH, HEIGHT);
    add("<title>%s</title>\n", escaped(title));
    add("<rect width=\"100%%\" height=\"100%%\" fill=\"white\"/>\n");
    axes();
    for (List<RateLines.Point> forward : lines.forwards()) {
      line(forward, "#b3541e", " stroke-dasharray=\"7 4\"");
    }
    line(lines.zeros(), "#1f4e79", "");
    List<Double> inside = marks.stream().filter(t -> t > 0 && t <= lines.horizon()).toList();
    if (inside.size() <= MOST_MARKS) {
      for (double t : inside) {
        add(
            "<circle cx=\"%.2f\" cy=\"%.2f\" r=\"3\" fill=\"white\" stroke=\"#1f4e79\"/>\n",
            x(t), y(curve.zero(t)));
      }
    }
    legend(title);
    add("</svg>\n");
    return text.toString();
  }

  private void add(String format, Object... arguments) {
    text.append(String.format(Locale.ROOT, format, arguments));
  }

  private double x(double time) {
    return LEFT + (WIDTH - LEFT - RIGHT) * time / lines.horizon();
  }

  private double y(double rate) {
    return TOP + (HEIGHT - TOP - BOTTOM) * (range[1] - rate) / (range[1] - range[0]);
  }

  private void axes() {
    double percent = RateLines.step(100 * (range[1] - range[0]), 7);
    for (double tick : RateLines.ticks(100 * range[0], 100 * range[1], percent)) {
      double at = y(tick / 100);
      add(
          "<line x1=\"%.2f\" y1=\"%.2f\" x2=\"%.2f\" y2=\"%.2f\" stroke=\"%s\"/>\n",
          LEFT, at, WIDTH - RIGHT, at, Math.abs(tick) < 1e-9 ? "#777" : "#ddd");
      add(
          "<text x=\"%.2f\" y=\"%.2f\" text-anchor=\"end\">%s</text>\n",
          LEFT - 8, at + 4.5, number(tick, percent) + " %");
    }
    double years = RateLines.step(lines.horizon(), 8);
    double floor = HEIGHT - BOTTOM;
    for (double tick : RateLines.ticks(0, lines.horizon(), years)) {
      add(
          "<line x1=\"%.2f\" y1=\"%.2f\" x2=\"%.2f\" y2=\"%.2f\" stroke=\"#333\"/>\n",
          x(tick), floor, x(tick), floor + 5);
      add(
          "<text x=\"%.2f\" y=\"%.2f\" text-anchor=\"middle\">%s</text>\n",
          x(tick), floor + 20, number(tick, years));
    }
    add(
        "<path d=\"M%.2f %.2fV%.2fH%.2f\" fill=\"none\" stroke=\"#333\"/>\n",
        LEFT, TOP, floor, WIDTH - RIGHT);
    add(
        "<text x=\"%.2f\" y=\"%.2f\" text-anchor=\"middle\">years</text>\n",
        0.5 * (LEFT + WIDTH - RIGHT), HEIGHT - 12);
  }

  private static String number(double tick, double step) {
    double shown = Math.abs(tick) < 1e-9 * step ? 0.0 : tick;
    return String.format(Locale.ROOT, "%." + RateLines.decimals(step) + "f", shown);
  }

  private void line(List<RateLines.Point> points, String colour, String style) {
    StringBuilder path = new StringBuilder();
    for (RateLines.Point point : points) {
      path.append(path.isEmpty() ? 'M' : 'L')
          .append(String.format(Locale.ROOT, "%.2f %.2f", x(point.time()), y(point.rate())));
    }
    add(
        "<path d=\"%s\" fill=\"none\" stroke=\"%s\" stroke-width=\"1.8\""
            + " stroke-linejoin=\"round\"%s/>\n",
        path, colour, style);
  }

  private void legend(String title) {
    add("<text x=\"%.2f\" y=\"24\" font-weight=\"bold\">%s</text>\n", LEFT, escaped(title));
    double at = WIDTH - RIGHT - 290;
    add(
        "<path d=\"M%.2f 20h28\" stroke=\"#1f4e79\" stroke-width=\"1.8\"/>\n"
            + "<text x=\"%.2f\" y=\"24\">zero rate</text>\n",
        at, at + 34);
    add(
        "<path d=\"M%.2f 20h28\" stroke=\"#b3541e\" stroke-width=\"1.8\""
            + " stroke-dasharray=\"7 4\"/>\n<text x=\"%.2f\" y=\"24\">instantaneous forward</text>\n",
        at + 112, at + 146);
  }

  private static String escaped(String words) {
    return words
        .replaceAll("\\p{Cntrl}", " ")
        .replace("&", "&amp;")
        .replace("<", "&lt;")
        .replace(">", "&gt;");
  }
}
