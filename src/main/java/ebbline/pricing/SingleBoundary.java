package ebbline.pricing;

import ebbline.instrument.CashFlows;
import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.time.TimeAxis;
import java.util.List;

/** Tells from a claim's flows whether holding on and exercising cross at one rate only. */
final class SingleBoundary {
  /*
   * Let each right exchange a positive amount at one time r for positive flows at r or later, r not falling from right to
   * right. Then by induction what holding on is worth, as a multiple of the bond for r, falls as the rate rises: the later
   * flows do, the larger or the smaller of two such things does, and so does its expectation. The exchange itself is a
   * constant multiple, so they cross once. Adding the same flows to both sides of every exchange changes no decision; that
   * makes a swap a bond at par.
   */
  private SingleBoundary() {}

  /** As {@link Decisions#order()} says. */
  static int order(Claim claim) {
    return claim.flows().isEmpty() ? ofExchanges(claim.rights()) : ofBond(claim);
  }

  private static int ofBond(Claim claim) {
    CashFlows flows = claim.flows();
    int n = flows.size();
    int kept = n;
    double later = Double.POSITIVE_INFINITY;
    List<Right> rights = claim.rights();
    for (int i = rights.size() - 1; i >= 0; i--) {
      CashFlows received = rights.get(i).received();
      if (received.size() != 1 || !(received.amount(0) > 0) || received.time(0) > later) {
        return 0;
      }
      later = received.time(0);
      double until = rights.get(i).keptUntil() + TimeAxis.SAME_MOMENT;
      if (kept < n && flows.time(kept) <= until) {
        return 0;
      }
      while (kept > 0 && flows.time(kept - 1) > until) {
        kept--;
        if (!(flows.amount(kept) >= 0)) {
          return 0;
        }
      }
      if (kept < n && flows.time(kept) < later) {
        return 0;
      }
    }
    return 1;
  }

  /** Rights to flows, against nothing: the first of each is the price of the rest. */
  private static int ofExchanges(List<Right> rights) {
    int sign = 0;
    CashFlows after = CashFlows.NONE;
    for (int i = rights.size() - 1; i >= 0; i--) {
      CashFlows received = rights.get(i).received();
      if (received.size() < 2 || received.amount(0) == 0) {
        return 0;
      }
      int own = received.amount(0) > 0 ? 1 : -1;
      sign = sign == 0 ? own : sign;
      if (own != sign || !isRest(received, after, sign)) {
        return 0;
      }
      after = received;
    }
    return sign;
  }

  /** Whether the flows after the first have one sign and, less those of the next right, keep it. */
  private static boolean isRest(CashFlows flows, CashFlows next, int sign) {
    int j = next.size() - 1;
    for (int i = flows.size() - 1; i >= 1; i--) {
      double amount = -sign * flows.amount(i);
      if (j >= 1 && next.time(j) == flows.time(i)) {
        amount += sign * next.amount(j);
        j--;
      }
      if (!(amount >= 0) || flows.time(i) < flows.time(0)) {
        return false;
      }
    }
    return j < 1 && (next.isEmpty() || next.time(0) >= flows.time(0));
  }
}
