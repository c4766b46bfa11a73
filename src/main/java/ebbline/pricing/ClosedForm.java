package ebbline.pricing;

import ebbline.instrument.Claim;
import ebbline.instrument.Right;
import ebbline.model.GaussianRates;

/**
 * Claims with at most one right, by formula: the flows, plus what the right is worth to its owner,
 * plus the options on single rates.
 *
 * <p>Good to 1e-12 of the face, or 1e-10 relative where that is larger, out to strikes of five
 * standard deviations; any signs of the flows, any number of exercise regions.
 */
public final class ClosedForm {
  private ClosedForm() {}

  /** Whether a formula exists for this claim: no more than one right. */
  public static boolean applies(Claim claim) {
    return claim.rights().size() <= 1;
  }

  /**
   * @throws IllegalArgumentException if the claim has more than one right
   */
  public static Valuation value(Claim claim, GaussianRates rates) {
    if (!applies(claim)) {
      throw new IllegalArgumentException(
          "a closed form exists for one right at most, found " + claim.rights().size());
    }
    Valuation sum = Discounting.value(claim.flows(), rates.curve());
    if (!claim.optionlets().isEmpty()) {
      sum = plus(sum, OptionletPricing.value(claim.optionlets(), rates));
    }
    if (!claim.rights().isEmpty()) {
      sum = plus(sum, rightValue(claim, rates));
    }
    return new Valuation(sum.presentValue(), Method.CLOSED_FORM, sum.errorBound());
  }

  private static Valuation plus(Valuation one, Valuation other) {
    double sum = one.presentValue() + other.presentValue();
    return new Valuation(
        sum, Method.CLOSED_FORM, one.errorBound() + other.errorBound() + 0.5 * Math.ulp(sum));
  }

  /**
   * The worth to the holder of the claim's only right: positive if it is the holder's, negative if
   * it is the issuer's.
   */
  public static Valuation rightValue(Claim claim, GaussianRates rates) {
    if (claim.rights().size() != 1) {
      throw new IllegalArgumentException("one right, found " + claim.rights().size());
    }
    Right right = claim.rights().get(0);
    ExerciseValue worth =
        ExerciseValue.of(ExerciseValue.exchanged(claim, right), right.decision(), rates);
    double sign = right.party() == Right.Party.HOLDER ? 1 : -1;
    return new Valuation(sign * worth.value() + 0.0, Method.CLOSED_FORM, worth.bound());
  }
}
