package ebbline.data;

import ebbline.instrument.FixedLeg;
import ebbline.time.Moment;
import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;

/** Cells that hold a list, {@code DATE@VALUE} joined with semicolons. */
final class DatedList {
  private DatedList() {}

  /** New coupons, {@code DATE@RATE}. */
  static List<FixedLeg.Step> steps(String text) {
    return read(text, "2028-06-30@4.5%", (at, value) -> step(at, RateText.parse(value)));
  }

  private static FixedLeg.Step step(Moment at, double rate) {
    return new FixedLeg.Step(at, rate);
  }

  /** Repayments, {@code DATE@AMOUNT} in money of the face. */
  static List<FixedLeg.Sinking> sinking(String text, double face) {
    double money = Math.abs(face);
    return read(
        text,
        "2028-06-30@250000",
        (at, value) -> new FixedLeg.Sinking(at, 100 * NumberText.parse(value) / money));
  }

  static <T> List<T> read(String text, String example, BiFunction<Moment, String, T> reader) {
    List<T> found = new ArrayList<>();
    for (String part : text.split(";", -1)) {
      int at = part.indexOf('@');
      if (at < 0) {
        throw new IllegalArgumentException(
            "expected DATE@VALUE joined with ; such as "
                + example
                + ", found '"
                + part.strip()
                + "'");
      }
      try {
        found.add(
            reader.apply(
                Moment.parse(part.substring(0, at).strip()), part.substring(at + 1).strip()));
      } catch (IllegalArgumentException e) {
        throw new IllegalArgumentException(e.getMessage() + " in '" + part.strip() + "'", e);
      }
    }
    return found;
  }
}
