package ebbline.instrument;

import java.util.Objects;
import java.util.OptionalDouble;

/**
 * An option on the floating rate of one period: max(0, ±(growth − (1 + accrual × strike))) times
 * the notional, paid at the period's end.
 *
 * @param option a call gains when rates rise (a caplet), a put when they fall (a floorlet)
 * @param start of the period, years from today; not before today
 * @param end of the period, when it is paid
 * @param accrual years for which interest is counted, above 0
 * @param strike annual rate, a decimal; absent where it is at the money
 * @param basis when the rate is known
 * @param notional per 100 face; above 0
 * @param growthOver by which factor the floating rate's growth exceeds the discounting curve's; 1
 *     on a single curve
 */
public record Optionlet(
    OptionKind option,
    double start,
    double end,
    double accrual,
    OptionalDouble strike,
    RateBasis basis,
    double notional,
    double growthOver) {

  public Optionlet {
    Objects.requireNonNull(option, "option");
    Objects.requireNonNull(strike, "strike");
    Objects.requireNonNull(basis, "basis");
    StrikeTerms.requireFinite(strike);
    if (!(start >= 0 && end > start && Double.isFinite(end))) {
      throw new IllegalArgumentException(
          "a rate's period starts today or later and ends after that, found "
              + start
              + " to "
              + end);
    }
    if (!(accrual > 0 && Double.isFinite(accrual))) {
      throw new IllegalArgumentException("accrual must be above 0, found " + accrual);
    }
    if (!(notional > 0 && growthOver > 0 && Double.isFinite(notional / growthOver))) {
      throw new IllegalArgumentException(
          "notional and growth must be above 0, found " + notional + " and " + growthOver);
    }
  }

  /** The same option at a strike, its growth held a factor over the discounting curve's. */
  public Optionlet at(double rate, double factor) {
    return new Optionlet(
        option, start, end, accrual, OptionalDouble.of(rate), basis, notional, factor);
  }

  /** The growth beyond which a call pays, 1 + accrual × strike. */
  public double strikeGrowth() {
    return 1
        + accrual
            * strike.orElseThrow(
                () ->
                    new IllegalArgumentException(
                        "a strike at the money is known only where there is a curve"));
  }

  /** What exercise would bring if it were certain, in bonds: those of the start and of the end. */
  public CashFlows exchanged() {
    double size = option.sign() * notional;
    return CashFlows.of(
        new double[] {start, end}, new double[] {size * growthOver, -size * strikeGrowth()});
  }
}
