package ebbline.instrument;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.time.BusinessCalendar;
import ebbline.time.CalendarRegistry;
import ebbline.time.DayCount;
import ebbline.time.ExDividend;
import ebbline.time.Moment;
import ebbline.time.Roll;
import ebbline.time.ScheduleTerms.AccrualDates;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;

class LegInstrumentsTest {
  private static final TimeAxis TODAY = TimeAxis.from(LocalDate.of(2026, 11, 30));
  private static final BusinessCalendar TARGET = CalendarRegistry.standard().find("target");

  private static final List<DayCount> DAY_COUNTS = List.of(DayCount.values());
  private static final List<Roll> ROLLS = List.of(Roll.values());
  private static final List<AccrualDates> ACCRUALS = List.of(AccrualDates.values());

  private static <T> T any(List<T> all, Random random) {
    return all.get(random.nextInt(all.size()));
  }

  private static BondTerms terms(String maturity, int frequency) {
    return BondTerms.of(Moment.parse(maturity), frequency, DayCount.ACT_ACT_ICMA);
  }

  private static double years(String date) {
    return TODAY.years(LocalDate.parse(date));
  }

  @Test
  void aStepAppliesFromItsCouponDateOn() {
    FixedLeg leg =
        new FixedLeg(
            terms("2030-06-30", 1),
            0.03,
            List.of(new FixedLeg.Step(Moment.parse("2028-06-30"), 0.04)),
            List.of());
    assertThat(new StepBond(leg).claim(TODAY).flows().amounts())
        .containsExactly(new double[] {3, 3, 4, 104}, within(1e-14));
    FixedLeg off =
        new FixedLeg(
            terms("2030-06-30", 1),
            0.03,
            List.of(new FixedLeg.Step(Moment.parse("2028-07-30"), 0.04)),
            List.of());
    assertThatThrownBy(() -> off.on(TODAY)).hasMessageContaining("such as 2028-06-30");
    FixedLeg past =
        new FixedLeg(
            terms("2030-06-30", 1),
            0.03,
            List.of(new FixedLeg.Step(Moment.parse("2020-06-30"), 0.05)),
            List.of());
    assertThat(past.on(TODAY).coupon(0)).isCloseTo(5, within(1e-14));
  }

  @Test
  void interestIsPaidOnWhatIsStillOwed() {
    FixedLeg leg =
        new FixedLeg(
            terms("4", 1).withRedemption(102),
            0.05,
            List.of(),
            List.of(
                new FixedLeg.Sinking(Moment.ofYears(2), 25),
                new FixedLeg.Sinking(Moment.ofYears(3), 25)));
    PlacedLeg placed = leg.on(TimeAxis.undated());
    assertThat(placed.flowsAfter(0).amounts())
        .containsExactly(new double[] {5, 30, 28.75, 53.5}, within(1e-13));
    assertThat(placed.outstanding(1.5)).isEqualTo(100);
    assertThat(placed.outstanding(2)).isEqualTo(75);
    assertThat(placed.accrued(2.5)).isCloseTo(1.875, within(1e-14));
    assertThat(placed.redemptionAfter(1)).isEmpty();
    assertThat(placed.redemptionAfter(3).getAsDouble()).isCloseTo(51, within(1e-13));
    assertThatThrownBy(
            () ->
                new FixedLeg(
                    terms("4", 1),
                    0.05,
                    List.of(),
                    List.of(new FixedLeg.Sinking(Moment.ofYears(2), 101))))
        .hasMessageContaining("repay the face at most");
    FixedLeg between =
        new FixedLeg(
            terms("4", 1), 0.05, List.of(), List.of(new FixedLeg.Sinking(Moment.ofYears(2.5), 10)));
    assertThatThrownBy(() -> between.on(TimeAxis.undated())).hasMessageContaining("coupon date");
  }

  @Test
  void exDividendTheCouponGoesToTheSellerAndAccruedIsNegative() {
    BondTerms gilt =
        terms("2034-12-07", 2)
            .withSettlement(0, ExDividend.businessDays(7, BusinessCalendar.WEEKENDS));
    PlacedLeg leg = FixedLeg.of(gilt, 0.04).on(TODAY); // ex from 2026-11-26
    Claim claim = leg.claim();
    assertThat(claim.flows().time(0)).isEqualTo(years("2027-06-07"));
    assertThat(claim.accrued()).isCloseTo(-2 * 7 / 183.0, within(1e-14));
    assertThat(leg.yieldTerms().periods()[0]).isCloseTo(1 + 7 / 183.0, within(1e-14));
    PlacedLeg before = FixedLeg.of(gilt, 0.04).on(TimeAxis.from(LocalDate.of(2026, 11, 25)));
    assertThat(before.claim().accrued()).isPositive();
  }

  @Test
  void aRolledPaymentIsLateAndCarriesInterestOnlyWhereTheAccrualIsAdjusted() {
    // 2027-02-28 is a Sunday.
    Conventions unadjusted =
        new Conventions(DayCount.ACT_360, TARGET, Roll.FOLLOWING, false, AccrualDates.UNADJUSTED);
    Conventions adjusted =
        new Conventions(DayCount.ACT_360, TARGET, Roll.FOLLOWING, false, AccrualDates.ADJUSTED);
    BondTerms terms = terms("2028-02-28", 2);
    PlacedLeg still = FixedLeg.of(terms.withConventions(unadjusted), 0.036).on(TODAY);
    PlacedLeg moved = FixedLeg.of(terms.withConventions(adjusted), 0.036).on(TODAY);
    assertThat(still.periods().get(0).payment()).isEqualTo(years("2027-03-01"));
    assertThat(still.coupon(0)).isCloseTo(0.01 * 184, within(1e-12));
    // The adjusted period runs from Friday 2026-08-28 to Monday 2027-03-01.
    assertThat(moved.coupon(0)).isCloseTo(0.01 * 185, within(1e-12));
    assertThat(still.yieldTerms().paidPeriods()[0])
        .isCloseTo(still.yieldTerms().periods()[0] + 1 / 184.0, within(1e-14));
  }

