package ebbline.data;

import ebbline.curve.DiscountCurve;
import ebbline.curve.FlatCurve;
import ebbline.curve.InterpolatedCurve;
import ebbline.curve.SmithWilsonCurve;
import ebbline.curve.SvenssonCurve;
import ebbline.time.TimeAxis;
import java.math.BigDecimal;
import java.nio.file.Path;
import java.time.LocalDate;

/** Writes curve files that read back to the same curve, to the last bit. */
public final class CurveWriter {
  private static final double LARGEST_RATE = 100;

  private CurveWriter() {}

  /**
   * Writes a curve whole or not at all.
   *
   * @param axis its as-of date, if it has one, and how its years are counted
   * @throws OutputProblem if it cannot be written
   * @throws IllegalArgumentException in words for a curve that no curve file holds
   */
  public static void write(Path path, DiscountCurve curve, TimeAxis axis) {
    String text = text(curve, axis);
    AtomicFile.write(path, file -> file.write(text));
  }

  private static String text(DiscountCurve curve, TimeAxis axis) {
    StringBuilder text = new StringBuilder();
    axis.asOf().ifPresent(date -> setting(text, "as-of", date.toString()));
    if (axis.basis() != TimeAxis.TimeBasis.ACT_365F) {
      setting(text, "day-count", axis.basis().label());
    }
    if (curve instanceof InterpolatedCurve nodes) {
      setting(text, "interpolation", nodes.interpolation().label());
      text.append("maturity,discount\n");
      double[] times = nodes.nodes();
      double[] logs = nodes.nodeLogDiscounts();
      for (int i = 0; i < times.length; i++) {
        text.append(maturity(times[i], axis)).append(',').append(discount(logs[i])).append('\n');
      }
    } else if (curve instanceof SmithWilsonCurve kernels) {
      kernels(text, kernels, axis);
    } else if (curve instanceof SvenssonCurve formula) {
      formula(text, formula);
    } else if (curve instanceof FlatCurve flat) {
      throw new IllegalArgumentException("a flat curve needs no file: --curve flat:" + flat.rate());
    } else {
      throw new IllegalArgumentException("a curve file holds no such curve");
    }
    return text.toString();
  }

  private static void setting(StringBuilder text, String key, String value) {
    text.append("# ").append(key).append(": ").append(value).append('\n');
  }

  private static String discount(double log) {
    return DiscountDigits.discount(log).toPlainString();
  }

  /** The date of a time where it has one to the last bit, otherwise the time. */
  public static String maturity(double time, TimeAxis axis) {
    if (axis.asOf().isPresent()) {
      LocalDate today = axis.asOf().get();
      LocalDate date = today.plusDays(Math.round(time / axis.years(today.plusDays(1))));
      if (axis.years(date) == time) {
        return date.toString();
      }
    }
    String text = Double.toString(time);
    return text.endsWith(".0") ? text.substring(0, text.length() - 2) : text;
  }

  private static void kernels(StringBuilder text, SmithWilsonCurve curve, TimeAxis axis) {
    setting(text, "interpolation", "smith-wilson");
    setting(text, "ultimate-forward", rate(curve.ultimateForward()));
    setting(text, "speed", Double.toString(curve.speed()));
    text.append("maturity,discount,kernel\n");
    double[] times = curve.nodes();
    double[] logs = curve.nodeLogDiscounts();
    double[] weights = curve.weights();
    for (int i = 0; i < times.length; i++) {
      text.append(maturity(times[i], axis))
          .append(',')
          .append(discount(logs[i]))
          .append(',')
          .append(weights[i])
          .append('\n');
    }
  }

  private static void formula(StringBuilder text, SvenssonCurve curve) {
    double[] betas = curve.betas();
    double[] taus = curve.taus();
    boolean oneHump = betas[3] == 0 && taus[0] == taus[1];
    setting(text, "form", oneHump ? "nelson-siegel" : "svensson");
    text.append("parameter,value\n");
    for (int i = 0; i < (oneHump ? 3 : 4); i++) {
      text.append("beta").append(i).append(',').append(rate(betas[i])).append('\n');
    }
    for (int i = 0; i < (oneHump ? 1 : 2); i++) {
      text.append("tau").append(i + 1).append(',').append(taus[i]).append('\n');
    }
  }

  /** A rate as the readers take it: a fraction, or per cent where it is 1 or more. */
  private static String rate(double rate) {
    if (!(Math.abs(rate) <= LARGEST_RATE)) {
      throw new IllegalArgumentException(
          "a curve file holds rates up to 10000 %, found " + rate + ": the fit is degenerate");
    }
    return Math.abs(rate) < 1
        ? Double.toString(rate)
        : new BigDecimal(Double.toString(rate)).movePointRight(2).toPlainString() + "%";
  }
}
