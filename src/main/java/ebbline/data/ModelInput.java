package ebbline.data;

import ebbline.curve.DiscountCurve;
import ebbline.model.GaussianRates;
import ebbline.model.HullWhite;
import ebbline.model.Vasicek;
import ebbline.pricing.FittedParameters;
import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What a model file holds.
 *
 * @param measure risk-neutral or historical
 * @param axis the as-of date, if it has one, and how years are counted
 * @param vasicek the model, if it is Vasicek's
 * @param hullWhite the model, if it is Hull and White's
 * @param curve the curve under a Hull–White model
 * @param marketPriceOfRisk λ, where it was estimated
 * @param fit how the parameters were found, where they were
 * @param file the file; empty for a model that has not been saved
 */
public record ModelInput(
    Measure measure,
    TimeAxis axis,
    Optional<Vasicek> vasicek,
    Optional<HullWhite> hullWhite,
    Optional<DiscountCurve> curve,
    OptionalDouble marketPriceOfRisk,
    Optional<FitSummary> fit,
    Optional<SourceFile> file) {

  /** Under which law the parameters hold. */
  public enum Measure {
    RISK_NEUTRAL("risk-neutral"),
    HISTORICAL("historical");

    private final String label;

    Measure(String label) {
      this.label = label;
    }

    public String label() {
      return label;
    }
  }

  /** Vasicek under the pricing measure. */
  public static ModelInput of(Vasicek model, TimeAxis axis, Optional<FitSummary> fit) {
    return new ModelInput(
        Measure.RISK_NEUTRAL,
        axis,
        Optional.of(model),
        Optional.empty(),
        Optional.empty(),
        OptionalDouble.empty(),
        fit,
        Optional.empty());
  }

  /** Hull–White on a curve. */
  public static ModelInput of(
      HullWhite model, DiscountCurve curve, TimeAxis axis, Optional<FitSummary> fit) {
    return new ModelInput(
        Measure.RISK_NEUTRAL,
        axis,
        Optional.empty(),
        Optional.of(model),
        Optional.of(curve),
        OptionalDouble.empty(),
        fit,
        Optional.empty());
  }

  /** The model that pricers take. */
  public GaussianRates rates() {
    return vasicek.isPresent()
        ? vasicek.get().rates()
        : hullWhite.orElseThrow().on(curve.orElseThrow());
  }

  /** How sure the parameters are, where the file says; its covariance may be empty. */
  public Optional<FittedParameters> fitted() {
    return fit.filter(f -> !f.covariance().isEmpty())
        .map(
            f ->
                new FittedParameters(
                    List.copyOf(f.standardErrors().keySet()), f.covariance(), vasicek));
  }
}
