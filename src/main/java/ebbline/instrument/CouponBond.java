package ebbline.instrument;

import ebbline.time.TimeAxis;

/** Paper with fixed payments and no rights. */
public sealed interface CouponBond extends Instrument
    permits Bond, StepBond, AmortisingBond, ZeroBond, Bill {

  FixedLeg leg();

  @Override
  default Claim claim(TimeAxis axis) {
    return leg().on(axis).claim();
  }
}
