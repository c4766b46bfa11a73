package ebbline.report;

import ebbline.fitting.options.OptionFit;
import java.util.List;
import java.util.Locale;

/**
 * The objective of a calibration over mean reversion as a picture: how sharply the quotes hold it.
 * The same profile gives the same bytes.
 */
public final class ProfileSvg {
  private static final double WIDTH = 720;
  private static final double HEIGHT = 420;
  private static final double LEFT = 90;
  private static final double RIGHT = 24;
  private static final double TOP = 44;
  private static final double BOTTOM = 56;
  private static final int MARKS = 5;

  private ProfileSvg() {}

  /**
   * @param profile at least two points, in the order of mean reversion
   * @param fitted mean reversion of the fit, marked
   */
  public static String draw(List<OptionFit.ProfilePoint> profile, double fitted) {
    if (profile.size() < 2) {
      throw new IllegalArgumentException(
          "a picture of a profile needs two points, found " + profile.size());
    }
    double low = profile.get(0).meanReversion();
    double high = profile.get(profile.size() - 1).meanReversion();
    double most = profile.stream().mapToDouble(OptionFit.ProfilePoint::rmse).max().orElseThrow();
    double top = most > 0 ? most : 1;
    StringBuilder text = new StringBuilder();
    add(
        text,
        "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"%.0f\" height=\"%.0f\" viewBox=\"0 0 %.0f"
            + " %.0f\" font-family=\"Helvetica, Arial, sans-serif\" font-size=\"13\">\n",
        WIDTH,
        HEIGHT,
        WIDTH,
        HEIGHT);
    add(text, "<title>Profile of the objective over mean reversion</title>\n");
    add(text, "<rect width=\"100%%\" height=\"100%%\" fill=\"white\"/>\n");
    add(
        text,
        "<text x=\"%.0f\" y=\"24\" font-size=\"15\">Root of the mean squared error, volatility"
            + " fitted anew</text>\n",
        LEFT);
    for (int k = 0; k <= MARKS; k++) {
      double share = (double) k / MARKS;
      double x = x(share);
      double y = y(share);
      add(
          text,
          "<line x1=\"%.2f\" y1=\"%.2f\" x2=\"%.2f\" y2=\"%.2f\" stroke=\"#dddddd\"/>\n",
          LEFT,
          y,
          WIDTH - RIGHT,
          y);
      add(
          text,
          "<text x=\"%.2f\" y=\"%.2f\" text-anchor=\"end\">%.3g</text>\n",
          LEFT - 8,
          y + 4,
          share * top);
      add(
          text,
          "<text x=\"%.2f\" y=\"%.2f\" text-anchor=\"middle\">%.4f</text>\n",
          x,
          HEIGHT - BOTTOM + 20,
          low + share * (high - low));
    }
    add(
        text,
        "<text x=\"%.2f\" y=\"%.2f\" text-anchor=\"middle\">mean reversion a year</text>\n",
        0.5 * (LEFT + WIDTH - RIGHT),
        HEIGHT - 12);
    add(text, "<polyline fill=\"none\" stroke=\"#1f4e79\" stroke-width=\"2\" points=\"");
    for (OptionFit.ProfilePoint point : profile) {
      add(
          text,
          "%.2f,%.2f ",
          x((point.meanReversion() - low) / (high - low)),
          y(point.rmse() / top));
    }
    add(text, "\"/>\n");
    double x = x((fitted - low) / (high - low));
    add(
        text,
        "<line x1=\"%.2f\" y1=\"%.2f\" x2=\"%.2f\" y2=\"%.2f\" stroke=\"#b3541e\""
            + " stroke-dasharray=\"6 4\"/>\n",
        x,
        TOP,
        x,
        HEIGHT - BOTTOM);
    add(text, "</svg>\n");
    return text.toString();
  }

  private static double x(double share) {
    return LEFT + share * (WIDTH - RIGHT - LEFT);
  }

  private static double y(double share) {
    return HEIGHT - BOTTOM - share * (HEIGHT - BOTTOM - TOP);
  }

  private static void add(StringBuilder text, String format, Object... values) {
    text.append(String.format(Locale.ROOT, format, values));
  }
}