  @Test
  void settlementWaitsForTheIssue() {
    BondTerms fresh = terms("2031-12-15", 2).withEnds(OddPeriods.from(Moment.parse("2026-12-15")));
    Claim claim = FixedLeg.of(fresh, 0.04).on(TODAY).claim();
    assertThat(claim.settlement()).isEqualTo(years("2026-12-15"));
    assertThat(claim.accrued()).isZero();
    assertThat(claim.flows().size()).isEqualTo(10);
    BondTerms timed = terms("5", 2).withEnds(OddPeriods.from(Moment.ofYears(0.25)));
    Claim stub = FixedLeg.of(timed, 0.04).on(TimeAxis.undated()).claim();
    assertThat(stub.flows().amount(0)).isCloseTo(1, within(1e-14));
    assertThat(stub.settlement()).isEqualTo(0.25);
  }

  @Test
  void aFloatingNoteKnowsItsRunningCouponAndLeavesTheOthersOpen() {
    FloatingNote note = new FloatingNote(terms("2028-02-28", 2), OptionalDouble.of(0.04), 0.002);
    Claim claim = note.claim(TODAY);
    assertThat(claim.flows().times()).containsExactly(years("2027-02-28"), years("2028-02-28"));
    assertThat(claim.flows().amounts()).containsExactly(new double[] {2, 100}, within(1e-14));
    assertThat(claim.floating()).hasSize(2);
    assertThat(claim.floating().get(0).margin()).isCloseTo(0.1, within(1e-15));
    assertThat(claim.accrued()).isCloseTo(2 * 94 / 184.0, within(1e-13));
    FloatingNote today = new FloatingNote(terms("5", 2), OptionalDouble.of(0.04), 0.002);
    assertThat(today.claim(TimeAxis.undated()).flows().amounts())
        .containsExactly(new double[] {2, 100}, within(1e-14));
    assertThat(today.claim(TimeAxis.undated()).floating()).hasSize(9);
    FloatingNote unknown = new FloatingNote(terms("2028-02-28", 2), OptionalDouble.empty(), 0.002);
    assertThatThrownBy(() -> unknown.claim(TODAY)).hasMessageContaining("give it as coupon");
  }

  @Test
  void payerAndReceiverOfASwapOweEachOther() {
    BondTerms terms = terms("5", 2);
    Claim payer =
        new Swap(SwapSide.PAYER, terms, 0.03, OptionalDouble.empty()).claim(TimeAxis.undated());
    Claim receiver =
        new Swap(SwapSide.RECEIVER, terms, 0.03, OptionalDouble.empty()).claim(TimeAxis.undated());
    assertThat(payer.flows()).isEqualTo(receiver.flows().times(-1));
    assertThat(payer.floating().get(3).notional()).isEqualTo(100);
    assertThat(payer.floating()).hasSize(10);
    BondTerms seasoned =
        terms("2030-08-31", 2)
            .withEnds(
                new OddPeriods(
                    Optional.of(Moment.parse("2025-08-31")), Optional.empty(), Optional.empty()));
    assertThatThrownBy(
            () -> new Swap(SwapSide.PAYER, seasoned, 0.03, OptionalDouble.empty()).claim(TODAY))
        .hasMessageContaining("give it as fixing");
  }

  /** Seeded: a bond is the sum of a zero-coupon bond and its coupons, whatever its dates. */
  @Test
  void theSumOfTheStripsIsTheBond() {
    Random random = new Random(41);
    for (int i = 0; i < 10_000; i++) {
      DayCount dayCount = any(DAY_COUNTS, random);
      int frequency = new int[] {1, 2, 4, 12}[random.nextInt(4)];
      LocalDate maturity = LocalDate.of(2027, 1, 1).plusDays(random.nextInt(15_000));
      BondTerms terms =
          BondTerms.of(Moment.of(maturity), frequency, dayCount)
              .withConventions(
                  new Conventions(
                      dayCount,
                      TARGET,
                      any(ROLLS, random),
                      random.nextBoolean(),
                      any(ACCRUALS, random)));
      PlacedLeg bond = FixedLeg.of(terms, 0.05).on(TODAY);
      PlacedLeg zero = FixedLeg.of(terms, 0).on(TODAY);
      PlacedLeg one = FixedLeg.of(terms, 0.01).on(TODAY);
      double sum = total(bond.flowsAfter(0));
      double parts = total(zero.flowsAfter(0)) + 5 * (total(one.flowsAfter(0)) - 100);
      assertThat(sum).as("seed 41, bond %s", i).isCloseTo(parts, within(1e-9));
      double first = bond.couponTimesAfter(0)[0];
      // Accrued interest rises by the day count until the coupon is paid.
      double before = -1;
      for (int k = 0; k < 5; k++) {
        double time = Math.floor(first * 365 * k / 5) / 365;
        double accrued = bond.accrued(time);
        assertThat(accrued).as("seed 41, bond %s", i).isGreaterThanOrEqualTo(before);
        before = accrued;
      }
      assertThat(before).isLessThanOrEqualTo(bond.coupon(bond.periodAt(0)) * 1.06);
    }
  }

  private static double total(CashFlows flows) {
    double sum = 0;
    for (double amount : flows.amounts()) {
      sum += amount;
    }
    return sum;
  }
}
