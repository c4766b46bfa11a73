package ebbline.instrument;

import java.util.Objects;

/** Short paper without coupons, quoted by a discount or a simple rate on actual days. */
public record Bill(BondTerms terms) implements CouponBond {

  public Bill {
    Objects.requireNonNull(terms, "terms");
  }

  @Override
  public String kind() {
    return "bill";
  }

  @Override
  public FixedLeg leg() {
    return FixedLeg.of(terms, 0);
  }
}
