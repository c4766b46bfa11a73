package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.Objects;

/**
 * One payment of the redemption at maturity.
 *
 * @param redemption per 100 face; above 0
 */
public record ZeroBond(Moment maturity, double redemption) implements Instrument {

  public ZeroBond {
    Objects.requireNonNull(maturity, "maturity");
    Terms.requireRedemption(redemption);
  }

  @Override
  public String kind() {
    return "zero-bond";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    double time = axis.years(maturity);
    Terms.requireAfter("maturity", maturity, time, 0, "today");
    return Claim.of(CashFlows.single(time, redemption));
  }
}
