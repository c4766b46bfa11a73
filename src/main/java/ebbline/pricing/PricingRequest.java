package ebbline.pricing;

import ebbline.pricing.simulation.Sampling;
import ebbline.time.Moment;
import java.util.Objects;
import java.util.Optional;

/**
 * What the user asks of a pricing run.
 *
 * @param method to price by; empty for the most accurate that applies
 * @param steps of a tree
 * @param sampling of a simulation
 * @param horizon for forward price, carry and roll-down; empty for none
 */
public record PricingRequest(
    Optional<Method> method, int steps, Sampling sampling, Optional<Moment> horizon) {
  /** Steps of a tree where the user gives none. */
  public static final int STEPS = 500;

  /** The most accurate method, no horizon. */
  public static final PricingRequest STANDARD =
      new PricingRequest(Optional.empty(), STEPS, Optional.empty());

  /** With the usual sampling. */
  public PricingRequest(Optional<Method> method, int steps, Optional<Moment> horizon) {
    this(method, steps, Sampling.of(Simulation.PATHS, 1, 1), horizon);
  }

  public PricingRequest {
    Objects.requireNonNull(method, "method");
    Objects.requireNonNull(sampling, "sampling");
    Objects.requireNonNull(horizon, "horizon");
  }
}
