package ebbline.instrument;

import ebbline.time.Moment;
import java.util.Objects;

/** When a bond may be called or put, and at what clean price per 100 of what is still owed. */
public sealed interface ExerciseTerm {

  /** Above 0, per 100. */
  double price();

  /** On one date. */
  record OnDate(Moment at, double price) implements ExerciseTerm {
    public OnDate {
      Objects.requireNonNull(at, "at");
      requirePrice(price, at.toString());
    }
  }

  /** On every coupon date from one moment to another, both included. */
  record InRange(Moment from, Moment to, double price) implements ExerciseTerm {
    public InRange {
      Objects.requireNonNull(from, "from");
      Objects.requireNonNull(to, "to");
      requirePrice(price, from + ".." + to);
    }
  }

  private static void requirePrice(double price, String when) {
    if (!(price > 0 && Double.isFinite(price))) {
      throw new IllegalArgumentException(
          "a call or put price must be above 0, found " + price + " at " + when);
    }
  }
}
