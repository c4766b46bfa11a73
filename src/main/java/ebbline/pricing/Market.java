package ebbline.pricing;

import ebbline.curve.DiscountCurve;
import ebbline.instrument.Claim;
import ebbline.instrument.Instrument;
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
 * @param projection the curve of floating rates, where it is not the one that discounts
 * @param fitted how sure the model's parameters are, where a fit found them
 */
public record Market(
    TimeAxis axis,
    DiscountCurve curve,
    Optional<GaussianRates> rates,
    Optional<DiscountCurve> projection,
    Optional<FittedParameters> fitted) {

  public Market {
    Objects.requireNonNull(axis, "axis");
    Objects.requireNonNull(curve, "curve");
    Objects.requireNonNull(rates, "rates");
    Objects.requireNonNull(projection, "projection");
    Objects.requireNonNull(fitted, "fitted");
  }

  /** Parameters taken as certain. */
  public Market(
      TimeAxis axis,
      DiscountCurve curve,
      Optional<GaussianRates> rates,
      Optional<DiscountCurve> projection) {
    this(axis, curve, rates, projection, Optional.empty());
  }

  /** The same market with floating rates from a curve of their own. */
  public Market withProjection(DiscountCurve forwards) {
    return new Market(axis, curve, rates, Optional.of(forwards), fitted);
  }

  /** The same market with parameters that a fit found. */
  public Market withFitted(FittedParameters parameters) {
    return new Market(axis, curve, rates, projection, Optional.of(parameters));
  }

  /** The instrument's terms here, floating rates and strikes at the money as the curves say. */
  public Claim claim(Instrument instrument) {
    return Projection.fixed(instrument.claim(axis), curve, projection.orElse(curve));
  }

  public static Market of(TimeAxis axis, DiscountCurve curve) {
    return new Market(axis, curve, Optional.empty(), Optional.empty());
  }

  public static Market of(TimeAxis axis, GaussianRates rates) {
    return new Market(axis, rates.curve(), Optional.of(rates), Optional.empty());
  }
}
