package ebbline.instrument;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import ebbline.time.DayCount;
import ebbline.time.Moment;
import ebbline.time.TimeAxis;
import java.time.LocalDate;
import java.util.List;
import org.junit.jupiter.api.Test;

class CallableBondTest {
  private static final TimeAxis TODAY = TimeAxis.from(LocalDate.of(2026, 11, 30));

  private static FixedLeg leg(String maturity) {
    return FixedLeg.of(BondTerms.of(Moment.parse(maturity), 2, DayCount.ACT_ACT_ICMA), 0.06);
  }

  private static ExerciseTerm on(String at, double price) {
    return new ExerciseTerm.OnDate(Moment.parse(at), price);
  }

  private static ExerciseTerm range(String from, String to, double price) {
    return new ExerciseTerm.InRange(Moment.parse(from), Moment.parse(to), price);
  }

  private static CallableBond callable(String maturity, String notice, ExerciseTerm... calls) {
    return new CallableBond(
        "callable-bond",
        leg(maturity),
        List.of(calls),
        List.of(),
        new Notice(Moment.parse(notice)));
  }

  @Test
  void aRangeIsEveryCouponDateInItAndKeepsTheCouponOfTheDay() {
    Claim claim = callable("5", "0", range("2", "4", 101)).claim(TimeAxis.undated());
    assertThat(claim.rights()).hasSize(5);
    Right first = claim.rights().get(0);
    assertThat(first.party()).isEqualTo(Right.Party.ISSUER);
    assertThat(first.decision()).isEqualTo(2);
    assertThat(first.keptUntil()).isEqualTo(2);
    assertThat(first.received()).isEqualTo(CashFlows.single(2, 101));
  }

  @Test
  void betweenCouponsTheAccruedInterestIsPaidToo() {
    Claim claim = callable("5", "0.25", on("2.25", 102)).claim(TimeAxis.undated());
    Right call = claim.rights().get(0);
    assertThat(call.decision()).isEqualTo(2);
    assertThat(call.keptUntil()).isEqualTo(2.25);
    assertThat(call.received().amount(0)).isCloseTo(103.5, within(1e-13));
  }

  @Test
  void noticeOnDatesIsCountedBackByTheCalendar() {
    Claim claim = callable("2031-11-30", "1M", on("2028-05-31", 100)).claim(TODAY);
    assertThat(claim.rights().get(0).decision()).isEqualTo(TODAY.years(LocalDate.of(2028, 4, 30)));
    assertThat(claim.rights().get(0).keptUntil()).isEqualTo(TODAY.years(LocalDate.of(2028, 5, 31)));
  }

  @Test
  void callsOfThePastAreHistoryAndLeaveTheRest() {
    Claim claim = callable("2031-11-30", "0", range("2020-11-30", "2029-05-30", 100)).claim(TODAY);
    assertThat(claim.rights()).hasSize(5);
    assertThat(claim.rights().get(0).decision()).isPositive();
  }

  @Test
  void aCallRepaysWhatIsStillOwed() {
    FixedLeg sinking =
        new FixedLeg(
            BondTerms.of(Moment.ofYears(4), 1, DayCount.ACT_ACT_ICMA),
            0.05,
            List.of(),
            List.of(new FixedLeg.Sinking(Moment.ofYears(2), 40)));
    CallableBond bond =
        new CallableBond("callable-bond", sinking, List.of(on("2", 102)), List.of(), Notice.NONE);
    Right call = bond.claim(TimeAxis.undated()).rights().get(0);
    assertThat(call.received().amount(0)).isCloseTo(61.2, within(1e-13));
  }

  @Test
  void bothPartiesMayHaveRights() {
    CallableBond bond =
        new CallableBond(
            "putable-bond",
            leg("5"),
            List.of(range("2", "4", 102)),
            List.of(on("3", 98)),
            Notice.NONE);
    assertThat(bond.claim(TimeAxis.undated()).rights()).hasSize(6);
    assertThat(bond.claim(TimeAxis.undated()).rights().get(2).party())
        .isEqualTo(Right.Party.HOLDER);
  }

  @Test
  void whatMakesNoSenseIsRefusedInWords() {
    assertThatThrownBy(() -> callable("5", "0", on("5", 100)).claim(TimeAxis.undated()))
        .hasMessageContaining("before maturity");
    assertThatThrownBy(() -> callable("5", "0", on("7", 100)).claim(TimeAxis.undated()))
        .hasMessageContaining("before maturity 5.0, found 7.0");
    assertThatThrownBy(
            () -> callable("5", "0", range("2", "4", 100), on("3", 101)).claim(TimeAxis.undated()))
        .hasMessageContaining("overlap at 3.0");
    assertThatThrownBy(() -> callable("5", "0", range("4", "2", 100)).claim(TimeAxis.undated()))
        .hasMessageContaining("runs forward");
    assertThatThrownBy(() -> callable("5", "0", range("2.1", "2.2", 100)).claim(TimeAxis.undated()))
        .hasMessageContaining("coupon date in a range");
    assertThatThrownBy(() -> callable("5", "2.5", on("2", 100)).claim(TimeAxis.undated()))
        .hasMessageContaining("longer than the time to the first call");
    assertThatThrownBy(() -> on("2", -100)).hasMessageContaining("above 0, found -100.0 at 2.0");
    assertThatThrownBy(() -> new Notice(Moment.parse("2027-01-01")))
        .hasMessageContaining("a tenor such as 30D");
    CallableBond early =
        new CallableBond(
            "callable-bond",
            FixedLeg.of(
                BondTerms.of(Moment.parse("2036-11-30"), 2, DayCount.ACT_ACT_ICMA)
                    .withEnds(OddPeriods.from(Moment.parse("2027-05-31"))),
                0.05),
            List.of(on("2027-03-31", 100)),
            List.of(),
            Notice.NONE);
    assertThatThrownBy(() -> early.claim(TODAY)).hasMessageContaining("after the issue 2027-05-31");
  }

  @Test
  void aBermudanSwaptionEntersWhatIsLeftOfTheSwap() {
    BermudanSwaption payer =
        new BermudanSwaption(
            SwapSide.PAYER,
            BondTerms.of(Moment.ofYears(5), 1, DayCount.ACT_ACT_ICMA),
            0.04,
            List.of(new BermudanSwaption.Window(Moment.ofYears(2), Moment.ofYears(4))));
    Claim claim = payer.claim(TimeAxis.undated());
    assertThat(claim.rights()).hasSize(3);
    assertThat(claim.rights().get(1).received().times()).containsExactly(3, 4, 5);
    assertThat(claim.rights().get(1).received().amounts())
        .containsExactly(new double[] {100, -4, -104}, within(1e-13));
    BermudanSwaption off =
        new BermudanSwaption(
            SwapSide.PAYER,
            BondTerms.of(Moment.ofYears(5), 1, DayCount.ACT_ACT_ICMA),
            0.04,
            List.of(new BermudanSwaption.Window(Moment.ofYears(2.5), Moment.ofYears(2.5))));
    assertThatThrownBy(() -> off.claim(TimeAxis.undated())).hasMessageContaining("coupon date");
  }
}
