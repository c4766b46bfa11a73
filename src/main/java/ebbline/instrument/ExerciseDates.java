package ebbline.instrument;

import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** The dates of a schedule of calls or puts that lie ahead, with their prices. */
final class ExerciseDates {
  private final String name;
  private final PlacedLeg leg;
  private final TimeAxis axis;
  private final TreeMap<Double, Double> prices = new TreeMap<>();

  private ExerciseDates(String name, PlacedLeg leg, TimeAxis axis) {
    this.name = name;
    this.leg = leg;
    this.axis = axis;
  }

  /**
   * @param name for messages, {@code call} or {@code put}
   * @return clean price per 100 by time, in order; moments up to today are history and left out
   * @throws IllegalArgumentException in words for a date before the issue or not before maturity, a
   *     range without coupon dates or from its end to its start, or two prices on one date
   */
  static Map<Double, Double> of(
      String name, List<ExerciseTerm> terms, PlacedLeg leg, TimeAxis axis) {
    ExerciseDates dates = new ExerciseDates(name, leg, axis);
    for (ExerciseTerm term : terms) {
      if (term instanceof ExerciseTerm.OnDate on) {
        double at = axis.years(on.at());
        dates.requireInside(at, on.at().toString());
        dates.add(at, on.price());
      } else {
        dates.addRange((ExerciseTerm.InRange) term);
      }
    }
    return dates.prices;
  }

  private void addRange(ExerciseTerm.InRange range) {
    double from = axis.years(range.from());
    double to = axis.years(range.to());
    String text = range.from() + ".." + range.to();
    if (!(to >= from)) {
      throw new IllegalArgumentException(
          "a range of " + name + " dates runs forward, found " + text);
    }
    requireInside(from, text);
    requireInside(to, text);
    int before = prices.size();
    for (double at : leg.couponTimesAfter(0)) {
      if (at >= from - TimeAxis.SAME_MOMENT && at <= to + TimeAxis.SAME_MOMENT) {
        add(at, range.price());
      }
    }
    if (prices.size() == before && to > TimeAxis.SAME_MOMENT) {
      throw new IllegalArgumentException(
          "there must be a coupon date in a range of " + name + " dates, found " + text);
    }
  }

  private void requireInside(double at, String text) {
    double end = leg.periods().get(leg.periods().size() - 1).end();
    if (!(at < end - TimeAxis.SAME_MOMENT)) {
      throw new IllegalArgumentException(
          "a "
              + name
              + " date must lie before maturity "
              + leg.terms().maturity()
              + ", found "
              + text);
    }
    if (leg.terms().ends().issue().isPresent()) {
      double issue = axis.years(leg.terms().ends().issue().get());
      if (!(at > issue + TimeAxis.SAME_MOMENT)) {
        throw new IllegalArgumentException(
            "a "
                + name
                + " date must lie after the issue "
                + leg.terms().ends().issue().get()
                + ", found "
                + text);
      }
    }
  }

  private void add(double at, double price) {
    if (!(at > TimeAxis.SAME_MOMENT)) {
      return;
    }
    Double near = prices.ceilingKey(at - TimeAxis.SAME_MOMENT);
    if (near != null && near <= at + TimeAxis.SAME_MOMENT) {
      throw new IllegalArgumentException(
          "a "
              + name
              + " date must have one price; lists and ranges overlap at "
              + (leg.isDated() ? leg.dateAt(at).toString() : Double.toString(at)));
    }
    prices.put(at, price);
  }
}
