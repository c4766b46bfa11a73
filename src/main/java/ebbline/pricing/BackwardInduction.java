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
  private static final double FINE = 0.32;
  private static final double COARSE = 0.42;
  private static final double FINE_RANGE = 8;
  private static final double COARSE_RANGE = 7.4;

  /** Of the size of what is exchanged: rounding, and errors that both resolutions share. */
  private static final double FLOOR = 1e-12;

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
    double fine = new Induction(decisions, FINE, FINE_RANGE).value();
    double coarse = new Induction(decisions, COARSE, COARSE_RANGE).value();
    double bound = Math.abs(fine - coarse) + decisions.size() * (FLOOR + decisions.merged());
    return new Valuation(fine + 0.0, Method.BACKWARD_INDUCTION, bound);
  }

  /** One run at a chosen resolution, for studies and tests. */
  static double rightsValue(Claim claim, GaussianRates rates, double spacing, double range) {
    return new Induction(new Decisions(claim, rates), spacing, range).value();
  }
}
