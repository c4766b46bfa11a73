package ebbline.check;

import java.util.OptionalDouble;

/**
 * A published case with what the program makes of it.
 *
 * @param published the case
 * @param quantity what is compared, in words
 * @param computed the program's figure; empty for a text (a date) and where nothing was computed
 * @param computedText the program's answer as text; empty where nothing was computed
 * @param difference |computed − reference|; 0 or 1 for texts that agree or not
 * @param tolerance what the difference may be
 * @param verdict the outcome
 * @param note why a case is not computed, not claimed, or compared with something else
 */
public record CaseResult(
    PublishedCase published,
    String quantity,
    OptionalDouble computed,
    String computedText,
    double difference,
    double tolerance,
    Verdict verdict,
    String note) {

  /** A figure against the printed one, at half a unit of its last digit. */
  public static CaseResult of(PublishedCase c, String quantity, double computed) {
    return of(c, quantity, computed, halfUnit(c.reference()), "");
  }

  /** A figure against the printed one, at a tolerance that the case's source calls for. */
  public static CaseResult of(
      PublishedCase c, String quantity, double computed, double tolerance, String note) {
    double reference = Double.parseDouble(c.reference());
    double difference = Math.abs(computed - reference);
    String said =
        c.isPublished() || !note.isEmpty() ? note : "no published figure: own recomputation";
    Verdict verdict;
    if (difference <= tolerance * (1 + 1e-9)) { // the halves of decimal digits are not exact
      verdict = Verdict.MATCHES;
    } else if (c.isPublished() && agreesWithExactArithmetic(c, computed, tolerance)) {
      verdict = Verdict.SOURCE_ROUNDED;
      said = said.isEmpty() ? "the source rounds on the way; exact: " + c.recomputed() : said;
    } else {
      verdict = Verdict.MISSES;
    }
    return new CaseResult(
        c,
        quantity,
        OptionalDouble.of(computed),
        Double.toString(computed),
        difference,
        tolerance,
        verdict,
        said);
  }

  /** A text, a date for example, that must be the same. */
  public static CaseResult ofText(PublishedCase c, String quantity, String computed) {
    boolean same = computed.equals(c.reference());
    return new CaseResult(
        c,
        quantity,
        OptionalDouble.empty(),
        computed,
        same ? 0 : 1,
        0,
        same ? Verdict.MATCHES : Verdict.MISSES,
        c.isPublished() ? "" : "no published figure: own recomputation");
  }

  /** The case with the verdict that it is shown and not claimed. */
  CaseResult shown(String why) {
    return new CaseResult(
        published, quantity, computed, computedText, difference, tolerance, Verdict.SHOWN, why);
  }

  static CaseResult notComputed(PublishedCase c, String why) {
    return new CaseResult(c, c.id(), OptionalDouble.empty(), "", 0, 0, Verdict.NOT_COMPUTED, why);
  }

  /*
   * Exact arithmetic itself lies outside the printed figure's rounding, and the computation lies
   * within half a unit of the recomputation's own last digit or 1e-9 relative, whichever is wider.
   */
  private static boolean agreesWithExactArithmetic(
      PublishedCase c, double computed, double tolerance) {
    if (c.recomputed().isEmpty()) {
      return false;
    }
    double exact = Double.parseDouble(c.recomputed());
    boolean sourceIsOff =
        Math.abs(exact - Double.parseDouble(c.published())) > tolerance * (1 + 1e-9);
    double allowed = Math.max(halfUnit(c.recomputed()), 1e-9 * Math.abs(exact));
    return sourceIsOff && Math.abs(computed - exact) <= allowed;
  }

  /** Half a unit of the last printed digit of a decimal figure. */
  static double halfUnit(String figure) {
    int exponentAt = Math.max(figure.indexOf('e'), figure.indexOf('E'));
    String mantissa = exponentAt < 0 ? figure : figure.substring(0, exponentAt);
    int exponent = exponentAt < 0 ? 0 : Integer.parseInt(figure.substring(exponentAt + 1));
    int point = mantissa.indexOf('.');
    int decimals = point < 0 ? 0 : mantissa.length() - point - 1;
    return 0.5 * Math.pow(10, exponent - decimals);
  }
}
