package ebbline.instrument;

import java.util.Objects;

/** A bond whose coupon changes on given dates. */
public record StepBond(FixedLeg leg) implements CouponBond {

  public StepBond {
    Objects.requireNonNull(leg, "leg");
  }

  @Override
  public String kind() {
    return "step-bond";
  }
}
