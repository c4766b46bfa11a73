package ebbline.instrument;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import org.junit.jupiter.api.Test;

class BondTest {
  private static final TimeAxis TODAY = TimeAxis.from(LocalDate.of(2026, 11, 30));

  private static Bond bond(String maturity, double coupon, int frequency) {
    return Bond.of(Moment.parse(maturity), coupon, frequency, DayCount.ACT_ACT_ICMA, 100, 0);
  }

  private static Bond actual365(String maturity, double coupon, int frequency) {
    return Bond.of(Moment.parse(maturity), coupon, frequency, DayCount.ACT_365F, 100, 0);
  }

  @Test
  void onTimesCouponsFallBackFromMaturity() {
    Claim claim = bond("1.75", 0.06, 2).claim(TimeAxis.undated());
    assertThat(claim.flows().times()).containsExactly(0.25, 0.75, 1.25, 1.75);
    assertThat(claim.flows().amounts()).containsExactly(3, 3, 3, 103);
    assertThat(claim.accrued()).isCloseTo(1.5, within(1e-15));
    assertThat(claim.settlement()).isZero();
  }

  @Test
  void aCouponThatFallsTodayBelongsToThePast() {
    Claim claim = bond("5", 0.05, 2).claim(TimeAxis.undated());
    assertThat(claim.flows().size()).isEqualTo(10);
    assertThat(claim.accrued()).isZero();
    Claim thirds = bond("0.5833333333333334", 0.12, 12).claim(TimeAxis.undated());
    assertThat(thirds.flows().size()).isEqualTo(7);
    assertThat(thirds.accrued()).isZero();
  }

  @Test
  void aTenorWithoutADateIsAnExactLength() {
    Claim claim = bond("18M", 0.04, 2).claim(TimeAxis.undated());
    assertThat(claim.flows().times()).containsExactly(0.5, 1, 1.5);
  }

  @Test
  void onDatesCouponsAreCountedFromMaturityAndKeepTheDay() {
    Claim claim = bond("2028-08-31", 0.04, 2).claim(TODAY);
    LocalDate[] dates = {
      LocalDate.of(2027, 2, 28),
      LocalDate.of(2027, 8, 31),
      LocalDate.of(2028, 2, 29),
      LocalDate.of(2028, 8, 31)
    };
    assertThat(claim.flows().size()).isEqualTo(4);
    for (int i = 0; i < dates.length; i++) {
      assertThat(claim.flows().time(i)).isEqualTo(TODAY.years(dates[i]));
    }
    // 91 of the 181 days from 31 August to 28 February
    assertThat(claim.accrued()).isCloseTo(2.0 * 91 / 181, within(1e-14));
  }

  @Test
  void act365CouponsHaveTheDaysOfTheirPeriod() {
    Claim claim = actual365("2027-11-30", 0.0365, 2).claim(TODAY);
    assertThat(claim.flows().amount(0)).isCloseTo(0.01 * 181, within(1e-14));
    assertThat(claim.flows().amount(1)).isCloseTo(100 + 0.01 * 184, within(1e-13));
    assertThat(claim.accrued()).isZero();
    Claim later = actual365("2027-11-10", 0.0365, 2).claim(TODAY);
    assertThat(later.accrued()).isCloseTo(0.01 * 20, within(1e-14));
  }

  @Test
  void settlementIsCountedInBusinessDays() {
    // 2026-11-27 is a Friday
    TimeAxis friday = TimeAxis.from(LocalDate.of(2026, 11, 27));
    Bond bond = Bond.of(Moment.parse("2028-12-01"), 0.04, 2, DayCount.ACT_ACT_ICMA, 100, 2);
    Claim claim = bond.claim(friday);
    assertThat(claim.settlement()).isEqualTo(friday.years(LocalDate.of(2026, 12, 1)));
    assertThat(claim.accrued()).isZero(); // the coupon of settlement day is the seller's
    assertThat(claim.flows().size()).isEqualTo(4);
  }

  @Test
  void aTenorWithADateIsADate() {
    Claim claim = bond("2Y", 0.04, 1).claim(TODAY);
    assertThat(claim.flows().times())
        .containsExactly(
            TODAY.years(LocalDate.of(2027, 11, 30)), TODAY.years(LocalDate.of(2028, 11, 30)));
  }

  @Test
  void theZeroOptionReceivesTheBondLessTheStrike() {
    ZeroBond zero = ZeroBond.of(Moment.parse("3"), 100);
    Claim call =
        new ZeroOption(OptionKind.CALL, Moment.parse("1"), zero, 87).claim(TimeAxis.undated());
    assertThat(call.flows().isEmpty()).isTrue();
    Right right = call.rights().get(0);
    assertThat(right.party()).isEqualTo(Right.Party.HOLDER);
    assertThat(right.decision()).isEqualTo(1);
    assertThat(right.received()).isEqualTo(flows(1, -87, 3, 100));
    Claim put =
        new ZeroOption(OptionKind.PUT, Moment.parse("1"), zero, 87).claim(TimeAxis.undated());
    assertThat(put.rights().get(0).received()).isEqualTo(flows(1, 87, 3, -100));
  }

  private static CashFlows flows(double t, double a, double u, double b) {
    return CashFlows.of(new double[] {t, u}, new double[] {a, b});
  }

