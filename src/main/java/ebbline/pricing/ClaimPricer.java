package ebbline.pricing;

import ebbline.instrument.Claim;
import ebbline.model.GaussianRates;

/** The value of a claim by the method that is asked for, or by the most accurate one. */
final class ClaimPricer {
  private final Market market;
  private final PricingRequest request;

  ClaimPricer(Market market, PricingRequest request) {
    this.market = market;
    this.request = request;
  }

  /**
   * @throws IllegalArgumentException in words if the method does not price the claim, or a model is
   *     missing
   */
  Valuation value(Claim claim) {
    if (request.method().isEmpty() && claim.isCertain()) {
      return Discounting.value(claim, market.curve());
    } else if (request.method().isEmpty()) {
      return BestMethod.value(claim, rates());
    }
    Method method = request.method().get();
    if (method == Method.SIMULATION) {
      return Simulation.value(claim, rates(), request.sampling());
    }
    if (!claim.optionlets().isEmpty() && method != Method.CLOSED_FORM) {
      throw new IllegalArgumentException(
          "options on single rates are priced by closed-form or simulation, not by "
              + method.label());
    }
    return switch (method) {
      case BACKWARD_INDUCTION -> BackwardInduction.value(claim, rates());
      case TRINOMIAL -> TrinomialPricing.value(claim, rates(), request.steps());
      case CLOSED_FORM ->
          claim.isCertain()
              ? Discounting.value(claim, market.curve())
              : ClosedForm.value(claim, rates());
      default ->
          throw new IllegalArgumentException(
              "the method " + method.label() + " does not price this row; use auto");
    };
  }

  private GaussianRates rates() {
    return market
        .rates()
        .orElseThrow(
            () ->
                new IllegalArgumentException(
                    "an option needs a model and not only a curve: give --model FILE, or --model"
                        + " hull-white with --mean-reversion and --volatility"));
  }
}
