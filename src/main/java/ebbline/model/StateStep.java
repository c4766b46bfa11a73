package ebbline.model;

/**
 * The joint normal law of the state at a step's end and of its integral over the step, given the
 * state x at its start, under the risk-neutral measure.
 *
 * <p>x(to) has mean {@code decay x + stateMean} and variance {@code stateVariance}; ∫x has mean
 * {@code loading x + integralMean} and variance {@code integralVariance}.
 *
 * @param decay e^(−aΔ)
 * @param loading G(Δ), years
 * @param stateMean mean of x(to) from x = 0, per year
 * @param stateVariance per year²
 * @param integralMean mean of ∫x from x = 0
 * @param integralVariance variance of ∫x
 * @param covariance of x(to) with ∫x, per year
 */
public record StateStep(
    double decay,
    double loading,
    double stateMean,
    double stateVariance,
    double integralMean,
    double integralVariance,
    double covariance) {

  /** The part of ∫x's standard deviation that x(to) does not explain. */
  public double residualDeviation() {
    double explained = stateVariance > 0 ? covariance / stateVariance * covariance : 0;
    return Math.sqrt(Math.max(0, integralVariance - explained));
  }
}
