package ebbline.fitting.quotes;

import ebbline.curve.DiscountCurve;
import ebbline.fitting.FittedQuote;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** What a user should know before trusting a curve built from quotes. */
final class CurveWarnings {
  private static final double LOW_FORWARD = -0.02;
  private static final double FORWARD_JUMP = 0.01;
  private static final int LOOKS_PER_PIECE = 8;

  private CurveWarnings() {}

  static List<String> of(
      DiscountCurve curve, List<QuoteEquation> quotes, List<FittedQuote> fitted, boolean exact) {
    List<String> warnings = new ArrayList<>();
    double[] nodes = curve.nodes();
    double last = nodes[nodes.length - 1];
    forwards(curve, last, quotes, warnings);
    for (QuoteEquation quote : quotes) {
      if (quote.lastTime() > last) {
        warnings.add(
            text("%s reaches to %.4g years, beyond the last node", quote.id(), quote.lastTime()));
      }
    }
    if (exact) {
      for (FittedQuote quote : fitted) {
        double scale = Math.max(1, Math.abs(quote.quote()));
        if (Math.abs(quote.error()) > 1e-6 * scale) {
          warnings.add(text("%s is missed by more than 0.01 bp", quote.id()));
        }
      }
    }
    return warnings;
  }

  private static void forwards(
      DiscountCurve curve, double last, List<QuoteEquation> quotes, List<String> warnings) {
    double[] breaks = curve.breaks();
    double lowest = Double.POSITIVE_INFINITY;
    double lowestAt = 0;
    double jump = 0;
    double jumpAt = 0;
    for (int i = 0; i < breaks.length && breaks[i] < last; i++) {
      double to = i + 1 < breaks.length ? Math.min(breaks[i + 1], last) : last;
      for (int k = 0; k <= LOOKS_PER_PIECE; k++) {
        double t =
            k == LOOKS_PER_PIECE
                ? Math.nextDown(to)
                : breaks[i] + (to - breaks[i]) * k / LOOKS_PER_PIECE;
        double forward = curve.forward(t);
        if (forward < lowest) {
          lowest = forward;
          lowestAt = t;
        }
      }
      double step = Math.abs(curve.forward(to) - curve.forward(Math.nextDown(to)));
      if (to < last && step > jump) {
        jump = step;
        jumpAt = to;
      }
    }
    if (lowest < LOW_FORWARD) {
      warnings.add(text("the forward falls to %.4f %% at %.4g years", 100 * lowest, lowestAt));
    } else if (lowest < 0 && quotes.stream().allMatch(quote -> quote.quote() >= 0)) {
      warnings.add(
          text("discount factors rise at %.4g years though no quote is negative", lowestAt));
    }
    if (jump > FORWARD_JUMP) {
      warnings.add(text("the forward jumps by %.4f %% at %.4g years", 100 * jump, jumpAt));
    }
  }

  private static String text(String format, Object... arguments) {
    return String.format(Locale.ROOT, format, arguments);
  }
}
