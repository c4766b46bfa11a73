package ebbline.pricing;

import ebbline.instrument.Claim;
import ebbline.model.GaussianRates;

/**
 * Claims with any number of rights of either party, by backward induction over the decision dates:
 * between two dates the state is exactly normal, so only dates are steps.
 *
 * <p>Under the forward measure of the last decision the deflated value is a martingale; each piece
 * between exercise boundaries is integrated to spectral accuracy. Idea: Henrard 2005; Andricopoulos
 * et al. 2003, J. Fin. Econ. 67.
 */
public final class BackwardInduction {
  private static final double FINE = 0.35;
  private static final double COARSE = 0.45;
  private static final double FINE_RANGE = 7.4;
  private static final double COARSE_RANGE = 6.9;

  /**
   * Of the size of what is exchanged: rounding, which grows with the range of the bonds, and errors
   * that both resolutions share.
   */
  private static final double FLOOR = 4e-12;

  private BackwardInduction() {}

  /**
   * The value, with the difference to a coarser run as error bound.
   *
   * @throws IllegalArgumentException if the volatility is so large that a bond's price leaves the
   *     range of doubles
   */
  public static Valuation value(Claim claim, GaussianRates rates) {
    Valuation flows = Discounting.value(claim.flows(), rates.curve());
    if (claim.rights().isEmpty()) {
      return flows;
    }
    Valuation rights = rightsValue(claim, rates);
    return new Valuation(
        flows.presentValue() + rights.presentValue(),
        Method.BACKWARD_INDUCTION,
        flows.errorBound() + rights.errorBound());
  }

  /**
   * What the claim's rights are worth to its holder: his own less those against him.
   *
   * @throws IllegalArgumentException as {@link #value}
   */
  public static Valuation rightsValue(Claim claim, GaussianRates rates) {
    if (claim.rights().isEmpty()) {
      return new Valuation(0, Method.BACKWARD_INDUCTION, 0);
    }
    Decisions decisions = new Decisions(claim, rates);
    Induction.Hints hints = new Induction.Hints(decisions);
    double fine = new Induction(decisions, FINE, FINE_RANGE, hints).value();
    double coarse = new Induction(decisions, COARSE, COARSE_RANGE, hints).value();
    double spread = 1 + decisions.mostLoading();
    double floor = FLOOR * spread * spread + decisions.merged();
    double bound = Math.abs(fine - coarse) + decisions.size() * floor;
    return new Valuation(fine + 0.0, Method.BACKWARD_INDUCTION, bound);
  }

  /** The value alone, by the finer run only: for searches and differences. */
  static double presentValue(Claim claim, GaussianRates rates) {
    return Discounting.value(claim.flows(), rates.curve()).presentValue()
        + rightsValue(claim, rates, FINE, FINE_RANGE);
  }

  /** One run at a chosen resolution, for studies and tests. */
  static double rightsValue(Claim claim, GaussianRates rates, double spacing, double range) {
    Decisions decisions = new Decisions(claim, rates);
    return new Induction(decisions, spacing, range, new Induction.Hints(decisions)).value();
  }
}
