package ebbline.instrument;

import java.util.Objects;

/** A bond that repays parts of its face before maturity. */
public record AmortisingBond(FixedLeg leg) implements CouponBond {

  public AmortisingBond {
    Objects.requireNonNull(leg, "leg");
  }

  @Override
  public String kind() {
    return "amortising-bond";
  }
}