  @Test
  void aCleanStrikeHasAccruedInterestAdded() {
    Bond bond = bond("2.25", 0.08, 2);
    BondOption clean =
        new BondOption(OptionKind.CALL, Moment.parse("0.5"), bond, 99, BondOption.StrikeKind.CLEAN);
    BondOption cash =
        new BondOption(OptionKind.CALL, Moment.parse("0.5"), bond, 99, BondOption.StrikeKind.CASH);
    CashFlows received = clean.claim(TimeAxis.undated()).rights().get(0).received();
    assertThat(received.amount(0)).isCloseTo(-99 - 2, within(1e-14));
    assertThat(cash.claim(TimeAxis.undated()).rights().get(0).received().amount(0)).isEqualTo(-99);
    assertThat(received.times()).containsExactly(0.5, 0.75, 1.25, 1.75, 2.25);
  }

  @Test
  void theCouponOnTheDayOfExerciseIsNotBought() {
    BondOption option =
        new BondOption(
            OptionKind.PUT, Moment.parse("3"), bond("5", 0.1, 2), 98, BondOption.StrikeKind.CLEAN);
    CashFlows received = option.claim(TimeAxis.undated()).rights().get(0).received();
    assertThat(received.times()).containsExactly(3, 3.5, 4, 4.5, 5);
    assertThat(received.amount(0)).isEqualTo(98); // nothing has accrued on a coupon day
  }

  @Test
  void termsThatMakeNoSenseAreRefusedInWords() {
    assertThatThrownBy(() -> bond("2026-11-30", 0.04, 2).claim(TODAY))
        .hasMessage("maturity must lie after today, found 2026-11-30");
    assertThatThrownBy(() -> bond("2030-11-30", 0.04, 2).claim(TimeAxis.undated()))
        .hasMessageContaining("a date needs an as-of date");
    assertThatThrownBy(() -> bond("3", 0.04, 3)).hasMessageContaining("1, 2, 4 or 12, found 3");
    assertThatThrownBy(() -> bond("300", 0.04, 2).claim(TimeAxis.undated()))
        .hasMessageContaining("within 200 years");
    assertThatThrownBy(() -> bond("3", Double.NaN, 2)).hasMessageContaining("NaN");
    assertThatThrownBy(() -> ZeroBond.of(Moment.parse("3"), 0))
        .hasMessage("redemption must be above 0, found 0.0");
    assertThatThrownBy(() -> ZeroBond.of(Moment.parse("-1"), 100).claim(TimeAxis.undated()))
        .hasMessageContaining("maturity must lie after today");
    ZeroBond zero = ZeroBond.of(Moment.parse("3"), 100);
    assertThatThrownBy(
            () ->
                new ZeroOption(OptionKind.CALL, Moment.parse("3"), zero, 90)
                    .claim(TimeAxis.undated()))
        .hasMessage("maturity must lie after expiry, found 3.0");
    assertThatThrownBy(
            () ->
                new ZeroOption(OptionKind.CALL, Moment.parse("-0.1"), zero, 90)
                    .claim(TimeAxis.undated()))
        .hasMessageContaining("expiry must not lie before today");
    assertThatThrownBy(
            () ->
                new BondOption(
                        OptionKind.CALL,
                        Moment.parse("6"),
                        bond("5", 0.04, 2),
                        90,
                        BondOption.StrikeKind.CLEAN)
                    .claim(TimeAxis.undated()))
        .hasMessageContaining("maturity must lie after settlement or expiry");
    assertThatThrownBy(() -> OptionKind.of("straddle")).hasMessage("expected call or put");
  }

  @Test
  void couponsAndAccrualFollowTheDayCount() {
    TimeAxis axis = TimeAxis.from(LocalDate.of(2024, 3, 31));
    // 31 August 2023 to 29 February 2024 to 31 August 2024; 31 days into 184.
    record Expected(DayCount count, double coupon, double accrued) {}
    for (Expected e :
        new Expected[] {
          new Expected(DayCount.ACT_ACT_ICMA, 1 / 2.0, 31 / 368.0),
          new Expected(DayCount.ACT_ACT_ISDA, 184 / 366.0, 31 / 366.0),
          new Expected(DayCount.ACT_365F, 184 / 365.0, 31 / 365.0),
          new Expected(DayCount.ACT_365L, 184 / 366.0, 31 / 366.0),
          new Expected(DayCount.ACT_360, 184 / 360.0, 31 / 360.0),
          new Expected(DayCount.THIRTY_360, 1 / 2.0, 32 / 360.0),
          new Expected(DayCount.THIRTY_U_360, 1 / 2.0, 30 / 360.0),
          new Expected(DayCount.THIRTY_E_360, 1 / 2.0, 31 / 360.0),
          new Expected(DayCount.THIRTY_E_360_ISDA, 1 / 2.0, 30 / 360.0),
          // 29 February 2024 is a Thursday, 31 August a Saturday: 132 weekdays, 22 of them gone.
          new Expected(DayCount.BUS_252, 132 / 252.0, 22 / 252.0)
        }) {
      Bond bond = Bond.of(Moment.parse("2024-08-31"), 0.06, 2, e.count(), 100, 0);
      Claim claim = bond.claim(axis);
      assertThat(claim.flows().amounts())
          .as(e.count().label())
          .containsExactly(new double[] {100 + 6 * e.coupon()}, within(3e-14));
      assertThat(claim.accrued()).as(e.count().label()).isCloseTo(6 * e.accrued(), within(1e-15));
    }
  }
}
