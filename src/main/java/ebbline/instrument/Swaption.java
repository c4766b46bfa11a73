package ebbline.instrument;

import ebbline.time.DayCount;
import ebbline.time.ExDividend;
import ebbline.time.Moment;
import ebbline.time.Tenor;
import ebbline.time.TimeAxis;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A European option, settled physically, to enter a swap that starts at expiry.
 *
 * @param side of the fixed rate in the swap
 * @param expiry moment of exercise and start of the swap; today is allowed
 * @param tenor length of the swap
 * @param frequency payments a year of both legs
 * @param strike fixed rate, annual, a decimal; absent where it is at the money, the forward swap
 *     rate
 */
public record Swaption(
    SwapSide side,
    Moment expiry,
    Tenor tenor,
    int frequency,
    Conventions conventions,
    OptionalDouble strike)
    implements Instrument {

  public Swaption {
    Objects.requireNonNull(side, "side");
    Objects.requireNonNull(expiry, "expiry");
    Objects.requireNonNull(tenor, "tenor");
    Objects.requireNonNull(conventions, "conventions");
    Objects.requireNonNull(strike, "strike");
    StrikeTerms.requireFinite(strike);
    if (!(tenor.years() > 0)) {
      throw new IllegalArgumentException("tenor must be above 0, found " + tenor);
    }
  }

  /** On a swap of regular periods without holidays. */
  public static Swaption of(
      SwapSide side, Moment expiry, Tenor tenor, int frequency, OptionalDouble strike) {
    return new Swaption(
        side, expiry, tenor, frequency, Conventions.of(DayCount.ACT_ACT_ICMA), strike);
  }

  @Override
  public String kind() {
    return "swaption";
  }

  @Override
  public Claim claim(TimeAxis axis) {
    double exercise = OptionClaim.exercise(expiry, axis);
    boolean dated = axis.isDated(expiry);
    Moment start = dated ? Moment.of(axis.date(expiry)) : Moment.ofYears(exercise);
    Moment end =
        dated
            ? Moment.of(tenor.after(axis.date(expiry)))
            : Moment.ofYears(exercise + tenor.years());
    BondTerms terms =
        new BondTerms(
            end, frequency, 100, conventions, OddPeriods.from(start), 0, ExDividend.never());
    int sign = side.sign();
    List<LegPeriod> periods = LegPeriods.of(terms, axis);
    double[] times = new double[periods.size()];
    double[] coupons = new double[times.length];
    List<FloatingCoupon> floating = new ArrayList<>();
    for (int i = 0; i < times.length; i++) {
      LegPeriod period = periods.get(i);
      times[i] = period.payment();
      coupons[i] = sign * 100 * period.years();
      floating.add(
          new FloatingCoupon(
              Math.max(exercise, period.start()),
              period.end(),
              period.payment(),
              -sign * 100,
              0,
              0));
    }
    CashFlows perUnit = CashFlows.of(times, coupons);
    CashFlows fixed = strike.isPresent() ? perUnit.times(strike.getAsDouble()) : CashFlows.NONE;
    Right right =
        new Right(
            Right.Party.HOLDER,
            exercise,
            exercise,
            fixed,
            floating,
            Optional.of(new StrikeTerms(strike, perUnit)));
    return new Claim(CashFlows.NONE, List.of(right), 0, 0);
  }
}
