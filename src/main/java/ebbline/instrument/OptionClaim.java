package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** An outright option as a claim: no flows of its own, one right to flows against cash. */
final class OptionClaim {
  private OptionClaim() {}

  /** Years to exercise; not before today. */
  static double exercise(Moment expiry, TimeAxis axis) {
    double time = axis.years(expiry);
    if (!(time >= 0)) {
      throw new IllegalArgumentException("expiry must not lie before today, found " + expiry);
    }
    return time;
  }

  /**
   * The claim.
   *
   * @param flows what is bought or sold; only those after exercise count
   * @param strike paid or received for them at exercise; absent where it is at the money
   */
  static Claim of(OptionKind option, double exercise, CashFlows flows, OptionalDouble strike) {
    CashFlows perUnit = CashFlows.single(exercise, -option.sign());
    CashFlows received = flows.after(exercise).times(option.sign());
    if (strike.isPresent()) {
      received = perUnit.times(strike.getAsDouble()).plus(received);
    }
    Right right =
        new Right(
            Right.Party.HOLDER,
            exercise,
            exercise,
            received,
            List.of(),
            Optional.of(new StrikeTerms(strike, perUnit)));
    return new Claim(CashFlows.NONE, List.of(right), 0, 0);
  }
}
