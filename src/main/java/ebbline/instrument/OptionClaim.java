package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.List;

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
   * @param cash paid or received for them at exercise
   */
  static Claim of(OptionKind option, double exercise, CashFlows flows, double cash) {
    CashFlows received =
        CashFlows.single(exercise, -cash).plus(flows.after(exercise)).times(option.sign());
    Right right = new Right(Right.Party.HOLDER, exercise, exercise, received);
    return new Claim(CashFlows.NONE, List.of(right), 0, 0);
  }
}
