package ebbline.instrument;

import ebbline.time.TimeAxis;
import java.util.Optional;

/** What is owed, when, and who may choose: terms without prices. */
public sealed interface Instrument
    permits CouponBond,
        FloatingNote,
        Swap,
        CallableBond,
        BermudanSwaption,
        ZeroOption,
        BondOption,
        RateOption,
        RateOptionStrip,
        Swaption {

  /** The name of the kind as books write it. */
  String kind();

  /**
   * The terms in years from today: here dates end.
   *
   * @throws IllegalArgumentException in words if the terms make no sense on this axis (matured,
   *     expired, a date without an as-of date)
   */
  Claim claim(TimeAxis axis);

  /** Fixed payments that are made if nobody exercises; empty where there are none. */
  default Optional<FixedLeg> fixedLeg() {
    return Optional.empty();
  }
}
