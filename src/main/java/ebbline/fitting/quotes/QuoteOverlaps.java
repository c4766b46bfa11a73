package ebbline.fitting.quotes;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Quotes of a sheet that speak of the same stretch of the curve. */
public final class QuoteOverlaps {
  private QuoteOverlaps() {}

  /**
   * The ends of all quotes, increasing, those that are one moment once: the nodes of a curve
   * through as many of the quotes as can be met.
   */
  public static double[] nodes(List<QuoteEquation> quotes) {
    double[] ends = quotes.stream().mapToDouble(QuoteEquation::lastTime).sorted().toArray();
    int count = 0;
    for (double end : ends) {
      if (count == 0 || end - ends[count - 1] > CurveBuilder.SAME_TIME) {
        ends[count++] = end;
      }
    }
    return java.util.Arrays.copyOf(ends, count);
  }

  /**
   * In words: quotes that end at one time, and forward periods of which each covers a part of the
   * other, so that one quote moves the curve under the other.
   */
  public static List<String> describe(List<SheetQuote> quotes) {
    List<SheetQuote> sorted = new ArrayList<>(quotes);
    sorted.sort(Comparator.comparingDouble(quote -> quote.equation().lastTime()));
    List<String> found = new ArrayList<>();
    for (int i = 1; i < sorted.size(); i++) {
      SheetQuote one = sorted.get(i - 1);
      SheetQuote other = sorted.get(i);
      if (other.equation().lastTime() - one.equation().lastTime() <= CurveBuilder.SAME_TIME) {
        found.add(one.id() + " and " + other.id() + " end at the same time");
      }
    }
    List<SheetQuote> forwards =
        quotes.stream()
            .filter(quote -> quote.kind() == QuoteKind.FRA || quote.kind() == QuoteKind.FUTURE)
            .sorted(Comparator.comparingDouble(SheetQuote::start))
            .toList();
    for (int i = 0; i < forwards.size(); i++) {
      for (int j = i + 1; j < forwards.size(); j++) {
        SheetQuote one = forwards.get(i);
        SheetQuote other = forwards.get(j);
        double shared = one.end() - other.start();
        boolean partly =
            other.start() - one.start() > CurveBuilder.SAME_TIME
                && other.end() - one.end() > CurveBuilder.SAME_TIME;
        // A few days between the dates of neighbouring contracts are the rule.
        if (partly
            && shared > 0.1 * Math.min(one.end() - one.start(), other.end() - other.start())) {
          found.add("the periods of " + one.id() + " and " + other.id() + " overlap");
        }
      }
    }
    return found;
  }
}
