package ebbline.check;

import ebbline.pricing.Valuation;
import java.util.Objects;
import java.util.Optional;

/**
 * A row's value by one method.
 *
 * @param id the row's
 * @param method its name as results show it; empty where the row has no value at all
 * @param value money for the row's face, with the method's own error bound; empty where there is
 *     none
 * @param difference the value less the reference's
 * @param seconds that the method took
 * @param verdict the outcome
 * @param message why there is no value; empty else
 */
public record ChallengeFigure(
    String id,
    String method,
    Optional<Valuation> value,
    double difference,
    double seconds,
    ChallengeVerdict verdict,
    String message) {

  public ChallengeFigure {
    Objects.requireNonNull(id, "id");
    Objects.requireNonNull(method, "method");
    Objects.requireNonNull(value, "value");
    Objects.requireNonNull(verdict, "verdict");
    Objects.requireNonNull(message, "message");
  }

  /** A row without any value. */
  public static ChallengeFigure failed(String id, String message) {
    return new ChallengeFigure(id, "", Optional.empty(), 0, 0, ChallengeVerdict.FAILED, message);
  }

  /** Whether this alone makes the challenge fail. */
  public boolean fails() {
    return verdict == ChallengeVerdict.UNEXPLAINED || verdict == ChallengeVerdict.FAILED;
  }
}
