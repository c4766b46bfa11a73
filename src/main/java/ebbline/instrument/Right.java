package ebbline.instrument;

import java.util.Objects;

/**
 * One date on which one party may exchange what is left of a claim for something else.
 *
 * <p>Who exercises gives up the claim's own flows after {@code keptUntil} and takes {@code
 * received} instead (all seen from the holder of the claim). A bond option has no flows of its own
 * and receives the bond less the strike; a callable bond gives up its later coupons for the call
 * price.
 *
 * @param party who decides
 * @param decision when, in years from today; not negative
 * @param keptUntil the claim's own flows up to and including this time are paid in any case; at
 *     least {@code decision}
 * @param received flows at or after {@code decision} that take the place of the rest
 */
public record Right(Party party, double decision, double keptUntil, CashFlows received) {

  /** Who holds the choice. */
  public enum Party {
    /** The holder of the claim, who takes the larger value. */
    HOLDER,
    /** The other side, who leaves the holder the smaller value. */
    ISSUER
  }

  public Right {
    Objects.requireNonNull(party, "party");
    Objects.requireNonNull(received, "received");
    if (!(decision >= 0 && keptUntil >= decision && Double.isFinite(keptUntil))) {
      throw new IllegalArgumentException(
          "a decision is not before today nor after the flows it keeps, found decision "
              + decision
              + " and flows kept until "
              + keptUntil);
    }
    if (!received.isEmpty()
        && !(received.time(0) >= decision - ebbline.time.TimeAxis.SAME_MOMENT)) {
      throw new IllegalArgumentException(
          "what is received comes at or after the decision, found " + received.time(0));
    }
  }
}
