package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.util.List;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * A caplet or floorlet: an option on the floating rate of one period.
 *
 * @param option a call is a caplet, a put a floorlet
 * @param start of the rate's period
 * @param terms their maturity is the period's end; the day count is theirs
 * @param strike annual rate, a decimal; absent where it is at the money, the forward rate
 */
public record RateOption(
    OptionKind option, Moment start, BondTerms terms, OptionalDouble strike, RateBasis basis)
    implements Instrument {

  public RateOption {
    Objects.requireNonNull(option, "option");
    Objects.requireNonNull(start, "start");
    Objects.requireNonNull(terms, "terms");
    Objects.requireNonNull(strike, "strike");
    Objects.requireNonNull(basis, "basis");
    StrikeTerms.requireFinite(strike);
  }

  @Override
  public String kind() {
    return option == OptionKind.CALL ? "caplet" : "floorlet";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    double from = OptionClaim.exercise(start, axis);
    double to = axis.years(terms.maturity());
    Terms.requireAfter("maturity", terms.maturity(), to, from, "expiry");
    double accrual = to - from;
    if (axis.isDated(terms.maturity())) {
      accrual = 0;
      for (LegPeriod each : LegPeriods.of(terms.withEnds(OddPeriods.from(start)), axis)) {
        accrual += each.years();
      }
    }
    return Claim.of(List.of(new Optionlet(option, from, to, accrual, strike, basis, 100, 1)));
  }
}
