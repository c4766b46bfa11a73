package ebbline.pricing;

import ebbline.instrument.Claim;
import ebbline.model.GaussianRates;

/** The most accurate method that a claim allows. */
public final class BestMethod {
  private BestMethod() {}

  /** Discounting without rights, a closed form for one, backward induction for more. */
  public static Valuation value(Claim claim, GaussianRates rates) {
    if (claim.isCertain()) {
      return Discounting.value(claim, rates.curve());
    }
    return ClosedForm.applies(claim)
        ? ClosedForm.value(claim, rates)
        : BackwardInduction.value(claim, rates);
  }

  /** The present value of {@link #value} without its bound, which takes most of half the time. */
  static double presentValue(Claim claim, GaussianRates rates) {
    return claim.isCertain() || ClosedForm.applies(claim)
        ? value(claim, rates).presentValue()
        : BackwardInduction.presentValue(claim, rates);
  }

  /** What the claim's rights are worth to its holder, by the same choice. */
  public static Valuation rightsValue(Claim claim, GaussianRates rates) {
    return claim.rights().size() == 1
        ? ClosedForm.rightValue(claim, rates)
        : BackwardInduction.rightsValue(claim, rates);
  }
}
