package ebbline.instrument;

import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * A cap or floor: options on the floating rates of successive periods at one strike.
 *
 * @param option a call is a cap, a put a floor
 * @param terms schedule; its issue is the start of the first period, one period from today where
 *     there is none
 * @param strike annual rate, a decimal; absent where it is at the money, the swap rate of the
 *     periods
 */
public record RateOptionStrip(
    OptionKind option, BondTerms terms, OptionalDouble strike, RateBasis basis)
    implements Instrument {

  public RateOptionStrip {
    Objects.requireNonNull(option, "option");
    Objects.requireNonNull(terms, "terms");
    Objects.requireNonNull(strike, "strike");
    Objects.requireNonNull(basis, "basis");
    StrikeTerms.requireFinite(strike);
  }

  @Override
  public String kind() {
    return option == OptionKind.CALL ? "cap" : "floor";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    Moment start = terms.ends().issue().orElseGet(() -> onePeriodOn(axis));
    if (!(axis.years(start) >= -TimeAxis.SAME_MOMENT)) {
      throw new IllegalArgumentException(
          "the first period must start today or later, found " + start);
    }
    Terms.requireAfter(
        "maturity", terms.maturity(), axis.years(terms.maturity()), axis.years(start), "start");
    BondTerms placed =
        terms.withEnds(
            new OddPeriods(
                java.util.Optional.of(start),
                terms.ends().firstCoupon(),
                terms.ends().lastCoupon()));
    List<Optionlet> optionlets = new ArrayList<>();
    for (LegPeriod period : LegPeriods.of(placed, axis)) {
      optionlets.add(
          new Optionlet(
              option,
              Math.max(0, period.start()),
              period.end(),
              period.years(),
              strike,
              basis,
              100,
              1));
    }
    return Claim.of(optionlets);
  }

  private Moment onePeriodOn(TimeAxis axis) {
    int months = 12 / terms.frequency();
    return axis.isDated(terms.maturity())
        ? Moment.of(new Tenor(months, 0).after(axis.asOf().orElseThrow()))
        : Moment.ofYears(1.0 / terms.frequency());
  }
}
