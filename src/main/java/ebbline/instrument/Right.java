package ebbline.instrument;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

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
 * @param received flows at or after {@code decision} that take the place of the rest, those of a
 *     known strike included
 * @param floating interest not fixed yet that is received besides; a market turns it into flows
 * @param strike what a unit of strike brings, where there is one
 */
public record Right(
    Party party,
    double decision,
    double keptUntil,
    CashFlows received,
    List<FloatingCoupon> floating,
    Optional<StrikeTerms> strike) {

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
    Objects.requireNonNull(strike, "strike");
    floating = List.copyOf(floating);
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

  /** Fixed flows, without a strike of its own. */
  public Right(Party party, double decision, double keptUntil, CashFlows received) {
    this(party, decision, keptUntil, received, List.of(), Optional.empty());
  }

  /** Whether flows and strike are all known, or a market has yet to say some of them. */
  public boolean isFixed() {
    return floating.isEmpty() && (strike.isEmpty() || strike.get().value().isPresent());
  }

  /**
   * What is received, all of it.
   *
   * @throws IllegalArgumentException if floating interest or a strike at the money is not fixed yet
   */
  @Override
  public CashFlows received() {
    if (isFixed()) {
      return received;
    }
    throw new IllegalArgumentException(
        "a right to floating interest or at the money is known only where there is a curve");
  }

  /** The part of what is received that is fixed already. */
  public CashFlows known() {
    return received;
  }

  /** The same right with everything fixed. */
  public Right fixed(CashFlows all, Optional<StrikeTerms> struck) {
    return new Right(party, decision, keptUntil, all, List.of(), struck);
  }
}
