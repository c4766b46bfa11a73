package ebbline.data;

import ebbline.instrument.BermudanSwaption;
import ebbline.instrument.ExerciseTerm;
import ebbline.instrument.Notice;
import ebbline.time.Moment;
import java.util.ArrayList;
import java.util.List;

/** Cells that hold schedules of rights: {@code DATE@PRICE;FROM..TO@PRICE}. */
final class ExerciseText {
  private ExerciseText() {}

  /** Calls or puts. */
  static List<ExerciseTerm> terms(String text) {
    List<ExerciseTerm> found = new ArrayList<>();
    for (String part : text.split(";", -1)) {
      int at = part.indexOf('@');
      if (at < 0) {
        throw new IllegalArgumentException(
            "expected DATE@PRICE or FROM..TO@PRICE joined with ; such as 2029-05-15@101, found '"
                + part.strip()
                + "'");
      }
      found.add(placed(part, () -> term(part, at)));
    }
    return found;
  }

  private static ExerciseTerm term(String part, int at) {
    double price = NumberText.parse(part.substring(at + 1).strip());
    List<Moment> ends = ends(part.substring(0, at));
    return ends.size() == 1
        ? new ExerciseTerm.OnDate(ends.get(0), price)
        : new ExerciseTerm.InRange(ends.get(0), ends.get(1), price);
  }

  /** Exercise dates of a swaption, {@code DATE;FROM..TO}. */
  static List<BermudanSwaption.Window> windows(String text) {
    List<BermudanSwaption.Window> found = new ArrayList<>();
    for (String part : text.split(";", -1)) {
      List<Moment> ends = placed(part, () -> ends(part));
      found.add(new BermudanSwaption.Window(ends.get(0), ends.get(ends.size() - 1)));
    }
    return found;
  }

  /** One moment, or two with dots between. */
  private static List<Moment> ends(String text) {
    int dots = text.indexOf("..");
    return dots < 0
        ? List.of(Moment.parse(text.strip()))
        : List.of(
            Moment.parse(text.substring(0, dots).strip()),
            Moment.parse(text.substring(dots + 2).strip()));
  }

  static Notice notice(String text) {
    return new Notice(Moment.parse(text));
  }

  private static <T> T placed(String part, java.util.function.Supplier<T> reader) {
    try {
      return reader.get();
    } catch (IllegalArgumentException e) {
      throw new IllegalArgumentException(e.getMessage() + " in '" + part.strip() + "'", e);
    }
  }
}
