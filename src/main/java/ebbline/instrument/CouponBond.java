package ebbline.instrument;

import ebbline.time.TimeAxis;
import java.util.Optional;

/** Paper with fixed payments and no rights. */
public sealed interface CouponBond extends Instrument
    permits Bond, StepBond, AmortisingBond, ZeroBond, Bill {

  FixedLeg leg();

  @Override
  default Claim claim(TimeAxis axis) {
    return leg().on(axis).claim();
  }

  @Override
  default Optional<FixedLeg> fixedLeg() {
    return Optional.of(leg());
  }
}
