package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.model.GaussianRates;
import ebbline.time.TimeAxis;
import java.util.Objects;
import java.util.Optional;

/**
 * What a row is priced from.
 *
 * @param axis today, and how years are counted
 * @param curve discount factors
 * @param rates the short-rate model over the curve, where there is one
 */
public record Market(TimeAxis axis, DiscountCurve curve, Optional<GaussianRates> rates) {

  public Market {
    Objects.requireNonNull(axis, "axis");
    Objects.requireNonNull(curve, "curve");
    Objects.requireNonNull(rates, "rates");
  }

  public static Market of(TimeAxis axis, DiscountCurve curve) {
    return new Market(axis, curve, Optional.empty());
  }

  public static Market of(TimeAxis axis, GaussianRates rates) {
    return new Market(axis, rates.curve(), Optional.of(rates));
  }
}
